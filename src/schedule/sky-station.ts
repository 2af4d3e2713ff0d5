import type { SkyStation } from '../sky/types';
import type { PlanSettings, PlanStation } from './context';

/**
 * A station's limits for a session: its own, its mount's and the session's lowest elevation, by the stricter.
 */
export function skyStation(
  station: PlanStation,
  settings: Pick<PlanSettings, 'minElevationDeg'>,
): SkyStation {
  const { minElevationDeg, maxElevationDeg } = elevationsOf(station);
  return {
    site: station.site,
    minElevationDeg: Math.max(minElevationDeg, settings.minElevationDeg),
    maxElevationDeg,
    horizon: station.horizon,
    mount: station.mount,
  };
}

/** What a station's own limits and an az–el mount leave of the elevations. */
export function elevationsOf({ minElevationDeg, maxElevationDeg, mount }: PlanStation) {
  if (mount.kind !== 'az-el') return { minElevationDeg, maxElevationDeg };
  const { minDeg, maxDeg } = mount.elevation;
  return {
    minElevationDeg: Math.max(minElevationDeg, minDeg),
    maxElevationDeg: Math.min(maxElevationDeg, maxDeg),
  };
}
