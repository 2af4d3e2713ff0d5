'use client';

import { lazy, Suspense, useState } from 'react';
import { countBlocks } from '@/src/schedule/blocks';
import type { PlanMode } from '@/src/schedule/context';
import { removeScan } from '@/src/schedule/gestures/remove-scan';
import { scanStopMs, type Scan } from '@/src/schedule/plan';
import { clockText, shortLengthText } from '@/src/schedule/words';
import { dayOfYear } from '@/src/units/time';
import { useActs } from '../_timeline/acts';
import { useDerived } from '../_timeline/derived';
import { useKeyPlacing } from '../_timeline/key-placing';
import { focusGrid } from '../_timeline/places';
import { ROLE_WORDS } from '../_timeline/said';
import { useTimeline } from '../_timeline/store';
import { ScanProblems } from './scan-problems';
import { StationTable } from './station-table';
import { Triangle } from './triangle';

/** Times, stations, problems and expected fringes of a scan. */
export default function ScanPanel({ scan }: { scan: Scan }) {
  const numbers = useDerived((derived) => derived.numbers);
  const context = useTimeline((state) => state.context);
  const stations = useTimeline((state) => state.stations);
  const count = useDerived((derived) => countBlocks(derived.plan));
  const source = context.sources[scan.sourceId];
  const mode = context.modes[scan.modeId];
  const flux = mode && source?.components[mode.band]?.reduce((sum, { fluxJy }) => sum + fluxJy, 0);
  return (
    <>
      <div className="flex items-baseline gap-2">
        <h1 className="text-[22px] leading-[26px]">Scan {numbers.get(scan.id)}</h1>
        <span className="text-ink2">of {count}</span>
        <span className="chip ml-auto">
          {scan.stations.length} of {stations.length} stations
        </span>
      </div>
      <div>
        <b className="text-lead">{source?.name}</b>{' '}
        <span className="text-ink2">
          {source && ROLE_WORDS[source.role]}
          {flux === undefined ? '' : `, ${flux.toFixed(2)} Jy`}
        </span>
        {mode && (
          <div className="help whitespace-nowrap" style={{ fontStretch: '84%' }}>
            {modeLine(mode)}
          </div>
        )}
      </div>
      <dl className="grid grid-cols-[auto_auto_1fr] gap-x-3.5 border-y border-rule py-[5px] text-table">
        <Time
          label={`Start, day ${String(dayOfYear(scan.startMs)).padStart(3, '0')}`}
          value={clockText(scan.startMs)}
        />
        <Time label="Stop" value={clockText(scanStopMs(scan))} />
        <Time label="Length" value={shortLengthText(scan.lengthSeconds)} />
      </dl>
      <StationTable scan={scan} />
      <ScanProblems scanId={scan.id} />
      <Triangle scan={scan} />
      {scan.comment !== '' && <p className="help">{scan.comment}</p>}
      <Actions scan={scan} />
    </>
  );
}

function Time({ label, value }: { label: string; value: string }) {
  return (
    <div>
      <dt className="text-[11.5px] leading-[14px] text-ink2">{label}</dt>
      <dd className="text-lead font-head">{value}</dd>
    </div>
  );
}

const EditScan = lazy(() => import('./edit-scan'));

function Actions({ scan }: { scan: Scan }) {
  const canEdit = useTimeline((state) => state.canEdit);
  const number = useDerived((derived) => derived.numbers.get(scan.id)) ?? '';
  const [isEditing, setIsEditing] = useState(false);
  const { dispatch } = useActs();
  const { startMove } = useKeyPlacing();
  if (!canEdit) return null;
  return (
    <div className="sticky bottom-[-12px] mt-auto flex gap-2 bg-paper pb-[12px] pt-2">
      <button type="button" className="btn" onClick={() => setIsEditing(true)}>
        Edit scan
      </button>
      <button
        type="button"
        className="btn"
        title="Move with the arrow keys (M)"
        onClick={() => startMove(scan.id)}
      >
        Move
      </button>
      <button
        type="button"
        className="btn btn-danger ml-auto"
        onClick={() => {
          dispatch((plan) => removeScan(plan, scan.id));
          focusGrid();
        }}
      >
        Remove
      </button>
      {isEditing && (
        <Suspense>
          <EditScan scan={scan} number={number} onClose={() => setIsEditing(false)} />
        </Suspense>
      )}
    </div>
  );
}

/** "22 GHz, 2 × 32 MHz × 2 pol, 2 bit, 512 Mb/s" */
function modeLine(mode: PlanMode): string {
  const { band, channelsPerPolarisation, channelBandwidthHz, polarisations, bits } = mode;
  const megabits = (2 * channelBandwidthHz * bits * channelsPerPolarisation * polarisations) / 1e6;
  return `${band}, ${channelsPerPolarisation} × ${channelBandwidthHz / 1e6} MHz × ${polarisations} pol, ${bits} bit, ${megabits} Mb/s`;
}
