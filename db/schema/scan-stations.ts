import { sql } from 'drizzle-orm';
import { check, foreignKey, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { scans } from './scans';
import { sessionStations } from './session-stations';

export const scanStations = sqliteTable(
  'scan_stations',
  {
    sessionId: text('session_id').notNull(),
    scanId: text('scan_id').notNull(),
    stationCode: text('station_code').notNull(),
    lateSeconds: integer('late_seconds').notNull(),
    earlySeconds: integer('early_seconds').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.sessionId, t.scanId, t.stationCode] }),
    foreignKey({
      columns: [t.sessionId, t.scanId],
      foreignColumns: [scans.sessionId, scans.id],
    }).onDelete('cascade'),
    foreignKey({
      columns: [t.sessionId, t.stationCode],
      foreignColumns: [sessionStations.sessionId, sessionStations.stationCode],
    }),
    check('scan_stations_times', sql`${t.lateSeconds} >= 0 AND ${t.earlySeconds} >= 0`),
  ],
);
