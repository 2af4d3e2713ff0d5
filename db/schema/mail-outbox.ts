import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';

/** Messages, written with what they tell of and sent after it. */
export const mailOutbox = sqliteTable(
  'mail_outbox',
  {
    id: text('id').primaryKey(),
    /** one message for one thing told; also the provider's idempotency key */
    dedupeKey: text('dedupe_key').notNull().unique(),
    to: text('to_address').notNull(),
    subject: text('subject').notNull(),
    text: text('text').notNull(),
    html: text('html').notNull(),
    sessionId: text('session_id').references(() => sessions.id),
    stationCode: text('station_code'),
    madeAtMs: integer('made_at_ms').notNull(),
    state: text('state', { enum: ['waiting', 'sent', 'failed'] }).notNull(),
    tries: integer('tries').notNull().default(0),
    sentAtMs: integer('sent_at_ms'),
    providerId: text('provider_id'),
    /** what the provider said to the last try */
    trouble: text('trouble').notNull().default(''),
  },
  (t) => [
    index('mail_outbox_by_state').on(t.state, t.madeAtMs),
    check('mail_outbox_state', sql`${t.state} IN ('waiting', 'sent', 'failed')`),
    check('mail_outbox_sent', sql`(${t.state} = 'sent') = (${t.sentAtMs} IS NOT NULL)`),
    check('mail_outbox_tries', sql`${t.tries} >= 0`),
  ],
);
