import { normalise180, radToDeg } from '../units/angle';
import { spansWhere, stepsOver } from './crossings';
import type { Floor } from './floor';
import { horizonElevationDeg } from './horizon';
import type { Spans } from './interval-set';
import { changeMs } from './search';
import { trackAzEl, trackElevationDeg } from './track';
import type { Track } from './track';
import type { View } from './view';

/** Between these steps the Earth turns by 15′: the margin has one extremum between corners at most. */
const STEP_MS = 60_000;
/** Elevation moves by 0.25° in a step: farther than this outside the floor's heights it cannot matter. */
const BAND_DEG = 1;

/**
 * Times in which a source is on or above a floor, by looking each minute.
 *
 * @returns sorted and disjoint
 *
 * Error   edges ≤ 0.5 ms from the track; the height of a turn ≤ 2·10⁻⁷°
 * Source  margin over the floor at each minute, each corner and each extremum that could change the answer
 */
export function searchedFloor(track: Track, floor: Floor, view: View): Spans {
  const { horizon, site } = floor;
  const lowestDeg = Math.max(floor.lowestDeg, horizon.lowestDeg);
  const margin = (ms: number) => {
    const { azimuthDeg, elevationDeg } = trackAzEl(track, site, ms);
    return elevationDeg - Math.max(lowestDeg, horizonElevationDeg(horizon, azimuthDeg));
  };
  const matters = (ms: number) => {
    const elevationDeg = trackElevationDeg(track, site, ms);
    return elevationDeg > lowestDeg - BAND_DEG && elevationDeg < horizon.highestDeg + BAND_DEG;
  };
  const { startMs, endMs } = view;
  const steps = stepsOver(view.span, STEP_MS);
  const nodes = steps.filter((ms) => ms === startMs || ms === endMs || matters(ms));
  return spansWhere(margin, withCorners(track, floor, nodes));
}

/** Adds the instants at which the azimuth passes a corner of the floor. */
function withCorners(track: Track, floor: Floor, nodes: readonly number[]): number[] {
  const azimuth = (ms: number) => trackAzEl(track, floor.site, ms).azimuthDeg;
  const masked = [...new Set(floor.azimuthRad)].map(radToDeg);
  const corners: number[] = [];
  let beforeMs = nodes[0] ?? NaN;
  let before = azimuth(beforeMs);
  for (const ms of nodes.slice(1)) {
    const here = azimuth(ms);
    // a longer step lies where the floor does not matter
    const passing = ms - beforeMs <= STEP_MS + 1 ? masked : [];
    const moved = normalise180(here - before);
    for (const corner of passing) {
      const way = normalise180(corner - before);
      if (way === 0 || way / moved <= 0 || way / moved >= 1) continue;
      const from = before;
      const sign = Math.sign(way);
      const passed = (at: number) => sign * normalise180(azimuth(at) - from) >= sign * way;
      corners.push(changeMs(passed, beforeMs, ms));
    }
    [beforeMs, before] = [ms, here];
  }
  return [...nodes, ...corners].sort((a, b) => a - b);
}
