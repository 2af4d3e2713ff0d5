import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { users } from './users';

/** The id is the SHA-256 of the token in the browser's cookie. */
export const loginSessions = sqliteTable(
  'login_sessions',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    /** unix seconds */
    expiresAt: integer('expires_at').notNull(),
  },
  (t) => [index('login_sessions_user').on(t.userId)],
);
