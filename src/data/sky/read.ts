import 'server-only';
import { db } from '../../../db/client';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import type { PlanMode, PlanSource } from '../../schedule/context';
import { skyTable, type SkyTable } from '../../schedule/sky-table';
import { gmstHours, moonSeparationDeg, sunSeparationDeg } from '../../sky/position';
import type { Interval } from '../../units/time';
import { answer, forbiddenFor, type Failure } from '../errors';
import { readModes, readSources, readStations } from '../plan/context';
import { fluxOf } from '../plan/flux';
import { headOf } from '../session/head';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import type { SkySheet, SkySource } from './dto';

/** Elevations, windows and common windows of a session's sources over its span. */
export const readSky = (viewer: Viewer, key: string): Promise<{ ok: true; table: SkyTable } | Failure> =>
  answer(async () => {
    const session = await fetchReadable(viewer, key);
    return { ok: true, table: (await skyOf(session)).table };
  });

/** All that the Sky page of a session shows. */
export const readSkySheet = (viewer: Viewer, key: string): Promise<{ ok: true; sheet: SkySheet } | Failure> =>
  answer(async () => {
    const session = await fetchReadable(viewer, key);
    const { stations, sources, span, table } = await skyOf(session);
    const mode = (await readModes(db())).find(({ id }) => id === session.modeId);
    const middle = new Date((span.start.getTime() + span.end.getTime()) / 2);
    const now = nowMs();
    return {
      ok: true,
      sheet: {
        session: headOf(session, now),
        band: mode?.band ?? null,
        minElevationDeg: session.minElevationDeg,
        gmstStartHours: gmstHours(span.start),
        stations: stations.map(({ code, name, site }) => ({ code, name, site })),
        sources: sources.map((source) => skySource(source, mode, middle)),
        table,
        nowMs: now,
      },
    };
  });

async function fetchReadable(viewer: Viewer, key: string): Promise<SessionRow> {
  const session = await fetchSession(db(), viewer, key);
  if (!can(viewer, 'plan.read-draft', subjectOf(session))) throw forbiddenFor('plan.read-draft');
  return session;
}

async function skyOf({ id, startMs, lengthSeconds, minElevationDeg, stations: codes }: SessionRow) {
  const span: Interval = { start: new Date(startMs), end: new Date(startMs + lengthSeconds * 1000) };
  const sources = await readSources(db(), id);
  const stations = await readStations(db(), codes);
  return { span, sources, stations, table: skyTable(stations, sources, { minElevationDeg }, span) };
}

function skySource(source: PlanSource, mode: PlanMode | undefined, middle: Date): SkySource {
  const { id, name, role, position } = source;
  return {
    id,
    name,
    role,
    position,
    fluxJy: fluxOf(source, mode?.band),
    sunDeg: sunSeparationDeg(position, middle),
    moonDeg: moonSeparationDeg(position, middle),
  };
}
