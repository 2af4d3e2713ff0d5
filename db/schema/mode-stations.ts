import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { modes } from './modes';
import { stations } from './stations';

/** What is said of a station in a mode; a station without a row does the mode as its own bits allow. */
export const modeStations = sqliteTable(
  'mode_stations',
  {
    modeId: text('mode_id')
      .notNull()
      .references(() => modes.id, { onDelete: 'cascade' }),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    isAble: integer('is_able', { mode: 'boolean' }).notNull(),
    /** fewer bits than the mode's; null is the mode's own */
    bits: integer('bits'),
    note: text('note').notNull().default(''),
  },
  (t) => [
    primaryKey({ columns: [t.modeId, t.stationCode] }),
    check('mode_stations_able', sql`${t.isAble} IN (0, 1)`),
    check('mode_stations_bits', sql`${t.bits} IN (1, 2)`),
  ],
);
