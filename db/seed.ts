import 'server-only';
import { eq, gt, inArray, notInArray, or, sql } from 'drizzle-orm';
import { hashPassword } from '../src/viewer/password';
import { db, transact, type Tx } from './client';
import { clockEvents } from './schema/clock-events';
import { clockReadings } from './schema/clock-readings';
import { grants } from './schema/grants';
import { journal } from './schema/journal';
import { modeChannels } from './schema/mode-channels';
import { modes } from './schema/modes';
import { offers } from './schema/offers';
import { scanOutcomes } from './schema/scan-outcomes';
import { scans } from './schema/scans';
import { seedMarks } from './schema/seed-marks';
import { sessionComments } from './schema/session-comments';
import { sessions } from './schema/sessions';
import { slotReplies } from './schema/slot-replies';
import { slots } from './schema/slots';
import { sourceBands } from './schema/source-bands';
import { sources } from './schema/sources';
import { stationBands } from './schema/station-bands';
import { stations } from './schema/stations';
import { users } from './schema/users';
import { ACCOUNTS, DEMO_PASSWORD } from './seed-data/accounts';
import { BAND_22, BAND_8, MODES } from './seed-data/modes';
import { SESSIONS } from './seed-data/session';
import { OTHER_SOURCES, SOURCES } from './seed-data/sources';
import { SEFDS, STATIONS } from './seed-data/stations';
import { fillAnswers } from './seed-answers';
import { fillClocks, fillCounters, fillEquipment } from './seed-clocks';
import { seedId, userId } from './seed-ids';
import { demoStartMs, fillSessions, modeId, sessionId, sessionStartMs, sourceId } from './seed-sessions';

const MARK = 'demo';
const STALE_MS = 24 * 3_600_000;
const SESSION_IDS = SESSIONS.map(({ code }) => sessionId(code));
const USER_IDS = ACCOUNTS.map(({ email }) => userId(email));

/** Fills the demo once; later moves its dates on, as long as no one has changed or added anything. */
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
    await fillEquipment(tx, nowMs);
    await fillCounters(tx, nowMs);
    await fillSessions(tx, startMs);
    await fillAccounts(tx, accounts);
    await fillDated(tx, nowMs);
    return 'filled';
  });
}

/** All that happened: what the clocks showed, what the stations said. */
async function fillDated(tx: Tx, nowMs: number): Promise<void> {
  await fillClocks(tx, nowMs);
  await fillAnswers(tx, nowMs);
}

function moveDates(nowMs: number): Promise<'moved' | 'kept'> {
  return transact(async (tx) => {
    const [mark] = await tx.select().from(seedMarks).where(eq(seedMarks.name, MARK));
    if (!mark || (await isTouched(tx, mark))) return 'kept';
    const startMs = demoStartMs(nowMs);
    for (const session of SESSIONS) {
      const id = sessionId(session.code);
      const shiftMs = sessionStartMs(session, startMs) - sessionStartMs(session, mark.startMs);
      await tx
        .update(sessions)
        .set({ startMs: sessionStartMs(session, startMs) })
        .where(eq(sessions.id, id));
      await tx
        .update(scans)
        .set({ startMs: sql`${scans.startMs} + ${shiftMs}` })
        .where(eq(scans.sessionId, id));
    }
    await emptyDated(tx);
    await fillDated(tx, nowMs);
    await tx.update(seedMarks).set({ startMs, seededAtMs: nowMs }).where(eq(seedMarks.name, MARK));
    return 'moved';
  });
}

/** Whether people have worked on it: then its dates are theirs. */
async function isTouched(tx: Tx, mark: typeof seedMarks.$inferSelect): Promise<boolean> {
  const since = mark.seededAtMs;
  const counts = await Promise.all([
    tx.$count(journal, inArray(journal.sessionId, SESSION_IDS)),
    tx.$count(sessions, or(gt(sessions.rev, 0), notInArray(sessions.id, SESSION_IDS))),
    tx.$count(sessionComments, gt(sessionComments.atMs, since)),
    tx.$count(clockReadings, or(gt(clockReadings.enteredAtMs, since), gt(clockReadings.setAsideAtMs, since))),
    tx.$count(clockEvents, gt(clockEvents.enteredAtMs, since)),
    tx.$count(offers, gt(offers.madeAtMs, since)),
    tx.$count(slotReplies, gt(slotReplies.atMs, since)),
    tx.$count(scanOutcomes, gt(scanOutcomes.atMs, since)),
  ]);
  return counts.some((count) => count > 0);
}

async function emptyDated(tx: Tx): Promise<void> {
  const ours = await tx.select({ id: offers.id }).from(offers).where(inArray(offers.sessionId, SESSION_IDS));
  const offerIds = ours.map(({ id }) => id);
  await tx.delete(sessionComments).where(inArray(sessionComments.sessionId, SESSION_IDS));
  await tx.delete(scanOutcomes).where(inArray(scanOutcomes.sessionId, SESSION_IDS));
  await tx.delete(slotReplies).where(inArray(slotReplies.sessionId, SESSION_IDS));
  await tx.delete(slots).where(inArray(slots.offerId, offerIds));
  await tx.delete(offers).where(inArray(offers.id, offerIds));
  await tx.delete(clockReadings).where(inArray(clockReadings.enteredBy, USER_IDS));
  await tx.delete(clockEvents).where(inArray(clockEvents.userId, USER_IDS));
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
  const all = [...SOURCES, ...OTHER_SOURCES];
  await tx
    .insert(sources)
    .values(all.map(([name, raDeg, decDeg, role]) => ({ id: sourceId(name), name, raDeg, decDeg, role })));
  await tx.insert(sourceBands).values(
    all.flatMap(([name, , , , at22, at8]) => [
      { sourceId: sourceId(name), band: BAND_22, fluxJy: at22[0], sizeMas: at22[1] },
      { sourceId: sourceId(name), band: BAND_8, fluxJy: at8[0], sizeMas: at8[1] },
    ]),
  );
}

type HashedAccount = (typeof ACCOUNTS)[number] & { passwordHash: string };

async function fillAccounts(tx: Tx, accounts: readonly HashedAccount[]): Promise<void> {
  await tx.insert(users).values(
    accounts.map(({ email, passwordHash }) => ({
      id: userId(email),
      email,
      passwordHash,
      isDemo: true,
    })),
  );
  await tx.insert(grants).values(
    accounts.flatMap(({ email, role, stationCode, sessionCodes = [null] }) =>
      sessionCodes.map((code) => ({
        id: seedId('grant', `${email} ${role} ${code ?? ''}`),
        userId: userId(email),
        role,
        stationCode: stationCode ?? null,
        sessionId: code === null ? null : sessionId(code),
      })),
    ),
  );
}
