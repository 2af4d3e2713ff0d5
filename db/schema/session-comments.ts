import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { stations } from './stations';
import { users } from './users';

export const sessionComments = sqliteTable(
  'session_comments',
  {
    /** made by the client, so that one sent twice stands once */
    id: text('id').primaryKey(),
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    role: text('role').notNull(),
    /** the station an operator speaks for */
    stationCode: text('station_code').references(() => stations.code),
    atMs: integer('at_ms').notNull(),
    text: text('text').notNull(),
  },
  (t) => [
    index('session_comments_by_time').on(t.sessionId, t.atMs),
    check('session_comments_text', sql`length(trim(${t.text})) > 0`),
  ],
);
