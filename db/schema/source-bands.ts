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
    /** instead of flux and size: [{ fluxJy, majorMas, minorMas, positionAngleDeg, eastMas, northMas }, …] */
    components: text('components').notNull().default('[]'),
  },
  (t) => [
    primaryKey({ columns: [t.sourceId, t.band] }),
    check('source_bands_flux', sql`${t.fluxJy} > 0`),
    check('source_bands_size', sql`${t.sizeMas} > 0`),
    check('source_bands_components', sql`json_valid(${t.components})`),
  ],
);
