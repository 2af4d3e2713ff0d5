'use client';

import type { Route } from 'next';
import type { ModeDto } from '@/src/data/mode/dto';
import { writeBlock, type AnyBlock, type Typed } from '@/src/exchange/catalogue/block';
import { MODE_BLOCKS, NEW_MODE_BLOCKS } from '@/src/exchange/catalogue/mode';
import { NewObject } from '../../../_catalogue/new-object';
import { add } from '../actions';

type Name = (typeof NEW_MODE_BLOCKS)[number];

const START: Readonly<Record<Name, Typed>> = {
  head: {},
  channels: {
    channels: [{ edgeHz: '', sideband: 'upper', polarisation: 'R', bandwidthHz: '32', bits: '2' }],
  },
  correlator: { integrationSeconds: '2', spectralChannels: '64' },
};

/** A mode from nothing, or from the channels and settings of another. */
export function NewMode({ copied }: { copied: ModeDto | null }) {
  const start = copied ? startOf(copied) : START;
  return (
    <NewObject
      title={copied ? `Copy of ${copied.blocks.head.name}` : 'New mode'}
      list={{ href: '/modes' as Route, label: 'Modes' }}
      label="Add the mode"
      blocks={NEW_MODE_BLOCKS.map((name) => ({
        name,
        block: MODE_BLOCKS[name] as unknown as AnyBlock,
        start: start[name],
      }))}
      note="Which stations can do it, and how, follows on the mode’s page."
      add={add}
    />
  );
}

const startOf = ({ blocks }: ModeDto): Readonly<Record<Name, Typed>> => ({
  head: { ...writeBlock(MODE_BLOCKS.head, blocks.head), name: `${blocks.head.name}, copy` },
  channels: writeBlock(MODE_BLOCKS.channels, blocks.channels),
  correlator: writeBlock(MODE_BLOCKS.correlator, blocks.correlator),
});
