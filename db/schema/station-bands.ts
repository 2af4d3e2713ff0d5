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
    feeds: text('feeds', { enum: ['circular', 'linear'] })
      .notNull()
      .default('circular'),
    /** opacity at the zenith, nepers; null takes the zenith SEFD at every elevation */
    zenithOpacity: real('zenith_opacity'),
    /** relative gain: [[elevationDeg, gain], …] by elevation */
    gainCurve: text('gain_curve').notNull().default('[]'),
  },
  (t) => [
    primaryKey({ columns: [t.stationCode, t.band] }),
    check('station_bands_sefd', sql`${t.sefdJy} > 0`),
    check('station_bands_feeds', sql`${t.feeds} IN ('circular', 'linear')`),
    check('station_bands_opacity', sql`${t.zenithOpacity} >= 0`),
    check('station_bands_gain', sql`json_valid(${t.gainCurve})`),
  ],
);
