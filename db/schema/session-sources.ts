import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { sources } from './sources';

export const sessionSources = sqliteTable(
  'session_sources',
  {
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id, { onDelete: 'cascade' }),
    sourceId: text('source_id')
      .notNull()
      .references(() => sources.id),
    wantedScans: integer('wanted_scans').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.sessionId, t.sourceId] }),
    check('session_sources_wanted', sql`${t.wantedScans} >= 0`),
  ],
);
