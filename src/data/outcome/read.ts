import 'server-only';
import { sql } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { scanOutcomes } from '../../../db/schema/scan-outcomes';
import type { Hours } from '../../schedule/slots';

export type Outcome = 'good' | 'partly' | 'lost';

export const REASONS = [
  'wind',
  'antenna',
  'receiver',
  'formatter',
  'recorder',
  'clock',
  'interference',
  'other',
] as const;
export type Reason = (typeof REASONS)[number];

/** What a station last said of a scan. */
export type OutcomeDto = {
  scanId: string;
  station: string;
  outcome: Outcome;
  /** times off source */
  lost: Hours[];
  reason: Reason | null;
  text: string;
  role: string;
  isOnBehalf: boolean;
  atMs: number;
  /** how often it was said; more than once is amended */
  times: number;
};

type Row = Omit<OutcomeDto, 'lost' | 'isOnBehalf'> & { lost: string; isOnBehalf: number };

/** The newest word on each scan of a session, of one station or of all. */
export async function outcomesOf(
  from: Database | Tx,
  sessionId: string,
  station: string | null = null,
): Promise<OutcomeDto[]> {
  const rows = await from.all<Row>(sql`
    SELECT scan_id AS scanId, station_code AS station, outcome, lost, reason, text, role,
      is_on_behalf AS isOnBehalf, at_ms AS atMs, times
    FROM (SELECT *, count(*) OVER one AS times, row_number() OVER (one ORDER BY seq DESC) AS rank
      FROM ${scanOutcomes}
      WHERE session_id = ${sessionId} AND (${station} IS NULL OR station_code = ${station})
      WINDOW one AS (PARTITION BY station_code, scan_id))
    WHERE rank = 1 ORDER BY station_code, scan_id`);
  return rows.map((row) => ({
    ...row,
    lost: JSON.parse(row.lost) as Hours[],
    isOnBehalf: row.isOnBehalf === 1,
  }));
}

/**
 * The word on a scan, or on a nodding group that is said as one: good or lost where all its legs are, else partly.
 *
 * @returns under the first leg's id; undefined where a leg was not spoken of
 */
export function wordOn(legIds: readonly string[], outcomes: readonly OutcomeDto[]): OutcomeDto | undefined {
  const said = legIds.flatMap((id) => outcomes.find(({ scanId }) => scanId === id) ?? []);
  const newest = said.reduce<OutcomeDto | undefined>(
    (best, one) => (!best || one.atMs > best.atMs ? one : best),
    undefined,
  );
  const [first = ''] = legIds;
  if (!newest || said.length < legIds.length) return undefined;
  if (said.length === 1) return newest;
  const words = new Set(said.map(({ outcome }) => outcome));
  const worst = said.find(({ outcome }) => outcome !== 'good') ?? newest;
  return {
    ...worst,
    scanId: first,
    outcome: words.size === 1 ? worst.outcome : 'partly',
    lost: said.flatMap(({ lost }) => lost),
    atMs: newest.atMs,
  };
}
