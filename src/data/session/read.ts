import 'server-only';
import { sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { offers } from '../../../db/schema/offers';
import { scans } from '../../../db/schema/scans';
import { sessionStations } from '../../../db/schema/session-stations';
import { sessions } from '../../../db/schema/sessions';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { answer, forbiddenFor, type Failure } from '../errors';
import { answersOf, type StationAnswer } from '../slot/answers';
import { derivedState, type SessionHead, type SessionListItem } from './dto';
import { fetchSession, readableBy, subjectOf } from './scope';

/** The sessions the viewer may know of, newest start first. */
export const listSessions = (
  viewer: Viewer,
): Promise<{ ok: true; sessions: SessionListItem[]; canMake: boolean } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'session.list')) throw forbiddenFor('session.list');
    const rows = await db()
      .select({
        id: sessions.id,
        code: sessions.code,
        title: sessions.title,
        state: sessions.state,
        startMs: sessions.startMs,
        lengthSeconds: sessions.lengthSeconds,
        stations: sql<string>`(SELECT json_group_array(${sessionStations.stationCode} ORDER BY ${sessionStations.stationCode}) FROM ${sessionStations} WHERE ${sessionStations}.session_id = ${sessions}.id)`,
        scanCount: sql<number>`(SELECT count(CASE WHEN group_id IS NULL THEN 1 END) + count(DISTINCT group_id) FROM ${scans} WHERE ${scans}.session_id = ${sessions}.id)`,
        offer: sql<
          string | null
        >`(SELECT json_object('number', ${offers}.number, 'kind', ${offers}.kind) FROM ${offers} WHERE ${offers}.session_id = ${sessions}.id ORDER BY ${offers}.number DESC LIMIT 1)`,
      })
      .from(sessions)
      .where(readableBy(viewer))
      .orderBy(sql`${sessions.startMs} DESC`, sessions.code);
    const answers = await answersOf(
      db(),
      rows.map(({ id }) => id),
    );
    const now = nowMs();
    return {
      ok: true,
      sessions: rows.map((row) => listItem(viewer, row, answers, now)),
      canMake: can(viewer, 'session.make'),
    };
  });

/** What stands in the title block; for pages of a session that are not its plan. */
export const readSession = (
  viewer: Viewer,
  key: string,
): Promise<{ ok: true; session: SessionHead } | Failure> =>
  answer(async () => {
    const row = await fetchSession(db(), viewer, key);
    const { id, code, title, startMs, lengthSeconds, stations } = row;
    const state = derivedState(row, nowMs());
    return { ok: true, session: { id, code, title, state, startMs, lengthSeconds, stations } };
  });

type Row = Pick<SessionListItem, 'id' | 'code' | 'title' | 'startMs' | 'lengthSeconds'> & {
  state: Parameters<typeof derivedState>[0]['state'];
  stations: string;
  scanCount: number;
  offer: string | null;
};

function listItem(viewer: Viewer, row: Row, answers: readonly StationAnswer[], now: number): SessionListItem {
  const stations = JSON.parse(row.stations) as string[];
  const canReadPlan = can(viewer, 'plan.read-draft', subjectOf({ id: row.id, stations }));
  const { id, code, title, startMs, lengthSeconds } = row;
  return {
    id,
    code,
    title,
    state: derivedState(row, now),
    startMs,
    lengthSeconds,
    stations,
    scanCount: canReadPlan ? row.scanCount : null,
    canReadPlan,
    offer: row.offer === null ? null : (JSON.parse(row.offer) as SessionListItem['offer']),
    answers: Object.fromEntries(
      answers.filter((one) => one.sessionId === id).map(({ station, answer: word }) => [station, word]),
    ),
  };
}
