'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useState } from 'react';
import { numberText } from '@/app/_ui/format';
import type { ModeDto } from '@/src/data/mode/dto';
import { MODE_BLOCKS, plainChannel } from '@/src/exchange/catalogue/mode';
import { dataRateOf } from '@/src/schedule/mode-channels';
import { ObjectBlock, type Editing } from '../../../_catalogue/object-block';
import { ObjectHead } from '../../../_catalogue/object-head';
import { Pairs } from '../../../_catalogue/pairs';
import { keepBlock, retire } from '../actions';
import { ChannelsView } from './channels-view';
import { CorrelatorView } from './correlator-view';
import { AbilityView } from './ability-view';
import '../../../_catalogue/object.css';

export function ModePage({ mode }: { mode: ModeDto }) {
  const { id, blocks, canEdit } = mode;
  const { head } = blocks;
  const channels = blocks.channels.channels;
  const [open, setOpen] = useState<string | null>(null);
  const editing: Editing = { open, setOpen, can: () => canEdit, keep: (act) => keepBlock(id, act) };
  const bitsPerS = dataRateOf(channels.map(plainChannel));

  return (
    <>
      <ObjectHead
        list={{ href: '/modes' as Route, label: 'Modes' }}
        name={head.name}
        sub={`${head.band} · ${numberText(bitsPerS / 1e6)} Mb/s`}
        noun="mode"
        retiredAtMs={mode.retiredAtMs}
        sessionsAhead={mode.sessionsAhead}
        retire={canEdit ? (isRetired) => retire(id, isRetired) : null}
      >
        {canEdit && (
          <Link href={`/modes/new?copy=${id}` as Route} className="btn">
            Copy mode
          </Link>
        )}
      </ObjectHead>
      <div className="object-columns object-columns-2">
        <div className="object-column">
          <ObjectBlock name="channels" block={MODE_BLOCKS.channels} value={blocks.channels} editing={editing}>
            <ChannelsView channels={channels} toneSpacingHz={head.toneSpacingHz} />
          </ObjectBlock>
          <ObjectBlock name="stations" block={MODE_BLOCKS.stations} value={blocks.stations} editing={editing}>
            <AbilityView mode={mode} />
          </ObjectBlock>
        </div>
        <div className="object-column object-side">
          <ObjectBlock name="head" block={MODE_BLOCKS.head} value={head} editing={editing}>
            <Pairs
              pairs={[
                ['Name', head.name],
                ['Band', head.band],
                [
                  'Coherence time',
                  head.coherenceSeconds === null
                    ? 'not given: no loss is taken'
                    : `${numberText(head.coherenceSeconds)} s`,
                ],
                [
                  'Calibration tones',
                  head.toneSpacingHz === null ? 'none' : `each ${numberText(head.toneSpacingHz / 1e6)} MHz`,
                ],
                ['Recorded in 1 h on source', `${numberText((bitsPerS * 3600) / 8 / 1e9, 1)} GB a station`],
              ]}
            />
          </ObjectBlock>
          <ObjectBlock
            name="correlator"
            block={MODE_BLOCKS.correlator}
            value={blocks.correlator}
            editing={editing}
          >
            <CorrelatorView correlator={blocks.correlator} channels={channels} />
          </ObjectBlock>
          <p className="help">Offers and published versions keep the mode as it was when they were made.</p>
        </div>
      </div>
    </>
  );
}
