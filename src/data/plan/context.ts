import 'server-only';
import { asc, eq, inArray } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { modeChannels } from '../../../db/schema/mode-channels';
import { modes } from '../../../db/schema/modes';
import { sessionSources } from '../../../db/schema/session-sources';
import { sourceBands } from '../../../db/schema/source-bands';
import { sources } from '../../../db/schema/sources';
import { stationBands } from '../../../db/schema/station-bands';
import { stations } from '../../../db/schema/stations';
import type { GaussianComponent } from '../../array/structure';
import type { PlanMode } from '../../schedule/context';
import { summaryOf } from '../../schedule/mode-channels';
import type { Component } from '../../exchange/catalogue/source';
import type { HorizonPoint, Mount } from '../../sky/types';
import { degToRad } from '../../units/angle';
import type { TimelineSource, TimelineStation } from './dto';

const RAD_PER_MAS = Math.PI / 648_000_000;

export async function readStations(
  from: Database | Tx,
  codes: readonly string[],
): Promise<TimelineStation[]> {
  const rows = await from
    .select()
    .from(stations)
    .where(inArray(stations.code, [...codes]))
    .orderBy(asc(stations.code));
  const bands = await from
    .select()
    .from(stationBands)
    .where(inArray(stationBands.stationCode, [...codes]));
  return rows.map((row) => ({
    code: row.code,
    name: row.name,
    site: { latitudeDeg: row.latitudeDeg, longitudeDeg: row.longitudeDeg, heightM: row.heightM },
    minElevationDeg: row.minElevationDeg,
    maxElevationDeg: row.maxElevationDeg,
    horizon: horizonOf(row.horizon),
    mount: mountOf(row),
    bits: row.bits === 1 ? 1 : 2,
    sefdJy: Object.fromEntries(
      bands.filter((band) => band.stationCode === row.code).map((band) => [band.band, band.sefdJy]),
    ),
    timeZone: row.timeZone,
    dishM: row.dishM,
  }));
}

function mountOf(row: typeof stations.$inferSelect): Mount {
  const first = {
    minDeg: row.axis1MinDeg,
    maxDeg: row.axis1MaxDeg,
    rateDegPerS: row.axis1RateDegPerS,
    accelDegPerS2: row.axis1AccelDegPerS2,
  };
  const second = {
    minDeg: row.axis2MinDeg,
    maxDeg: row.axis2MaxDeg,
    rateDegPerS: row.axis2RateDegPerS,
    accelDegPerS2: row.axis2AccelDegPerS2,
  };
  const { mountKind: kind, settleSeconds } = row;
  switch (kind) {
    case 'az-el':
      return { kind, azimuth: first, elevation: second, settleSeconds };
    case 'ha-dec':
      return { kind, hourAngle: first, declination: second, settleSeconds };
    case 'xy-ns':
    case 'xy-ew':
      return { kind, x: first, y: second, settleSeconds };
  }
}

export async function readSources(from: Database | Tx, sessionId: string): Promise<TimelineSource[]> {
  const rows = await from
    .select({
      id: sources.id,
      name: sources.name,
      raDeg: sources.raDeg,
      decDeg: sources.decDeg,
      role: sources.role,
      wantedScans: sessionSources.wantedScans,
    })
    .from(sessionSources)
    .innerJoin(sources, eq(sources.id, sessionSources.sourceId))
    .where(eq(sessionSources.sessionId, sessionId))
    .orderBy(asc(sources.raDeg), asc(sources.id));
  const bands = await from
    .select({ band: sourceBands })
    .from(sourceBands)
    .innerJoin(sessionSources, eq(sessionSources.sourceId, sourceBands.sourceId))
    .where(eq(sessionSources.sessionId, sessionId));
  return rows.map(({ raDeg, decDeg, ...row }) => ({
    ...row,
    position: { raDeg, decDeg },
    components: Object.fromEntries(
      bands.filter(({ band }) => band.sourceId === row.id).map(({ band }) => [band.band, componentsOf(band)]),
    ),
  }));
}

export async function readModes(from: Database | Tx): Promise<PlanMode[]> {
  const rows = await from.select().from(modes).orderBy(asc(modes.name));
  const channels = await from
    .select()
    .from(modeChannels)
    .orderBy(asc(modeChannels.modeId), asc(modeChannels.number));
  return rows.map(({ id, name, band, coherenceSeconds, integrationSeconds, spectralChannels }) => ({
    id,
    name,
    band,
    coherenceSeconds,
    integrationSeconds,
    spectralChannels,
    ...summaryOf(
      channels
        .filter(({ modeId }) => modeId === id)
        .map((channel) => ({ ...channel, bits: channel.bits === 1 ? 1 : 2 })),
    ),
  }));
}

export function horizonOf(stored: string): HorizonPoint[] {
  const corners = JSON.parse(stored) as [azimuthDeg: number, elevationDeg: number][];
  return corners.map(([azimuthDeg, elevationDeg]) => ({ azimuthDeg, elevationDeg }));
}

type StoredComponent = Omit<Component, 'band'>;

/** The list of components stands for flux density and size where there is one. */
export function componentsOf(band: typeof sourceBands.$inferSelect): GaussianComponent[] {
  const stored = JSON.parse(band.components) as StoredComponent[];
  if (stored.length === 0) return [roundGaussian(band.fluxJy, band.sizeMas ?? 0)];
  return stored.map((one) => ({
    fluxJy: one.fluxJy,
    majorRad: one.majorMas * RAD_PER_MAS,
    minorRad: one.minorMas * RAD_PER_MAS,
    positionAngleRad: degToRad(one.positionAngleDeg),
    eastRad: one.eastMas * RAD_PER_MAS,
    northRad: one.northMas * RAD_PER_MAS,
  }));
}

function roundGaussian(fluxJy: number, sizeMas: number): GaussianComponent {
  const fwhmRad = sizeMas * RAD_PER_MAS;
  return { fluxJy, majorRad: fwhmRad, minorRad: fwhmRad, positionAngleRad: 0, eastRad: 0, northRad: 0 };
}
