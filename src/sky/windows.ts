import { normalise180, normalise360 } from '../units/angle';
import { MS_PER_DAY } from '../units/time';
import type { Interval } from '../units/time';
import { spansBetweenTurns, spansWhere, stepsOver } from './crossings';
import type { Margin } from './crossings';
import { horizonElevationDeg, prepareHorizon } from './horizon';
import type { Horizon } from './horizon';
import { intervalsOf, spansOf, sweep } from './interval-set';
import type { Spans } from './interval-set';
import { sunSeparationDeg } from './position';
import type { RotationOptions } from './position';
import { changeMs, highestMs } from './search';
import { siteFrame } from './site';
import type { SiteFrame } from './site';
import { trackAzEl, trackElevationDeg, trackHourAngleDeg, trackOf } from './track';
import type { Track } from './track';
import type { SkyPosition, SkyStation } from './types';

/** Between these steps the Earth turns by 15′: a mask's margin has one extremum between corners at most. */
const MASK_STEP_MS = 60_000;
/** Elevation moves by 0.25° in a step: farther than this outside a mask's heights it cannot matter. */
const MASK_BAND_DEG = 1;
const SUN_STEP_MS = MS_PER_DAY / 8;
/** The Sun moves by 1.02° a day at most; with room for aberration. */
const SUN_DEG_PER_DAY = 1.05;
const HALF_TURN_MS = 43_082_045;

/**
 * Times at which a station can see a source.
 *
 * @param source   ICRS place
 * @param station  site; limits in degrees of geometric elevation, inclusive; horizon wraps at 360° and the stricter
 *                 of mask and limit holds; sunLimitDeg = least distance from the Sun
 * @param span     half-open span of UTC, 1900–2100
 * @param opts     dut1Seconds = UT1 − UTC, default 0
 * @returns sorted, disjoint, half-open intervals inside the span, edges on milliseconds; empty if never
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   edges ≤ 0.1 s or, where the source moves along a limit, what 0.1″ of elevation is worth; tested against
 *         ERFA to 1 s or 0.002° (tests/sky/windows.test.ts)
 * Source  science: exact geometry cut at the culminations, where elevation turns; masks sampled each minute, each corner
 *         and extremum refined
 */
export function visibilityWindows(
  source: SkyPosition,
  station: SkyStation,
  span: Interval,
  opts: RotationOptions = {},
): Interval[] {
  if (!(span.end > span.start)) return [];
  return trackWindows(trackOf(source, span, opts), source, station, span);
}

/**
 * Windows of many sources at many stations.
 *
 * Shape   [source][station][window]
 * Error   as visibilityWindows; 25 µs a pair and day without masks, 0.5 ms with
 */
