import { normalise180 } from '../units/angle';
import { utcParts } from '../units/time';
import { AXIS_WORDS, secondAxis } from './axes';
import type { Mount } from './types';

/**
 * What keeps a dish from a scan: a direction within the first axis's dead zone, the end of its range, the ends of the
 * second axis's range, or the first axis's rate near its own end.
 */
export type ObstacleKind = 'dead-zone' | 'end-of-range' | 'too-low' | 'too-high' | 'too-fast';

/**
 * Why a dish cannot do it, and which of its axes; the sentence goes on after the station's name.
 *
 * atMs  from when on, epoch ms; null where it is a direction without a time
 */
export type Impossible = {
  impossible: string;
  kind: ObstacleKind;
  limit: 'first' | 'second';
  atMs: number | null;
};

/** The first axis cannot show an angle on any turn. */
export function inDeadZone(mount: Mount, firstDeg: number): Impossible {
  const turned = Math.round(normalise180(firstDeg));
  const shown = mount.kind === 'az-el' ? (turned + 360) % 360 : turned;
  const sign = shown < 0 ? '\u2212' : '';
  const impossible = `cannot turn to ${AXIS_WORDS[mount.kind].first} ${sign}${Math.abs(shown)}°`;
  return { impossible, kind: 'dead-zone', limit: 'first', atMs: null };
}

/** A scan begins within the first axis's range and leaves it. */
export function atEndOfRange(mount: Mount, atMs: number): Impossible {
  const { first } = AXIS_WORDS[mount.kind];
  const impossible = `would run into the ${first} limit at ${clock(atMs)}`;
  return { impossible, kind: 'end-of-range', limit: 'first', atMs };
}

/** The first axis would have to turn faster than it can. */
export function tooFast(mount: Mount, atMs: number): Impossible {
  const { first } = AXIS_WORDS[mount.kind];
  const impossible = `would be too slow in ${first} to follow at ${clock(atMs)}`;
  return { impossible, kind: 'too-fast', limit: 'first', atMs };
}

/**
 * The second axis would be outside its range.
 *
 * @returns null if it is within
 * @throws RangeError if the angle is not finite (programmer error)
 */
export function secondOutside(
  mount: Mount,
  secondDeg: number,
  atMs: number | null = null,
): Impossible | null {
  const { minDeg, maxDeg } = secondAxis(mount);
  if (!Number.isFinite(secondDeg)) throw new RangeError(`Not an angle: ${secondDeg}`);
  if (secondDeg >= minDeg && secondDeg <= maxDeg) return null;
  const isLow = secondDeg < minDeg;
  const when = atMs === null ? '' : ` at ${clock(atMs)}`;
  const what = mount.kind === 'az-el' ? '' : ` of ${AXIS_WORDS[mount.kind].second}`;
  const side = isLow ? `below the mount’s lowest ${minDeg}°` : `above the mount’s highest ${maxDeg}°`;
  const impossible = `would be ${side}${what}${when}`.replace('-', '\u2212');
  return { impossible, kind: isLow ? 'too-low' : 'too-high', limit: 'second', atMs };
}

function clock(ms: number): string {
  const { hour, minute, second } = utcParts(ms);
  return [hour, minute, second].map((part) => String(part).padStart(2, '0')).join(':');
}
