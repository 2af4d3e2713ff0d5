import 'server-only';
import { and, eq, inArray, or, sql, type SQL } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { sessionStations } from '../../../db/schema/session-stations';
import { sessions } from '../../../db/schema/sessions';
import { POLICY, type SessionSubject, type Viewer } from '../../access/policy';
import { notFound } from '../errors';

/** Sessions that the viewer may know of, as a condition of the query itself. */
export function readableBy(viewer: Viewer): SQL | undefined {
  const scopes = POLICY['session.read'];
  if (viewer.grants.some(({ role }) => scopes[role] === 'any')) return sql`1`;
  const own = viewer.grants.filter(({ role }) => scopes[role] === 'own');
  const ids = own.flatMap(({ sessionId }) => (sessionId === null ? [] : [sessionId]));
  const codes = own.flatMap(({ stationCode }) => (stationCode === null ? [] : [stationCode]));
  return or(
    sql`0`,
    inArray(sessions.id, ids),
    sql`EXISTS (SELECT 1 FROM ${sessionStations} WHERE ${sessionStations.sessionId} = ${sessions.id} AND ${inArray(sessionStations.stationCode, codes)})`,
  );
}

export type SessionRow = typeof sessions.$inferSelect & { stations: string[] };

/** The session of an address (its id or its code); one that is not the viewer's is not found. */
export async function fetchSession(from: Database | Tx, viewer: Viewer, key: string): Promise<SessionRow> {
  const [row] = await from
    .select()
    .from(sessions)
    .where(and(or(eq(sessions.id, key), eq(sessions.code, key.toUpperCase())), readableBy(viewer)));
  if (!row) throw notFound(`There is no session ${key.slice(0, 40)}.`);
  const taking = await from
    .select({ code: sessionStations.stationCode })
    .from(sessionStations)
    .where(eq(sessionStations.sessionId, row.id))
    .orderBy(sessionStations.stationCode);
  return { ...row, stations: taking.map(({ code }) => code) };
}

export const subjectOf = (session: Pick<SessionRow, 'id' | 'stations'>): SessionSubject => ({
  sessionId: session.id,
  stationCodes: session.stations,
});
