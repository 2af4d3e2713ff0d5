import { sql } from 'drizzle-orm';
import { check, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const modes = sqliteTable(
  'modes',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull().unique(),
    band: text('band').notNull(),
    skyHz: real('sky_hz').notNull(),
    channelBandwidthHz: real('channel_bandwidth_hz').notNull(),
    channelsPerPolarisation: integer('channels_per_polarisation').notNull(),
    polarisations: integer('polarisations').notNull(),
    bits: integer('bits').notNull(),
    coherenceSeconds: real('coherence_seconds'),
  },
  (t) => [
    check('modes_sky', sql`${t.skyHz} > 0`),
    check('modes_channels', sql`${t.channelBandwidthHz} > 0 AND ${t.channelsPerPolarisation} > 0`),
    check('modes_polarisations', sql`${t.polarisations} IN (1, 2)`),
    check('modes_bits', sql`${t.bits} IN (1, 2)`),
    check('modes_coherence', sql`${t.coherenceSeconds} > 0`),
  ],
);
