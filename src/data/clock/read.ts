import 'server-only';
import { and, asc, desc, eq, gte, inArray, isNull } from 'drizzle-orm';
import { db, type Database, type Tx } from '../../../db/client';
import { clockEvents } from '../../../db/schema/clock-events';
import { clockReadings } from '../../../db/schema/clock-readings';
import { sessionStations } from '../../../db/schema/session-stations';
import { sessions } from '../../../db/schema/sessions';
import { stations } from '../../../db/schema/stations';
import { can, canSome, type Viewer } from '../../access/policy';
import { fitClock, predictClock, type ClockFit } from '../../clock/fit';
import { secondState } from '../../clock/second';
import { nowMs } from '../../env';
import type { StationClock } from '../../outlook/clock-place';
import { answer, forbiddenFor, notFound, type Failure } from '../errors';
import { readableBy } from '../session/scope';
import type { ClockSummary, ReadingDto, StationClockDto } from './dto';

type StationRow = typeof stations.$inferSelect;
type ReadingRow = typeof clockReadings.$inferSelect;
type Fitted = { fit: ClockFit | null; rows: ReadingRow[]; used: ReadingRow[] };

const DAY_MS = 86_400_000;
/** A fit looks this far back. */
const FIT_DAYS = 120;
const RECENT = 60;

/** One station's clock log: readings, changes, the fit of its formatter's pulse. */
export const readStationClock = (
  viewer: Viewer,
  code: string,
): Promise<{ ok: true; clock: StationClockDto } | Failure> =>
  answer(async () => {
    const station = await fetchStation(db(), viewer, code);
    const now = nowMs();
    const pulse = 'formatter';
    const { fit, rows, used } = await fitOf(db(), station, pulse, now);
    const changes = await db()
      .select()
      .from(clockEvents)
      .where(eq(clockEvents.stationCode, station.code))
      .orderBy(desc(clockEvents.atMs));
    const oldest = rows.at(-1)?.atMs ?? now - FIT_DAYS * DAY_MS;
    const newestUsedMs = used[0]?.atMs;
    return {
      ok: true,
      clock: {
        station: stationOf(station),
        pulse,
        readings: rows.map((row) => readingOf(row, used, fit, pulse)),
        changes: changes.map(({ id, atMs, kind, stepSeconds, note, role }) => ({
          id,
          atMs,
          kind,
          stepSeconds,
          note,
          role,
        })),
        fit,
        now: fit && predictClock(fit, new Date(now)),
        isBehindChange: changes.some(({ atMs }) => newestUsedMs !== undefined && atMs > newestUsedMs),
        sessions: await sessionsOf(db(), viewer, station.code, oldest, now),
        canWrite: station.retiredAtMs === null && can(viewer, 'clock.write', { stationCode: station.code }),
        canSetAside: can(viewer, 'clock.set-aside', { stationCode: station.code }),
        nowMs: now,
      },
    };
  });

/** The clocks that the viewer may read, one line each, west to east. */
export const listClocks = (
  viewer: Viewer,
): Promise<{ ok: true; clocks: ClockSummary[]; nowMs: number } | Failure> =>
  answer(async () => {
    if (!canSome(viewer, 'clock.read')) throw forbiddenFor('clock.read');
    const now = nowMs();
    const rows = await db()
      .select()
      .from(stations)
      .where(isNull(stations.retiredAtMs))
      .orderBy(asc(stations.longitudeDeg), asc(stations.code));
    const readable = rows.filter(({ code }) => can(viewer, 'clock.read', { stationCode: code }));
    const clocks = await Promise.all(readable.map((station) => summaryOf(db(), station, now)));
    return { ok: true, clocks, nowMs: now };
  });

/** What the outlook needs of the clocks of some stations. */
export async function clocksOf(
  from: Database | Tx,
  codes: readonly string[],
  atMs: number,
): Promise<Record<string, StationClock>> {
  const rows = await from
    .select()
    .from(stations)
    .where(inArray(stations.code, [...codes]));
  const clocks: Record<string, StationClock> = {};
  for (const station of rows) {
    const { fit, used, rows: all } = await fitOf(from, station, 'formatter', atMs);
    const resyncs = await from
      .select({ atMs: clockEvents.atMs })
      .from(clockEvents)
      .where(and(eq(clockEvents.stationCode, station.code), eq(clockEvents.kind, 'resync')));
    const checks = all.map((row) => ({ atMs: row.atMs, check: row.secondCheck, off: row.secondOff }));
    clocks[station.code] = {
      readAtMs: used[0]?.atMs ?? null,
      fit,
      instrument: instrumentOf(station),
      second: secondState(
        checks,
        resyncs.map((event) => event.atMs),
      ),
    };
  }
  return clocks;
}

