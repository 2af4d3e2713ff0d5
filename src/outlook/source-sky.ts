import type { PlanContext } from '../schedule/context';
import { stationOnMs, type Plan, type ScanId, type StationCode } from '../schedule/plan';
import { skyStation } from '../schedule/sky-station';
import { horizonElevationDeg, prepareHorizon } from '../sky/horizon';
import type { SkyStation } from '../sky/types';
import { prepareSite, trackAzEl, trackElevationDeg, trackOf } from '../sky/track';
import { trackWindows } from '../sky/windows';

/** How a station sees one source over the span of a plan. */
export type StationSky = {
  code: StationCode;
  /** [epoch ms, elevation in degrees], one line for each window above mask and limits */
  lines: readonly (readonly (readonly [atMs: number, elevationDeg: number])[])[];
  /** the scans it takes part in: hours on source, and where it points at their ends */
  scans: readonly {
    scanId: ScanId;
    startMs: number;
    stopMs: number;
    /** [azimuth, elevation] in degrees at start, middle and stop */
    points: readonly (readonly [azimuthDeg: number, elevationDeg: number])[];
  }[];
  /** [azimuth, elevation] of mask and lowest limit all round, every 5° */
  ground: readonly (readonly [azimuthDeg: number, elevationDeg: number])[];
};

const GROUND_STEP_DEG = 5;

/**
 * Elevation of a source at each station of a plan, and where its scans stand on the sky.
 *
 * @param wanted  source and band of the scans; stepSeconds > 0 between points of a line, ends of windows included
 * @returns stations in the plan's order; empty where the source is not in the context
 *
 * Error   as trackOf
 * Source  geometric elevation, as the windows take it
 */
export function sourceSky(
  plan: Plan,
  context: PlanContext,
  wanted: { sourceId: string; band: string; stepSeconds: number },
): StationSky[] {
  const source = context.sources[wanted.sourceId];
  const { startMs, lengthSeconds } = plan.span;
  if (!source || lengthSeconds <= 0) return [];
  const span = { start: new Date(startMs), end: new Date(startMs + lengthSeconds * 1000) };
  const track = trackOf(source.position, span);
  const observed = plan.scans.filter(
    ({ sourceId, modeId }) => sourceId === wanted.sourceId && context.modes[modeId]?.band === wanted.band,
  );
  return plan.stations.flatMap((code) => {
    const station = context.stations[code];
    if (!station) return [];
    const site = prepareSite(station.site);
    const limits = skyStation(station, context.settings);
    const lines = trackWindows(track, source.position, limits, span).map(({ start, end }) =>
      timesBetween(start.getTime(), end.getTime(), wanted.stepSeconds * 1000).map(
        (ms) => [ms, trackElevationDeg(track, site, ms)] as const,
      ),
    );
    const scans = observed.flatMap((scan) => {
      const member = scan.stations.find((one) => one.station === code);
      if (!member) return [];
      const on = stationOnMs(scan, member);
      const times = [on.startMs, (on.startMs + on.stopMs) / 2, on.stopMs];
      const points = times.map((ms) => {
        const { azimuthDeg, elevationDeg } = trackAzEl(track, site, ms);
        return [azimuthDeg, elevationDeg] as const;
      });
      return [{ scanId: scan.id, ...on, points }];
    });
    return [{ code, lines, scans, ground: groundOf(limits) }];
  });
}

function timesBetween(fromMs: number, untilMs: number, stepMs: number): number[] {
  const steps = Math.max(1, Math.ceil((untilMs - fromMs) / stepMs));
  return Array.from({ length: steps + 1 }, (_, index) => fromMs + ((untilMs - fromMs) * index) / steps);
}

function groundOf({ horizon, minElevationDeg }: SkyStation): (readonly [number, number])[] {
  const mask = prepareHorizon(horizon);
  return Array.from({ length: 360 / GROUND_STEP_DEG }, (_, index) => {
    const azimuthDeg = index * GROUND_STEP_DEG;
    return [azimuthDeg, Math.max(minElevationDeg, mask ? horizonElevationDeg(mask, azimuthDeg) : 0)] as const;
  });
}
