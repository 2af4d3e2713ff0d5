import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';

/** What a command can touch: rows are never deleted, so that a revision is never used twice. */
export const subjects = sqliteTable(
  'subjects',
  {
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id),
    id: text('id').notNull(),
    rev: integer('rev').notNull(),
    top: integer('top').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.sessionId, t.id] }),
    check('subjects_rev', sql`${t.rev} >= 0 AND ${t.top} >= 0 AND ${t.top} <= ${t.rev}`),
  ],
);
