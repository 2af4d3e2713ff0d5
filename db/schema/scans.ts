import { sql } from 'drizzle-orm';
import { check, foreignKey, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { modes } from './modes';
import { noddingGroups } from './nodding-groups';
import { sessions } from './sessions';
import { sources } from './sources';

export const scans = sqliteTable(
  'scans',
  {
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id, { onDelete: 'cascade' }),
    id: text('id').notNull(),
    sourceId: text('source_id')
      .notNull()
      .references(() => sources.id),
    modeId: text('mode_id')
      .notNull()
      .references(() => modes.id),
    startMs: integer('start_ms').notNull(),
    lengthSeconds: integer('length_seconds').notNull(),
    groupId: text('group_id'),
    leg: text('leg', { enum: ['target', 'calibrator'] }),
    comment: text('comment').notNull().default(''),
  },
  (t) => [
    primaryKey({ columns: [t.sessionId, t.id] }),
    foreignKey({
      columns: [t.sessionId, t.groupId],
      foreignColumns: [noddingGroups.sessionId, noddingGroups.id],
    }),
    index('scans_by_start').on(t.sessionId, t.startMs, t.id),
    check('scans_start', sql`${t.startMs} % 1000 = 0`),
    check('scans_length', sql`${t.lengthSeconds} >= 1`),
    check('scans_leg', sql`(${t.groupId} IS NULL) = (${t.leg} IS NULL)`),
    check('scans_leg_word', sql`${t.leg} IN ('target', 'calibrator')`),
  ],
);
