import { sql } from 'drizzle-orm';
import { check, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const sources = sqliteTable(
  'sources',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull().unique(),
    raDeg: real('ra_deg').notNull(),
    decDeg: real('dec_deg').notNull(),
    role: text('role', { enum: ['target', 'phase-ref', 'finder', 'polarisation'] }).notNull(),
  },
  (t) => [
    check('sources_name', sql`length(trim(${t.name})) > 0`),
    check('sources_place', sql`${t.raDeg} >= 0 AND ${t.raDeg} < 360 AND ${t.decDeg} BETWEEN -90 AND 90`),
    check('sources_role', sql`${t.role} IN ('target', 'phase-ref', 'finder', 'polarisation')`),
  ],
);
