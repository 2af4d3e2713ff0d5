'use client';

import { createContext, useContext, useEffect, useRef, useState } from 'react';
import type { SkyTable } from '@/src/schedule/sky-table';
import { clockText, shortLengthText } from '@/src/schedule/words';
import { scanStopMs, type ScanId } from '@/src/schedule/plan';
import { useDerivedStore } from './derived';
import { firstFitting, judge, nextSnap, type Judged } from './placement';
import { spareWords, VERDICT_WORDS } from './read-out';
import { clampView, HOUR, viewEndMs } from './scale';
import { focusGrid } from './places';
import { pickedUp } from './sheet-pointer';
import type { Placing, TimelineState } from './state';
import { useTimelineStore } from './store';
import { useDrop } from './use-drop';

export const DEFAULT_LENGTH_SECONDS = 600;
/** The live region speaks at most so often. */
const SAY_EVERY_MS = 1000;

type KeyPlacing = {
  startNew: (sourceId: string) => void;
  startMove: (scanId: ScanId) => void;
  startLength: (scanId: ScanId) => void;
  /** seconds, + later or longer */
  nudge: (seconds: number) => void;
  toNextSnap: (direction: 1 | -1) => void;
  drop: (force: boolean) => void;
  cancel: () => void;
  /** what the live region says */
  sentence: string;
};

const KeyContext = createContext<KeyPlacing | null>(null);

export function useKeyPlacing(): KeyPlacing {
  const value = useContext(KeyContext);
  if (!value) throw new Error('outside the timeline');
  return value;
}

/** Adding, moving and stretching without a mouse: what is held is dropped by Enter, let go by Escape. */
export function KeyPlacingProvider({
  table,
  children,
}: {
  table: SkyTable | null;
  children: React.ReactNode;
}) {
  const store = useTimelineStore();
  const derived = useDerivedStore();
  const drop = useDrop();
  const { sentence, say } = useSpeech();

  const hold = (placing: Placing) => {
    const state = store.getState();
    store.setState({ placing, view: viewHolding(state, placing) });
    const judged = judge(placing, state.plan, state.context);
    const number = placing.scanId === null ? null : (derived.getState().numbers.get(placing.scanId) ?? null);
    say(sentenceOf(judged, number));
  };
  const begin = (placing: Placing) => {
    hold(placing);
    focusGrid();
  };
  const pick = (scanId: ScanId, what: 'move' | 'length') => {
    const { plan, canEdit, revs } = store.getState();
    const scan = plan.scans.find(({ id }) => id === scanId);
    if (scan && canEdit) begin(pickedUp(scan, what, null, revs));
  };
  const change = (update: (placing: Placing) => Placing) => {
    const { placing } = store.getState();
    if (placing?.by === 'keys') hold(update(placing));
  };

  const value: KeyPlacing = {
    sentence,
    startNew: (sourceId) => {
      const state = store.getState();
      if (!state.canEdit || !table) return;
      begin(firstFitting(state, newPlacing(state, sourceId)));
    },
    startMove: (scanId) => pick(scanId, 'move'),
    startLength: (scanId) => pick(scanId, 'length'),
    nudge: (seconds) =>
      change((placing) =>
        placing.what === 'length'
          ? { ...placing, lengthSeconds: Math.max(1, placing.lengthSeconds + seconds), snappedTo: null }
          : { ...placing, startMs: placing.startMs + seconds * 1000, snappedTo: null },
      ),
    toNextSnap: (direction) => change((placing) => nextSnap(store.getState(), placing, direction)),
    drop: (force) => {
      const { placing } = store.getState();
      if (placing?.by !== 'keys') return;
      drop({ force });
      if (store.getState().placing === null) say('');
      focusGrid();
    },
    cancel: () => {
      store.setState({ placing: null });
      say('');
      focusGrid();
    },
  };
  return <KeyContext.Provider value={value}>{children}</KeyContext.Provider>;
}

/** At the end of the chosen scan, else where the view begins. */
function newPlacing(state: TimelineState, sourceId: string): Placing {
  const { plan, chosen, view, mode } = state;
  const after = plan.scans.find(({ id }) => id === chosen?.scanId);
  const cursorMs = after ? scanStopMs(after) : Math.max(view.startMs, plan.span.startMs);
  return {
    by: 'keys',
    what: 'new',
    scanId: null,
    sourceId,
    modeId: mode.id,
    startMs: Math.ceil(cursorMs / 10_000) * 10_000,
    lengthSeconds: DEFAULT_LENGTH_SECONDS,
    stations: 'all-up',
    snappedTo: null,
    pointer: null,
    isCopy: false,
    seenRevs: state.revs,
    outStation: null,
  };
}

function viewHolding({ view, plan }: TimelineState, { startMs, lengthSeconds }: Placing) {
  const isSeen = startMs >= view.startMs && startMs + lengthSeconds * 1000 <= viewEndMs(view);
  return isSeen ? view : clampView({ ...view, startMs: startMs - (view.hours * HOUR) / 3 }, plan);
}

/** "Scan 16, start 01:03:00. Fits. 10 of 10 baselines. Af has 11 s spare." */
export function sentenceOf(judged: Judged, number: string | null): string {
  const { placing, expected, possible, tightest, verdict, reason, sourceName } = judged;
  const who = number === null ? `New scan of ${sourceName}` : `Scan ${number}`;
  const what =
    placing.what === 'length'
      ? `length ${shortLengthText(placing.lengthSeconds)}`
      : `start ${clockText(placing.startMs)}`;
  const parts = [
    `${who}, ${what}.`,
    VERDICT_WORDS[verdict],
    reason,
    `${expected} of ${possible} baselines.`,
    tightest
      ? `${tightest.station} ${tightest.spareSeconds < 0 ? 'is' : 'has'} ${spareWords(tightest.spareSeconds)}.`
      : '',
  ];
  return parts.filter((part) => part !== '').join(' ');
}

/** The newest sentence, at most one a second. */
function useSpeech() {
  const [sentence, setSentence] = useState('');
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  const waiting = useRef<string | null>(null);
  useEffect(
    () => () => {
      if (timer.current) clearTimeout(timer.current);
    },
    [],
  );
  const say = (next: string) => {
    if (timer.current) {
      waiting.current = next;
      return;
    }
    setSentence(next);
    timer.current = setTimeout(() => {
      timer.current = null;
      if (waiting.current === null) return;
      const late = waiting.current;
      waiting.current = null;
      say(late);
    }, SAY_EVERY_MS);
  };
  return { sentence, say };
}
