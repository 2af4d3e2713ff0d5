import { sql } from 'drizzle-orm';
import { check, index, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { stations } from './stations';
import { users } from './users';

export const grants = sqliteTable(
  'grants',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    role: text('role', {
      enum: ['admin', 'scheduler', 'operator', 'correlator', 'investigator'],
    }).notNull(),
    stationCode: text('station_code').references(() => stations.code),
    sessionId: text('session_id').references(() => sessions.id),
  },
  (t) => [
    index('grants_of_user').on(t.userId),
    check('grants_role', sql`${t.role} IN ('admin', 'scheduler', 'operator', 'correlator', 'investigator')`),
    check('grants_station', sql`(${t.role} = 'operator') = (${t.stationCode} IS NOT NULL)`),
    check('grants_session', sql`(${t.role} = 'investigator') = (${t.sessionId} IS NOT NULL)`),
  ],
);
