import { axisAngles, firstAxis, secondAxis } from './axes';
import { axisFrame } from './axis-frame';
import {
  leavesFirstAtMs,
  leavesSecondAt,
  scanEnd,
  scanPath,
  tooFastAtMs,
  turnsFor,
  type ScanPath,
} from './cable';
import { atEndOfRange, inDeadZone, secondOutside, tooFast, type Impossible } from './impossible';
import { siteFrame } from './site';
import { trackAzEl, trackOf } from './track';
import type { Track } from './track';
import type {
  Axis,
  AzEl,
  AzElMount,
  DrivenAxis,
  Geodetic,
  Interval,
  Mount,
  Pointing,
  SkyPosition,
} from './types';

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
  if (!(v > 0 && v < Infinity && a > 0 && a < Infinity))
    throw new RangeError(`A drive needs a rate and an acceleration: ${v}, ${a}`);
  const d = Math.abs(distanceDeg);
  return d < (v * v) / a ? 2 * Math.sqrt(d / a) : d / v + v / a;
}

/**
 * Refuses a mount that cannot be.
 *
 * @throws RangeError if a range is not finite or ends before it begins, a drive's figure is not positive or settling
 *         is negative or not finite (programmer error)
 */
export function checkMount(mount: Mount): void {
  for (const axis of [firstAxis(mount), secondAxis(mount)]) {
    const { minDeg, maxDeg } = axis;
    if (!(minDeg > -Infinity && maxDeg >= minDeg && maxDeg < Infinity))
      throw new RangeError(`Not a range of angles: ${minDeg} to ${maxDeg}`);
    axisSeconds(0, axis);
  }
  const { settleSeconds } = mount;
  if (!(settleSeconds >= 0 && settleSeconds < Infinity))
    throw new RangeError(`Not a time to settle: ${settleSeconds}`);
}

/**
 * Quickest legal motion of an az–el mount from one pointing to a direction.
 *
 * @param mount  limits inclusive; settleSeconds is added when anything moves
 * @param from   where the dish points, its cable's turn in motorAzimuthDeg
 * @param to     direction to reach
 * @returns seconds and the motor azimuth reached; or why there is none. Of equally quick turns the one nearest to
 *          the middle of the cable's range
 * @throws RangeError if an input is not finite or the mount cannot be (programmer error)
 *
 * Error   ≤ 1e-6 s on the reference (tests/sky/slew.test.ts)
 * Source  both axes start together, each as axisSeconds; azimuth moves monotonically, so no limit is passed
 */
export function slewMotion(
  mount: AzElMount,
  from: Pointing,
  to: AzEl,
): { seconds: number; motorAzimuthDeg: number } | Impossible {
  checkMount(mount);
  const [held, wanted] = [from, to].map((direction) => axisAngles(mount.kind, 0, direction));
  if (!held || !wanted) throw new RangeError('A motion has two ends');
  const blocked = secondOutside(mount, wanted.secondDeg);
  if (blocked) return blocked;
  const start = { motorDeg: from.motorAzimuthDeg, secondDeg: held.secondDeg };
  const motion = quickest(mount, start, { start: wanted, leastTurnDeg: 0, mostTurnDeg: 0 });
  return motion
    ? { seconds: motion.seconds, motorAzimuthDeg: motion.motorDeg }
    : inDeadZone(mount, wanted.firstDeg);
}

/**
 * Slew to the start of a scan, on a turn of the cable on which the whole scan can be tracked.
 *
 * @param station  site and mount
 * @param from     where the dish points before
 * @param to       source and scan; scan longer than zero
 * @returns seconds and the pointing at the START of the scan (carry on from pointingAtEnd); or why it is impossible
 * @throws RangeError if an input is not finite, the scan is empty or the mount cannot be (programmer error)
 *
 * Error   times in the sentence ≤ 1 s (truncated to the second); paths as scanPath
 * Source  science: shortest slew among turns that meet no limit
 */
export function slewBetween(
  station: SlewStation,
  from: Pointing,
  to: SlewTarget,
): { seconds: number; pointing: Pointing } | Impossible {
  const { mount, site } = station;
  const { path, start } = wayOf(station, to);
  const { secondDeg } = axisAngles(mount.kind, site.latitudeDeg, from);
  const motion = motionTo(mount, path, { motorDeg: from.motorAzimuthDeg, secondDeg });
  if ('impossible' in motion) return motion;
  return { seconds: motion.seconds, pointing: { ...start, motorAzimuthDeg: motion.motorDeg } };
}

/**
 * Pointing at the END of a scan that was tracked without a break from its start.
 *
 * @param start  pointing at the scan's start, as slewBetween or firstPointing gave it
 * @throws RangeError if an input is not finite, the scan is empty or the mount cannot be (programmer error)
 */
export function pointingAtEnd(station: SlewStation, start: Pointing, to: SlewTarget): Pointing {
  const { path, end } = wayOf(station, to);
  return { ...end, motorAzimuthDeg: start.motorAzimuthDeg + path.endTurnDeg };
}