/** A station whose clock log is the viewer's to read; another's is not found. */
export async function fetchStation(from: Database | Tx, viewer: Viewer, code: string): Promise<StationRow> {
  const [station] = await from.select().from(stations).where(eq(stations.code, code));
  const missing = () => notFound(`There is no clock log of ${code.slice(0, 8)}.`);
  if (!station) throw missing();
  if (!canSome(viewer, 'clock.read')) throw forbiddenFor('clock.read');
  if (!can(viewer, 'clock.read', { stationCode: station.code })) throw missing();
  return station;
}

/** All readings of a pulse and the fit of those that are used, both newest first. */
export async function fitOf(
  from: Database | Tx,
  station: Pick<StationRow, 'code' | 'stabilityFloor' | 'driftPerDay'>,
  pulse: ReadingRow['pulse'],
  atMs: number,
): Promise<Fitted> {
  const rows = await from
    .select()
    .from(clockReadings)
    .where(
      and(
        eq(clockReadings.stationCode, station.code),
        eq(clockReadings.pulse, pulse),
        gte(clockReadings.atMs, atMs - FIT_DAYS * DAY_MS),
      ),
    )
    .orderBy(desc(clockReadings.atMs), asc(clockReadings.id));
  const used = rows.filter(({ state }) => state === 'used');
  if (used.length === 0) return { fit: null, rows, used };
  const events = await from
    .select({ atMs: clockEvents.atMs })
    .from(clockEvents)
    .where(eq(clockEvents.stationCode, station.code));
  const readings = used.map((row) => ({
    at: new Date(row.atMs),
    offsetSeconds: row.offsetSeconds,
    ...(row.sigmaSeconds !== null && { sigmaSeconds: row.sigmaSeconds }),
  }));
  const { stabilityFloor, driftPerDay } = station;
  const fit = fitClock(readings, {
    events: events.map((event) => new Date(event.atMs)),
    stabilityFloor,
    driftPerDay,
  });
  return { fit, rows, used };
}

async function summaryOf(from: Database, station: StationRow, now: number): Promise<ClockSummary> {
  const { fit, rows, used } = await fitOf(from, station, 'formatter', now);
  const far = fit?.segments.reduce((sum, { setAside }) => sum + setAside.length, 0) ?? 0;
  return {
    code: station.code,
    name: station.name,
    readAtMs: used[0]?.atMs ?? null,
    now: fit && predictClock(fit, new Date(now)),
    used: used.length - far,
    setAside: rows.filter(({ state }) => state === 'set-aside').length + far,
    waiting: rows.filter(({ state }) => state === 'waiting').length,
    scatterSeconds: fit?.segments.at(-1)?.scatterSeconds ?? null,
    recent: used.slice(0, RECENT).map(({ atMs, offsetSeconds }) => ({ atMs, offsetSeconds })),
  };
}

function readingOf(
  row: ReadingRow,
  used: readonly ReadingRow[],
  fit: ClockFit | null,
  pulse: ReadingRow['pulse'],
): ReadingDto {
  const { id, atMs, offsetSeconds, sigmaSeconds, secondCheck, secondOff, state, reason, note, origin } = row;
  const index = used.indexOf(row);
  return {
    id,
    pulse,
    atMs,
    offsetSeconds,
    sigmaSeconds,
    secondCheck,
    secondOff,
    state,
    reason,
    note,
    origin,
    enteredRole: row.enteredRole,
    fromFitSeconds: fit && offsetSeconds - predictClock(fit, new Date(atMs)).offsetSeconds,
    isFar: index >= 0 && (fit?.segments.some(({ setAside }) => setAside.includes(index)) ?? false),
  };
}

const instrumentOf = ({ instrumentDelaySeconds: seconds, instrumentDelaySigmaSeconds: sigma }: StationRow) =>
  seconds === null || sigma === null ? null : { seconds, sigmaSeconds: sigma };

function stationOf(row: StationRow): StationClockDto['station'] {
  const { code, name, timeZone, counterStart, counterStop, stationCableSeconds, gpsCableSeconds } = row;
  const { instrumentDelaySeconds, instrumentDelaySigmaSeconds } = row;
  return {
    code,
    name,
    timeZone,
    counterStart,
    counterStop,
    stationCableSeconds,
    gpsCableSeconds,
    instrumentDelaySeconds,
    instrumentDelaySigmaSeconds,
  };
}

async function sessionsOf(from: Database, viewer: Viewer, code: string, sinceMs: number, now: number) {
  const rows = await from
    .select({ code: sessions.code, startMs: sessions.startMs, lengthSeconds: sessions.lengthSeconds })
    .from(sessions)
    .innerJoin(sessionStations, eq(sessionStations.sessionId, sessions.id))
    .where(and(eq(sessionStations.stationCode, code), readableBy(viewer)))
    .orderBy(asc(sessions.startMs));
  return rows
    .map((row) => ({ code: row.code, startMs: row.startMs, endMs: row.startMs + row.lengthSeconds * 1000 }))
    .filter(({ startMs, endMs }) => endMs >= sinceMs && startMs <= now + 14 * DAY_MS);
}
