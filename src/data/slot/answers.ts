import 'server-only';
import { sql } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { offers } from '../../../db/schema/offers';
import { slotReplies } from '../../../db/schema/slot-replies';
import { slots } from '../../../db/schema/slots';
import { answerTo, hoursWithout, type Hours } from '../../schedule/slots';
import { oneOf } from '../plan/rows';
import type { Answered } from './dto';

/** The newest slot of a station and what it last said of it. */
export type StationAnswer = Answered & {
  sessionId: string;
  station: string;
  offerId: string;
  modeIds: string[];
};

type Row = {
  sessionId: string;
  station: string;
  offerId: string;
  startMs: number;
  endMs: number;
  modes: string;
  reply: 'confirmed' | 'partly' | 'declined' | null;
  hours: string | null;
  reason: string | null;
  atMs: number | null;
  role: string | null;
  isOnBehalf: number | null;
  askedStartMs: number | null;
  askedEndMs: number | null;
  askedModes: string | null;
};

/** The stations' answers to the newest offer of each session. */
export async function answersOf(
  from: Database | Tx,
  sessionIds: readonly string[],
): Promise<StationAnswer[]> {
  const rows = await from.all<Row>(sql`
    SELECT o.session_id AS sessionId, s.station_code AS station, o.id AS offerId, s.start_ms AS startMs,
      s.end_ms AS endMs, s.modes AS modes, r.reply, r.hours, r.reason, r.at_ms AS atMs, r.role,
      r.is_on_behalf AS isOnBehalf, q.start_ms AS askedStartMs, q.end_ms AS askedEndMs, q.modes AS askedModes
    FROM ${offers} o
    JOIN ${slots} s ON s.offer_id = o.id
    LEFT JOIN ${slotReplies} r ON r.seq = (SELECT max(n.seq) FROM ${slotReplies} n
      WHERE n.session_id = o.session_id AND n.station_code = s.station_code)
    LEFT JOIN ${slots} q ON q.offer_id = r.offer_id AND q.station_code = r.station_code
    WHERE o.session_id IN ${oneOf(sessionIds)}
      AND o.number = (SELECT max(m.number) FROM ${offers} m WHERE m.session_id = o.session_id)
    ORDER BY o.session_id, s.station_code`);
  return rows.map(answerOfRow);
}

function answerOfRow(row: Row): StationAnswer {
  const { sessionId, station, offerId, startMs, endMs } = row;
  const modeIds = JSON.parse(row.modes) as string[];
  const hours = row.hours === null ? [] : (JSON.parse(row.hours) as Hours[]);
  const asked = {
    startMs: row.askedStartMs ?? startMs,
    endMs: row.askedEndMs ?? endMs,
    modeIds: row.askedModes === null ? modeIds : (JSON.parse(row.askedModes) as string[]),
  };
  const answer = answerTo(
    { startMs, endMs, modeIds },
    row.reply === null ? null : { reply: row.reply, hours, asked },
  );
  const cannot = row.reply === null || answer === 'stale' ? null : { hours };
  return {
    sessionId,
    station,
    offerId,
    startMs,
    endMs,
    modeIds,
    answer,
    hours,
    without: hoursWithout([startMs, endMs], cannot),
    reason: row.reason ?? '',
    answeredAtMs: row.atMs,
    role: row.role,
    isOnBehalf: row.isOnBehalf === 1,
  };
}
