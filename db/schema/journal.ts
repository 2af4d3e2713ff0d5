import { sql } from 'drizzle-orm';
import {
  check,
  index,
  integer,
  sqliteTable,
  text,
  uniqueIndex,
  type AnySQLiteColumn,
} from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { users } from './users';

export const journal = sqliteTable(
  'journal',
  {
    seq: integer('seq').primaryKey({ autoIncrement: true }),
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id),
    actId: text('act_id').notNull(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    role: text('role').notNull(),
    atMs: integer('at_ms').notNull(),
    area: text('area', { enum: ['plan'] }).notNull(),
    verb: text('verb').notNull(),
    kind: text('kind', { enum: ['do', 'undo', 'redo'] }).notNull(),
    /** the do-row that an undo or a redo is about */
    ofSeq: integer('of_seq').references((): AnySQLiteColumn => journal.seq),
    command: text('command').notNull(),
    inverse: text('inverse').notNull(),
    subjects: text('subjects').notNull(),
    topsBefore: text('tops_before').notNull(),
  },
  (t) => [
    uniqueIndex('journal_act').on(t.sessionId, t.actId),
    index('journal_of_session').on(t.sessionId, t.seq),
    index('journal_of_user').on(t.sessionId, t.userId, t.seq),
    index('journal_of_row').on(t.ofSeq, t.seq),
    check('journal_area', sql`${t.area} IN ('plan')`),
    check(
      'journal_kind',
      sql`${t.kind} IN ('do', 'undo', 'redo') AND (${t.kind} = 'do') = (${t.ofSeq} IS NULL)`,
    ),
    check('journal_of', sql`${t.ofSeq} < ${t.seq}`),
    check(
      'journal_json',
      sql`json_valid(${t.command}) AND json_valid(${t.inverse}) AND json_valid(${t.subjects}) AND json_valid(${t.topsBefore})`,
    ),
  ],
);
