import type { StationCode } from './plan';

type Span = readonly [startMs: number, endMs: number];

/** Elevations and windows of a session's sources, small enough to travel: what ribbons and counts are drawn from. */
export type SkyTable = {
  startMs: number;
  stepSeconds: number;
  /** hundredths of a degree at startMs + n · step, by source and station */
  elevations: Readonly<Record<string, Readonly<Record<StationCode, readonly number[]>>>>;
  /** times above mask and limits, whole milliseconds */
  windows: Readonly<Record<string, Readonly<Record<StationCode, readonly Span[]>>>>;
  /** times when at least n + 1 stations see the source */
  common: Readonly<Record<string, readonly (readonly Span[])[]>>;
};

/**
 * Elevation by straight line between the table's nodes; the end nodes hold outside.
 *
 * @returns degrees; null if the table lacks the pair
 *
 * Error   ≤ 0.03° from 0° to 60° of elevation, ≤ 0.15° to 85°, 1.3° where a source passes through the zenith or,
 *         under the horizon, the nadir (tests/schedule/sky-table.test.ts)
 */
export function tableElevationDeg(
  table: SkyTable,
  sourceId: string,
  station: StationCode,
  atMs: number,
): number | null {
  const nodes = table.elevations[sourceId]?.[station];
  if (!nodes || nodes.length === 0) return null;
  const at = Math.max(0, Math.min(nodes.length - 1, (atMs - table.startMs) / (table.stepSeconds * 1000)));
  const left = nodes[Math.floor(at)] ?? 0;
  const right = nodes[Math.min(nodes.length - 1, Math.floor(at) + 1)] ?? left;
  return (left + (right - left) * (at - Math.floor(at))) / 100;
}

/**
 * How many stations see a source, as steps over the whole span.
 *
 * @returns adjoining steps, each with a count; adjacent ones differ
 */
export function stationsUp(
  table: SkyTable,
  sourceId: string,
  fromMs: number,
  toMs: number,
): { startMs: number; endMs: number; up: number }[] {
  const spans = Object.values(table.windows[sourceId] ?? {}).flat();
  const edges = [fromMs, ...spans.flat().filter((ms) => ms > fromMs && ms < toMs), toMs].sort(
    (a, b) => a - b,
  );
  const steps: { startMs: number; endMs: number; up: number }[] = [];
  for (let index = 0; index + 1 < edges.length; index++) {
    const startMs = edges[index] ?? fromMs;
    const endMs = edges[index + 1] ?? toMs;
    if (endMs <= startMs) continue;
    const up = spans.filter(([start, end]) => start <= startMs && end >= endMs).length;
    const last = steps.at(-1);
    if (last && last.up === up) last.endMs = endMs;
    else steps.push({ startMs, endMs, up });
  }
  return steps;
}
