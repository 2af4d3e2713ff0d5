import { normalise180 } from '../units/angle';
import { axisAngles, firstAxis, secondAxis } from './axes';
import { spansWhere, stepsOver } from './crossings';
import { horizonElevationDeg, prepareHorizon } from './horizon';
import { intervalsOf } from './interval-set';
import { siteFrame } from './site';
import { trackAzEl } from './track';
import type { Track } from './track';
import type { AngleRange, AzEl, Interval, MountLimits, SkyStation } from './types';

/** A short span, as of a scan, is looked at as often as this; a longer one each minute. */
const SHORT_MS = 7_200_000;
const SHORT_STEP_MS = 15_000;
const LONG_STEP_MS = 60_000;

/**
 * Times at which a station can see a source, by looking again and again: a tenth of the code of trackWindows, for where
 * code has to travel. The Sun and unavailability are not looked at.
 *
 * @param span  part of the track's span, or within a day of it
 * @returns sorted, disjoint, half-open intervals inside the span, edges on milliseconds; empty if never
 * @throws RangeError if an input is not finite (programmer error)
 *
 * Error   as trackWindows, but that a mast or a gap of a mask which is passed in less than a step (15 s in two hours, else
 *         60 s) can be missed (tests/sky/windows-by-search.test.ts). Cost: 0.5 ms for a day
 * Source  least room to any limit; its sign changes by bisection, its turns by golden section
 */
export function windowsBySearch(track: Track, station: SkyStation, span: Interval): Interval[] {
  const lengthMs = span.end.getTime() - span.start.getTime();
  if (!(lengthMs > 0)) return [];
  const site = siteFrame(station.site);
  const horizon = prepareHorizon(station.horizon);
  const { minElevationDeg, maxElevationDeg = 90, mount } = station;
  const room = (ms: number) => {
    const seen = trackAzEl(track, site, ms);
    const floorDeg = horizon ? horizonElevationDeg(horizon, seen.azimuthDeg) : -90;
    return Math.min(
      seen.elevationDeg - Math.max(minElevationDeg, floorDeg),
      maxElevationDeg - seen.elevationDeg,
      mount ? roomOfMount(mount, station.site.latitudeDeg, seen) : Infinity,
    );
  };
  const stepMs = lengthMs > SHORT_MS ? LONG_STEP_MS : SHORT_STEP_MS;
  return intervalsOf(spansWhere(room, stepsOver(span, stepMs)));
}

/** Degrees to the nearest limit of a mount; negative outside it. */
function roomOfMount(mount: MountLimits, latitudeDeg: number, seen: AzEl): number {
  const { firstDeg, secondDeg } = axisAngles(mount.kind, latitudeDeg, seen);
  const second = secondAxis(mount);
  const keyholeDeg = mount.keyholeDeg ?? 0;
  const endsDeg = mount.kind === 'az-el' ? 90 - secondDeg : 90 - Math.abs(secondDeg);
  return Math.min(
    roundTurn(firstDeg, firstAxis(mount)),
    second ? Math.min(secondDeg - second.minDeg, second.maxDeg - secondDeg) : Infinity,
    keyholeDeg > 0 ? endsDeg - keyholeDeg : Infinity,
  );
}

/** Degrees by which an angle is inside a range, wherever its turns begin. */
function roundTurn(deg: number, range: AngleRange | undefined): number {
  if (!range || range.maxDeg - range.minDeg >= 360) return Infinity;
  const half = (range.maxDeg - range.minDeg) / 2;
  return half - Math.abs(normalise180(deg - range.minDeg - half));
}
