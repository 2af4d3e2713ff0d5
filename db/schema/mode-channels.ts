import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { modes } from './modes';

/** One sideband of one polarisation. */
export const modeChannels = sqliteTable(
  'mode_channels',
  {
    modeId: text('mode_id')
      .notNull()
      .references(() => modes.id, { onDelete: 'cascade' }),
    number: integer('number').notNull(),
    /** sky frequency of the edge that the sideband starts from */
    edgeHz: real('edge_hz').notNull(),
    sideband: text('sideband', { enum: ['upper', 'lower'] }).notNull(),
    polarisation: text('polarisation', { enum: ['R', 'L', 'X', 'Y'] }).notNull(),
    bandwidthHz: real('bandwidth_hz').notNull(),
    bits: integer('bits').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.modeId, t.number] }),
    check('mode_channels_number', sql`${t.number} >= 1`),
    check('mode_channels_edge', sql`${t.edgeHz} > 0 AND ${t.bandwidthHz} > 0`),
    check('mode_channels_sideband', sql`${t.sideband} IN ('upper', 'lower')`),
    check('mode_channels_polarisation', sql`${t.polarisation} IN ('R', 'L', 'X', 'Y')`),
    check('mode_channels_bits', sql`${t.bits} IN (1, 2)`),
  ],
);
