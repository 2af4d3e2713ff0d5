import { normalise180 } from '../units/angle';
import { AXIS_WORDS, axisAngles, firstAxis, secondAxis, type AxisAngles } from './axes';
import { utcParts } from '../units/time';
import type { Interval } from '../units/time';
import { trackAzEl, trackOf } from './track';
import type { Track } from './track';
import { scanPath, turnsFor } from './cable';
import type { ScanPath } from './cable';
import { siteFrame } from './site';
import type { Axis, AzEl, AzElMount, Geodetic, Mount, Pointing, SkyPosition } from './types';

/** Why a dish cannot do it, and which of its axes; the sentence goes on after the station's name. */
export type Impossible = { impossible: string; limit: 'first' | 'second'; atMs: number | null };

export type SlewStation = { site: Geodetic; mount: Mount };

/** A source and the time it is to be tracked; `track` saves its making and must cover the scan. */
export type SlewTarget = { source: SkyPosition; scan: Interval; track?: Track };

/** Two slews within this time of each other are equally quick. */
const TIE_SECONDS = 1e-9;

/**
 * Time of one axis from rest to rest.
 *
 * @param distanceDeg  way to go, either sign
 * @param axis         rateDegPerS > 0, accelDegPerS2 > 0 (the same for braking)
 * @returns seconds
 * @throws RangeError if the distance is not finite or a drive's figure is not positive (programmer error)
 *
 * Error   closed form; ≤ 0.01 s against an integrated speed of 20 000 steps (tests/sky/slew.test.ts)
 * Source  uniform acceleration: 2√(d/a) when d < v²/a, else d/v + v/a
 */
export function axisSeconds(distanceDeg: number, axis: Axis): number {
  const { rateDegPerS: v, accelDegPerS2: a } = axis;
  if (!Number.isFinite(distanceDeg)) throw new RangeError(`Not a distance: ${distanceDeg}`);
  if (!(v > 0 && a > 0)) throw new RangeError(`A drive needs a rate and an acceleration: ${v}, ${a}`);
  const d = Math.abs(distanceDeg);
  return d < (v * v) / a ? 2 * Math.sqrt(d / a) : d / v + v / a;
}

/**
 * Quickest legal motion of an az–el mount from one pointing to a direction.
 *
 * @param mount  limits inclusive; settleSeconds is added when anything moves
 * @param from   where the dish points, its cable's turn in motorAzimuthDeg
 * @param to     direction to reach
 * @returns seconds and the motor azimuth reached; or why there is none. Of equally quick turns the one nearest to
 *          the middle of the cable's range
 * @throws RangeError if an input is not finite (programmer error)
 *
 * Error   ≤ 1e-6 s on the reference (tests/sky/slew.test.ts)
 * Source  both axes start together, each as axisSeconds; azimuth moves monotonically, so no limit is passed
 */
export function slewMotion(
  mount: AzElMount,
  from: Pointing,
  to: AzEl,
): { seconds: number; motorAzimuthDeg: number } | Impossible {
  const [held, wanted] = [from, to].map((direction) => axisAngles(mount.kind, 0, direction));
  if (!held || !wanted) throw new RangeError('A motion has two ends');
  const blocked = secondOutside(mount, wanted.secondDeg);
  if (blocked) return blocked;
  const turns = turnsFor(mount, wanted.firstDeg);
  const start = { motorDeg: from.motorAzimuthDeg, secondDeg: held.secondDeg };
  const motion = quickest(mount, start, wanted.secondDeg, turns);
  return motion
    ? { seconds: motion.seconds, motorAzimuthDeg: motion.motorDeg }
    : deadZone(mount, wanted.firstDeg);
}

/**
 * Slew to the start of a scan, on a turn of the cable on which the whole scan can be tracked.
 *
 * @param station  site and mount
 * @param from     where the dish points before
 * @param to       source and scan; scan longer than zero
 * @returns seconds and the pointing at the START of the scan (carry on from pointingAtEnd); or why it is impossible
 * @throws RangeError if an input is not finite or the scan is empty (programmer error)
 *
 * Error   times in the sentence ≤ 1 s (truncated to the second); the scan is sampled each 60 s, closer where azimuth
 *         runs fast. Drive rates while tracking (keyhole) are not checked here
 * Source  science: shortest slew among turns that meet no limit
 */
export function slewBetween(
  station: SlewStation,
  from: Pointing,
  to: SlewTarget,
): { seconds: number; pointing: Pointing } | Impossible {
  const { mount } = station;
  const { path, start } = wayOf(station, to);
  const blocked = secondAlong(mount, path);
  if (blocked) return blocked;
  const turns = turnsFor(mount, path.start.firstDeg);
  const whole = turns.filter((turn) => path.leavesRangeAtMs(mount, turn) === null);
  const { secondDeg } = axisAngles(mount.kind, station.site.latitudeDeg, from);
  const held = { motorDeg: from.motorAzimuthDeg, secondDeg };
  const motion = quickest(mount, held, path.start.secondDeg, whole);
  if (!motion) return noTurn(mount, path, turns);
  return { seconds: motion.seconds, pointing: { ...start, motorAzimuthDeg: motion.motorDeg } };
}

/**
 * Pointing at the END of a scan that was tracked without a break from its start.
 *
 * @param start  pointing at the scan's start, as slewBetween or firstPointing gave it
 * @throws RangeError if an input is not finite or the scan is empty (programmer error)
 */
