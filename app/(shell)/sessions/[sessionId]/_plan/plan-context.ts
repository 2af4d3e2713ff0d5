import type { Timeline } from '@/src/data/plan/dto';
import type { PlanContext } from '@/src/schedule/context';

/** What the pure modules need to judge a plan, from what a page reads. */
export function planContextOf(timeline: Timeline): PlanContext {
  return {
    stations: byKey(timeline.stations, 'code'),
    sources: byKey(timeline.sources, 'id'),
    modes: byKey(timeline.modes, 'id'),
    away: {},
    clockReadAtMs: {},
    nowMs: timeline.nowMs,
    settings: timeline.settings,
  };
}

const byKey = <T, K extends keyof T>(items: readonly T[], key: K): Record<string, T> =>
  Object.fromEntries(items.map((item) => [String(item[key]), item]));
