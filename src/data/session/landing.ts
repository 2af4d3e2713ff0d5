import 'server-only';
import { and, asc, sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { sessions } from '../../../db/schema/sessions';
import type { Role, Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { readableBy } from './scope';

/** Where a person's work begins: planners at the sessions, an operator at the desk, the others at the next session. */
export async function landingFor(viewer: Viewer): Promise<string> {
  const has = (role: Role) => viewer.grants.find((grant) => grant.role === role);
  if (has('admin') || has('scheduler')) return '/sessions';
  const operator = has('operator');
  if (operator?.stationCode) return `/stations/${operator.stationCode}/desk`;
  const page = has('correlator') ? 'fringes' : has('investigator') ? 'coverage' : null;
  const code = page === null ? null : await nextSession(viewer);
  return code === null ? '/sessions' : `/sessions/${encodeURIComponent(code)}/${page}`;
}

/** The first that has not ended, of those the viewer knows of; if all have, the last. */
async function nextSession(viewer: Viewer): Promise<string | null> {
  const end = sql`${sessions.startMs} + ${sessions.lengthSeconds} * 1000`;
  const open = and(readableBy(viewer), sql`${sessions.state} <> 'cancelled'`);
  const [next] = await db()
    .select({ code: sessions.code })
    .from(sessions)
    .where(and(open, sql`${end} > ${nowMs()}`))
    .orderBy(asc(sessions.startMs))
    .limit(1);
  if (next) return next.code;
  const [last] = await db()
    .select({ code: sessions.code })
    .from(sessions)
    .where(open)
    .orderBy(sql`${sessions.startMs} DESC`)
    .limit(1);
  return last?.code ?? null;
}
