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
    /** UT1 − UTC */
    dut1Seconds: real('dut1_seconds').notNull().default(0),
    /** ages of the newest clock reading: from here a note, from there unknown */
    clockNoteHours: real('clock_note_hours').notNull().default(24),
    clockUnknownDays: real('clock_unknown_days').notNull().default(7),
    /** taken for a station whose instrument delay is not known (memory) */
    instrumentSigmaSeconds: real('instrument_sigma_seconds').notNull().default(5e-7),
    pairLimitDeg: real('pair_limit_deg').notNull().default(3),
    pauseEveryMinutes: integer('pause_every_minutes'),
    pauseMinutes: integer('pause_minutes'),
    finderEveryMinutes: integer('finder_every_minutes'),
    /** what the session is for, as the investigator says it */
    purpose: text('purpose').notNull().default(''),
    /** rises with each change of the form, so that no one overwrites another */
    rev: integer('rev').notNull().default(0),
  },
  (t) => [
    check('sessions_code', sql`${t.code} = upper(${t.code}) AND length(trim(${t.code})) > 0`),
    check('sessions_state', sql`${t.state} IN ('draft', 'offered', 'published', 'closed', 'cancelled')`),
    check('sessions_span', sql`${t.startMs} % 1000 = 0 AND ${t.lengthSeconds} >= 1`),
    check('sessions_elevation', sql`${t.minElevationDeg} BETWEEN 0 AND 90`),
    check('sessions_spare', sql`${t.leastSpareSeconds} >= 0`),
    check('sessions_dut1', sql`abs(${t.dut1Seconds}) < 0.9`),
    check(
      'sessions_clock',
      sql`${t.clockNoteHours} > 0 AND ${t.clockUnknownDays} > 0 AND ${t.instrumentSigmaSeconds} >= 0`,
    ),
    check('sessions_pair', sql`${t.pairLimitDeg} > 0`),
    check(
      'sessions_pause',
      sql`(${t.pauseEveryMinutes} IS NULL) = (${t.pauseMinutes} IS NULL) AND ${t.pauseMinutes} > 0 AND ${t.pauseEveryMinutes} > ${t.pauseMinutes} AND ${t.finderEveryMinutes} > 0`,
    ),
    check(
      'sessions_snr',
      sql`${t.snrDoubtful} > 0 AND ${t.snrDoubtful} < ${t.snrFair} AND ${t.snrFair} < ${t.snrStrong}`,
    ),
  ],
);
