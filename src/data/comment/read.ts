import 'server-only';
import { asc, eq } from 'drizzle-orm';
import { db } from '../../../db/client';
import { sessionComments } from '../../../db/schema/session-comments';
import { can, roleLabel, type Role, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { answer, type Failure } from '../errors';
import type { SessionHead } from '../session/dto';
import { headOf } from '../session/head';
import { fetchSession, subjectOf } from '../session/scope';

export type CommentDto = {
  id: string;
  /** "Scheduler", "Operator Af" */
  by: string;
  isMine: boolean;
  atMs: number;
  text: string;
};

/** What was said of a session, oldest first. */
export const readComments = (
  viewer: Viewer,
  key: string,
): Promise<
  { ok: true; session: SessionHead; comments: CommentDto[]; canWrite: boolean; nowMs: number } | Failure
> =>
  answer(async () => {
    const session = await fetchSession(db(), viewer, key);
    const rows = await db()
      .select()
      .from(sessionComments)
      .where(eq(sessionComments.sessionId, session.id))
      .orderBy(asc(sessionComments.atMs), asc(sessionComments.id));
    const now = nowMs();
    return {
      ok: true,
      session: headOf(session, now),
      comments: rows.map(({ id, role, stationCode, userId, atMs, text }) => ({
        id,
        by: roleLabel({ role: role as Role, stationCode }),
        isMine: userId === viewer.userId,
        atMs,
        text,
      })),
      canWrite: can(viewer, 'comment.write', subjectOf(session)),
      nowMs: now,
    };
  });
