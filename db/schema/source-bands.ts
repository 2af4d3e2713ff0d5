import { sql } from 'drizzle-orm';
import { check, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sources } from './sources';

export const sourceBands = sqliteTable(
  'source_bands',
  {
    sourceId: text('source_id')
      .notNull()
      .references(() => sources.id),
    band: text('band').notNull(),
    fluxJy: real('flux_jy').notNull(),
    /** FWHM of a round Gaussian; null is a point */
    sizeMas: real('size_mas'),
  },
  (t) => [
    primaryKey({ columns: [t.sourceId, t.band] }),
    check('source_bands_flux', sql`${t.fluxJy} > 0`),
    check('source_bands_size', sql`${t.sizeMas} > 0`),
  ],
);
