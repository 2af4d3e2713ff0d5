import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { scans } from '../../../db/schema/scans';
import { subjects } from '../../../db/schema/subjects';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { startsEndMs } from '../../schedule/best-start';
import { SPAN_SUBJECT } from '../../schedule/commands';
import type { PlanMode, PlanSource, PlanStation } from '../../schedule/context';
import { skyStation } from '../../schedule/sky-station';
import { skyTable } from '../../schedule/make-sky-table';
import type { SkyTable } from '../../schedule/sky-table';
import { gmstHours, moonSeparationDeg, sunSeparationDeg } from '../../sky/position';
import { spansOf } from '../../sky/interval-set';
import { windowsFor } from '../../sky/windows';
import type { Interval } from '../../units/time';
import { answer, forbiddenFor, type Failure } from '../errors';
import { readModes, readSources, readStations } from '../plan/context';
import { fluxOf } from '../plan/flux';
import { headOf } from '../session/head';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import type { SkySheet, SkySource, StartSheet } from './dto';
import { isEnded } from '../../schedule/ended';

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
        starts: await startsOf(viewer, session, { stations, sources }),
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

/** Windows over as long as a start a sidereal day later would need, and what may be moved. */
async function startsOf(
  viewer: Viewer,
  session: SessionRow,
  { stations, sources }: { stations: readonly PlanStation[]; sources: readonly PlanSource[] },
): Promise<StartSheet> {
  const { startMs, lengthSeconds, minElevationDeg } = session;
  const longestSeconds = Math.max(lengthSeconds, 86_400);
  const span = { start: new Date(startMs), end: new Date(startsEndMs(startMs, longestSeconds * 1000)) };
  const targets = sources.filter(({ role }) => role === 'target');
  const weighed = targets.length > 0 ? targets : sources;
  const windows = windowsFor(
    weighed.map(({ position }) => position),
    stations.map((station) => skyStation(station, { minElevationDeg })),
    span,
  );
  return {
    windows: windows.map((byStation) =>
      Object.fromEntries(stations.map(({ code }, index) => [code, spansOf(byStation[index] ?? [])])),
    ),
    areTargets: targets.length > 0,
    longestSeconds,
    move: await moveOf(viewer, session),
  };
}

async function moveOf(viewer: Viewer, session: SessionRow): Promise<StartSheet['move']> {
  const isOver = isEnded(session.state);
  if (isOver || !can(viewer, 'plan.edit', subjectOf(session))) return null;
  // the legs of a nodding group stand as one, as on the timeline
  const placed = await db()
    .select({
      startMs: sql<number>`min(${scans.startMs})`,
      stopMs: sql<number>`max(${scans.startMs} + 1000 * ${scans.lengthSeconds})`,
    })
    .from(scans)
    .where(eq(scans.sessionId, session.id))
    .groupBy(sql`coalesce(${scans.groupId}, ${scans.id})`);
  const [span] = await db()
    .select({ rev: subjects.rev })
    .from(subjects)
    .where(and(eq(subjects.sessionId, session.id), eq(subjects.id, SPAN_SUBJECT)));
  return {
    spanRev: span?.rev ?? 0,
    scans: placed.map((scan) => [scan.startMs, scan.stopMs] as const),
  };
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
