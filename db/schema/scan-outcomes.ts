import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { stations } from './stations';
import { users } from './users';

/** How a scan went at a station; the newest counts, and each stays as it was said. */
export const scanOutcomes = sqliteTable(
  'scan_outcomes',
  {
    seq: integer('seq').primaryKey({ autoIncrement: true }),
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id),
    /** a scan of the snapshot; the draft may have dropped it */
    scanId: text('scan_id').notNull(),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    outcome: text('outcome', { enum: ['good', 'partly', 'lost'] }).notNull(),
    /** times off source: [[startMs, endMs], …] */
    lost: text('lost').notNull().default('[]'),
    reason: text('reason', {
      enum: ['wind', 'antenna', 'receiver', 'formatter', 'recorder', 'clock', 'interference', 'other'],
    }),
    text: text('text').notNull().default(''),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    role: text('role').notNull(),
    isOnBehalf: integer('is_on_behalf', { mode: 'boolean' }).notNull(),
    atMs: integer('at_ms').notNull(),
    actId: text('act_id').notNull(),
  },
  (t) => [
    uniqueIndex('scan_outcomes_act').on(t.sessionId, t.actId),
    index('scan_outcomes_of_scan').on(t.sessionId, t.stationCode, t.scanId, t.seq),
    check('scan_outcomes_outcome', sql`${t.outcome} IN ('good', 'partly', 'lost')`),
    check(
      'scan_outcomes_lost',
      sql`json_valid(${t.lost}) AND (${t.outcome} = 'good') = (json_array_length(${t.lost}) = 0)`,
    ),
    check(
      'scan_outcomes_reason',
      sql`${t.reason} IN ('wind', 'antenna', 'receiver', 'formatter', 'recorder', 'clock', 'interference', 'other') AND (${t.outcome} = 'good') = (${t.reason} IS NULL)`,
    ),
    check('scan_outcomes_other', sql`${t.reason} IS NOT 'other' OR length(trim(${t.text})) > 0`),
    check('scan_outcomes_behalf', sql`${t.isOnBehalf} IN (0, 1)`),
  ],
);
