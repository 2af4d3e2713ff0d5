import { azElBatch } from '../sky/az-el-batch';
import type { Interval } from '../sky/types';
import { overlap, windowsFor } from '../sky/windows';
import type { PlanSettings, PlanSource, PlanStation } from './context';
import type { StationCode } from './plan';
import { skyStation } from './sky-station';
import type { SkyTable } from './sky-table';

/** So far apart that the table stays small and a straight line between is below a pixel on the sheet. */
const STEP_SECONDS = 600;

/**
 * Elevations every ten minutes, windows, and common windows of at least 1 … n stations.
 *
 * @param settings  minElevationDeg holds on top of each station's own limit
 * @param span      half-open span of UTC
 * @returns nodes reach the span's end or go past it by less than a step
 *
 * Error   windows as `visibilityWindows`; elevations rounded to 0.01°
 */
export function skyTable(
  stations: readonly PlanStation[],
  sources: readonly PlanSource[],
  settings: Pick<PlanSettings, 'minElevationDeg'>,
  span: Interval,
): SkyTable {
  const startMs = span.start.getTime();
  const steps = Math.ceil((span.end.getTime() - startMs) / (STEP_SECONDS * 1000)) + 1;
  const places = sources.map((source) => source.position);
  const windows = windowsFor(
    places,
    stations.map((station) => skyStation(station, settings)),
    span,
  );
  const { elevationDeg } = azElBatch(
    places,
    stations.map((station) => station.site),
    Array.from({ length: steps }, (_, step) => startMs + step * STEP_SECONDS * 1000),
  );
  const elevationsOf = (source: number) =>
    stations.map((station, index): [StationCode, number[]] => {
      const from = (source * stations.length + index) * steps;
      const own = elevationDeg.subarray(from, from + steps);
      return [station.code, Array.from(own, (deg) => Math.round(deg * 100))];
    });
  return {
    startMs,
    stepSeconds: STEP_SECONDS,
    elevations: Object.fromEntries(
      sources.map((source, index) => [source.id, Object.fromEntries(elevationsOf(index))]),
    ),
    windows: Object.fromEntries(
      sources.map((source, index) => [
        source.id,
        Object.fromEntries(
          stations.map((station, at) => [station.code, (windows[index]?.[at] ?? []).map(spanOf)]),
        ),
      ]),
    ),
    common: Object.fromEntries(
      sources.map((source, index) => [
        source.id,
        stations.map((_, least) => overlap(windows[index] ?? [], least + 1).map(spanOf)),
      ]),
    ),
  };
}

const spanOf = (interval: Interval): readonly [number, number] => [
  Math.round(interval.start.getTime()),
  Math.round(interval.end.getTime()),
];
