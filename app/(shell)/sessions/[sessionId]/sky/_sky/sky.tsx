'use client';

import { useState, type KeyboardEvent, type PointerEvent } from 'react';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { saveFile } from '@/app/_ui/save-file';
import { staveOrder } from '@/app/_ui/stave-order';
import type { SkySheet } from '@/src/data/sky/dto';
import { Axis } from './axis';
import { BestStart } from './best-start';
import { windowsCsv } from './csv';
import { Elevation } from './elevation';
import { pairText, rowsOf, type Mark } from './model';
import { msAt, useWidth, xOf, type Scale } from './scale';
import { SourcePanel } from './source-panel';
import { SourceRows } from './source-rows';
import { ToolBar } from './tool-bar';
import { WindowTable } from './window-table';

const STEP_MS = 600_000;

/** When each station sees each source, and when they see it together. */
export function Sky({ sheet: read }: { sheet: SkySheet }) {
  const sheet = { ...read, stations: staveOrder(read.stations) };
  const { session, sources, stations } = sheet;
  const [leftOut, setLeftOut] = useState<readonly string[]>([]);
  const codes = stations.map(({ code }) => code).filter((code) => !leftOut.includes(code));
  const [mark, setMark] = useState<Mark>(() =>
    stations.length > 2 ? { kind: 'least', least: Math.ceil((stations.length * 2) / 3) } : { kind: 'all' },
  );
  const [chosenId, setChosenId] = useState(sources[0]?.id ?? '');
  const [atMs, setAtMs] = useState<number | null>(null);
  const [isTable, setIsTable] = useState(false);
  const { boxRef, width } = useWidth();

  const source = sources.find(({ id }) => id === chosenId) ?? sources[0];
  if (!source || stations.length === 0) return <NothingYet sheet={sheet} />;

  const rows = rowsOf(sheet, codes, mark);
  const scale: Scale = {
    startMs: session.startMs,
    endMs: session.startMs + session.lengthSeconds * 1000,
    gmstStartHours: sheet.gmstStartHours,
    width,
  };
  const chooseCodes = (next: string[]) => {
    setLeftOut(stations.map(({ code }) => code).filter((code) => !next.includes(code)));
    if (mark.kind === 'least' && mark.least >= next.length)
      setMark(next.length > 2 ? { kind: 'least', least: next.length - 1 } : { kind: 'all' });
  };
  const onKeyDown = keysOf({
    move: (by) => {
      const index = sources.findIndex(({ id }) => id === source.id) + by;
      setChosenId(sources[Math.max(0, Math.min(sources.length - 1, index))]?.id ?? source.id);
    },
    step: (by) => {
      const next = (atMs ?? scale.startMs) + (atMs === null ? 0 : by * STEP_MS);
      setAtMs(Math.max(scale.startMs, Math.min(scale.endMs, next)));
    },
    clear: () => setAtMs(null),
  });
  const onPointerMove = (event: PointerEvent<HTMLElement>) => {
    const svg = event.target instanceof Element ? event.target.closest('svg[data-time]') : null;
    setAtMs(svg ? msAt(scale, event.clientX - svg.getBoundingClientRect().left) : null);
  };

  return (
    <>
      <div className="min-h-bar flex flex-wrap items-center border-b border-rule text-table">
        <ToolBar
          stations={stations}
          codes={codes}
          onCodes={chooseCodes}
          mark={mark}
          onMark={setMark}
          minElevationDeg={sheet.minElevationDeg}
        />
        <div className="ml-auto flex items-center gap-2 px-3.5 py-1">
          <button type="button" className="btn" aria-pressed={isTable} onClick={() => setIsTable(!isTable)}>
            {isTable ? 'As bars' : 'As a table'}
          </button>
          <button
            type="button"
            className="btn"
            onClick={() => saveFile(`${session.code}-sky.csv`, 'text/csv', windowsCsv(sheet, rows, mark))}
          >
            Export table
          </button>
        </div>
      </div>
      <div className="grid min-h-0 flex-1 grid-cols-[minmax(0,1fr)] desk:grid-cols-[minmax(0,1fr)_308px] desk:overflow-hidden">
        {isTable ? (
          <div className="min-h-0 bg-sheet desk:overflow-y-auto">
            <WindowTable sheet={sheet} rows={rows} mark={mark} count={codes.length} />
          </div>
        ) : (
          <div
            className="min-h-0 bg-sheet desk:overflow-y-auto"
            onPointerMove={onPointerMove}
            onPointerLeave={() => setAtMs(null)}
          >
            <div className="relative">
              <div className="z-axis bg-sheet desk:sticky desk:top-0">
                <Axis scale={scale} boxRef={boxRef} heads={headsOf(mark, codes.length)} />
              </div>
              <SourceRows
                rows={rows}
                scale={scale}
                mark={mark}
                count={codes.length}
                chosenId={source.id}
                onChoose={setChosenId}
                onKeyDown={onKeyDown}
              />
              <div className="bg-sheet desk:[@media(min-height:860px)]:sticky desk:[@media(min-height:860px)]:bottom-0">
                <Elevation sheet={sheet} source={source} codes={codes} scale={scale} atMs={atMs} />
                <BestStart sheet={sheet} codes={codes} />
              </div>
              <Hairline x={atMs === null ? null : xOf(scale, atMs)} />
            </div>
            <p className="help px-[12px] py-2 desk:px-[16px]">
              Bars from the top: {codes.join(', ')}. Figures: stations up. Outlined: all {codes.length}. Arrow
              keys choose a source and move the time.
            </p>
          </div>
        )}
        <SourcePanel sheet={sheet} source={source} codes={codes} mark={mark} />
      </div>
    </>
  );
}

function Hairline({ x }: { x: number | null }) {
  if (x === null) return null;
  return (
    <div
      className="pointer-events-none absolute inset-y-0 left-[12px] z-axis desk:left-[152px]"
      aria-hidden="true"
    >
      <div className="h-full w-px bg-ink2" style={{ transform: `translateX(${x.toFixed(1)}px)` }} />
    </div>
  );
}

const headsOf = (mark: Mark, count: number) => [
  `All ${count}`,
  mark.kind === 'least' ? `${mark.least} up` : mark.kind === 'pair' ? pairText(mark) : '',
  'Sun',
  'Moon',
];

type Moves = { move: (by: number) => void; step: (by: number) => void; clear: () => void };

const keysOf =
  ({ move, step, clear }: Moves) =>
  (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const acts: Readonly<Record<string, () => void>> = {
      ArrowUp: () => move(-1),
      ArrowDown: () => move(1),
      PageUp: () => move(-10),
      PageDown: () => move(10),
      Home: () => move(-Infinity),
      End: () => move(Infinity),
      ArrowLeft: () => step(event.shiftKey ? -6 : -1),
      ArrowRight: () => step(event.shiftKey ? 6 : 1),
      Escape: clear,
    };
    const act = acts[event.key];
    if (!act) return;
    act();
    event.preventDefault();
  };

function NothingYet({ sheet: { stations, session } }: { sheet: SkySheet }) {
  const isWithout = stations.length === 0 ? 'stations' : 'sources';
  return (
    <EmptySheet heading={`${session.code} has no ${isWithout} yet`} codes={stations.map(({ code }) => code)}>
      <p>
        When a source is up is worked out from the session’s stations and sources. Add {isWithout} to it
        first.
      </p>
    </EmptySheet>
  );
}
