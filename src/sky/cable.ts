import { normalise180 } from '../units/angle';
import type { Vector3 } from '../units/vector';
import { anglesToward, firstRate, type AxisFrame } from './axis-frame';
import { changeMs } from './search';
import { SIDEREAL_RAD_PER_MS, trackDirection } from './track';
import type { AxisAngles } from './axes';
import type { Track } from './track';
import type { AngleRange } from './types';

/** An end of a scan, ready for many mounts. */
export type ScanEnd = {
  atMs: number;
  /** of the source, Earth-fixed; as of trackDirection */
  direction: Vector3;
  /** of that direction */
  longitudeRad: number;
};

/** The way of a mount's axes along a scan; the first is counted from its start without a break. */
export type ScanPath = {
  axes: AxisFrame;
  track: Track;
  startMs: number;
  endMs: number;
  start: AxisAngles;
  end: AxisAngles;
  /** of the first axis, degrees from its angle at the start */
  endTurnDeg: number;
  leastTurnDeg: number;
  mostTurnDeg: number;
  /** of the second axis */
  leastSecondDeg: number;
  mostSecondDeg: number;
  /** instants inside the scan between which both axes go one way, sorted */
  turnsAtMs: readonly number[];
};

const HALF_TURN = Math.PI;
const TURN = 2 * Math.PI;
const NONE: readonly number[] = [];

/**
 * Motor angles of the first axis that show an angle, within its range.
 *
 * @param range     limits inclusive
 * @param firstDeg  any finite angle
 * @returns degrees, nearest to the middle of the range first (the lower of two as near); empty in the dead zone
 * @throws RangeError if the angle is not finite (programmer error)
 */
export function turnsFor({ minDeg, maxDeg }: AngleRange, firstDeg: number): number[] {
  if (!Number.isFinite(firstDeg)) throw new RangeError(`Not an angle: ${firstDeg}`);
  const turns: number[] = [];
  for (let k = Math.ceil((minDeg - firstDeg) / 360); firstDeg + 360 * k <= maxDeg; k += 1) {
    turns.push(firstDeg + 360 * k);
  }
  const middle = (minDeg + maxDeg) / 2;
  return turns.sort((a, b) => Math.abs(a - middle) - Math.abs(b - middle) || a - b);
}

/** Where a source stands at an instant, for all mounts. */
export function scanEnd(track: Track, atMs: number): ScanEnd {
  const direction = trackDirection(track, atMs);
  return { atMs, direction, longitudeRad: Math.atan2(direction[1], direction[0]) };
}

/**
 * The way along a scan.
 *
 * @param axes   of the mount
 * @param track  of the source; holds the scan, or ends less than a day from it
 * @param start  of the scan; before its end
 * @param end    of the scan
 * @throws RangeError if the scan is empty or an instant not finite (programmer error)
 *
 * Error   ≤ 1e-6° of a path looked at each 0.1 s (tests/sky/cable.test.ts), 1′ from the end of the first axis on
 * Source  a mount's axes are azimuth and elevation of a place whose zenith is the end of the first axis: the second
 *         turns back at the meridian, the first where cos H = tan φ / tan δ if |δ| > |φ|, else nowhere
 *         (spherical triangle of pole, zenith and source)
 */
export function scanPath(axes: AxisFrame, track: Track, start: ScanEnd, end: ScanEnd): ScanPath {
  if (!(end.atMs > start.atMs && end.atMs < Infinity)) throw new RangeError('A scan has a length');
  const from = anglesToward(axes, start.direction);
  const to = anglesToward(axes, end.direction);
  const path: ScanPath = {
    axes,
    track,
    startMs: start.atMs,
    endMs: end.atMs,
    start: from,
    end: to,
    endTurnDeg: 0,
    leastTurnDeg: 0,
    mostTurnDeg: 0,
    leastSecondDeg: Math.min(from.secondDeg, to.secondDeg),
    mostSecondDeg: Math.max(from.secondDeg, to.secondDeg),
    turnsAtMs: turnings(axes, start, end.atMs),
  };
  let { firstDeg } = from;
  for (const ms of path.turnsAtMs) {
    const at = anglesToward(axes, trackDirection(track, ms));
    turnBy(path, stepDeg(axes, start.direction, firstDeg, at.firstDeg));
    firstDeg = at.firstDeg;
    path.leastSecondDeg = Math.min(path.leastSecondDeg, at.secondDeg);
    path.mostSecondDeg = Math.max(path.mostSecondDeg, at.secondDeg);
  }
  turnBy(path, stepDeg(axes, start.direction, firstDeg, to.firstDeg));
  return path;
}

/**
 * First instant at which a dish that starts on a turn leaves the range of the first axis.
 *
 * @param startMotorDeg  motor angle at the start of the scan
 * @returns epoch ms, within 1 ms; null if it does not
 */
