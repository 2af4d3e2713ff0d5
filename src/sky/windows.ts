import type { Interval } from '../units/time';
import { intervalsOf, intervalsWithin, spansOf, sweep } from './interval-set';
import type { RotationOptions } from './position';
import { sightSpans, sightsOf } from './sights';
import { awayFromSun } from './sun-cut';
import { trackOf, tracksOf } from './track';
import type { Track } from './track';
import type { SkyPosition, SkyStation } from './types';
import { viewOf, wholeOf } from './view';

/**
 * Times at which a station can see a source.
 *
 * @param source   ICRS place: raDeg any finite angle, decDeg [-90, 90]
 * @param station  site; limits in degrees of geometric elevation, [-90, 90], inclusive; horizon wraps at 360° and the
 *                 stricter of mask and limit holds; sunLimitDeg = least distance from the Sun, [0, 180]; mount and away
 *                 as SkyStation has them
 * @param span     half-open span of UTC, 1900–2100; nothing is seen in an empty one
 * @param opts     dut1Seconds = UT1 − UTC, default 0
 * @returns sorted, disjoint, half-open intervals inside the span, edges on milliseconds; empty if never
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   edges ≤ 0.1 s or, where the source moves along a limit, what 0.1″ of elevation is worth; tested against
 *         ERFA to 0.2 s or 0.001° (tests/sky/windows.test.ts)
 * Source  as capSpans (limits) and floorSpans (masks)
 */
export function visibilityWindows(
  source: SkyPosition,
  station: SkyStation,
  span: Interval,
  opts: RotationOptions = {},
): Interval[] {
  if (isEmpty(span)) return [];
  return trackWindows(trackOf(source, span, opts), source, station, span);
}

/**
 * Windows of many sources at many stations.
 *
 * Shape   [source][station][window]; edges at the span's ends are one Date each, shared by all windows
 * Error   as visibilityWindows; 0.3 µs a pair and day without masks, 1.2 µs with (npm run bench windows-batch)
 */
export function windowsFor(
  sources: readonly SkyPosition[],
  stations: readonly SkyStation[],
  span: Interval,
  opts: RotationOptions = {},
): Interval[][][] {
  if (isEmpty(span)) return sources.map(() => stations.map(() => []));
  const sights = stations.map(sightsOf);
  const whole = wholeOf(span);
  const sun = awayFromSun(whole);
  return tracksOf(sources, span, opts).map((track, index) => {
    const view = viewOf(track, whole);
    const source = sources[index];
    return source
      ? sights.map((one) => intervalsWithin(sightSpans(track, source, one, view, sun), whole.span))
      : [];
  });
}

/**
 * Times at which at least k sets of intervals hold.
 *
 * @param sets     each sorted and disjoint
 * @param atLeast  k ≥ 1
 * @returns sorted, disjoint, half-open; touching ones joined, empty ones dropped
 * @throws RangeError if k is not a whole number of at least 1 (programmer error)
 *
 * Error   exact
 * Source  sweep over the edges
 */
export function overlap(sets: readonly (readonly Interval[])[], atLeast: number): Interval[] {
  return intervalsOf(sweep(sets.map(spansOf), atLeast));
}

/**
 * visibilityWindows on a track that is already there; the span may be part of the track's, or reach a day beyond it.
 *
 * Error   as visibilityWindows; beyond the track as trackOf
 */
export function trackWindows(
  track: Track,
  source: SkyPosition,
  station: SkyStation,
  span: Interval,
): Interval[] {
  if (isEmpty(span)) return [];
  const whole = wholeOf(span);
  const view = viewOf(track, whole);
  return intervalsWithin(sightSpans(track, source, sightsOf(station), view, awayFromSun(whole)), whole.span);
}

function isEmpty(span: Interval): boolean {
  const lengthMs = span.end.getTime() - span.start.getTime();
  if (!Number.isFinite(lengthMs)) throw new RangeError('The span has an end that is no instant');
  return lengthMs <= 0;
}
