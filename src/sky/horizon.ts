import { normalise360 } from '../units/angle';
import type { HorizonPoint } from './types';

/** A horizon mask made ready: corners by azimuth, the first repeated a turn later and the last a turn earlier. */
export type Horizon = { corners: readonly HorizonPoint[]; lowestDeg: number; highestDeg: number };

/**
 * A mask made ready for many look-ups.
 *
 * @param points  corners in any order; two at one azimuth make an upright step
 * @returns null when there are no points
 * @throws RangeError if a corner is not finite (programmer error)
 */
export function prepareHorizon(points: readonly HorizonPoint[] | undefined): Horizon | null {
  if (!points || points.length === 0) return null;
  const sorted = points.map(({ azimuthDeg, elevationDeg }) => {
    if (!Number.isFinite(azimuthDeg) || !Number.isFinite(elevationDeg)) {
      throw new RangeError(`Not a corner of a horizon: ${azimuthDeg}, ${elevationDeg}`);
    }
    return { azimuthDeg: normalise360(azimuthDeg), elevationDeg };
  });
  sorted.sort((a, b) => a.azimuthDeg - b.azimuthDeg);
  const turned = (by: number) => sorted.map((p) => ({ ...p, azimuthDeg: p.azimuthDeg + by }));
  const elevations = sorted.map((p) => p.elevationDeg);
  return {
    corners: [...turned(-360).slice(-1), ...sorted, ...turned(360).slice(0, 1)],
    lowestDeg: Math.min(...elevations),
    highestDeg: Math.max(...elevations),
  };
}

/**
 * Elevation of a mask at an azimuth, linear between corners and across north.
 *
 * @param azimuthDeg  [0, 360)
 * @returns degrees; on an upright step the higher side
 *
 * Source  definition of this project's masks (science: piecewise linear in azimuth, wraps at 360°)
 */
export function horizonElevationDeg(horizon: Horizon, azimuthDeg: number): number {
  const { corners } = horizon;
  let [low, high] = [0, corners.length - 1];
  // the corners low and high enclose the azimuth: low is the last at or below it
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    const corner = corners[middle];
    if (corner && corner.azimuthDeg <= azimuthDeg) low = middle;
    else high = middle;
  }
  const [left, right] = [corners[low], corners[high]];
  if (!left || !right) throw new RangeError('A horizon has corners');
  const width = right.azimuthDeg - left.azimuthDeg;
  const along = width > 0 ? (azimuthDeg - left.azimuthDeg) / width : 0;
  const onLine = left.elevationDeg + along * (right.elevationDeg - left.elevationDeg);
  if (azimuthDeg > left.azimuthDeg) return onLine;
  return stepTopDeg(corners, low);
}

/** The highest of all corners at one azimuth. */
function stepTopDeg(corners: readonly HorizonPoint[], last: number): number {
  const azimuthDeg = corners[last]?.azimuthDeg;
  let top = -Infinity;
  for (let index = last; index >= 0 && corners[index]?.azimuthDeg === azimuthDeg; index -= 1) {
    top = Math.max(top, corners[index]?.elevationDeg ?? -Infinity);
  }
  return top;
}
