import { baselinesOf } from '@/src/array/baseline';
import type { SkySheet, SkySource } from '@/src/data/sky/dto';
import type { StationCode } from '@/src/schedule/plan';
import { stationsUp, tableElevationDeg, type SkyTable } from '@/src/schedule/sky-table';

export type Span = readonly [startMs: number, endMs: number];
type Step = { startMs: number; endMs: number; up: number };
export type Pair = { first: StationCode; second: StationCode };

/** Which times a wash stands behind. */
export type Mark = { kind: 'all' } | { kind: 'least'; least: number } | ({ kind: 'pair' } & Pair);

export type Row = {
  source: SkySource;
  bars: readonly { code: StationCode; spans: readonly Span[] }[];
  steps: readonly Step[];
  all: readonly Span[];
  marked: readonly Span[];
};

/** Each source with the bars of the chosen stations, their counts, and the times that are marked. */
export function rowsOf(sheet: SkySheet, codes: readonly StationCode[], mark: Mark): Row[] {
  return sheet.sources.map((source) => {
    const steps = stepsOf(sheet, source.id, codes);
    const all = spansWith(steps, codes.length);
    return {
      source,
      bars: codes.map((code) => ({ code, spans: windowsOf(sheet.table, source.id, code) })),
      steps,
      all,
      marked: mark.kind === 'all' ? all : togetherIn(sheet, source.id, codes, mark),
    };
  });
}

/** The times at which a mark holds, of the chosen stations. */
export function togetherIn(
  sheet: SkySheet,
  sourceId: string,
  codes: readonly StationCode[],
  mark: Mark,
): Span[] {
  if (mark.kind === 'pair') return spansWith(stepsOf(sheet, sourceId, [mark.first, mark.second]), 2);
  return spansWith(stepsOf(sheet, sourceId, codes), mark.kind === 'all' ? codes.length : mark.least);
}

function stepsOf({ session, table }: SkySheet, sourceId: string, codes: readonly StationCode[]): Step[] {
  const windows = Object.fromEntries(codes.map((code) => [code, windowsOf(table, sourceId, code)]));
  const chosen = { ...table, windows: { [sourceId]: windows } };
  return stationsUp(chosen, sourceId, session.startMs, session.startMs + session.lengthSeconds * 1000);
}

/** Steps with at least so many up, joined; none where no station is asked for. */
function spansWith(steps: readonly Step[], least: number): Span[] {
  if (least === 0) return [];
  const spans: Span[] = [];
  for (const { startMs, endMs, up } of steps) {
    if (up < least) continue;
    const last = spans.at(-1);
    if (last && last[1] === startMs) spans.splice(-1, 1, [last[0], endMs]);
    else spans.push([startMs, endMs]);
  }
  return spans;
}

export const windowsOf = (table: SkyTable, sourceId: string, code: StationCode): readonly Span[] =>
  table.windows[sourceId]?.[code] ?? [];

export const secondsOf = (spans: readonly Span[]) =>
  spans.reduce((sum, [startMs, endMs]) => sum + (endMs - startMs) / 1000, 0);

export type Point = { ms: number; elevationDeg: number };

/** A station's elevations in one window: its ends, and the table's nodes between. */
export function pointsIn(table: SkyTable, sourceId: string, code: StationCode, [from, to]: Span): Point[] {
  const stepMs = table.stepSeconds * 1000;
  const nodes: number[] = [];
  for (let ms = table.startMs + Math.ceil((from - table.startMs) / stepMs) * stepMs; ms < to; ms += stepMs)
    if (ms > from) nodes.push(ms);
  return [from, ...nodes, to].flatMap((ms) => {
    const elevationDeg = tableElevationDeg(table, sourceId, code, ms);
    return elevationDeg === null ? [] : [{ ms, elevationDeg }];
  });
}

/** Where a station sees the source highest; null where it never sees it. */
export function highestOf(table: SkyTable, sourceId: string, code: StationCode): Point | null {
  return windowsOf(table, sourceId, code)
    .flatMap((span) => pointsIn(table, sourceId, code, span))
    .reduce<Point | null>(
      (best, point) => (best === null || point.elevationDeg > best.elevationDeg ? point : best),
      null,
    );
}

export const pairsOf = (stations: SkySheet['stations']): Pair[] =>
  baselinesOf(stations).map(({ first, second }) => ({ first: first.code, second: second.code }));

export const pairText = ({ first, second }: Pair) => `${first}–${second}`;

/** "All 6", "At least 4", "Em–Cf". */
export function markText(mark: Mark, count: number): string {
  if (mark.kind === 'all') return `All ${count}`;
  return mark.kind === 'least' ? `At least ${mark.least}` : pairText(mark);
}
