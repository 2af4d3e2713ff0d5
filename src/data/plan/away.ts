import 'server-only';
import { and, gt, inArray, lt } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { stationUnavailability } from '../../../db/schema/station-unavailability';
import type { SessionRow } from '../session/scope';
import type { StationAnswer } from '../slot/answers';
import type { AwayDto } from './dto';

/** When a session's stations are not there: what they declined, and what was planned at the station. */
export async function awayOf(
  from: Database | Tx,
  session: Pick<SessionRow, 'startMs' | 'lengthSeconds' | 'stations'>,
  answers: readonly StationAnswer[],
): Promise<Record<string, AwayDto[]>> {
  const endMs = session.startMs + session.lengthSeconds * 1000;
  const planned = await from
    .select()
    .from(stationUnavailability)
    .where(
      and(
        inArray(stationUnavailability.stationCode, session.stations),
        lt(stationUnavailability.startMs, endMs),
        gt(stationUnavailability.endMs, session.startMs),
      ),
    )
    .orderBy(stationUnavailability.startMs);
  return Object.fromEntries(
    session.stations.map((code) => [
      code,
      [
        ...answers
          .filter(({ station }) => station === code)
          .flatMap(({ without, reason }) =>
            without.map(([startMs, untilMs]) => ({
              startMs,
              endMs: untilMs,
              why: reason,
              isDeclined: true,
            })),
          ),
        ...planned
          .filter(({ stationCode }) => stationCode === code)
          .map(({ startMs, endMs: untilMs, why }) => ({ startMs, endMs: untilMs, why, isDeclined: false })),
      ],
    ]),
  );
}