export function leavesFirstAtMs(
  path: ScanPath,
  { minDeg, maxDeg }: AngleRange,
  startMotorDeg: number,
): number | null {
  if (startMotorDeg + path.leastTurnDeg >= minDeg && startMotorDeg + path.mostTurnDeg <= maxDeg) return null;
  const direction = trackDirection(path.track, path.startMs);
  const isOut = (motorDeg: number) => motorDeg < minDeg || motorDeg > maxDeg;
  if (isOut(startMotorDeg)) return path.startMs;
  let [motorDeg, firstDeg, fromMs] = [startMotorDeg, path.start.firstDeg, path.startMs];
  for (const ms of [...path.turnsAtMs, path.endMs]) {
    const [baseDeg, baseFirstDeg] = [motorDeg, firstDeg];
    const motorAt = (atMs: number) => {
      const at = anglesToward(path.axes, trackDirection(path.track, atMs)).firstDeg;
      return baseDeg + stepDeg(path.axes, direction, baseFirstDeg, at);
    };
    if (isOut(motorAt(ms))) return changeMs((atMs) => isOut(motorAt(atMs)), fromMs, ms);
    motorDeg = motorAt(ms);
    firstDeg = anglesToward(path.axes, trackDirection(path.track, ms)).firstDeg;
    fromMs = ms;
  }
  return null;
}

/**
 * First instant outside the range of the second axis.
 *
 * @returns epoch ms, within 1 ms, and the angle where it is known to be outside; null if there is none
 */
export function leavesSecondAt(
  path: ScanPath,
  { minDeg, maxDeg }: AngleRange,
): { atMs: number; secondDeg: number } | null {
  if (path.leastSecondDeg >= minDeg && path.mostSecondDeg <= maxDeg) return null;
  const at = (ms: number) => anglesToward(path.axes, trackDirection(path.track, ms)).secondDeg;
  return firstWhere(path, (ms) => at(ms) < minDeg || at(ms) > maxDeg, at);
}

/**
 * First instant at which the first axis would have to turn faster than it can.
 *
 * @param rateDegPerS  of the first axis
 * @returns epoch ms, within 1 ms; null if there is none
 *
 * Error   none but where a source passes within 1′ of the end of the axis
 */
export function tooFastAtMs(path: ScanPath, rateDegPerS: number): number | null {
  const perRad = rateDegPerS / (SIDEREAL_RAD_PER_MS * 1000);
  const steepest = Math.max(-path.leastSecondDeg, path.mostSecondDeg) * (Math.PI / 180);
  // |sin φ − cos φ cos A tan h| ≤ 1 + tan h
  if ((180 / Math.PI) * (1 + Math.tan(steepest)) <= perRad) return null;
  const rateAt = (ms: number) => Math.abs(firstRate(path.axes, trackDirection(path.track, ms)));
  return (
    firstWhere(
      path,
      (ms) => rateAt(ms) > perRad,
      () => 0,
    )?.atMs ?? null
  );
}

/** First instant at which something holds that holds at an end of a part of the path if it holds anywhere in it. */
function firstWhere(path: ScanPath, holds: (ms: number) => boolean, secondAt: (ms: number) => number) {
  let fromMs = path.startMs;
  if (holds(fromMs)) return { atMs: fromMs, secondDeg: secondAt(fromMs) };
  for (const ms of [...path.turnsAtMs, path.endMs]) {
    if (holds(ms)) return { atMs: changeMs(holds, fromMs, ms), secondDeg: secondAt(ms) };
    fromMs = ms;
  }
  return null;
}

function turnBy(path: ScanPath, deg: number): void {
  const turnDeg = path.endTurnDeg + deg;
  path.endTurnDeg = turnDeg;
  if (turnDeg < path.leastTurnDeg) path.leastTurnDeg = turnDeg;
  else if (turnDeg > path.mostTurnDeg) path.mostTurnDeg = turnDeg;
}

/** Half a turn at most lies between two turnings, and the way is known where it may be as much. */
function stepDeg(axes: AxisFrame, direction: Vector3, fromDeg: number, toDeg: number): number {
  const short = normalise180(toDeg - fromDeg);
  return goesRound(axes, direction) && axes.way * short < -90 ? short + 360 * axes.way : short;
}

/** Whether a source goes all the way round the first axis. */
function goesRound(axes: AxisFrame, direction: Vector3): boolean {
  return Math.abs(direction[2]) < Math.abs(axes.sinTilt);
}

/** Instants at which an axis may turn back. */
function turnings(axes: AxisFrame, start: ScanEnd, endMs: number): readonly number[] {
  const hourRad = axes.longitudeRad - start.longitudeRad;
  const endRad = hourRad + (endMs - start.atMs) * SIDEREAL_RAD_PER_MS;
  const hours: number[] = [];
  for (let k = Math.floor(hourRad / HALF_TURN) + 1; k * HALF_TURN < endRad; k += 1) hours.push(k * HALF_TURN);
  if (!goesRound(axes, start.direction)) {
    const awayRad = digressionRad(axes.sinTilt, start.direction[2]);
    for (const at of [awayRad, -awayRad]) {
      for (let k = Math.floor((hourRad - at) / TURN) + 1; at + k * TURN < endRad; k += 1)
        hours.push(at + k * TURN);
    }
    hours.sort((a, b) => a - b);
  }
  if (hours.length === 0) return NONE;
  return hours.map((rad) => start.atMs + (rad - hourRad) / SIDEREAL_RAD_PER_MS);
}

/** Hour angle at which a source that does not go round the axis turns back, from the sines of tilt and declination. */
function digressionRad(sinTilt: number, sinDec: number): number {
  if (sinDec === 0) return HALF_TURN / 2;
  const cos = (sinTilt / sinDec) * Math.sqrt((1 - sinDec * sinDec) / (1 - sinTilt * sinTilt));
  return Math.acos(Math.max(-1, Math.min(1, cos)));
}
