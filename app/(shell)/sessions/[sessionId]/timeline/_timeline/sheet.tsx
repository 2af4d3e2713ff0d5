'use client';

import type { SkyTable } from '@/src/schedule/sky-table';
import { Away } from './away';
import { Axis } from './axis';
import { FringeStrip, HatchPatterns } from './fringe-strip';
import { Ghost } from './ghost';
import { ChosenBars, ChosenWash, Headings } from './headings';
import { NowLine } from './now-line';
import { ProblemMarks } from './problem-marks';
import { Ribbons, RiseAndSet, StationsUpStrip } from './ribbons';
import { Brackets, inView, Notes, Slews } from './scans';
import type { Frame } from './scale';
import { Staves, TimeLines } from './staves';
import { focusOf } from './tool-bar';
import { useDerivedStore } from './derived';
import { useStore } from 'zustand';
import { useTimeline } from './store';

/** The drawing. Order of layers: DESIGN §8. */
export function Sheet({ frame, table, loudKey }: { frame: Frame; table: SkyTable; loudKey: string | null }) {
  const stations = useTimeline((state) => state.stations);
  const sources = useTimeline((state) => state.context.sources);
  const focusId = useTimeline(focusOf);
  const chosenId = useTimeline((state) => state.chosen?.scanId ?? null);
  const fadedScanId = useTimeline((state) =>
    state.placing?.isCopy ? null : (state.placing?.scanId ?? null),
  );
  const answers = useTimeline((state) => state.answers);
  const away = useTimeline((state) => state.away);
  const derived = useStore(useDerivedStore());
  const { plan, numbers, legs, lateKeys, outlook } = derived;
  const chosen = plan.scans.find((scan) => scan.id === chosenId && inView(frame, scan));
  return (
    <svg width={frame.width} height={frame.height} aria-hidden="true" className="block flex-none select-none">
      <HatchPatterns />
      <clipPath id="sheet-clip">
        <rect x={frame.left} y={frame.headings} width={frame.drawWidth} height={frame.height} />
      </clipPath>
      <clipPath id="bars-clip">
        <rect x={frame.left - 8} y={frame.headings} width={frame.drawWidth + 16} height={frame.height} />
      </clipPath>
      <g clipPath="url(#bars-clip)">{chosen && <ChosenWash frame={frame} scan={chosen} />}</g>
      <TimeLines frame={frame} />
      {focusId !== null && <Ribbons frame={frame} table={table} sourceId={focusId} stations={stations} />}
      <Staves frame={frame} stations={stations} answers={answers} />
      <Brackets frame={frame} plan={plan} stations={stations} fadedScanId={fadedScanId} />
      <g clipPath="url(#sheet-clip)">
        <Slews frame={frame} stations={stations} legs={legs} lateKeys={lateKeys} fadedScanId={fadedScanId} />
        <Notes
          frame={frame}
          plan={plan}
          stations={stations}
          legs={legs}
          table={table}
          focusId={focusId}
          lateKeys={lateKeys}
          fadedScanId={fadedScanId}
        />
        <Away frame={frame} stations={stations} away={away} />
      </g>
      <Headings
        frame={frame}
        plan={plan}
        numbers={numbers}
        sources={sources}
        chosenId={chosenId}
        placingId={fadedScanId}
      />
      <FringeStrip frame={frame} plan={plan} outlook={outlook} chosenId={chosenId} />
      <StationsUpStrip frame={frame} table={table} sourceId={focusId} />
      <g clipPath="url(#bars-clip)">{chosen && <ChosenBars frame={frame} scan={chosen} />}</g>
      <Axis frame={frame} />
      <Ghost frame={frame} table={table} />
      {focusId !== null && <RiseAndSet frame={frame} table={table} sourceId={focusId} stations={stations} />}
      <ProblemMarks frame={frame} derived={derived} stations={stations} loudKey={loudKey} />
      <NowLine frame={frame} />
    </svg>
  );
}

/** The sheet while elevations are on their way: ruled and labelled, without notes. */
export function RuledSheet({ frame, children }: { frame: Frame; children?: React.ReactNode }) {
  const stations = useTimeline((state) => state.stations);
  const answers = useTimeline((state) => state.answers);
  return (
    <div className="relative">
      <svg width={frame.width} height={frame.height} aria-hidden="true" className="block flex-none">
        <TimeLines frame={frame} />
        <Staves frame={frame} stations={stations} answers={answers} />
        <Axis frame={frame} />
      </svg>
      {children}
    </div>
  );
}
