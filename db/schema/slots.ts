import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { offers } from './offers';
import { stations } from './stations';

/** The hours an offer asks of a station: first start less lead to last stop plus tail. */
export const slots = sqliteTable(
  'slots',
  {
    offerId: text('offer_id')
      .notNull()
      .references(() => offers.id),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    startMs: integer('start_ms').notNull(),
    endMs: integer('end_ms').notNull(),
    /** ids of the modes it records in, sorted */
    modes: text('modes').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.offerId, t.stationCode] }),
    check('slots_span', sql`${t.startMs} < ${t.endMs}`),
    check('slots_modes', sql`json_valid(${t.modes})`),
  ],
);
