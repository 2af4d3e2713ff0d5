import 'server-only';
import { createHash } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import { SIDEREAL_DAY_SECONDS } from '../src/units/constants';
import { idOf } from '../src/schedule/plan-ids';
import { hashPassword } from '../src/viewer/password';
import { db, transact, type Tx } from './client';
import { ACCOUNTS, DEMO_PASSWORD } from './seed-data/accounts';
import { BAND_22, BAND_8, MODES } from './seed-data/modes';
import { SCANS, SESSION } from './seed-data/session';
import { SOURCES } from './seed-data/sources';
import { SEFDS, STATIONS } from './seed-data/stations';
import { grants } from './schema/grants';
import { journal } from './schema/journal';
import { modeChannels } from './schema/mode-channels';
import { modes } from './schema/modes';
import { scanStations } from './schema/scan-stations';
import { scans } from './schema/scans';
import { seedMarks } from './schema/seed-marks';
import { sessionSources } from './schema/session-sources';
import { sessionStations } from './schema/session-stations';
import { sessions } from './schema/sessions';
import { sourceBands } from './schema/source-bands';
import { sources } from './schema/sources';
import { stationBands } from './schema/station-bands';
import { stations } from './schema/stations';
import { subjects } from './schema/subjects';
import { users } from './schema/users';

const MARK = 'demo';
const HOUR_MS = 3_600_000;
const STALE_MS = 24 * HOUR_MS;
const LEAD_MS = 48 * HOUR_MS;

/** Fills the demo once; later moves its dates on, as long as no one has changed its plan. */
export async function seedDemo(nowMs: number): Promise<'filled' | 'moved' | 'kept'> {
  const [mark] = await db().select().from(seedMarks).where(eq(seedMarks.name, MARK));
  if (mark) return Math.abs(nowMs - mark.seededAtMs) > STALE_MS ? moveDates(nowMs) : 'kept';
  const accounts = await Promise.all(
    ACCOUNTS.map(async (account) => ({ ...account, passwordHash: await hashPassword(DEMO_PASSWORD) })),
  );
  return transact(async (tx) => {
    const startMs = demoStartMs(nowMs);
    const [marked] = await tx
      .insert(seedMarks)
      .values({ name: MARK, startMs, seededAtMs: nowMs })
      .onConflictDoNothing()
      .returning();
    if (!marked) return 'kept';
    await fillCatalogues(tx);
    await fillSession(tx, startMs);
    await fillAccounts(tx, accounts);
    return 'filled';
  });
}

/** The first start at least 48 h ahead that is whole sidereal days from the base, to 10 s. */
export function demoStartMs(nowMs: number): number {
  const baseMs = Date.parse(SESSION.baseStart);
  const dayMs = SIDEREAL_DAY_SECONDS * 1000;
  const startMs = (days: number) => baseMs + Math.round((days * dayMs) / 10_000) * 10_000;
  const days = Math.ceil((nowMs + LEAD_MS - baseMs) / dayMs);
  return startMs(days) >= nowMs + LEAD_MS ? startMs(days) : startMs(days + 1);
}

/** The same for the same name on every machine. */
export const seedId = (kind: string, name: string): string =>
  idOf(createHash('sha256').update(`${kind}:${name}`).digest());

const sourceId = (name: string) => seedId('source', name);
const modeId = (band: string) => seedId('mode', band);
const sessionId = seedId('session', SESSION.code);

function moveDates(nowMs: number): Promise<'moved' | 'kept'> {
  return transact(async (tx) => {
    const [mark] = await tx.select().from(seedMarks).where(eq(seedMarks.name, MARK));
    const [session] = await tx.select().from(sessions).where(eq(sessions.id, sessionId));
    const touched = await tx.$count(journal, eq(journal.sessionId, sessionId));
    if (!mark || !session || touched > 0 || session.startMs !== mark.startMs) return 'kept';
    const startMs = demoStartMs(nowMs);
    const shiftMs = startMs - mark.startMs;
    await tx.update(sessions).set({ startMs }).where(eq(sessions.id, sessionId));
    await tx
      .update(scans)
      .set({ startMs: sql`${scans.startMs} + ${shiftMs}` })
      .where(eq(scans.sessionId, sessionId));
    await tx.update(seedMarks).set({ startMs, seededAtMs: nowMs }).where(eq(seedMarks.name, MARK));
    return 'moved';
  });
}

