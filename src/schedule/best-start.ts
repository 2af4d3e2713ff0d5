import type { Spans } from '../sky/interval-set';
import { SIDEREAL_DAY_SECONDS } from '../units/constants';

/** What a session would have if it started then: means over the targets. */
export type StartHours = { startMs: number; stationHours: number; baselineHours: number };

const STEP_MS = 600_000;
const HOUR_MS = 3_600_000;
const SIDEREAL_DAY_MS = Math.round(SIDEREAL_DAY_SECONDS * 1000);

/** Last instant that windows must be known for, so that every start of a sidereal day can be weighed. */
export const startsEndMs = (fromMs: number, lengthMs: number): number => fromMs + SIDEREAL_DAY_MS + lengthMs;

/**
 * Station-hours and baseline-hours of a session of given length, for each start of one sidereal day.
 *
 * @param windows   times in which a station sees a target, sorted and disjoint, from fromMs to startsEndMs at least
 * @param fromMs    first start, epoch ms
 * @param lengthMs  of the session, > 0
 * @returns every ten minutes and at the end of the sidereal day; hours, means over the targets, 0 without targets
 * @throws RangeError if an instant or the length is not finite, or the length not positive (programmer error)
 *
 * Shape   windows[target][station][span]
 * Error   rounding
 * Source  integral of the count n of stations up, and of n(n−1)/2; both are straight between the windows' edges
 */
export function startHours(
  windows: readonly (readonly Spans[])[],
  fromMs: number,
  lengthMs: number,
): StartHours[] {
  if (!(Number.isFinite(fromMs) && Number.isFinite(lengthMs) && lengthMs > 0))
    throw new RangeError(`Not a start and a length: ${fromMs}, ${lengthMs}`);
  const starts: number[] = [];
  for (let ms = 0; ms < SIDEREAL_DAY_MS; ms += STEP_MS) starts.push(fromMs + ms);
  starts.push(fromMs + SIDEREAL_DAY_MS);
  const targets = windows.map(knotsOf);
  return starts.map((startMs) => {
    let [stations, baselines] = [0, 0];
    for (const knots of targets) {
      const [from, until] = [gatheredAt(knots, startMs), gatheredAt(knots, startMs + lengthMs)];
      stations += until.stations - from.stations;
      baselines += until.baselines - from.baselines;
    }
    const scale = targets.length > 0 ? 1 / (targets.length * HOUR_MS) : 0;
    return { startMs, stationHours: stations * scale, baselineHours: baselines * scale };
  });
}

/**
 * The start with the most station-hours; of equal ones that with more baseline-hours, then the earlier.
 *
 * @returns null without starts
 */
export function bestStart(starts: readonly StartHours[]): StartHours | null {
  return starts.reduce<StartHours | null>((best, one) => {
    if (best === null) return one;
    const more = one.stationHours - best.stationHours;
    if (Math.abs(more) > TIE_HOURS) return more > 0 ? one : best;
    return one.baselineHours - best.baselineHours > TIE_HOURS ? one : best;
  }, null);
}

/** A few seconds: less is no reason to move a session. */
const TIE_HOURS = 0.002;

/** Stations up from here on, and what was gathered until here. */
type Knot = { ms: number; up: number; stations: number; baselines: number };

function knotsOf(stations: readonly Spans[]): Knot[] {
  const edges = stations
    .flat()
    .flatMap(([from, until]): [number, number][] => [
      [from, 1],
      [until, -1],
    ])
    .sort(([a], [b]) => a - b);
  const knots: Knot[] = [];
  let last: Knot = { ms: -Infinity, up: 0, stations: 0, baselines: 0 };
  for (const [ms, by] of edges) {
    last = { ...carried(last, ms), up: last.up + by };
    knots.push(last);
  }
  return knots;
}

function carried({ ms, up, stations, baselines }: Knot, untilMs: number): Knot {
  const length = up > 0 ? untilMs - ms : 0;
  return {
    ms: untilMs,
    up,
    stations: stations + up * length,
    baselines: baselines + ((up * (up - 1)) / 2) * length,
  };
}

function gatheredAt(knots: readonly Knot[], ms: number): Knot {
  let [low, high] = [0, knots.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((knots[middle]?.ms ?? Infinity) <= ms) low = middle + 1;
    else high = middle;
  }
  const before = knots[low - 1];
  return before ? carried(before, ms) : { ms, up: 0, stations: 0, baselines: 0 };
}
