import 'server-only';
import { asc, eq, sql } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { stationBands } from '../../../db/schema/station-bands';
import { stationUnavailability } from '../../../db/schema/station-unavailability';
import { stations } from '../../../db/schema/stations';
import {
  placeOf,
  type Corner,
  type PositionValues,
  type Sector,
} from '../../exchange/catalogue/station-site';
import type { GainPoint, RecordingValues } from '../../exchange/catalogue/station-signal';
import { notFound } from '../errors';
import type { StationBlocks } from './dto';

type Row = typeof stations.$inferSelect;

/** A station by its code, whatever its case. */
export async function fetchStation(from: Database | Tx, code: string): Promise<Row> {
  const [row] = await from
    .select()
    .from(stations)
    .where(eq(sql`lower(${stations.code})`, code.toLowerCase()));
  if (!row) throw notFound(`There is no station ${code.slice(0, 20)}.`);
  return row;
}

export async function blocksOf(from: Database | Tx, row: Row): Promise<StationBlocks> {
  const bands = await from
    .select()
    .from(stationBands)
    .where(eq(stationBands.stationCode, row.code))
    .orderBy(asc(stationBands.band));
  const away = await from
    .select()
    .from(stationUnavailability)
    .where(eq(stationUnavailability.stationCode, row.code))
    .orderBy(asc(stationUnavailability.startMs), asc(stationUnavailability.id));
  const corners = JSON.parse(row.horizon) as [number, number][];
  const sectors = JSON.parse(row.wrapSectors) as Sector[];
  return {
    position: positionOf(row),
    mount: {
      mountKind: row.mountKind,
      dishM: row.dishM,
      axisOffsetM: row.axisOffsetM,
      axis1MinDeg: row.axis1MinDeg,
      axis1MaxDeg: row.axis1MaxDeg,
      axis1RateDegPerS: row.axis1RateDegPerS,
      axis1AccelDegPerS2: row.axis1AccelDegPerS2,
      axis2MinDeg: row.axis2MinDeg,
      axis2MaxDeg: row.axis2MaxDeg,
      axis2RateDegPerS: row.axis2RateDegPerS,
      axis2AccelDegPerS2: row.axis2AccelDegPerS2,
      settleSeconds: row.settleSeconds,
      minElevationDeg: row.minElevationDeg,
      maxElevationDeg: row.maxElevationDeg,
      sunLimitDeg: row.sunLimitDeg,
    },
    wrap: { wrapSectors: sectors.map(({ name, minDeg, maxDeg }) => ({ name, minDeg, maxDeg })) },
    bands: {
      bands: bands.map(({ band, sefdJy, feeds, zenithOpacity, gainCurve }) => ({
        band,
        sefdJy,
        feeds,
        zenithOpacity,
        gainCurve: JSON.parse(gainCurve) as GainPoint[],
      })),
    },
    wiring: {
      counterStart: row.counterStart,
      counterStop: row.counterStop,
      stationCableSeconds: row.stationCableSeconds,
      gpsCableSeconds: row.gpsCableSeconds,
    },
    recording: {
      bits: row.bits === 1 ? '1' : '2',
      formatter: row.formatter,
      maxChannels: row.maxChannels,
      maxBitsPerS: row.maxBitsPerS,
      recorder: row.recorder,
      recorderBitsPerS: row.recorderBitsPerS,
      recorderFreeBytes: row.recorderFreeBytes,
      preScanSeconds: row.preScanSeconds,
      calibrationSeconds: row.calibrationSeconds,
    },
    allowances: {
      instrumentDelaySeconds: row.instrumentDelaySeconds,
      instrumentDelaySigmaSeconds: row.instrumentDelaySigmaSeconds,
      instrumentDelayFromMs: row.instrumentDelayFromMs,
      stabilityFloor: row.stabilityFloor,
      driftPerDay: row.driftPerDay,
    },
    horizon: { horizon: corners.map(([azimuthDeg, elevationDeg]) => ({ azimuthDeg, elevationDeg })) },
    away: { away: away.map(({ startMs, endMs, why }) => ({ startMs, endMs, why })) },
    contacts: { contacts: row.contacts },
  };
}

/** The columns of a position: the place is stored in either case, X, Y, Z as they were typed. */
export const positionColumns = (value: PositionValues) => ({ ...value, ...placeOf(value) });

export const recordingColumns = ({ bits, ...value }: RecordingValues) => ({ ...value, bits: Number(bits) });

export const horizonColumn = (corners: readonly Corner[]): string =>
  JSON.stringify(
    [...corners]
      .sort((a, b) => a.azimuthDeg - b.azimuthDeg)
      .map(({ azimuthDeg, elevationDeg }) => [azimuthDeg, elevationDeg]),
  );

/** Of a position typed as ITRF the place is worked out, so its form leaves it empty. */
function positionOf(row: Row): PositionValues {
  const isItrf = row.positionKind === 'itrf';
  return {
    name: row.name,
    timeZone: row.timeZone,
    positionKind: row.positionKind,
    latitudeDeg: isItrf ? null : row.latitudeDeg,
    longitudeDeg: isItrf ? null : row.longitudeDeg,
    heightM: isItrf ? null : row.heightM,
    itrfX: row.itrfX,
    itrfY: row.itrfY,
    itrfZ: row.itrfZ,
    positionSigmaM: row.positionSigmaM,
    positionEpoch: row.positionEpoch,
  };
}
