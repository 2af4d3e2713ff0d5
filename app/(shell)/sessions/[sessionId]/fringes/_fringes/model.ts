import { baselineLengthM, baselinesOf } from '@/src/array/baseline';
import {
  fringeOutlook,
  isExpected,
  type OutlookCell,
  type OutlookContext,
  type Verdict,
} from '@/src/outlook/fringe-outlook';
import type { Plan, Scan, ScanId, StationCode } from '@/src/schedule/plan';
import { scanNumbers } from '@/src/schedule/scan-numbers';
import { geodeticToItrf } from '@/src/sky/site';

export const VERDICTS: readonly (readonly [Verdict, string])[] = [
  ['strong', 'Strong'],
  ['fair', 'Fair'],
  ['doubtful', 'Doubtful'],
  ['none', 'None'],
  ['unknown', 'No data'],
  ['not-on', 'Not on'],
];

export type Ends = { first: StationCode; second: StationCode };
export type Pair = Ends & { lengthM: number };
export type Row = { scan: Scan; number: string; cells: readonly OutlookCell[] };

export type Outlook = {
  rows: readonly Row[];
  pairs: readonly Pair[];
  counts: Readonly<Record<Verdict, number>>;
};

export type Filter = {
  verdicts: ReadonlySet<Verdict>;
  stations: ReadonlySet<StationCode>;
  sourceId: string | null;
  columnsBy: 'station' | 'length';
};

/** Every scan and baseline of the plan, judged. */
export function outlookOf(plan: Plan, context: OutlookContext): Outlook {
  const numbers = scanNumbers(plan);
  const cells = new Map<ScanId, OutlookCell[]>();
  const counts: Record<Verdict, number> = {
    strong: 0,
    fair: 0,
    doubtful: 0,
    none: 0,
    unknown: 0,
    'not-on': 0,
  };
  for (const cell of fringeOutlook(plan, context)) {
    counts[cell.verdict] += 1;
    const row = cells.get(cell.scanId);
    if (row) row.push(cell);
    else cells.set(cell.scanId, [cell]);
  }
  const ends = plan.stations.flatMap((code) => {
    const station = context.stations[code];
    return station ? [{ code, site: station.site }] : [];
  });
  return {
    rows: plan.scans.map((scan) => ({
      scan,
      number: numbers.get(scan.id) ?? '',
      cells: cells.get(scan.id) ?? [],
    })),
    pairs: baselinesOf(ends).map(({ first, second }) => ({
      first: first.code,
      second: second.code,
      lengthM: baselineLengthM(geodeticToItrf(first.site), geodeticToItrf(second.site)),
    })),
    counts,
  };
}

/** The columns shown: of the stations ticked, by western station or by length. */
export function columnsOf({ pairs }: Outlook, filter: Filter): Pair[] {
  const shown = pairs.filter(
    ({ first, second }) => filter.stations.has(first) && filter.stations.has(second),
  );
  if (filter.columnsBy === 'station') return shown;
  return [...shown].sort((a, b) => a.lengthM - b.lengthM);
}

/** The scans shown: of the source chosen, with a cell of a verdict ticked in a column shown. */
export function rowsOf({ rows }: Outlook, filter: Filter, columns: readonly Pair[]): Row[] {
  const keys = new Set(columns.map(keyOf));
  return rows.filter(
    ({ scan, cells }) =>
      (filter.sourceId === null || scan.sourceId === filter.sourceId) &&
      cells.some((cell) => keys.has(keyOf(cell)) && filter.verdicts.has(cell.verdict)),
  );
}

export const keyOf = ({ first, second }: Ends) => `${first}–${second}`;

/** "10 of 15": expected, of those on source together. */
export function tally(cells: readonly OutlookCell[]): { expected: number; possible: number } {
  return {
    expected: cells.filter(isExpected).length,
    possible: cells.filter(({ verdict }) => verdict !== 'not-on').length,
  };
}

/** A cell that must be looked at: none, doubtful or unknown. */
export const fails = ({ verdict }: OutlookCell) =>
  verdict === 'none' || verdict === 'doubtful' || verdict === 'unknown';

const NOT_ON_WORDS: Readonly<Record<string, string>> = {
  low: 'low',
  out: 'out',
  declined: 'decl.',
  mode: 'mode',
};

export const notOnWord = ({ reason }: OutlookCell) => NOT_ON_WORDS[reason ?? 'out'] ?? 'out';
