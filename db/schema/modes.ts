import { sql } from 'drizzle-orm';
import { check, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

/** Frequencies, polarisations and bits are those of its channels. */
export const modes = sqliteTable(
  'modes',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull().unique(),
    band: text('band').notNull(),
    /** of the atmosphere; null takes no loss */
    coherenceSeconds: real('coherence_seconds'),
    /** between injected calibration tones; null is none */
    toneSpacingHz: real('tone_spacing_hz'),
    /** of the correlator: time of one integration, spectral channels in one channel */
    integrationSeconds: real('integration_seconds').notNull().default(2),
    spectralChannels: integer('spectral_channels').notNull().default(64),
    retiredAtMs: integer('retired_at_ms'),
  },
  (t) => [
    check('modes_name', sql`length(trim(${t.name})) > 0`),
    check('modes_coherence', sql`${t.coherenceSeconds} > 0`),
    check('modes_tones', sql`${t.toneSpacingHz} > 0`),
    check('modes_correlator', sql`${t.integrationSeconds} > 0 AND ${t.spectralChannels} >= 1`),
  ],
);
