import { sql } from 'drizzle-orm';
import { check, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { modes } from './modes';

export const sessions = sqliteTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    code: text('code').notNull().unique(),
    title: text('title').notNull(),
    state: text('state', { enum: ['draft', 'offered', 'published', 'closed', 'cancelled'] }).notNull(),
    startMs: integer('start_ms').notNull(),
    lengthSeconds: integer('length_seconds').notNull(),
    modeId: text('mode_id')
      .notNull()
      .references(() => modes.id),
    minElevationDeg: real('min_elevation_deg').notNull(),
    leastSpareSeconds: integer('least_spare_seconds').notNull(),
    snrDoubtful: real('snr_doubtful').notNull(),
    snrFair: real('snr_fair').notNull(),
    snrStrong: real('snr_strong').notNull(),
  },
  (t) => [
    check('sessions_code', sql`${t.code} = upper(${t.code}) AND length(trim(${t.code})) > 0`),
    check('sessions_state', sql`${t.state} IN ('draft', 'offered', 'published', 'closed', 'cancelled')`),
    check('sessions_span', sql`${t.startMs} % 1000 = 0 AND ${t.lengthSeconds} >= 1`),
    check('sessions_elevation', sql`${t.minElevationDeg} BETWEEN 0 AND 90`),
    check('sessions_spare', sql`${t.leastSpareSeconds} >= 0`),
    check(
      'sessions_snr',
      sql`${t.snrDoubtful} > 0 AND ${t.snrDoubtful} < ${t.snrFair} AND ${t.snrFair} < ${t.snrStrong}`,
    ),
  ],
);
