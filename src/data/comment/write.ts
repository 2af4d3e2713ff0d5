import 'server-only';
import { z } from 'zod';
import { transact } from '../../../db/client';
import { sessionComments } from '../../../db/schema/session-comments';
import { actingRole, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { ID_PATTERN } from '../../schedule/plan-ids';
import { answer, forbiddenFor, type Failure } from '../errors';
import { parsed } from '../input';
import { fetchSession, subjectOf } from '../session/scope';

const input = z.strictObject({
  id: z.string().regex(ID_PATTERN, 'The form has no id. Load the page again.'),
  text: z
    .string()
    .trim()
    .min(1, 'The comment is empty. Write it first.')
    .max(2000, 'The comment is longer than 2000 letters. Shorten it, or make two of it.'),
});

/** A comment on a session; sent twice it stands once. An operator speaks for a station of theirs. */
export const writeComment = (viewer: Viewer, key: string, body: unknown): Promise<{ ok: true } | Failure> =>
  answer(async () => {
    const { id, text } = parsed(input, body);
    return transact(async (tx) => {
      const session = await fetchSession(tx, viewer, key);
      const role = actingRole(viewer, 'comment.write', subjectOf(session));
      if (role === null) throw forbiddenFor('comment.write');
      const own = viewer.grants.find(
        (held) => held.role === 'operator' && session.stations.includes(held.stationCode ?? ''),
      );
      await tx
        .insert(sessionComments)
        .values({
          id,
          sessionId: session.id,
          userId: viewer.userId,
          role,
          stationCode: role === 'operator' ? (own?.stationCode ?? null) : null,
          atMs: nowMs(),
          text,
        })
        .onConflictDoNothing();
      return { ok: true };
    });
  });
