import {
  AstroTime,
  HorizonFromVector,
  Observer,
  RotateVector,
  Rotation_EQJ_HOR,
  Spherical,
  VectorFromSphere,
} from 'astronomy-engine';
import type { AzEl, Geodetic, Interval, SkyPosition, SkyStation } from '../../../src/sky/types';
import { horizonElevationDeg, prepareHorizon } from '../../../src/sky/horizon';

const STEP_MS = 60_000;
const EDGE_MS = 0.5;
const J2000_MS = Date.UTC(2000, 0, 1, 12);

export const ROUTE = 'astronomy-engine Rotation_EQJ_HOR + RotateVector + HorizonFromVector';

/** Azimuth and elevation as one gets them from the engine's public functions, no aberration. */
export function engineAzEl(source: SkyPosition, site: Geodetic, atMs: number): AzEl {
  const time = new AstroTime((atMs - J2000_MS) / 86_400_000);
  const observer = new Observer(site.latitudeDeg, site.longitudeDeg, site.heightM);
  const vector = VectorFromSphere(new Spherical(source.decDeg, source.raDeg, 1), time);
  const seen = HorizonFromVector(RotateVector(Rotation_EQJ_HOR(time, observer), vector), '');
  return { azimuthDeg: seen.lon, elevationDeg: seen.lat };
}

/** Windows by looking each minute and halving the minute in which something changes. */
export function engineWindows(source: SkyPosition, station: SkyStation, span: Interval): [number, number][] {
  const horizon = prepareHorizon(station.horizon);
  const isUp = (ms: number) => {
    const { azimuthDeg, elevationDeg } = engineAzEl(source, station.site, ms);
    if (elevationDeg < station.minElevationDeg) return false;
    return !horizon || elevationDeg >= horizonElevationDeg(horizon, azimuthDeg);
  };
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  const edges: number[] = [];
  let before = isUp(startMs);
  if (before) edges.push(startMs);
  for (let ms = startMs + STEP_MS; ms <= endMs; ms += STEP_MS) {
    const here = isUp(ms);
    if (here !== before) edges.push(edgeMs(isUp, ms - STEP_MS, ms, here));
    before = here;
  }
  if (before) edges.push(endMs);
  return edges.flatMap((edge, index) => (index % 2 === 1 ? [[edges[index - 1] ?? NaN, edge]] : []));
}

function edgeMs(isUp: (ms: number) => boolean, fromMs: number, untilMs: number, after: boolean): number {
  let [low, high] = [fromMs, untilMs];
  while (high - low > EDGE_MS) {
    const middle = (low + high) / 2;
    if (isUp(middle) === after) high = middle;
    else low = middle;
  }
  return high;
}