async function fillCatalogues(tx: Tx): Promise<void> {
  await tx
    .insert(modes)
    .values(MODES.map(({ channels: _, ...mode }) => ({ ...mode, id: modeId(mode.band) })));
  await tx
    .insert(modeChannels)
    .values(
      MODES.flatMap(({ band, channels }) =>
        channels.map((channel, index) => ({ ...channel, modeId: modeId(band), number: index + 1 })),
      ),
    );
  await tx.insert(stations).values([...STATIONS]);
  await tx
    .insert(stationBands)
    .values(
      SEFDS.flatMap(([stationCode, at22, at8]) => [
        { stationCode, band: BAND_22, sefdJy: at22 },
        ...(at8 === null ? [] : [{ stationCode, band: BAND_8, sefdJy: at8 }]),
      ]),
    );
  await tx
    .insert(sources)
    .values(
      SOURCES.map(([name, raDeg, decDeg, role]) => ({ id: sourceId(name), name, raDeg, decDeg, role })),
    );
  await tx.insert(sourceBands).values(
    SOURCES.flatMap(([name, , , , at22, at8]) => [
      { sourceId: sourceId(name), band: BAND_22, fluxJy: at22[0], sizeMas: at22[1] },
      { sourceId: sourceId(name), band: BAND_8, fluxJy: at8[0], sizeMas: at8[1] },
    ]),
  );
}

async function fillSession(tx: Tx, startMs: number): Promise<void> {
  const { code, title, lengthSeconds, minElevationDeg, leastSpareSeconds } = SESSION;
  const { snrDoubtful, snrFair, snrStrong } = SESSION;
  await tx.insert(sessions).values({
    id: sessionId,
    code,
    title,
    state: 'draft',
    startMs,
    lengthSeconds,
    modeId: modeId(BAND_22),
    minElevationDeg,
    leastSpareSeconds,
    snrDoubtful,
    snrFair,
    snrStrong,
  });
  await tx
    .insert(sessionStations)
    .values(STATIONS.map((station) => ({ sessionId, stationCode: station.code })));
  await tx
    .insert(sessionSources)
    .values(
      SOURCES.map(([name, , , , , , wantedScans]) => ({ sessionId, sourceId: sourceId(name), wantedScans })),
    );
  const plan = SCANS.map(([afterMinutes, minutes, source, codes], index) => ({
    id: seedId('scan', `${code} ${index + 1}`),
    sourceId: sourceId(source),
    modeId: modeId(index === 0 ? BAND_8 : BAND_22),
    startMs: startMs + afterMinutes * 60_000,
    lengthSeconds: minutes * 60,
    codes: codes.split(' '),
  }));
  await tx.insert(scans).values(plan.map(({ codes: _, ...scan }) => ({ sessionId, ...scan })));
  await tx
    .insert(scanStations)
    .values(
      plan.flatMap(({ id: scanId, codes }) =>
        codes.map((stationCode) => ({ sessionId, scanId, stationCode, lateSeconds: 0, earlySeconds: 0 })),
      ),
    );
  await tx
    .insert(subjects)
    .values([{ id: 'span' }, ...plan].map(({ id }) => ({ sessionId, id, rev: 0, top: 0 })));
}

type HashedAccount = (typeof ACCOUNTS)[number] & { passwordHash: string };

async function fillAccounts(tx: Tx, accounts: readonly HashedAccount[]): Promise<void> {
  const userId = (email: string) => seedId('user', email);
  await tx.insert(users).values(
    accounts.map(({ email, passwordHash }) => ({
      id: userId(email),
      email,
      passwordHash,
      isDemo: true,
    })),
  );
  await tx.insert(grants).values(
    accounts.map(({ email, role, stationCode, sessionCode }) => ({
      id: seedId('grant', `${email} ${role}`),
      userId: userId(email),
      role,
      stationCode: stationCode ?? null,
      sessionId: sessionCode === undefined ? null : seedId('session', sessionCode),
    })),
  );
}
