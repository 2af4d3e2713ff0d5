import { DEG_PER_RAD } from '../units/angle';
import { extentOf } from '../units/time';
import type { Interval } from '../units/time';
import type { RotationOptions } from './position';
import { siteFrame } from './site';
import { trackDirection, tracksOf } from './track';
import type { Geodetic, SkyPosition } from './types';

export type AzElTable = { azimuthDeg: Float64Array; elevationDeg: Float64Array };

/**
 * Azimuth and elevation of many sources at many sites and instants.
 *
 * @param sources  ICRS places
 * @param sites    geodetic places
 * @param timesMs  UTC, epoch ms, in any order, 1900–2100
 * @param opts     dut1Seconds = UT1 − UTC, default 0
 * @returns azimuth [0, 360); elevation, geometric (no refraction); degrees
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Shape   [source][site][time] → index (source · sites + site) · times + time, Float64Array(sources · sites · times)
 * Error   as trackOf: ≤ 0.1″ of azEl with diurnal aberration (tests/sky/az-el-batch.test.ts)
 * Source  as azEl; the apparent place is turned to the Earth once for each instant
 */
export function azElBatch(
  sources: readonly SkyPosition[],
  sites: readonly Geodetic[],
  timesMs: ArrayLike<number>,
  opts: RotationOptions = {},
): AzElTable {
  const times = timesMs.length;
  const size = sources.length * sites.length * times;
  const table = { azimuthDeg: new Float64Array(size), elevationDeg: new Float64Array(size) };
  if (size === 0) return table;
  const frames = sites.map(siteFrame);
  tracksOf(sources, spanOf(timesMs), opts).forEach((track, source) => {
    for (let time = 0; time < times; time += 1) {
      const [x, y, z] = trackDirection(track, timesMs[time] ?? NaN);
      let at = source * frames.length * times + time;
      for (const { east, north, up, eastSpeed } of frames) {
        const toEast = x * east[0] + y * east[1] + eastSpeed;
        const toNorth = x * north[0] + y * north[1] + z * north[2];
        const toUp = x * up[0] + y * up[1] + z * up[2];
        const azimuth = DEG_PER_RAD * Math.atan2(toEast, toNorth);
        // a hair west of north is north, not 360°
        table.azimuthDeg[at] = azimuth < 0 ? (azimuth + 360) % 360 : azimuth;
        table.elevationDeg[at] =
          DEG_PER_RAD * Math.atan2(toUp, Math.sqrt(toEast * toEast + toNorth * toNorth));
        at += times;
      }
    }
  });
  return table;
}

/** A track has a length, an instant has none. */
function spanOf(timesMs: ArrayLike<number>): Interval {
  const { startMs, endMs } = extentOf(timesMs);
  return { start: new Date(startMs), end: new Date(Math.max(endMs, startMs + 1)) };
}
