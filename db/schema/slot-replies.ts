import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { offers } from './offers';
import { sessions } from './sessions';
import { stations } from './stations';
import { users } from './users';

/** What a station said to an offer; the newest counts, and each stays as it was said. */
export const slotReplies = sqliteTable(
  'slot_replies',
  {
    seq: integer('seq').primaryKey({ autoIncrement: true }),
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    /** the offer it answers */
    offerId: text('offer_id')
      .notNull()
      .references(() => offers.id),
    reply: text('reply', { enum: ['confirmed', 'partly', 'declined'] }).notNull(),
    /** the hours the station can: [[startMs, endMs], …]; none where it declined */
    hours: text('hours').notNull(),
    reason: text('reason').notNull().default(''),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    role: text('role').notNull(),
    isOnBehalf: integer('is_on_behalf', { mode: 'boolean' }).notNull(),
    atMs: integer('at_ms').notNull(),
    actId: text('act_id').notNull(),
  },
  (t) => [
    uniqueIndex('slot_replies_act').on(t.sessionId, t.actId),
    index('slot_replies_of_station').on(t.sessionId, t.stationCode, t.seq),
    check('slot_replies_reply', sql`${t.reply} IN ('confirmed', 'partly', 'declined')`),
    check(
      'slot_replies_hours',
      sql`json_valid(${t.hours}) AND (${t.reply} = 'declined') = (json_array_length(${t.hours}) = 0)`,
    ),
    check('slot_replies_reason', sql`${t.reply} = 'confirmed' OR length(trim(${t.reason})) > 0`),
    check('slot_replies_behalf', sql`${t.isOnBehalf} IN (0, 1)`),
  ],
);