/**
 * Pointing of a dish that stands on a direction at the start of a session: the turn nearest to the middle of its range.
 *
 * @returns the pointing, or why the mount cannot point there
 * @throws RangeError if an input is not finite or the mount cannot be (programmer error)
 */
export function startPointing({ mount, site }: SlewStation, direction: AzEl): Pointing | Impossible {
  checkMount(mount);
  const { firstDeg, secondDeg } = axisAngles(mount.kind, site.latitudeDeg, direction);
  const blocked = secondOutside(mount, secondDeg);
  if (blocked) return blocked;
  const turn = turnsFor(firstAxis(mount), firstDeg)[0];
  if (turn === undefined) return inDeadZone(mount, firstDeg);
  return { ...direction, motorAzimuthDeg: turn };
}

/**
 * Pointing at the start of a station's first scan: the turn nearest to mid-range on which the whole scan can be tracked.
 *
 * @returns the pointing at the START of the scan, or why it is impossible
 * @throws RangeError if an input is not finite, the scan is empty or the mount cannot be (programmer error)
 */
export function firstPointing(station: SlewStation, to: SlewTarget): Pointing | Impossible {
  const { path, start } = wayOf(station, to);
  const motion = motionTo(station.mount, path, null);
  return 'impossible' in motion ? motion : { ...start, motorAzimuthDeg: motion.motorDeg };
}

/** Where the axes stand: the motor of the first on a turn, the second. */
export type Held = { motorDeg: number; secondDeg: number };

/** Time of a slew, NaN where a dish stands there at first; the motor angle of the first axis at its end. */
export type Motion = { seconds: number; motorDeg: number };

/**
 * Slew to the start of a path, on a turn on which it can be followed to its end.
 *
 * @param mount  as checkMount lets it pass
 * @param held   where the axes stand; null where the dish has not begun: it takes the turn nearest to mid-range
 * @throws RangeError if held is not finite (programmer error)
 *
 * Error, Source  as slewBetween
 */
export function motionTo(mount: Mount, path: ScanPath, held: Held | null): Motion | Impossible {
  const { minDeg, maxDeg, rateDegPerS } = firstAxis(mount);
  const outside = leavesSecondAt(path, secondAxis(mount));
  const blocked = outside && secondOutside(mount, outside.secondDeg, outside.atMs);
  if (blocked) return blocked;
  const fastMs = tooFastAtMs(path, rateDegPerS);
  if (fastMs !== null) return tooFast(mount, fastMs);
  const motion = quickest(mount, held, path);
  if (motion) return motion;
  const range = { minDeg, maxDeg };
  const ends = turnsFor(range, path.start.firstDeg).flatMap(
    (turn) => leavesFirstAtMs(path, range, turn) ?? [],
  );
  return ends.length > 0 ? atEndOfRange(mount, Math.max(...ends)) : inDeadZone(mount, path.start.firstDeg);
}

function wayOf({ site, mount }: SlewStation, to: SlewTarget): { path: ScanPath; start: AzEl; end: AzEl } {
  checkMount(mount);
  const track = to.track ?? trackOf(to.source, to.scan);
  const [startMs, endMs] = [to.scan.start.getTime(), to.scan.end.getTime()];
  const frame = siteFrame(site);
  const ends = [scanEnd(track, startMs), scanEnd(track, endMs)] as const;
  return {
    path: scanPath(axisFrame(mount.kind, frame), track, ...ends),
    start: trackAzEl(track, frame, startMs),
    end: trackAzEl(track, frame, endMs),
  };
}

/** Of equally quick turns the one nearest to mid-range, of two as near the lower. */
function quickest(
  mount: Mount,
  held: Held | null,
  path: Pick<ScanPath, 'start' | 'leastTurnDeg' | 'mostTurnDeg'>,
): Motion | null {
  const { firstDeg, secondDeg } = path.start;
  const first = firstAxis(mount);
  const secondSeconds = held ? axisSeconds(secondDeg - held.secondDeg, secondAxis(mount)) : 0;
  const middleDeg = (first.minDeg + first.maxDeg) / 2;
  let best: Motion | null = null;
  for (
    let turn = firstDeg + 360 * Math.ceil((first.minDeg - firstDeg - path.leastTurnDeg) / 360);
    turn + path.mostTurnDeg <= first.maxDeg;
    turn += 360
  ) {
    const seconds = held ? slewSeconds(mount, first, turn - held.motorDeg, secondSeconds) : NaN;
    const gain = best && held ? best.seconds - seconds : 0;
    const isNearer = !best || Math.abs(turn - middleDeg) < Math.abs(best.motorDeg - middleDeg);
    if (gain > TIE_SECONDS || (isNearer && gain >= -TIE_SECONDS)) best = { seconds, motorDeg: turn };
  }
  return best;
}

function slewSeconds(mount: Mount, first: DrivenAxis, turnDeg: number, secondSeconds: number): number {
  const moving = Math.max(axisSeconds(turnDeg, first), secondSeconds);
  return moving > 0 ? moving + mount.settleSeconds : 0;
}