export function pointingAtEnd(station: SlewStation, start: Pointing, to: SlewTarget): Pointing {
  const { path, end } = wayOf(station, to);
  return { ...end, motorAzimuthDeg: start.motorAzimuthDeg + path.endTurnDeg };
}

/**
 * Pointing of a dish that stands on a direction at the start of a session: the turn nearest to the middle of its range.
 *
 * @returns the pointing, or why the mount cannot point there
 * @throws RangeError if an input is not finite (programmer error)
 */
export function startPointing({ mount, site }: SlewStation, direction: AzEl): Pointing | Impossible {
  const { firstDeg, secondDeg } = axisAngles(mount.kind, site.latitudeDeg, direction);
  const blocked = secondOutside(mount, secondDeg);
  if (blocked) return blocked;
  const turn = turnsFor(mount, firstDeg)[0];
  if (turn === undefined) return deadZone(mount, firstDeg);
  return { ...direction, motorAzimuthDeg: turn };
}

/**
 * Pointing at the start of a station's first scan: the turn nearest to mid-range on which the whole scan can be tracked.
 *
 * @returns the pointing at the START of the scan, or why it is impossible
 * @throws RangeError if an input is not finite or the scan is empty (programmer error)
 */
export function firstPointing(station: SlewStation, to: SlewTarget): Pointing | Impossible {
  const { mount } = station;
  const { path, start } = wayOf(station, to);
  const blocked = secondAlong(mount, path);
  if (blocked) return blocked;
  const turns = turnsFor(mount, path.start.firstDeg);
  const turn = turns.find((candidate) => path.leavesRangeAtMs(mount, candidate) === null);
  if (turn === undefined) return noTurn(mount, path, turns);
  return { ...start, motorAzimuthDeg: turn };
}

function wayOf({ site, mount }: SlewStation, to: SlewTarget): { path: ScanPath; start: AzEl; end: AzEl } {
  const track = to.track ?? trackOf(to.source, to.scan);
  const frame = siteFrame(site);
  const seen = (atMs: number) => trackAzEl(track, frame, atMs);
  const path = scanPath((atMs) => axisAngles(mount.kind, site.latitudeDeg, seen(atMs)), to.scan);
  return { path, start: seen(to.scan.start.getTime()), end: seen(to.scan.end.getTime()) };
}

type Motion = { seconds: number; motorDeg: number };

/** Turns come nearest to mid-range first, and a later one must be truly quicker. */
function quickest(
  mount: Mount,
  from: { motorDeg: number; secondDeg: number },
  secondDeg: number,
  turns: readonly number[],
): Motion | null {
  const secondSeconds = axisSeconds(secondDeg - from.secondDeg, secondAxis(mount));
  let best: Motion | null = null;
  for (const turn of turns) {
    const moving = Math.max(axisSeconds(turn - from.motorDeg, firstAxis(mount)), secondSeconds);
    const seconds = moving > 0 ? moving + mount.settleSeconds : 0;
    if (!best || seconds < best.seconds - TIE_SECONDS) best = { seconds, motorDeg: turn };
  }
  return best;
}

function secondOutside(
  mount: Mount,
  secondDeg: AxisAngles['secondDeg'],
  atMs: number | null = null,
): Impossible | null {
  const { minDeg, maxDeg } = secondAxis(mount);
  if (!Number.isFinite(secondDeg)) throw new RangeError(`Not an angle: ${secondDeg}`);
  if (secondDeg >= minDeg && secondDeg <= maxDeg) return null;
  const isLow = secondDeg < minDeg;
  const when = atMs === null ? '' : ` at ${clock(atMs)}`;
  const what = mount.kind === 'az-el' ? '' : ` of ${AXIS_WORDS[mount.kind].second}`;
  const side = isLow ? `below the mount’s lowest ${minDeg}°` : `above the mount’s highest ${maxDeg}°`;
  return { impossible: `would be ${side}${what}${when}`.replace('-', '\u2212'), limit: 'second', atMs };
}

function secondAlong(mount: Mount, path: ScanPath): Impossible | null {
  const { minDeg, maxDeg } = secondAxis(mount);
  const outside = path.leavesSecondAt(minDeg, maxDeg);
  return outside && secondOutside(mount, outside.secondDeg, outside.atMs);
}

function noTurn(mount: Mount, path: ScanPath, turns: readonly number[]): Impossible {
  const ends = turns.map((turn) => path.leavesRangeAtMs(mount, turn)).filter((ms) => ms !== null);
  if (ends.length === 0) return deadZone(mount, path.start.firstDeg);
  const atMs = Math.max(...ends);
  const { first } = AXIS_WORDS[mount.kind];
  return { impossible: `would run into the ${first} limit at ${clock(atMs)}`, limit: 'first', atMs };
}

function deadZone(mount: Mount, firstDeg: number): Impossible {
  const turned = Math.round(normalise180(firstDeg));
  const shown = mount.kind === 'az-el' ? (turned + 360) % 360 : turned;
  const text = `${Math.abs(shown)}°`;
  return {
    impossible: `cannot turn to ${AXIS_WORDS[mount.kind].first} ${shown < 0 ? '\u2212' : ''}${text}`,
    limit: 'first',
    atMs: null,
  };
}

function clock(ms: number): string {
  const { hour, minute, second } = utcParts(ms);
  return [hour, minute, second].map((part) => String(part).padStart(2, '0')).join(':');
}
