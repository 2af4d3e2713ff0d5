import { degToRad } from '../units/angle';
import { capBeyond, capOf, capSpans } from './cap';
import type { Cap } from './cap';
import { prepareFloor } from './floor';
import type { Floor } from './floor';
import { floorSpans } from './floor-spans';
import { intersect, spansOf, subtract, union } from './interval-set';
import type { Spans } from './interval-set';
import { mountCuts } from './mount-cuts';
import { siteFrame } from './site';
import type { Track } from './track';
import type { SkyPosition, SkyStation } from './types';
import type { Vector3 } from '../units/vector';
import { NEVER } from './view';
import type { View } from './view';

/** All that limits the view of a station, made ready once for many sources. */
export type Sights = {
  floor: Floor | null;
  /** each must hold */
  all: readonly Cap[];
  /** of each group one must hold */
  anyOf: readonly (readonly Cap[])[];
  sunLimitDeg: number;
  away: Spans;
};

/** Times in which a source is far enough from the Sun. */
export type SunCut = (source: SkyPosition, limitDeg: number) => Spans;

const UP: Vector3 = [0, 0, 1];

/**
 * A station's limits made ready.
 *
 * @throws RangeError if a limit, a corner of the mask or the site is not finite or out of range (programmer error)
 */
export function sightsOf(station: SkyStation): Sights {
  const { minElevationDeg, maxElevationDeg = 90, sunLimitDeg = 0, mount, away = [] } = station;
  checkElevation(minElevationDeg);
  checkElevation(maxElevationDeg);
  if (!(sunLimitDeg >= 0 && sunLimitDeg <= 180))
    throw new RangeError(`Sun limit outside 0–180°: ${sunLimitDeg}`);
  const site = siteFrame(station.site);
  const cuts = mount ? mountCuts(site, mount) : { all: [], anyOf: [] };
  const floor = prepareFloor(site, minElevationDeg, station.horizon);
  const level = typeof floor === 'number' && floor > -90 ? [capOf(site, UP, Math.sin(degToRad(floor)))] : [];
  const ceiling = maxElevationDeg < 90 ? [capBeyond(site, UP, Math.sin(degToRad(maxElevationDeg)))] : [];
  return {
    floor: typeof floor === 'number' ? null : floor,
    all: [...level, ...ceiling, ...cuts.all],
    anyOf: cuts.anyOf,
    sunLimitDeg,
    away: union([spansOf(away)]),
  };
}

/**
 * Times in which nothing hides a source from a station.
 *
 * @returns sorted and disjoint; view.whole itself where it always sees it
 */
export function sightSpans(
  track: Track,
  source: SkyPosition,
  sights: Sights,
  view: View,
  sun: SunCut,
): Spans {
  let held = view.whole;
  if (sights.floor) held = floorSpans(track, sights.floor, view);
  for (const cap of sights.all) {
    if (held === NEVER) return NEVER;
    held = both(held, capSpans(track, cap, view), view);
  }
  for (const caps of sights.anyOf) {
    held = both(held, union(caps.map((cap) => capSpans(track, cap, view))), view);
  }
  if (sights.sunLimitDeg > 0) held = both(held, sun(source, sights.sunLimitDeg), view);
  return sights.away.length > 0 ? subtract(held, sights.away) : held;
}

function both(a: Spans, b: Spans, view: View): Spans {
  if (a === view.whole) return b;
  if (b === view.whole) return a;
  return intersect(a, b);
}

function checkElevation(deg: number): void {
  if (!(Math.abs(deg) <= 90)) throw new RangeError(`Elevation limit outside ±90°: ${deg}`);
}
