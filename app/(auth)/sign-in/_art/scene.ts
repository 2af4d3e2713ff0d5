import { prepareSite, trackElevationDeg, trackOf } from '@/src/sky/track';
import type { Geodetic, SkyPosition } from '@/src/sky/types';

export type Scene = {
  source: { name: string; position: SkyPosition };
  /** in stave order */
  stations: readonly { code: string; site: Geodetic; minElevationDeg: number }[];
  span: { startMs: number; endMs: number };
  scans: readonly { startMs: number; lengthSeconds: number; codes: readonly string[] }[];
};

export type Point = { ms: number; elevationDeg: number };

export type Stave = {
  code: string;
  /** runs of time with the source above the station's limit */
  ribbons: readonly (readonly Point[])[];
  notes: readonly { from: Point; to: Point; scan: number }[];
};

const STEP_MS = 240_000;

/** Where the source stands over each station through the span, and on it the scans that lie inside. */
export function stavesOf({ source, stations, span, scans }: Scene): Stave[] {
  const track = trackOf(source.position, { start: new Date(span.startMs), end: new Date(span.endMs) });
  return stations.map(({ code, site, minElevationDeg }) => {
    const frame = prepareSite(site);
    const at = (ms: number): Point => ({ ms, elevationDeg: trackElevationDeg(track, frame, ms) });
    const ribbons: Point[][] = [];
    let run: Point[] = [];
    for (let ms = span.startMs; ms <= span.endMs; ms += STEP_MS) {
      const point = at(ms);
      if (point.elevationDeg >= minElevationDeg) {
        if (run.push(point) === 1) ribbons.push(run);
      } else {
        run = [];
      }
    }
    const notes = scans.flatMap(({ startMs, lengthSeconds, codes }, scan) => {
      const stopMs = startMs + lengthSeconds * 1000;
      const isInside = startMs >= span.startMs && stopMs <= span.endMs;
      return isInside && codes.includes(code) ? [{ from: at(startMs), to: at(stopMs), scan }] : [];
    });
    return { code, ribbons, notes };
  });
}
