import { createContext, useContext } from 'react';
import { useStore } from 'zustand';
import { createStore, type StoreApi } from 'zustand/vanilla';
import { staveOrder } from '@/app/_ui/stave-order';
import type { Timeline } from '@/src/data/plan/dto';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { planContextOf } from '../../../_plan/plan-context';
import { clampView, HOUR } from './scale';
import type { TimelineState } from './state';

export type TimelineStore = StoreApi<TimelineState>;

export function createTimelineStore(timeline: Timeline, chosenScanId: string | null = null): TimelineStore {
  const plan = unpackPlan(timeline.plan);
  const chosen = plan.scans.find(({ id }) => id === chosenScanId);
  const mode = timeline.modes.find(({ id }) => id === timeline.session.modeId) ?? timeline.modes[0];
  if (!mode) throw new Error(`session ${timeline.session.code} has no mode`);
  return createStore<TimelineState>(() => ({
    session: timeline.session,
    stations: staveOrder(timeline.stations),
    sources: timeline.sources,
    ...stationsWord(timeline),
    mode,
    canEdit: timeline.canEdit,
    confirmed: plan,
    revs: timeline.revs,
    seq: timeline.seq,
    steps: timeline.steps,
    pending: [],
    plan,
    line: 'ok',
    notice: null,
    view: chosen ? clampView({ hours: 8, startMs: chosen.startMs - 3 * HOUR }, plan) : firstView(plan.span),
    snap: 'slew',
    chosen: chosen ? { scanId: chosen.id, station: null } : null,
    isTrayOpen: false,
    traySourceId: null,
    pinnedSourceId: null,
    placing: null,
  }));
}

/** What the stations say and their clocks show: it changes without the journal. */
export const stationsWord = (timeline: Timeline) => ({
  context: planContextOf(timeline),
  answers: timeline.answers,
  away: timeline.away,
  clocks: timeline.clocks,
});

const StoreContext = createContext<TimelineStore | null>(null);
export const TimelineProvider = StoreContext.Provider;

export function useTimelineStore(): TimelineStore {
  const store = useContext(StoreContext);
  if (!store) throw new Error('outside the timeline');
  return store;
}

export const useTimeline = <T>(select: (state: TimelineState) => T): T =>
  useStore(useTimelineStore(), select);

function firstView(span: { startMs: number; lengthSeconds: number }) {
  const hours = span.lengthSeconds * 1000 <= 8 * HOUR ? span.lengthSeconds / 3600 : 8;
  return { startMs: span.startMs, hours: hours < 8 ? 8 : hours };
}
