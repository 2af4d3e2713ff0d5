import { sql } from 'drizzle-orm';
import { check, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';

/** Axis 1 turns about the fixed axis (azimuth of an az–el mount), axis 2 rides on it (elevation). */
export const stations = sqliteTable(
  'stations',
  {
    code: text('code').primaryKey(),
    name: text('name').notNull(),
    latitudeDeg: real('latitude_deg').notNull(),
    longitudeDeg: real('longitude_deg').notNull(),
    heightM: real('height_m').notNull(),
    minElevationDeg: real('min_elevation_deg').notNull(),
    maxElevationDeg: real('max_elevation_deg').notNull(),
    /** [[azimuthDeg, elevationDeg], …] by azimuth */
    horizon: text('horizon').notNull().default('[]'),
    mountKind: text('mount_kind', { enum: ['az-el'] }).notNull(),
    axis1MinDeg: real('axis1_min_deg').notNull(),
    axis1MaxDeg: real('axis1_max_deg').notNull(),
    axis1RateDegPerS: real('axis1_rate_deg_per_s').notNull(),
    axis1AccelDegPerS2: real('axis1_accel_deg_per_s2').notNull(),
    axis2MinDeg: real('axis2_min_deg').notNull(),
    axis2MaxDeg: real('axis2_max_deg').notNull(),
    axis2RateDegPerS: real('axis2_rate_deg_per_s').notNull(),
    axis2AccelDegPerS2: real('axis2_accel_deg_per_s2').notNull(),
    settleSeconds: real('settle_seconds').notNull(),
    bits: integer('bits').notNull(),
    dishM: real('dish_m').notNull(),
    timeZone: text('time_zone').notNull(),
  },
  (t) => [
    uniqueIndex('stations_code_any_case').on(sql`lower(${t.code})`),
    check('stations_code', sql`${t.code} GLOB '[A-Za-z][A-Za-z0-9]'`),
    check('stations_name', sql`length(trim(${t.name})) > 0`),
    check('stations_place', sql`abs(${t.latitudeDeg}) <= 90 AND abs(${t.longitudeDeg}) <= 180`),
    check(
      'stations_elevation',
      sql`${t.minElevationDeg} >= 0 AND ${t.minElevationDeg} < ${t.maxElevationDeg} AND ${t.maxElevationDeg} <= 90`,
    ),
    check('stations_horizon', sql`json_valid(${t.horizon})`),
    check('stations_mount', sql`${t.mountKind} IN ('az-el')`),
    check('stations_axis1', sql`${t.axis1MinDeg} < ${t.axis1MaxDeg}`),
    check('stations_axis2', sql`${t.axis2MinDeg} < ${t.axis2MaxDeg}`),
    check(
      'stations_drive',
      sql`${t.axis1RateDegPerS} > 0 AND ${t.axis1AccelDegPerS2} > 0 AND ${t.axis2RateDegPerS} > 0 AND ${t.axis2AccelDegPerS2} > 0`,
    ),
    check('stations_settle', sql`${t.settleSeconds} >= 0`),
    check('stations_bits', sql`${t.bits} IN (1, 2)`),
    check('stations_dish', sql`${t.dishM} > 0`),
  ],
);
