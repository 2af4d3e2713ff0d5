import { sql } from 'drizzle-orm';
import { check, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const users = sqliteTable(
  'users',
  {
    id: text('id').primaryKey(),
    email: text('email').notNull().unique(),
    passwordHash: text('password_hash').notNull(),
    /** null follows the device */
    theme: text('theme', { enum: ['day', 'night'] }),
    isDemo: integer('is_demo', { mode: 'boolean' }).notNull().default(false),
  },
  (t) => [
    check('users_email', sql`${t.email} = lower(${t.email}) AND ${t.email} LIKE '_%@_%'`),
    check('users_theme', sql`${t.theme} IN ('day', 'night')`),
    check('users_demo', sql`${t.isDemo} IN (0, 1)`),
  ],
);