export function windowsFor(
  sources: readonly SkyPosition[],
  stations: readonly SkyStation[],
  span: Interval,
  opts: RotationOptions = {},
): Interval[][][] {
  if (!(span.end > span.start)) return sources.map(() => stations.map(() => []));
  return sources.map((source) => {
    const track = trackOf(source, span, opts);
    return stations.map((station) => trackWindows(track, source, station, span));
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
 * visibilityWindows on a track that is already there; the span may be part of the track's.
 *
 * Error   as visibilityWindows
 */
export function trackWindows(
  track: Track,
  source: SkyPosition,
  station: SkyStation,
  span: Interval,
): Interval[] {
  if (!(span.end > span.start)) return [];
  const cuts = cutsOf(track, source, station, span);
  return intervalsOf(cuts.length === 1 ? (cuts[0] ?? []) : sweep(cuts, cuts.length));
}

/** One set of spans for each thing that limits the view. Mount limits (keyhole, HA–Dec, X–Y) become further sets here. */
function cutsOf(track: Track, source: SkyPosition, station: SkyStation, span: Interval): Spans[] {
  const { minElevationDeg, maxElevationDeg, sunLimitDeg } = station;
  const site = siteFrame(station.site);
  const horizon = prepareHorizon(station.horizon);
  const turns = culminations(track, site, span);
  const elevation: Margin = (ms) => trackElevationDeg(track, site, ms);
  const cuts = [spansBetweenTurns((ms) => elevation(ms) - minElevationDeg, turns)];
  if (maxElevationDeg !== undefined && maxElevationDeg < 90) {
    cuts.push(spansBetweenTurns((ms) => maxElevationDeg - elevation(ms), turns));
  }
  if (horizon && horizon.highestDeg > minElevationDeg) {
    const lowestDeg = Math.max(minElevationDeg, horizon.lowestDeg);
    cuts.push(aboveHorizon(track, site, horizon, lowestDeg, turns));
  }
  if (sunLimitDeg !== undefined && sunLimitDeg > 0) cuts.push(awayFromSun(source, sunLimitDeg, span));
  return cuts;
}

/** The ends of the span and the culminations between: elevation turns there and nowhere else. */
function culminations(track: Track, site: SiteFrame, span: Interval): number[] {
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  const startAngle = trackHourAngleDeg(track, site, startMs);
  // the first half turn that ends at hour angle 0 or 180
  const toGo = normalise360(-startAngle) % 180;
  const nodes = [startMs];
  for (
    let ms = startMs + (toGo / 180) * HALF_TURN_MS - HALF_TURN_MS;
    ms < endMs + HALF_TURN_MS;
    ms += HALF_TURN_MS
  ) {
    const aboutMs = 600_000;
    const upper = Math.abs(trackHourAngleDeg(track, site, ms)) < 90;
    const sign = upper ? 1 : -1;
    const turn = highestMs((at) => sign * trackElevationDeg(track, site, at), ms - aboutMs, ms + aboutMs);
    if (turn > startMs && turn < endMs) nodes.push(turn);
  }
  nodes.push(endMs);
  return nodes;
}

function aboveHorizon(
  track: Track,
  site: SiteFrame,
  horizon: Horizon,
  lowestDeg: number,
  turns: readonly number[],
): Spans {
  const margin: Margin = (ms) => {
    const { azimuthDeg, elevationDeg } = trackAzEl(track, site, ms);
    return elevationDeg - horizonElevationDeg(horizon, azimuthDeg);
  };
  const matters = (ms: number) => {
    const elevationDeg = trackElevationDeg(track, site, ms);
    return elevationDeg > lowestDeg - MASK_BAND_DEG && elevationDeg < horizon.highestDeg + MASK_BAND_DEG;
  };
  const ends = { start: new Date(turns[0] ?? NaN), end: new Date(turns.at(-1) ?? NaN) };
  const steps = stepsOver(ends, MASK_STEP_MS).filter(matters);
  const nodes = [...new Set([...turns, ...steps])].sort((a, b) => a - b);
  return spansWhere(margin, withCorners(track, site, horizon, nodes));
}

/** Adds the instants at which the azimuth passes a corner of the mask. */
function withCorners(track: Track, site: SiteFrame, horizon: Horizon, nodes: readonly number[]): number[] {
  const azimuth = (ms: number) => trackAzEl(track, site, ms).azimuthDeg;
  const masked = horizon.corners.slice(1, -1);
  const corners: number[] = [];
  let beforeMs = nodes[0] ?? NaN;
  let before = azimuth(beforeMs);
  for (const ms of nodes.slice(1)) {
    const here = azimuth(ms);
    // a longer step lies where the mask does not matter
    const passing = ms - beforeMs <= MASK_STEP_MS + 1 ? masked : [];
    const moved = normalise180(here - before);
    for (const corner of passing) {
      const way = normalise180(corner.azimuthDeg - before);
      if (way === 0 || way / moved <= 0 || way / moved >= 1) continue;
      const from = before;
      const sign = Math.sign(way);
      const passed = (at: number) => sign * normalise180(azimuth(at) - from) >= sign * way;
      corners.push(changeMs(passed, beforeMs, ms));
    }
    [beforeMs, before] = [ms, here];
  }
  return [...nodes, ...corners].sort((a, b) => a - b);
}

/** The Sun moves a degree a day: most spans are decided by one look. */
function awayFromSun(source: SkyPosition, limitDeg: number, span: Interval): Spans {
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  const margin: Margin = (ms) => sunSeparationDeg(source, new Date(ms)) - limitDeg;
  const reach = ((endMs - startMs) / 2 / MS_PER_DAY) * SUN_DEG_PER_DAY;
  const middle = margin((startMs + endMs) / 2);
  if (middle > reach) return [[startMs, endMs]];
  if (middle < -reach) return [];
  return spansWhere(margin, stepsOver(span, SUN_STEP_MS));
}
