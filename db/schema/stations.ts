import { sql } from 'drizzle-orm';
import { check, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';

/**
 * Axis 1 turns about a fixed line (azimuth, hour angle, X), axis 2 rides on it (elevation, declination, Y).
 */
export const stations = sqliteTable(
  'stations',
  {
    code: text('code').primaryKey(),
    name: text('name').notNull(),
    latitudeDeg: real('latitude_deg').notNull(),
    longitudeDeg: real('longitude_deg').notNull(),
    heightM: real('height_m').notNull(),
    /** which of the two was typed; the other is worked out of it */
    positionKind: text('position_kind', { enum: ['geodetic', 'itrf'] })
      .notNull()
      .default('geodetic'),
    /** metres, as typed; null where the position was typed as geodetic */
    itrfX: real('itrf_x'),
    itrfY: real('itrf_y'),
    itrfZ: real('itrf_z'),
    positionSigmaM: real('position_sigma_m'),
    /** decimal year of the position */
    positionEpoch: real('position_epoch'),
    minElevationDeg: real('min_elevation_deg').notNull(),
    maxElevationDeg: real('max_elevation_deg').notNull(),
    /** [[azimuthDeg, elevationDeg], …] by azimuth */
    horizon: text('horizon').notNull().default('[]'),
    mountKind: text('mount_kind', { enum: ['az-el', 'ha-dec', 'xy-ns', 'xy-ew'] }).notNull(),
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
    axisOffsetM: real('axis_offset_m').notNull().default(0),
    /** named parts of the cable's range: [{ name, minDeg, maxDeg }, …] */
    wrapSectors: text('wrap_sectors').notNull().default('[]'),
    /** what a scan takes before it records, and for calibration */
    preScanSeconds: real('pre_scan_seconds').notNull().default(0),
    calibrationSeconds: real('calibration_seconds').notNull().default(0),
    sunLimitDeg: real('sun_limit_deg'),
    maxChannels: integer('max_channels'),
    maxBitsPerS: real('max_bits_per_s'),
    formatter: text('formatter').notNull().default(''),
    recorder: text('recorder').notNull().default(''),
    recorderBitsPerS: real('recorder_bits_per_s'),
    recorderFreeBytes: real('recorder_free_bytes'),
    recorderFreeAtMs: integer('recorder_free_at_ms'),
    /** the pulse that starts the counter, and the one that stops it; one of the two is GPS */
    counterStart: text('counter_start', { enum: ['formatter', 'maser', 'gps'] })
      .notNull()
      .default('formatter'),
    counterStop: text('counter_stop', { enum: ['formatter', 'maser', 'gps'] })
      .notNull()
      .default('gps'),
    /** each a late arrival at the counter */
    stationCableSeconds: real('station_cable_seconds').notNull().default(0),
    gpsCableSeconds: real('gps_cable_seconds').notNull().default(0),
    /** from the pulse to the recorded signal, learned from fringes; null is not known */
    instrumentDelaySeconds: real('instrument_delay_seconds'),
    instrumentDelaySigmaSeconds: real('instrument_delay_sigma_seconds'),
    instrumentDelayFromMs: integer('instrument_delay_from_ms'),
    /** h and d of a prediction outside its data; defaults from memory */
    stabilityFloor: real('stability_floor').notNull().default(2e-14),
    driftPerDay: real('drift_per_day').notNull().default(1e-15),
    contacts: text('contacts').notNull().default(''),
    retiredAtMs: integer('retired_at_ms'),
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
    check('stations_mount', sql`${t.mountKind} IN ('az-el', 'ha-dec', 'xy-ns', 'xy-ew')`),
    check('stations_axis1', sql`${t.axis1MinDeg} < ${t.axis1MaxDeg}`),
    check('stations_axis2', sql`${t.axis2MinDeg} < ${t.axis2MaxDeg}`),
    check(
      'stations_drive',
      sql`${t.axis1RateDegPerS} > 0 AND ${t.axis1AccelDegPerS2} > 0 AND ${t.axis2RateDegPerS} > 0 AND ${t.axis2AccelDegPerS2} > 0`,
    ),
    check('stations_settle', sql`${t.settleSeconds} >= 0`),
    check('stations_bits', sql`${t.bits} IN (1, 2)`),
    check('stations_dish', sql`${t.dishM} > 0`),
    check(
      'stations_position',
      sql`${t.positionKind} IN ('geodetic', 'itrf') AND (${t.positionKind} = 'itrf') = (${t.itrfX} IS NOT NULL AND ${t.itrfY} IS NOT NULL AND ${t.itrfZ} IS NOT NULL)`,
    ),
    check('stations_position_sigma', sql`${t.positionSigmaM} >= 0`),
    check('stations_sectors', sql`json_valid(${t.wrapSectors})`),
    check('stations_before_scan', sql`${t.preScanSeconds} >= 0 AND ${t.calibrationSeconds} >= 0`),
    check('stations_sun', sql`${t.sunLimitDeg} BETWEEN 0 AND 180`),
    check(
      'stations_recording',
      sql`${t.maxChannels} > 0 AND ${t.maxBitsPerS} > 0 AND ${t.recorderBitsPerS} > 0 AND ${t.recorderFreeBytes} >= 0`,
    ),
    check(
      'stations_counter',
      sql`${t.counterStart} IN ('formatter', 'maser', 'gps') AND ${t.counterStop} IN ('formatter', 'maser', 'gps') AND (${t.counterStart} = 'gps') <> (${t.counterStop} = 'gps')`,
    ),
    check(
      'stations_instrument',
      sql`(${t.instrumentDelaySeconds} IS NULL) = (${t.instrumentDelaySigmaSeconds} IS NULL) AND ${t.instrumentDelaySigmaSeconds} >= 0`,
    ),
    check('stations_allowance', sql`${t.stabilityFloor} > 0 AND ${t.driftPerDay} >= 0`),
  ],
);
