import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { sources } from './sources';

export const noddingGroups = sqliteTable(
  'nodding_groups',
  {
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id, { onDelete: 'cascade' }),
    id: text('id').notNull(),
    targetId: text('target_id')
      .notNull()
      .references(() => sources.id),
    calibratorId: text('calibrator_id')
      .notNull()
      .references(() => sources.id),
    targetOnSeconds: integer('target_on_seconds').notNull(),
    calibratorOnSeconds: integer('calibrator_on_seconds').notNull(),
    turnSeconds: integer('turn_seconds').notNull(),
    first: text('first', { enum: ['target', 'calibrator'] }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.sessionId, t.id] }),
    check('nodding_groups_pair', sql`${t.targetId} <> ${t.calibratorId}`),
    check(
      'nodding_groups_times',
      sql`${t.targetOnSeconds} >= 1 AND ${t.calibratorOnSeconds} >= 1 AND ${t.turnSeconds} >= 0`,
    ),
    check('nodding_groups_first', sql`${t.first} IN ('target', 'calibrator')`),
  ],
);
