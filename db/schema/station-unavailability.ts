import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { stations } from './stations';

/** Planned hours, [start, end), in which a station does not observe. */
export const stationUnavailability = sqliteTable(
  'station_unavailability',
  {
    id: text('id').primaryKey(),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    startMs: integer('start_ms').notNull(),
    endMs: integer('end_ms').notNull(),
    why: text('why').notNull(),
  },
  (t) => [
    index('station_unavailability_by_start').on(t.stationCode, t.startMs),
    check('station_unavailability_span', sql`${t.startMs} < ${t.endMs}`),
    check('station_unavailability_why', sql`length(trim(${t.why})) > 0`),
  ],
);
