import { degToRad } from '../units/angle';
import type { Vector3 } from '../units/vector';
import { axisTriad, firstAxis, secondAxis } from './axes';
import { capBeyond, capOf } from './cap';
import type { Cap } from './cap';
import type { SiteFrame } from './site';
import type { AngleRange, MountLimits } from './types';

/** Caps all of which must hold, and groups of caps of each of which one must. */
export type MountCuts = { all: Cap[]; anyOf: Cap[][] };

/**
 * The sky that a mount can reach.
 *
 * @throws RangeError if a limit is not finite, a range ends before it starts or a keyhole is outside 0–90°
 *         (programmer error)
 *
 * Source  axis angles as MountLimits defines them: each limit is a cone about an axis or a half of the sky
 */
export function mountCuts(site: SiteFrame, limits: MountLimits): MountCuts {
  const keyholeDeg = limits.keyholeDeg ?? 0;
  if (!(keyholeDeg >= 0 && keyholeDeg <= 90)) throw new RangeError(`Keyhole outside 0–90°: ${keyholeDeg}`);
  const { along, zero, toward } = axisTriad(limits.kind, site.latitudeRad);
  // below the horizon of an az–el mount there is its own limit
  const from = limits.kind === 'az-el' ? {} : { from: keyholeDeg - 90 };
  return joined(
    cone(site, along, secondAxis(limits), { ...from, to: 90 - keyholeDeg }),
    turn(site, toward, zero, firstAxis(limits)),
  );
}

function joined(a: MountCuts, b: MountCuts): MountCuts {
  return { all: [...a.all, ...b.all], anyOf: [...a.anyOf, ...b.anyOf] };
}

/** Angles from the plane across an axis, like elevations about the vertical; the stricter of range and what is open. */
function cone(
  site: SiteFrame,
  axis: Vector3,
  range: AngleRange | undefined,
  open: { from?: number; to: number },
): MountCuts {
  checkRange(range);
  const fromDeg = Math.max(range?.minDeg ?? -90, open.from ?? -90);
  const toDeg = Math.min(range?.maxDeg ?? 90, open.to);
  const all: Cap[] = [];
  if (fromDeg > -90) all.push(capOf(site, axis, sineOf(fromDeg)));
  if (toDeg < 90) all.push(capBeyond(site, axis, sineOf(toDeg)));
  return { all, anyOf: [] };
}

/** Angles about an axis, from one direction toward another. */
function turn(site: SiteFrame, toward: Vector3, from: Vector3, range: AngleRange | undefined): MountCuts {
  checkRange(range);
  if (!range || range.maxDeg - range.minDeg >= 360) return { all: [], anyOf: [] };
  const after = halfOfSky(site, toward, from, range.minDeg, 1);
  const before = halfOfSky(site, toward, from, range.maxDeg, -1);
  return range.maxDeg - range.minDeg <= 180
    ? { all: [after, before], anyOf: [] }
    : { all: [], anyOf: [[after, before]] };
}

/** The half turn after an angle, or before it. */
function halfOfSky(site: SiteFrame, toward: Vector3, from: Vector3, deg: number, sign: 1 | -1): Cap {
  const [sin, cos] = [sign * Math.sin(degToRad(deg)), sign * Math.cos(degToRad(deg))];
  const part = (index: 0 | 1 | 2) => cos * toward[index] - sin * from[index];
  return capOf(site, [part(0), part(1), part(2)], 0);
}

/** Beyond ±90° there is nothing to see: no direction has such an angle. */
function sineOf(deg: number): number {
  return Math.abs(deg) <= 90 ? Math.sin(degToRad(deg)) : Math.sign(deg) * 2;
}

function checkRange(range: AngleRange | undefined): void {
  if (!range) return;
  const { minDeg, maxDeg } = range;
  if (!(Number.isFinite(minDeg) && maxDeg >= minDeg && maxDeg < Infinity)) {
    throw new RangeError(`Not a range of angles: ${minDeg} to ${maxDeg}`);
  }
}
