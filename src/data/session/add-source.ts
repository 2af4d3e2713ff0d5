import 'server-only';
import { eq } from 'drizzle-orm';
import { z } from 'zod';
import { transact } from '../../../db/client';
import { sessionSources } from '../../../db/schema/session-sources';
import { sessions } from '../../../db/schema/sessions';
import { sources } from '../../../db/schema/sources';
import type { Viewer } from '../../access/policy';
import { answer, notFound, Refusal, type Failure } from '../errors';
import { parsed } from '../input';
import { fetchEditable } from './editable';

const input = z.strictObject({ sourceId: z.string().max(32) });

/** Puts a catalogue source on a session's list, with no scan wanted yet; one that is there stays as it is. */
export const addSessionSource = (
  viewer: Viewer,
  key: string,
  body: unknown,
): Promise<{ ok: true; name: string } | Failure> =>
  answer(async () => {
    const { sourceId } = parsed(input, body);
    return transact(async (tx) => {
      const session = await fetchEditable(tx, viewer, key);
      const [source] = await tx.select().from(sources).where(eq(sources.id, sourceId));
      if (!source) throw notFound('That source is not in the catalogue.');
      if (source.retiredAtMs !== null) {
        const message = `${source.name} is retired. Choose another source.`;
        throw new Refusal({ ok: false, code: 'conflict', message });
      }
      const added = await tx
        .insert(sessionSources)
        .values({ sessionId: session.id, sourceId, wantedScans: 0 })
        .onConflictDoNothing()
        .returning();
      // an open form of the session must not take it out again unseen
      if (added.length > 0)
        await tx
          .update(sessions)
          .set({ rev: session.rev + 1 })
          .where(eq(sessions.id, session.id));
      return { ok: true, name: source.name };
    });
  });
