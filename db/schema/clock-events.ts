import { sql } from 'drizzle-orm';
import { check, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { stations } from './stations';
import { users } from './users';

/** A change at the station; the fit of its clock starts anew there. */
export const clockEvents = sqliteTable(
  'clock_events',
  {
    /** made by the client, so that one sent twice stands once */
    id: text('id').primaryKey(),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    atMs: integer('at_ms').notNull(),
    kind: text('kind', { enum: ['steered', 'resync', 'cable', 'receiver', 'power', 'other'] }).notNull(),
    /** the step of the offset, where it is known */
    stepSeconds: real('step_seconds'),
    note: text('note').notNull().default(''),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    role: text('role').notNull(),
    enteredAtMs: integer('entered_at_ms').notNull(),
  },
  (t) => [
    index('clock_events_by_time').on(t.stationCode, t.atMs),
    check(
      'clock_events_kind',
      sql`${t.kind} IN ('steered', 'resync', 'cable', 'receiver', 'power', 'other')`,
    ),
  ],
);
