import { sql } from 'drizzle-orm';
import { check, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { users } from './users';

/** A snapshot of the plan, as the stations were asked or told; it never changes. */
export const offers = sqliteTable(
  'offers',
  {
    id: text('id').primaryKey(),
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id),
    number: integer('number').notNull(),
    kind: text('kind', { enum: ['offer', 'publish'] }).notNull(),
    snapshot: text('snapshot').notNull(),
    /** SHA-256 of the snapshot's text, hexadecimal */
    checksum: text('checksum').notNull(),
    /** newest journal row that the snapshot holds */
    seq: integer('seq').notNull(),
    madeAtMs: integer('made_at_ms').notNull(),
    madeBy: text('made_by')
      .notNull()
      .references(() => users.id),
    answerByMs: integer('answer_by_ms'),
    note: text('note').notNull().default(''),
  },
  (t) => [
    uniqueIndex('offers_of_session').on(t.sessionId, t.number),
    check('offers_number', sql`${t.number} >= 1`),
    check('offers_kind', sql`${t.kind} IN ('offer', 'publish')`),
    check('offers_snapshot', sql`json_valid(${t.snapshot})`),
    check('offers_checksum', sql`length(${t.checksum}) = 64`),
  ],
);
