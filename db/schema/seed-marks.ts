import { integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

/** One row says that the demo is in, and which start its dates were shifted to. */
export const seedMarks = sqliteTable('seed_marks', {
  name: text('name').primaryKey(),
  startMs: integer('start_ms').notNull(),
  seededAtMs: integer('seeded_at_ms').notNull(),
});
