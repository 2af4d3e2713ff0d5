import type { BaselineEnd } from '../array/baseline';
import type { PlanContext, PlanStation } from '../schedule/context';
import { stationOnMs, type Scan } from '../schedule/plan';
import { geodeticToItrf } from '../sky/site';
import type { Itrf } from '../sky/types';
import { isInView } from './in-view';

type Span = readonly [startMs: number, stopMs: number];

/** One station's part in a scan; one that is left out counts as if it took part all the time. */
export type ScanEnd = BaselineEnd & {
  station: PlanStation;
  place: Itrf;
  isOut: boolean;
  on: Span;
  /** whether it sees the source all the time of a part of `on` */
  sees: (part: Span) => boolean;
  away: readonly Span[];
};

/** The time two stations have together on source, or why they have none. */
export type Together =
  { reason: null; seconds: number; midMs: number } | { reason: 'low' | 'out' | 'declined' };

/**
 * A station's part in a scan, made once for all its baselines.
 *
 * @returns a source that is not in the context is taken as seen: it is told as missing, not as low
 */
export function scanEnd(scan: Scan, station: PlanStation, context: PlanContext): ScanEnd {
  const taking = scan.stations.find((member) => member.station === station.code);
  const { startMs, stopMs } = stationOnMs(
    scan,
    taking ?? { station: station.code, lateSeconds: 0, earlySeconds: 0 },
  );
  const source = context.sources[scan.sourceId];
  const looks = ([from, until]: Span) => !source || isInView(station, source, context.settings, from, until);
  const seesAll = looks([startMs, stopMs]);
  return {
    code: station.code,
    site: station.site,
    station,
    place: geodeticToItrf(station.site),
    isOut: !taking,
    on: [startMs, stopMs],
    sees: (part) => seesAll || looks(part),
    away: (context.away[station.code] ?? []).map(({ start, end }) => [start.getTime(), end.getTime()]),
  };
}

/**
 * The time that counts for a baseline in a scan.
 *
 * @returns seconds and middle of the overlap, less the hours declined (of several pieces the longest). Where there is
 *          none the reason, in this order: low (either sees the source outside its limits at any time of the overlap),
 *          out (left out, or the two have no time in common), declined (no second of the overlap is left)
 *
 * Source  definition of this project's verdicts
 */
export function togetherOn(first: ScanEnd, second: ScanEnd): Together {
  const both: Span = [Math.max(first.on[0], second.on[0]), Math.min(first.on[1], second.on[1])];
  if (both[1] <= both[0]) return { reason: 'out' };
  if (!first.sees(both) || !second.sees(both)) return { reason: 'low' };
  if (first.isOut || second.isOut) return { reason: 'out' };
  const [startMs, stopMs] = longestFree(both, [...first.away, ...second.away]);
  if (stopMs <= startMs) return { reason: 'declined' };
  return { reason: null, seconds: (stopMs - startMs) / 1000, midMs: (startMs + stopMs) / 2 };
}

/** The longest piece of a span that lies in none of the others, the earlier of two alike; empty if there is none. */
function longestFree([startMs, stopMs]: Span, others: readonly Span[]): Span {
  const edges = [...others].sort((a, b) => a[0] - b[0]);
  let longest: Span = [startMs, startMs];
  let fromMs = startMs;
  for (const [awayMs, backMs] of [...edges, [stopMs, stopMs] as const]) {
    const untilMs = Math.min(awayMs, stopMs);
    if (untilMs - fromMs > longest[1] - longest[0]) longest = [fromMs, untilMs];
    fromMs = Math.max(fromMs, backMs);
  }
  return longest;
}
