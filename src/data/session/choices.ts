import 'server-only';
import { and, asc, eq, gt, inArray, isNull, ne, notInArray, or, sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { modes } from '../../../db/schema/modes';
import { sessionStations } from '../../../db/schema/session-stations';
import { sessions } from '../../../db/schema/sessions';
import { sources } from '../../../db/schema/sources';
import { stationUnavailability } from '../../../db/schema/station-unavailability';
import { stations } from '../../../db/schema/stations';
import type { Viewer } from '../../access/policy';
import type { ProspectStation } from '../../outlook/prospect';
import type { PlanMode, SourceRole } from '../../schedule/context';
import type { SkyPosition } from '../../sky/types';
import { horizonOf, readModes } from '../plan/context';
import { readableBy } from './scope';

type StationChoice = ProspectStation & { name: string; isRetired: boolean };
type ModeChoice = PlanMode & { isRetired: boolean };

export type SessionChoices = {
  stations: StationChoice[];
  sources: { id: string; name: string; role: SourceRole; position: SkyPosition; isRetired: boolean }[];
  modes: ModeChoice[];
  /** other sessions that are not over, and times at which a station cannot observe */
  taken: { station: string; startMs: number; endMs: number; by: { session: string } | { why: string } }[];
};

/** What the session has already, which may be kept even where it is retired. */
type Kept = {
  sessionId: string | null;
  codes: readonly string[];
  sourceIds: readonly string[];
  modeId: string | null;
};

/** What may be chosen: all that is not retired, and what the session has already. */
export async function choicesOf(viewer: Viewer, kept: Kept, now: number): Promise<SessionChoices> {
  const [stationRows, sourceRows, modeRows, planModes, taken] = await Promise.all([
    db()
      .select()
      .from(stations)
      .where(or(isNull(stations.retiredAtMs), inArray(stations.code, [...kept.codes])))
      .orderBy(asc(stations.longitudeDeg), asc(stations.code)),
    db()
      .select()
      .from(sources)
      .where(or(isNull(sources.retiredAtMs), inArray(sources.id, [...kept.sourceIds])))
      .orderBy(asc(sources.name)),
    db()
      .select({ id: modes.id, retiredAtMs: modes.retiredAtMs })
      .from(modes)
      .where(or(isNull(modes.retiredAtMs), eq(modes.id, kept.modeId ?? ''))),
    readModes(db()),
    takenTimes(viewer, kept.sessionId, now),
  ]);
  return {
    stations: stationRows.map(stationChoice),
    sources: sourceRows.map(({ id, name, role, raDeg, decDeg, retiredAtMs }) => ({
      id,
      name,
      role,
      position: { raDeg, decDeg },
      isRetired: retiredAtMs !== null,
    })),
    modes: planModes.flatMap((mode) => {
      const row = modeRows.find(({ id }) => id === mode.id);
      return row ? [{ ...mode, isRetired: row.retiredAtMs !== null }] : [];
    }),
    taken,
  };
}

function stationChoice(row: typeof stations.$inferSelect): StationChoice {
  const { code, name, latitudeDeg, longitudeDeg, heightM, minElevationDeg, maxElevationDeg } = row;
  return {
    code,
    name,
    site: { latitudeDeg, longitudeDeg, heightM },
    minElevationDeg,
    maxElevationDeg,
    horizon: horizonOf(row.horizon),
    ...(row.sunLimitDeg !== null && { sunLimitDeg: row.sunLimitDeg }),
    bits: row.bits === 1 ? 1 : 2,
    recorderFreeBytes: row.recorderFreeBytes,
    isRetired: row.retiredAtMs !== null,
  };
}

async function takenTimes(
  viewer: Viewer,
  sessionId: string | null,
  now: number,
): Promise<SessionChoices['taken']> {
  const others = await db()
    .select({
      code: sessions.code,
      station: sessionStations.stationCode,
      startMs: sessions.startMs,
      lengthSeconds: sessions.lengthSeconds,
    })
    .from(sessions)
    .innerJoin(sessionStations, eq(sessionStations.sessionId, sessions.id))
    .where(
      and(
        readableBy(viewer),
        ne(sessions.id, sessionId ?? ''),
        notInArray(sessions.state, ['cancelled', 'closed']),
        gt(sql<number>`${sessions.startMs} + 1000 * ${sessions.lengthSeconds}`, now),
      ),
    )
    .orderBy(asc(sessions.startMs), asc(sessions.code), asc(sessionStations.stationCode));
  const away = await db()
    .select()
    .from(stationUnavailability)
    .where(gt(stationUnavailability.endMs, now))
    .orderBy(asc(stationUnavailability.startMs));
  return [
    ...others.map(({ code, station, startMs, lengthSeconds }) => ({
      station,
      startMs,
      endMs: startMs + lengthSeconds * 1000,
      by: { session: code },
    })),
    ...away.map(({ stationCode, startMs, endMs, why }) => ({
      station: stationCode,
      startMs,
      endMs,
      by: { why },
    })),
  ];
}
