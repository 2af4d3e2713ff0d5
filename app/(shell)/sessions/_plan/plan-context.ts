import type { Timeline } from '@/src/data/plan/dto';
import { clockJudge } from '@/src/outlook/clock-place';
import type { OutlookContext } from '@/src/outlook/fringe-outlook';

/** With the clocks' judge as it is: its numbers too. */
export type PageContext = Omit<OutlookContext, 'judgeClock'> & { judgeClock: ReturnType<typeof clockJudge> };

/** What the pure modules need to judge a plan, from what a page reads. */
export function planContextOf(timeline: Timeline): PageContext {
  const { clocks, nowMs, settings } = timeline;
  return {
    stations: byKey(timeline.stations, 'code'),
    sources: byKey(timeline.sources, 'id'),
    modes: byKey(timeline.modes, 'id'),
    away: Object.fromEntries(
      Object.entries(timeline.away).map(([code, hours]) => [
        code,
        hours.map(({ startMs, endMs, why, isDeclined }) => ({
          start: new Date(startMs),
          end: new Date(endMs),
          why: isDeclined ? `declined: ${why}` : why,
        })),
      ]),
    ),
    clockReadAtMs: Object.fromEntries(
      Object.entries(clocks).map(([code, { readAtMs }]) => [code, readAtMs] as const),
    ),
    clockSecond: Object.fromEntries(
      Object.entries(clocks).flatMap(([code, { second }]) => {
        if (second === null || second.kind === 'checked') return [];
        const isOff = second.kind === 'off';
        return [
          [code, isOff ? { off: second.seconds, atMs: second.atMs } : { off: null, atMs: second.sinceMs }],
        ];
      }),
    ),
    nowMs,
    settings,
    judgeClock: clockJudge(clocks, nowMs, settings.clockRules),
  };
}

const byKey = <T, K extends keyof T>(items: readonly T[], key: K): Record<string, T> =>
  Object.fromEntries(items.map((item) => [String(item[key]), item]));
