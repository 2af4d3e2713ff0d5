/** Half-open span of UTC, [start, end). */
export type Interval = { start: Date; end: Date };

export const MS_PER_SECOND = 1000;
export const MS_PER_DAY = 86_400_000;

/** Calendar fields of an instant in UTC; month 1–12, dayOfYear 1–366. */
export type UtcParts = {
  year: number;
  month: number;
  day: number;
  dayOfYear: number;
  hour: number;
  minute: number;
  second: number;
  millisecond: number;
};

/**
 * Calendar fields of an instant.
 *
 * @param ms  epoch ms, UTC without leap seconds
 * @returns the fields in UTC (Gregorian calendar)
 * @throws RangeError if ms is not a finite instant (programmer error)
 *
 * Source  ISO 8601 calendar, by way of ECMA-262 Date
 */
export function utcParts(ms: number): UtcParts {
  const date = new Date(ms);
  if (!Number.isFinite(date.getTime())) throw new RangeError(`Not an instant: ${ms}`);
  return {
    year: date.getUTCFullYear(),
    month: date.getUTCMonth() + 1,
    day: date.getUTCDate(),
    dayOfYear: dayOfYear(ms),
    hour: date.getUTCHours(),
    minute: date.getUTCMinutes(),
    second: date.getUTCSeconds(),
    millisecond: date.getUTCMilliseconds(),
  };
}

/**
 * Ordinal day of an instant's UTC year.
 *
 * @param ms  epoch ms, UTC
 * @returns 1 on 1 January … 365, or 366 in a leap year
 * @throws RangeError if ms is not a finite instant (programmer error)
 *
 * Source  ISO 8601 ordinal date
 */
export function dayOfYear(ms: number): number {
  const year = new Date(ms).getUTCFullYear();
  if (!Number.isFinite(year)) throw new RangeError(`Not an instant: ${ms}`);
  return Math.floor((ms - Date.UTC(year, 0, 1)) / MS_PER_DAY) + 1;
}

/**
 * Length of an interval.
 *
 * @param interval  half-open span of UTC
 * @returns seconds; negative if it ends before it starts
 */
export function intervalSeconds(interval: Interval): number {
  return (interval.end.getTime() - interval.start.getTime()) / MS_PER_SECOND;
}

/**
 * The first and the last of some instants.
 *
 * @param timesMs  epoch ms, one at least, in any order
 * @throws RangeError if there is none, or one is not finite (programmer error)
 */
export function extentOf(timesMs: ArrayLike<number>): { startMs: number; endMs: number } {
  let [startMs, endMs] = [Infinity, -Infinity];
  for (let time = 0; time < timesMs.length; time += 1) {
    const atMs = timesMs[time] ?? NaN;
    if (!Number.isFinite(atMs)) throw new RangeError(`Not an instant: ${atMs}`);
    if (atMs < startMs) startMs = atMs;
    if (atMs > endMs) endMs = atMs;
  }
  if (startMs > endMs) throw new RangeError('No instants');
  return { startMs, endMs };
}
