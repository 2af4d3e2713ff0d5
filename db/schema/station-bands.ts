import { sql } from 'drizzle-orm';
import { check, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { stations } from './stations';

export const stationBands = sqliteTable(
  'station_bands',
  {
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
    band: text('band').notNull(),
    /** at the zenith, per polarisation */
    sefdJy: real('sefd_jy').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.stationCode, t.band] }),
    check('station_bands_sefd', sql`${t.sefdJy} > 0`),
  ],
);
