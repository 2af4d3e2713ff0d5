import { sql } from 'drizzle-orm';
import { check, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const sources = sqliteTable(
  'sources',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull().unique(),
    raDeg: real('ra_deg').notNull(),
    decDeg: real('dec_deg').notNull(),
    role: text('role', { enum: ['target', 'phase-ref', 'finder', 'polarisation'] }).notNull(),
    /** other names, as a list */
    aliases: text('aliases').notNull().default('[]'),
    /** toward east (times cos δ) and north, mas a year */
    properMotionEastMas: real('proper_motion_east_mas'),
    properMotionNorthMas: real('proper_motion_north_mas'),
    parallaxMas: real('parallax_mas'),
    retiredAtMs: integer('retired_at_ms'),
  },
  (t) => [
    check('sources_name', sql`length(trim(${t.name})) > 0`),
    check('sources_place', sql`${t.raDeg} >= 0 AND ${t.raDeg} < 360 AND ${t.decDeg} BETWEEN -90 AND 90`),
    check('sources_aliases', sql`json_valid(${t.aliases})`),
    check(
      'sources_motion',
      sql`(${t.properMotionEastMas} IS NULL) = (${t.properMotionNorthMas} IS NULL) AND ${t.parallaxMas} >= 0`,
    ),
    check('sources_role', sql`${t.role} IN ('target', 'phase-ref', 'finder', 'polarisation')`),
  ],
);
