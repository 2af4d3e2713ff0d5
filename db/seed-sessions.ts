import 'server-only';
import { SIDEREAL_DAY_SECONDS } from '../src/units/constants';
import type { Tx } from './client';
import { noddingGroups } from './schema/nodding-groups';
import { scanStations } from './schema/scan-stations';
import { scans } from './schema/scans';
import { sessionSources } from './schema/session-sources';
import { sessionStations } from './schema/session-stations';
import { sessions } from './schema/sessions';
import { subjects } from './schema/subjects';
import { ACCOUNTS } from './seed-data/accounts';
import { BAND_22, BAND_8 } from './seed-data/modes';
import { BASE_START, NODDING, SCANS, SESSIONS, SETTINGS } from './seed-data/session';
import { SOURCES } from './seed-data/sources';
import { STATIONS } from './seed-data/stations';
import { seedId, userId } from './seed-ids';

const HOUR_MS = 3_600_000;
const LEAD_MS = 48 * HOUR_MS;
const DAY_MS = SIDEREAL_DAY_SECONDS * 1000;

/** The first start at least 48 h ahead that is whole sidereal days from the base, to 10 s. */
export function demoStartMs(nowMs: number): number {
  const days = Math.ceil((nowMs + LEAD_MS - Date.parse(BASE_START)) / DAY_MS);
  return startAfter(days) >= nowMs + LEAD_MS ? startAfter(days) : startAfter(days + 1);
}

export const sessionStartMs = (session: (typeof SESSIONS)[number], draftStartMs: number): number =>
  startAfter(Math.round((draftStartMs - Date.parse(BASE_START)) / DAY_MS) - session.daysBefore);

const startAfter = (days: number): number =>
  Date.parse(BASE_START) + Math.round((days * DAY_MS) / 10_000) * 10_000;

export const SCHEDULER = 'scheduler@antiphon.example';

/** Who speaks for a station. */
export function operatorOf(code: string): string {
  const account = ACCOUNTS.find(({ role, stationCode }) => role === 'operator' && stationCode === code);
  if (!account) throw new RangeError(`The demo has no operator of ${code}.`);
  return userId(account.email);
}

export const sourceId = (name: string) => seedId('source', name);
export const modeId = (band: string) => seedId('mode', band);
export const sessionId = (code: string) => seedId('session', code);
export const scanId = (code: string, number: number | string) => seedId('scan', `${code} ${number}`);

export async function fillSessions(tx: Tx, draftStartMs: number): Promise<void> {
  for (const session of SESSIONS) await fillSession(tx, session, sessionStartMs(session, draftStartMs));
}

async function fillSession(tx: Tx, session: (typeof SESSIONS)[number], startMs: number): Promise<void> {
  const { code, title, state, purpose } = session;
  const id = sessionId(code);
  const groupId = seedId('group', code);
  await tx
    .insert(sessions)
    .values({ id, code, title, state, purpose, startMs, modeId: modeId(BAND_22), ...SETTINGS });
  await tx
    .insert(sessionStations)
    .values(STATIONS.map((station) => ({ sessionId: id, stationCode: station.code })));
  await tx.insert(sessionSources).values(
    SOURCES.map(([name, , , , , , wantedScans]) => ({
      sessionId: id,
      sourceId: sourceId(name),
      wantedScans,
    })),
  );
  await tx.insert(noddingGroups).values({
    sessionId: id,
    id: groupId,
    targetId: sourceId(sourceOfScan(NODDING.scan)),
    calibratorId: sourceId(NODDING.calibrator),
    targetOnSeconds: NODDING.targetOnSeconds,
    calibratorOnSeconds: NODDING.calibratorOnSeconds,
    turnSeconds: NODDING.turnSeconds,
    first: 'calibrator',
  });
  const plan = SCANS.flatMap((row, index) => scansOf(code, startMs, groupId, row, index + 1));
  for (const part of chunks(plan, 100)) {
    await tx.insert(scans).values(part.map(({ codes: _, ...scan }) => ({ sessionId: id, ...scan })));
    await tx.insert(scanStations).values(
      part.flatMap((scan) =>
        scan.codes.map((stationCode) => ({
          sessionId: id,
          scanId: scan.id,
          stationCode,
          lateSeconds: 0,
          earlySeconds: 0,
        })),
      ),
    );
  }
  await tx.insert(subjects).values(
    [{ id: 'span' }, { id: groupId }, ...plan].map((subject) => ({
      sessionId: id,
      id: subject.id,
      rev: 0,
      top: 0,
    })),
  );
}

/** One scan of a row; of the nodding group's row its legs, calibrator first and last. */
function scansOf(
  code: string,
  startMs: number,
  groupId: string,
  [afterMinutes, minutes, source, stations]: (typeof SCANS)[number],
  number: number,
) {
  const scan = {
    id: scanId(code, number),
    sourceId: sourceId(source),
    modeId: modeId(number === 1 ? BAND_8 : BAND_22),
    startMs: startMs + afterMinutes * 60_000,
    lengthSeconds: minutes * 60,
    codes: stations.split(' '),
  };
  if (number !== NODDING.scan) return [scan];
  const { calibratorOnSeconds, targetOnSeconds, turnSeconds, cycles, calibrator } = NODDING;
  const half = [calibratorOnSeconds + turnSeconds, targetOnSeconds + turnSeconds] as const;
  return Array.from({ length: 2 * cycles + 1 }, (_, index) => {
    const isTarget = index % 2 === 1;
    const before = Math.floor(index / 2) * (half[0] + half[1]) + (isTarget ? half[0] : 0);
    return {
      ...scan,
      id: scanId(code, `${number}.${index + 1}`),
      sourceId: isTarget ? scan.sourceId : sourceId(calibrator),
      startMs: scan.startMs + before * 1000,
      lengthSeconds: isTarget ? targetOnSeconds : calibratorOnSeconds,
      groupId,
      leg: isTarget ? ('target' as const) : ('calibrator' as const),
    };
  });
}

function sourceOfScan(number: number): string {
  const row = SCANS[number - 1];
  if (!row) throw new RangeError(`There is no scan ${number} in the demo.`);
  return row[2];
}

const chunks = <T>(items: readonly T[], size: number): T[][] =>
  Array.from({ length: Math.ceil(items.length / size) }, (_, k) => items.slice(k * size, (k + 1) * size));
