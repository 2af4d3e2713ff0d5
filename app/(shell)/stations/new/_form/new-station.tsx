'use client';

import type { Route } from 'next';

import type { AnyBlock, Typed } from '@/src/exchange/catalogue/block';
import { NEW_STATION_BLOCKS, STATION_BLOCKS, stationCodeField } from '@/src/exchange/catalogue/station';
import { NewObject } from '../../../_catalogue/new-object';
import { add } from '../actions';

const START: Readonly<Record<(typeof NEW_STATION_BLOCKS)[number], Typed>> = {
  position: { positionKind: 'geodetic' },
  mount: { mountKind: 'az-el', axisOffsetM: '0' },
  recording: { bits: '2', preScanSeconds: '0', calibrationSeconds: '0' },
};

export function NewStation() {
  return (
    <NewObject
      title="New station"
      list={{ href: '/stations' as Route, label: 'Stations' }}
      label="Add the station"
      code={stationCodeField}
      blocks={NEW_STATION_BLOCKS.map((name) => ({
        name,
        block: STATION_BLOCKS[name] as unknown as AnyBlock,
        start: START[name],
      }))}
      note="Sensitivity, horizon mask, counter wiring and the rest follow on the station’s page."
      add={add}
    />
  );
}
