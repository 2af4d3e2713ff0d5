import { normalise180 } from '../units/angle';
import type { Interval } from '../units/time';
import { changeMs } from './search';
import type { AzEl, Mount } from './types';

/** The way of a mount along a scan, azimuth counted without a break from the start. */
export type ScanPath = {
  start: AzEl;
  end: AzEl;
  /** motor azimuth at the end minus that at the start */
  endTurnDeg: number;
  /** first instant at which a dish that starts on this turn leaves the cable's range, or null */
  leavesRangeAtMs: (mount: Mount, startMotorDeg: number) => number | null;
  /** first instant outside the elevations and the elevation there, or null */
  leavesElevationsAt: (minDeg: number, maxDeg: number) => { atMs: number; elevationDeg: number } | null;
};

type Sample = { atMs: number; turnDeg: number; azimuthDeg: number; elevationDeg: number };

const STEP_MS = 60_000;
/** Azimuth may move by this much between samples before they are put closer, down to a second. */
const STEP_LIMIT_DEG = 30;
const LEAST_STEP_MS = 1000;

/**
 * Motor azimuths that show an azimuth, within the cable's range.
 *
 * @param mount       limits inclusive
 * @param azimuthDeg  any finite angle
 * @returns degrees, nearest to the middle of the range first (the lower of two as near); empty in the dead zone
 * @throws RangeError if the azimuth is not finite (programmer error)
 */
export function turnsFor(mount: Mount, azimuthDeg: number): number[] {
  if (!Number.isFinite(azimuthDeg)) throw new RangeError(`Not an azimuth: ${azimuthDeg}`);
  const { minDeg, maxDeg } = mount.azimuth;
  const turns: number[] = [];
  for (let k = Math.ceil((minDeg - azimuthDeg) / 360); azimuthDeg + 360 * k <= maxDeg; k += 1) {
    turns.push(azimuthDeg + 360 * k);
  }
  const middle = (minDeg + maxDeg) / 2;
  return turns.sort((a, b) => Math.abs(a - middle) - Math.abs(b - middle) || a - b);
}

/**
 * The way along a scan.
 *
 * @param directionAt  azimuth and elevation at an instant
 * @param scan         longer than zero
 * @throws RangeError if the scan is empty (programmer error)
 *
 * Error   limits met for less than a minute in mid-scan, by less than azimuth's bend within it, can be missed
 *         (0.1° at 60° elevation); the instants are refined to 1 ms
 */
export function scanPath(directionAt: (atMs: number) => AzEl, scan: Interval): ScanPath {
  const startMs = scan.start.getTime();
  const endMs = scan.end.getTime();
  if (!(endMs > startMs)) throw new RangeError('A scan has a length');
  const samples = sampled(directionAt, startMs, endMs);
  const { first, last } = samples;
  const turnAt = (atMs: number, near: Sample) =>
    near.turnDeg + normalise180(directionAt(atMs).azimuthDeg - near.azimuthDeg);

  return {
    start: { azimuthDeg: first.azimuthDeg, elevationDeg: first.elevationDeg },
    end: { azimuthDeg: last.azimuthDeg, elevationDeg: last.elevationDeg },
    endTurnDeg: last.turnDeg,
    leavesRangeAtMs: (mount, startMotorDeg) => {
      const { minDeg, maxDeg } = mount.azimuth;
      const outside = (turnDeg: number) =>
        startMotorDeg + turnDeg < minDeg || startMotorDeg + turnDeg > maxDeg;
      const found = firstOf(samples.all, (sample) => outside(sample.turnDeg));
      if (!found) return null;
      const { before, at } = found;
      return before ? changeMs((ms) => outside(turnAt(ms, before)), before.atMs, at.atMs) : at.atMs;
    },
    leavesElevationsAt: (minDeg, maxDeg) => {
      const outside = (elevationDeg: number) => elevationDeg < minDeg || elevationDeg > maxDeg;
      const found = firstOf(samples.all, (sample) => outside(sample.elevationDeg));
      if (!found) return null;
      const { before, at } = found;
      const atMs = before
        ? changeMs((ms) => outside(directionAt(ms).elevationDeg), before.atMs, at.atMs)
        : at.atMs;
      return { atMs, elevationDeg: at.elevationDeg };
    },
  };
}

function sampled(directionAt: (atMs: number) => AzEl, startMs: number, endMs: number) {
  const first: Sample = { atMs: startMs, turnDeg: 0, ...directionAt(startMs) };
  const all: Sample[] = [first];
  let last = first;
  let step = STEP_MS;
  while (last.atMs < endMs) {
    const atMs = Math.min(endMs, last.atMs + step);
    const direction = directionAt(atMs);
    const moved = normalise180(direction.azimuthDeg - last.azimuthDeg);
    if (Math.abs(moved) > STEP_LIMIT_DEG && atMs - last.atMs > LEAST_STEP_MS) {
      step = Math.max(LEAST_STEP_MS, (atMs - last.atMs) / 2);
      continue;
    }
    last = { atMs, turnDeg: last.turnDeg + moved, ...direction };
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
