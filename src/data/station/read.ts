import 'server-only';
import { and, asc, eq, gt, inArray, isNull, ne } from 'drizzle-orm';
import { db } from '../../../db/client';
import { sessionStations } from '../../../db/schema/session-stations';
import { sessions } from '../../../db/schema/sessions';
import { sources } from '../../../db/schema/sources';
import { stationBands } from '../../../db/schema/station-bands';
import { stationUnavailability } from '../../../db/schema/station-unavailability';
import { stations } from '../../../db/schema/stations';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { OWN_BLOCKS, STATION_BLOCKS, type StationBlockName } from '../../exchange/catalogue/station';
import { apparentOfDate } from '../../sky/direction';
import { earthFrameAt } from '../../sky/engine';
import { geodeticToItrf } from '../../sky/site';
import { radToDeg } from '../../units/angle';
import { answer, forbiddenFor, type Failure } from '../errors';
import { readableBy } from '../session/scope';
import type { StationDto, StationRow } from './dto';
import { blocksOf, fetchStation } from './rows';

/** A list to choose from stays one that can be read. */
const MOST_SOURCES = 1000;

export type StationListItem = { code: string; name: string; site: { longitudeDeg: number } };

/** The stations of these codes, or all in use, as lists of sessions and empty sheets name them. */
export const listStations = (
  viewer: Viewer,
  codes: readonly string[] | 'in use',
): Promise<{ ok: true; stations: StationListItem[] } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const rows = await db()
      .select({ code: stations.code, name: stations.name, longitudeDeg: stations.longitudeDeg })
      .from(stations)
      .where(codes === 'in use' ? isNull(stations.retiredAtMs) : inArray(stations.code, [...codes]))
      .orderBy(asc(stations.code));
    return {
      ok: true,
      stations: rows.map(({ code, name, longitudeDeg }) => ({ code, name, site: { longitudeDeg } })),
    };
  });

/** The stations in use, west or east of each other; none for someone who may not read them. */
export async function networkOf(viewer: Viewer | null): Promise<StationListItem[]> {
  const network = viewer && (await listStations(viewer, 'in use'));
  return network?.ok ? network.stations : [];
}

/** The whole catalogue, the retired ones too. */
export const listStationRows = (
  viewer: Viewer,
): Promise<{ ok: true; stations: StationRow[]; canAdd: boolean } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const now = nowMs();
    const rows = await db().select().from(stations).orderBy(asc(stations.code));
    const bands = await db().select().from(stationBands);
    const away = await db()
      .select()
      .from(stationUnavailability)
      .where(gt(stationUnavailability.endMs, now))
      .orderBy(asc(stationUnavailability.startMs));
    const ahead = await sessionsAhead(viewer, now);
    return {
      ok: true,
      canAdd: can(viewer, 'station.write'),
      stations: rows.map((row) => {
        const next = away.find(({ stationCode }) => stationCode === row.code);
        return {
          code: row.code,
          name: row.name,
          timeZone: row.timeZone,
          mountKind: row.mountKind,
          site: { latitudeDeg: row.latitudeDeg, longitudeDeg: row.longitudeDeg, heightM: row.heightM },
          dishM: row.dishM,
          sefdJy: Object.fromEntries(
            bands.filter((band) => band.stationCode === row.code).map((band) => [band.band, band.sefdJy]),
          ),
          recorderFreeBytes: row.recorderFreeBytes,
          nextAway: next ? { startMs: next.startMs, endMs: next.endMs, why: next.why } : null,
          sessionsAhead: ahead.filter(({ stationCode }) => stationCode === row.code).length,
          retiredAtMs: row.retiredAtMs,
        };
      }),
    };
  });

/** One station with all its blocks, and which of them the viewer may change. */
export const readStation = (
  viewer: Viewer,
  code: string,
): Promise<{ ok: true; station: StationDto } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const row = await fetchStation(db(), code);
    const site = { latitudeDeg: row.latitudeDeg, longitudeDeg: row.longitudeDeg, heightM: row.heightM };
    const isXyz = row.itrfX !== null && row.itrfY !== null && row.itrfZ !== null;
    const ahead = await sessionsAhead(viewer, nowMs());
    return {
      ok: true,
      station: {
        code: row.code,
        site,
        itrf: isXyz ? { x: row.itrfX ?? 0, y: row.itrfY ?? 0, z: row.itrfZ ?? 0 } : geodeticToItrf(site),
        recorderFreeAtMs: row.recorderFreeAtMs,
        retiredAtMs: row.retiredAtMs,
        blocks: await blocksOf(db(), row),
        skySources: await readSkySources(nowMs()),
        canEdit: editableBlocks(viewer, row.code),
        canRetire: can(viewer, 'station.write'),
        canReadDesk: can(viewer, 'desk.read', { stationCode: row.code }),
        canReadClock: can(viewer, 'clock.read', { stationCode: row.code }),
        sessionsAhead: ahead
          .filter(({ stationCode }) => stationCode === row.code)
          .map(({ code: sessionCode, title, startMs }) => ({ code: sessionCode, title, startMs })),
      },
    };
  });

async function readSkySources(atMs: number): Promise<StationDto['skySources']> {
  const rows = await db()
    .select({ id: sources.id, name: sources.name, raDeg: sources.raDeg, decDeg: sources.decDeg })
    .from(sources)
    .where(isNull(sources.retiredAtMs))
    .orderBy(asc(sources.name))
    .limit(MOST_SOURCES);
  const frame = earthFrameAt(atMs);
  return rows.map(({ id, name, ...place }) => {
    const [, , sinDec] = apparentOfDate(place, frame);
    return { id, name, decDeg: radToDeg(Math.asin(Math.max(-1, Math.min(1, sinDec)))) };
  });
}

function editableBlocks(viewer: Viewer, stationCode: string): StationBlockName[] {
  if (can(viewer, 'station.write')) return Object.keys(STATION_BLOCKS) as StationBlockName[];
  return can(viewer, 'station.write-own', { stationCode }) ? [...OWN_BLOCKS] : [];
}

const sessionsAhead = (viewer: Viewer, now: number) =>
  db()
    .select({
      stationCode: sessionStations.stationCode,
      code: sessions.code,
      title: sessions.title,
      startMs: sessions.startMs,
    })
    .from(sessionStations)
    .innerJoin(sessions, eq(sessions.id, sessionStations.sessionId))
    .where(and(gt(sessions.startMs, now), ne(sessions.state, 'cancelled'), readableBy(viewer)))
    .orderBy(asc(sessions.startMs));
