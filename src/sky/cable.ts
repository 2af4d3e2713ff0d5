import { normalise180 } from '../units/angle';
import type { Interval } from '../units/time';
import { changeMs } from './search';
import { firstAxis, type AxisAngles } from './axes';
import type { Mount } from './types';

/** The way of a mount's axes along a scan, the first counted without a break from the start. */
export type ScanPath = {
  start: AxisAngles;
  end: AxisAngles;
  /** motor angle of the first axis at the end minus that at the start */
  endTurnDeg: number;
  /** first instant at which a dish that starts on this turn leaves the first axis's range, or null */
  leavesRangeAtMs: (mount: Mount, startMotorDeg: number) => number | null;
  /** first instant outside a range of the second axis and its angle there, or null */
  leavesSecondAt: (minDeg: number, maxDeg: number) => { atMs: number; secondDeg: number } | null;
};

type Sample = { atMs: number; turnDeg: number; firstDeg: number; secondDeg: number };

const STEP_MS = 60_000;
/** The first axis may move by this much between samples before they are put closer, down to a second. */
const STEP_LIMIT_DEG = 30;
const LEAST_STEP_MS = 1000;

/**
 * Motor angles of the first axis that show an angle, within its range.
 *
 * @param mount     limits inclusive
 * @param firstDeg  any finite angle
 * @returns degrees, nearest to the middle of the range first (the lower of two as near); empty in the dead zone
 * @throws RangeError if the angle is not finite (programmer error)
 */
export function turnsFor(mount: Mount, firstDeg: number): number[] {
  if (!Number.isFinite(firstDeg)) throw new RangeError(`Not an angle: ${firstDeg}`);
  const { minDeg, maxDeg } = firstAxis(mount);
  const turns: number[] = [];
  for (let k = Math.ceil((minDeg - firstDeg) / 360); firstDeg + 360 * k <= maxDeg; k += 1) {
    turns.push(firstDeg + 360 * k);
  }
  const middle = (minDeg + maxDeg) / 2;
  return turns.sort((a, b) => Math.abs(a - middle) - Math.abs(b - middle) || a - b);
}

/**
 * The way along a scan.
 *
 * @param anglesAt  angles of the axes at an instant
 * @param scan      longer than zero
 * @throws RangeError if the scan is empty (programmer error)
 *
 * Error   limits met for less than a minute in mid-scan, by less than an axis's bend within it, can be missed
 *         (0.1° of azimuth at 60° elevation); the instants are refined to 1 ms
 */
export function scanPath(anglesAt: (atMs: number) => AxisAngles, scan: Interval): ScanPath {
  const startMs = scan.start.getTime();
  const endMs = scan.end.getTime();
  if (!(endMs > startMs)) throw new RangeError('A scan has a length');
  const samples = sampled(anglesAt, startMs, endMs);
  const { first, last } = samples;
  const turnAt = (atMs: number, near: Sample) =>
    near.turnDeg + normalise180(anglesAt(atMs).firstDeg - near.firstDeg);

  return {
    start: { firstDeg: first.firstDeg, secondDeg: first.secondDeg },
    end: { firstDeg: last.firstDeg, secondDeg: last.secondDeg },
    endTurnDeg: last.turnDeg,
    leavesRangeAtMs: (mount, startMotorDeg) => {
      const { minDeg, maxDeg } = firstAxis(mount);
      const outside = (turnDeg: number) =>
        startMotorDeg + turnDeg < minDeg || startMotorDeg + turnDeg > maxDeg;
      const found = firstOf(samples.all, (sample) => outside(sample.turnDeg));
      if (!found) return null;
      const { before, at } = found;
      return before ? changeMs((ms) => outside(turnAt(ms, before)), before.atMs, at.atMs) : at.atMs;
    },
    leavesSecondAt: (minDeg, maxDeg) => {
      const outside = (secondDeg: number) => secondDeg < minDeg || secondDeg > maxDeg;
      const found = firstOf(samples.all, (sample) => outside(sample.secondDeg));
      if (!found) return null;
      const { before, at } = found;
      const atMs = before ? changeMs((ms) => outside(anglesAt(ms).secondDeg), before.atMs, at.atMs) : at.atMs;
      return { atMs, secondDeg: at.secondDeg };
    },
  };
}

function sampled(anglesAt: (atMs: number) => AxisAngles, startMs: number, endMs: number) {
  const first: Sample = { atMs: startMs, turnDeg: 0, ...anglesAt(startMs) };
  const all: Sample[] = [first];
  let last = first;
  let step = STEP_MS;
  while (last.atMs < endMs) {
    const atMs = Math.min(endMs, last.atMs + step);
    const angles = anglesAt(atMs);
    const moved = normalise180(angles.firstDeg - last.firstDeg);
    if (Math.abs(moved) > STEP_LIMIT_DEG && atMs - last.atMs > LEAST_STEP_MS) {
      step = Math.max(LEAST_STEP_MS, (atMs - last.atMs) / 2);
      continue;
    }
    last = { atMs, turnDeg: last.turnDeg + moved, ...angles };
    all.push(last);
    step = STEP_MS;
  }
  return { all, first, last };
}

function firstOf(samples: readonly Sample[], holds: (sample: Sample) => boolean) {
  const index = samples.findIndex(holds);
  const at = samples[index];
  return at ? { before: samples[index - 1] ?? null, at } : null;
}
