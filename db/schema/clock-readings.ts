import { sql } from 'drizzle-orm';
import { check, index, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { stations } from './stations';
import { users } from './users';

/** Station clock minus UTC, via GPS, positive = early. */
export const clockReadings = sqliteTable(
  'clock_readings',
  {
    id: text('id').primaryKey(),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    /** whose pulse was read; a fit never mixes the two */
    pulse: text('pulse', { enum: ['formatter', 'maser'] }).notNull(),
    atMs: integer('at_ms').notNull(),
    offsetSeconds: real('offset_seconds').notNull(),
    /** what the counter showed, [0, 1) s; null where the offset was typed */
    counterSeconds: real('counter_seconds'),
    sigmaSeconds: real('sigma_seconds'),
    /** the formatter's whole second against UTC */
    secondCheck: text('second_check', { enum: ['yes', 'no', 'off'] }).notNull(),
    secondOff: integer('second_off'),
    state: text('state', { enum: ['used', 'set-aside', 'waiting'] }).notNull(),
    /** why it is set aside, or what it waits for */
    reason: text('reason').notNull().default(''),
    /** who set it aside, and when */
    setAsideBy: text('set_aside_by').references(() => users.id),
    setAsideRole: text('set_aside_role'),
    setAsideAtMs: integer('set_aside_at_ms'),
    note: text('note').notNull().default(''),
    origin: text('origin', { enum: ['form', 'file', 'api', 'desk'] }).notNull(),
    enteredBy: text('entered_by')
      .notNull()
      .references(() => users.id),
    enteredRole: text('entered_role').notNull(),
    enteredAtMs: integer('entered_at_ms').notNull(),
    actId: text('act_id').notNull(),
  },
  (t) => [
    uniqueIndex('clock_readings_act').on(t.stationCode, t.actId),
    index('clock_readings_by_time').on(t.stationCode, t.pulse, t.atMs),
    check('clock_readings_pulse', sql`${t.pulse} IN ('formatter', 'maser')`),
    check('clock_readings_offset', sql`abs(${t.offsetSeconds}) <= 86400.5`),
    check('clock_readings_counter', sql`${t.counterSeconds} >= 0 AND ${t.counterSeconds} < 1`),
    check('clock_readings_sigma', sql`${t.sigmaSeconds} > 0`),
    check(
      'clock_readings_second',
      sql`${t.secondCheck} IN ('yes', 'no', 'off') AND (${t.secondCheck} = 'off') = (${t.secondOff} IS NOT NULL) AND ${t.secondOff} <> 0`,
    ),
    check(
      'clock_readings_state',
      sql`${t.state} IN ('used', 'set-aside', 'waiting') AND (${t.state} = 'used' OR length(trim(${t.reason})) > 0)`,
    ),
    check('clock_readings_origin', sql`${t.origin} IN ('form', 'file', 'api', 'desk')`),
  ],
);
