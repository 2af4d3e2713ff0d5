'use client';

import { useEffect, useRef, useState } from 'react';
import type { SkyTable } from '@/src/schedule/sky-table';
import { useDerived } from './derived';
import { Footnotes } from './footnotes';
import { TimelineGrid } from './grid';
import { SHEET_ID } from './places';
import { MoveBar } from './move-bar';
import { Overview } from './overview';
import { ReadOut } from './read-out';
import { frameOf, type Frame } from './scale';
import { RuledSheet, Sheet } from './sheet';
import { useSheetPointer } from './sheet-pointer';
import { useTimeline } from './store';

const OVERVIEW_HEIGHT = 44;
/** Room kept for the notes before staves are drawn closer. */
const NOTES_HEIGHT = 112;
const LEAST_WIDTH = 680;

type Props = { table: SkyTable | null; problem: string | null; again: () => void };

/** The sheet with its notes and map, drawn to the room there is. */
export function Middle({ table, problem, again }: Props) {
  const { boxRef, width, height } = useRoom();
  const [loudKey, setLoudKey] = useState<string | null>(null);
  const view = useTimeline((state) => state.view);
  const staves = useTimeline((state) => state.stations.length);
  const isReady = useDerived((derived) => derived.isReady);
  const room = height === null ? null : height - OVERVIEW_HEIGHT - NOTES_HEIGHT;
  const frame = frameOf(Math.max(LEAST_WIDTH, width), view, staves, room);
  return (
    <div ref={boxRef} className="relative flex min-h-0 min-w-0 flex-col bg-sheet">
      <div
        className="relative min-w-0 flex-none overflow-x-auto overflow-y-hidden"
        data-ready={table && isReady ? '' : undefined}
      >
        {table && isReady ? (
          <LiveSheet frame={frame} table={table} loudKey={loudKey} />
        ) : (
          <RuledSheet frame={frame}>
            <Waiting problem={problem} again={again} count={staves} />
          </RuledSheet>
        )}
      </div>
      <MoveBar />
      <Footnotes onLoud={setLoudKey} />
      <div className="flex-none overflow-hidden">
        <Overview width={width} />
      </div>
    </div>
  );
}

function LiveSheet({ frame, table, loudKey }: { frame: Frame; table: SkyTable; loudKey: string | null }) {
  const pointer = useSheetPointer(frame);
  return (
    <div id={SHEET_ID} className="relative" style={{ width: frame.width }} {...pointer}>
      <Sheet frame={frame} table={table} loudKey={loudKey} />
      <TimelineGrid />
      <ReadOut frame={frame} />
    </div>
  );
}

function Waiting({ problem, again, count }: { problem: string | null; again: () => void; count: number }) {
  const late = useLate();
  if (problem !== null) {
    return (
      <div role="alert" className="error-box absolute left-[110px] top-[120px] max-w-[420px]">
        <p className="mb-2">
          <b>The sheet is not drawn.</b> {problem}
        </p>
        <button type="button" className="btn btn-sm" onClick={again}>
          Ask again
        </button>
      </div>
    );
  }
  return (
    <p role="status" className="absolute left-[110px] top-[60px] text-ink2">
      {late && `Working out elevations of ${count} ${count === 1 ? 'station' : 'stations'}`}
    </p>
  );
}

/** Nothing is said before 300 ms. */
function useLate(): boolean {
  const [late, setLate] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLate(true), 300);
    return () => clearTimeout(timer);
  }, []);
  return late;
}

/** Width of the middle column; its height only where the page does not scroll. */
function useRoom() {
  const boxRef = useRef<HTMLDivElement>(null);
  const [room, setRoom] = useState<{ width: number; height: number | null }>({ width: 972, height: null });
  useEffect(() => {
    const box = boxRef.current;
    if (!box) return;
    const desk = window.matchMedia('(min-width: 1024px)');
    const measure = () => setRoom({ width: box.clientWidth, height: desk.matches ? box.clientHeight : null });
    const observer = new ResizeObserver(measure);
    observer.observe(box);
    return () => observer.disconnect();
  }, []);
  return { boxRef, ...room };
}
