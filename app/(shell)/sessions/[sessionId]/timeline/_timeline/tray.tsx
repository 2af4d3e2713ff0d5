'use client';

import { useDraggable } from '@dnd-kit/core';
import { useState } from 'react';
import type { TimelineSource } from '@/src/data/plan/dto';
import { blocksOf } from '@/src/schedule/blocks';
import type { SkyTable } from '@/src/schedule/sky-table';
import { stationsUp } from '@/src/schedule/sky-table';
import { useKeyPlacing } from './key-placing';
import { ROLE_WORDS } from './said';
import { focusOf } from './tool-bar';
import { useTimeline, useTimelineStore } from './store';

/** The sources of the session: drag one onto the staves, or pick one and press Enter. */
export function Tray({ table }: { table: SkyTable | null }) {
  const sources = useTimeline((state) => state.sources);
  const canEdit = useTimeline((state) => state.canEdit);
  const isOpen = useTimeline((state) => state.isTrayOpen);
  const [find, setFind] = useState('');
  const word = find.trim().toLowerCase().replace('−', '-');
  const found = sources.filter(({ name }) => name.toLowerCase().includes(word));
  return (
    <aside
      id="tray"
      aria-label="Sources"
      className={`${isOpen ? 'flex' : 'hidden'} max-h-[50dvh] min-h-0 flex-col border-b border-rule desk:flex desk:max-h-none desk:border-b-0 desk:border-r`}
    >
      <div className="border-b border-rule px-[12px] py-[9px]">
        <label className="sr-only" htmlFor="find-source">
          Find a source
        </label>
        <input
          id="find-source"
          className="field"
          type="search"
          placeholder="Find a source"
          value={find}
          onChange={(event) => setFind(event.target.value)}
        />
      </div>
      <ul className="min-h-0 flex-1 overflow-y-auto">
        {found.map((source) => (
          <SourceRow key={source.id} source={source} table={table} />
        ))}
        {found.length === 0 && (
          <li className="help px-[12px] py-2">
            {sources.length === 0
              ? 'This session has no sources yet.'
              : `No source is called “${find.trim()}”.`}
          </li>
        )}
        {canEdit && found.length > 0 && (
          <li className="help px-[12px] py-[9px]">
            Drag a source onto the staves, or pick one and press <span className="kbd">Enter</span>. Bars show
            how many stations see it.
          </li>
        )}
      </ul>
    </aside>
  );
}

function SourceRow({ source, table }: { source: TimelineSource; table: SkyTable | null }) {
  const store = useTimelineStore();
  const canEdit = useTimeline((state) => state.canEdit);
  const band = useTimeline((state) => state.mode.band);
  const isFocus = useTimeline((state) => focusOf(state) === source.id);
  const isHeld = useTimeline(
    (state) => state.placing?.what === 'new' && state.placing.sourceId === source.id,
  );
  const scans = useTimeline(
    (state) =>
      blocksOf(state.plan).filter(({ legs }) => legs.some(({ sourceId }) => sourceId === source.id)).length,
  );
  const { startNew } = useKeyPlacing();
  const { setNodeRef, listeners } = useDraggable({ id: source.id, disabled: !canEdit || !table });
  const flux = source.components[band]?.reduce((sum, { fluxJy }) => sum + fluxJy, 0);
  return (
    <li className="border-b border-hair">
      <button
        ref={setNodeRef}
        type="button"
        {...listeners}
        onClick={() => store.setState({ traySourceId: source.id, chosen: null })}
        onKeyDown={(event) => {
          if (event.key !== 'Enter' || !canEdit || !table) return;
          event.preventDefault();
          store.setState({ traySourceId: source.id });
          startNew(source.id);
        }}
        aria-pressed={isFocus}
        className={`relative block h-[49px] w-full touch-manipulation py-[7px] pl-[22px] pr-[12px] text-left ${
          canEdit ? 'cursor-grab' : ''
        } ${isFocus ? 'bg-teal-wash' : 'hover:bg-sunk'} ${isHeld ? 'outline-dashed outline-[1.5px] -outline-offset-[3px] outline-ink' : ''}`}
      >
        {canEdit && <span aria-hidden="true" className="dots absolute left-[7px] top-2.5 h-[30px] w-2" />}
        {isFocus && <span aria-hidden="true" className="absolute inset-y-0 left-0 w-1 bg-teal" />}
        <span className="flex items-baseline justify-between font-head">
          {source.name}
          <span className="text-small font-text text-ink2">
            {flux === undefined ? 'no flux' : `${flux.toFixed(2)} Jy`}
          </span>
        </span>
        <span className="mt-0.5 flex items-end justify-between text-[11.5px] leading-[14px] text-ink2">
          <span className="whitespace-nowrap">
            {ROLE_WORDS[source.role]}, {scans} of {source.wantedScans}
          </span>
          {table && <UpBars table={table} sourceId={source.id} isFocus={isFocus} />}
        </span>
      </button>
    </li>
  );
}

const BARS = 32;

/** How many stations see the source, over the hours shown. */
function UpBars({ table, sourceId, isFocus }: { table: SkyTable; sourceId: string; isFocus: boolean }) {
  const startMs = useTimeline((state) => state.view.startMs);
  const hours = useTimeline((state) => state.view.hours);
  const staves = useTimeline((state) => state.stations.length);
  const stepMs = (hours * 3_600_000) / BARS;
  const steps = stationsUp(table, sourceId, startMs, startMs + hours * 3_600_000);
  let path = '';
  for (let bar = 0; bar < BARS; bar++) {
    const ms = startMs + (bar + 0.5) * stepMs;
    const up = steps.find((step) => ms >= step.startMs && ms < step.endMs)?.up ?? 0;
    const height = (12 * up) / Math.max(1, staves);
    path += `M${bar * 1.75} 12.5v${-height}h1.75v${height}z`;
  }
  return (
    <svg width="56" height="13" aria-hidden="true" className="flex-none">
      <line x1="0" x2="56" y1="12.5" y2="12.5" stroke="var(--edge)" />
      <path d={path} fill={isFocus ? 'var(--teal)' : 'var(--edge)'} />
    </svg>
  );
}
