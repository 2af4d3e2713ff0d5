import 'server-only';
import { eq, sql } from 'drizzle-orm';
import { saveOffer } from '../src/data/offer/save';
import { stationOnMs } from '../src/schedule/plan';
import { unpackPlan } from '../src/schedule/plan-rows';
import type { StoredSnapshot } from '../src/data/offer/read';
import { hoursWithout, type Hours, type Slot } from '../src/schedule/slots';
import type { Tx } from './client';
import { scanOutcomes } from './schema/scan-outcomes';
import { sessionComments } from './schema/session-comments';
import { sessionStations } from './schema/session-stations';
import { sessions } from './schema/sessions';
import { slotReplies } from './schema/slot-replies';
import { ACCOUNTS } from './seed-data/accounts';
import { COMMENTS, MISHAPS, REPLIES, UNSAID } from './seed-data/answers';
import { SESSIONS } from './seed-data/session';
import { seedId, userId } from './seed-ids';
import { operatorOf, scanId, SCHEDULER, sessionId } from './seed-sessions';

const HOUR_MS = 3_600_000;
const MINUTE_MS = 60_000;

/** Offers, publications, answers and outcomes of the sessions that are no longer drafts. */
export async function fillAnswers(tx: Tx, nowMs: number): Promise<void> {
  for (const { code, state } of SESSIONS) {
    if (state !== 'draft') await fillSession(tx, code, nowMs);
  }
}

async function fillSession(tx: Tx, code: string, nowMs: number): Promise<void> {
  const id = sessionId(code);
  const [row] = await tx.select().from(sessions).where(eq(sessions.id, id));
  if (!row) throw new RangeError(`The demo has no session ${code}.`);
  const taking = await tx.select().from(sessionStations).where(eq(sessionStations.sessionId, id));
  const session = { ...row, stations: taking.map(({ stationCode }) => stationCode).sort() };
  const make = (kind: 'offer' | 'publish', daysBefore: number) =>
    saveOffer(tx, session, {
      id: seedId(kind, code),
      kind,
      madeAtMs: session.startMs - daysBefore * 24 * HOUR_MS,
      madeBy: userId(SCHEDULER),
      answerByMs: session.startMs - 4 * 24 * HOUR_MS,
      note: '',
    });
  const { offer, slots } = await make('offer', 7);
  await fillReplies(tx, code, session.startMs, offer.id, slots);
  await make('publish', 3);
  await fillComments(tx, code, session.startMs, nowMs);
  await fillOutcomes(tx, code, (JSON.parse(offer.snapshot) as StoredSnapshot).plan, nowMs);
}

async function fillComments(tx: Tx, code: string, startMs: number, nowMs: number): Promise<void> {
  const said = COMMENTS.filter(({ session }) => session === code).flatMap(({ account, hours, text }) => {
    const who = ACCOUNTS.find(({ email }) => email === account);
    if (!who) throw new RangeError(`The demo has no account ${account}.`);
    const atMs = startMs + hours * HOUR_MS;
    // what was said later than now was not said yet
    if (atMs > nowMs) return [];
    const { role, stationCode = null } = who;
    return [
      {
        id: seedId('comment', `${code} ${hours}`),
        sessionId: sessionId(code),
        userId: userId(account),
        role,
        stationCode,
        atMs,
        text,
      },
    ];
  });
  if (said.length > 0) await tx.insert(sessionComments).values(said);
}

async function fillReplies(
  tx: Tx,
  code: string,
  startMs: number,
  offerId: string,
  slots: readonly Slot[],
): Promise<void> {
  const replies = REPLIES.filter(({ session }) => session === code);
  for (const [index, { station, reply, without, reason = '', isOnBehalf = false }] of replies.entries()) {
    const slot = slots.find((one) => one.station === station);
    if (!slot) continue;
    const span: Hours = [slot.startMs, slot.endMs];
    const cannot: Hours[] = without
      ? [[startMs + without[0] * MINUTE_MS, startMs + without[1] * MINUTE_MS]]
      : [];
    await tx.insert(slotReplies).values({
      sessionId: sessionId(code),
      stationCode: station,
      offerId,
      reply,
      hours: JSON.stringify(reply === 'declined' ? [] : hoursWithout(span, { hours: cannot })),
      reason,
      userId: isOnBehalf ? userId(SCHEDULER) : operatorOf(station),
      role: isOnBehalf ? 'scheduler' : 'operator',
      isOnBehalf,
      atMs: startMs - (6 * 24 - 2 * index) * HOUR_MS,
      actId: seedId('reply', `${code} ${station}`),
    });
  }
}

async function fillOutcomes(
  tx: Tx,
  code: string,
  rows: StoredSnapshot['plan'],
  nowMs: number,
): Promise<void> {
  const plan = unpackPlan(rows);
  const said = plan.stations.flatMap((station) => {
    const unsaid = UNSAID.find(([session, one]) => session === code && one === station)?.[2] ?? 0;
    const over = plan.scans.flatMap((scan) => {
      const member = scan.stations.find((one) => one.station === station);
      const on = member && stationOnMs(scan, member);
      return on && on.stopMs + 5 * MINUTE_MS <= nowMs ? [{ scan, on }] : [];
    });
    return over.slice(0, over.length - unsaid).map(({ scan, on }) => {
      const mishap = MISHAPS.find(
        (one) => one.session === code && one.station === station && scanId(code, one.scan) === scan.id,
      );
      const lostMs = Math.round(((mishap?.share ?? 0) * (on.stopMs - on.startMs)) / 1000) * 1000;
      return [
        scan.id,
        station,
        mishap?.outcome ?? 'good',
        mishap ? [[on.startMs, on.startMs + lostMs]] : [],
        mishap?.reason ?? null,
        mishap?.text ?? '',
        operatorOf(station),
        on.stopMs + 2 * MINUTE_MS,
        seedId('outcome', `${code} ${scan.id} ${station}`),
      ] as const;
    });
  });
  await tx.run(sql`INSERT INTO ${scanOutcomes} (session_id, scan_id, station_code, outcome, lost, reason, text,
      user_id, role, is_on_behalf, at_ms, act_id)
    SELECT ${sessionId(code)}, value ->> 0, value ->> 1, value ->> 2, value -> 3, value ->> 4, value ->> 5,
      value ->> 6, 'operator', 0, value ->> 7, value ->> 8
    FROM json_each(${JSON.stringify(said)})`);
}
