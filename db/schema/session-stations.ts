import { primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { sessions } from './sessions';
import { stations } from './stations';

export const sessionStations = sqliteTable(
  'session_stations',
  {
    sessionId: text('session_id')
      .notNull()
      .references(() => sessions.id, { onDelete: 'cascade' }),
    stationCode: text('station_code')
      .notNull()
      .references(() => stations.code),
  },
  (t) => [primaryKey({ columns: [t.sessionId, t.stationCode] })],
);
