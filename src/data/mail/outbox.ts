import 'server-only';
import { and, asc, eq, inArray, ne } from 'drizzle-orm';
import { db, transact, type Database, type Tx } from '../../../db/client';
import { mailOutbox } from '../../../db/schema/mail-outbox';
import { nowMs } from '../../env';
import { sendMail } from '../../mail/send';

type OutboxRow = typeof mailOutbox.$inferInsert;
export type Queued = Pick<
  OutboxRow,
  'dedupeKey' | 'to' | 'subject' | 'text' | 'html' | 'sessionId' | 'stationCode'
>;

/** Writes messages in the transaction of what they tell of; what was queued before stays as it is. */
export async function queueMail(tx: Tx, messages: readonly Queued[], madeAtMs: number): Promise<void> {
  if (messages.length === 0) return;
  await tx
    .insert(mailOutbox)
    .values(
      messages.map((message) => ({ ...message, id: message.dedupeKey, madeAtMs, state: 'waiting' as const })),
    )
    .onConflictDoNothing();
}

/** What of a session did not go out, with what the service said. */
export const unsentOf = (
  from: Database | Tx,
  sessionId: string,
): Promise<{ id: string; to: string; trouble: string }[]> =>
  from
    .select({ id: mailOutbox.id, to: mailOutbox.to, trouble: mailOutbox.trouble })
    .from(mailOutbox)
    .where(and(eq(mailOutbox.sessionId, sessionId), ne(mailOutbox.state, 'sent')))
    .orderBy(asc(mailOutbox.to));

/** Tries what of these is not sent yet, once each: what fails stays, with what the service said. */
export async function sendQueued(
  ids: readonly string[],
): Promise<{ sent: number; failed: { to: string; trouble: string }[] }> {
  const waiting = await db()
    .select()
    .from(mailOutbox)
    .where(and(inArray(mailOutbox.id, [...ids]), ne(mailOutbox.state, 'sent')))
    .orderBy(asc(mailOutbox.id));
  const tried = await Promise.all(
    waiting.map(async ({ id, to, subject, text, html, dedupeKey, tries }) => {
      const sent = await sendMail({ to, subject, text, html, key: dedupeKey });
      await transact((tx) =>
        tx
          .update(mailOutbox)
          .set(
            sent.ok
              ? {
                  state: 'sent',
                  tries: tries + 1,
                  sentAtMs: nowMs(),
                  providerId: sent.providerId,
                  trouble: '',
                }
              : { state: 'failed', tries: tries + 1, trouble: sent.trouble },
          )
          .where(eq(mailOutbox.id, id)),
      );
      return { to, sent };
    }),
  );
  return {
    sent: tried.filter(({ sent }) => sent.ok).length,
    failed: tried.flatMap(({ to, sent }) => (sent.ok ? [] : [{ to, trouble: sent.trouble }])),
  };
}
