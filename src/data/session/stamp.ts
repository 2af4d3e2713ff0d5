import 'server-only';
import { sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { clockEvents } from '../../../db/schema/clock-events';
import { clockReadings } from '../../../db/schema/clock-readings';
import { journal } from '../../../db/schema/journal';
import { offers } from '../../../db/schema/offers';
import { scanOutcomes } from '../../../db/schema/scan-outcomes';
import { sessionComments } from '../../../db/schema/session-comments';
import { sessionStations } from '../../../db/schema/session-stations';
import { slotReplies } from '../../../db/schema/slot-replies';
import { can, type Viewer } from '../../access/policy';
import { answer, type Failure } from '../errors';
import { fetchSession, subjectOf } from './scope';

/** Changes whenever something of a session changed: its plan (for those who see the draft), or its stations' word. */
export type SessionStamp = { ok: true; plan: string; stations: string };

export const readStamp = (viewer: Viewer, key: string): Promise<SessionStamp | Failure> =>
  answer(async () => {
    const session = await fetchSession(db(), viewer, key);
    const { id, rev, state } = session;
    const [row] = await db().all<{ seq: number; stations: string }>(sql`
      SELECT (SELECT coalesce(max(seq), 0) FROM ${journal} WHERE session_id = ${id}) AS seq,
        (SELECT count(*) FROM ${offers} WHERE session_id = ${id})
        || '.' || (SELECT coalesce(max(seq), 0) FROM ${slotReplies} WHERE session_id = ${id})
        || '.' || (SELECT coalesce(max(seq), 0) FROM ${scanOutcomes} WHERE session_id = ${id})
        || '.' || (SELECT count(*) FROM ${sessionComments} WHERE session_id = ${id})
        || '.' || (SELECT count(*) || '.' || coalesce(max(entered_at_ms), 0) || '.' || coalesce(max(set_aside_at_ms), 0)
            || '.' || count(CASE WHEN state = 'used' THEN 1 END)
          FROM ${clockReadings} WHERE station_code IN (SELECT station_code FROM ${sessionStations} WHERE session_id = ${id}))
        || '.' || (SELECT count(*) FROM ${clockEvents}
          WHERE station_code IN (SELECT station_code FROM ${sessionStations} WHERE session_id = ${id})) AS stations`);
    if (!row) throw new Error(`Session ${id} gave no stamp.`);
    const canReadDraft = can(viewer, 'plan.read-draft', subjectOf(session));
    return {
      ok: true,
      plan: canReadDraft ? String(row.seq) : '',
      stations: `${state}.${rev}.${row.stations}`,
    };
  });

/** As one text, for a page to know what it was made of; read before what it shows. Undefined where there is none. */
export async function knownStamp(
  viewer: Viewer,
  key: string,
  of: 'all' | 'stations',
): Promise<string | undefined> {
  const read = await readStamp(viewer, key);
  return read.ok ? stampText(read, of) : undefined;
}

export const stampText = ({ plan, stations }: SessionStamp, of: 'all' | 'stations'): string =>
  of === 'stations' ? stations : `${plan} ${stations}`;
