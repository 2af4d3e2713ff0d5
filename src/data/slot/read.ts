import 'server-only';
import { desc, eq, max, sql } from 'drizzle-orm';
import { db, type Database } from '../../../db/client';
import { journal } from '../../../db/schema/journal';
import { offers } from '../../../db/schema/offers';
import { scans } from '../../../db/schema/scans';
import { slotReplies } from '../../../db/schema/slot-replies';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { unpackPlan } from '../../schedule/plan-rows';
import type { Hours } from '../../schedule/slots';
import { stationOnMs, type Plan } from '../../schedule/plan';
import { countBlocks } from '../../schedule/blocks';
import { scanNumbers } from '../../schedule/scan-numbers';
import { answer, forbiddenFor, type Failure } from '../errors';
import { unsentOf } from '../mail/outbox';
import { newestSnapshot, type Snapshot } from '../offer/read';
import { derivedState } from '../session/dto';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import { answersOf, type StationAnswer } from './answers';
import type { SlotBoard, SlotDto, SlotWord } from './dto';

/** The slots of a session as they were offered last, with what each station said. */
export const readSlots = (viewer: Viewer, key: string): Promise<{ ok: true; board: SlotBoard } | Failure> =>
  answer(async () => {
    const session = await fetchSession(db(), viewer, key);
    if (!can(viewer, 'slot.read', subjectOf(session))) throw forbiddenFor('slot.read');
    const snapshot = await newestSnapshot(db(), session.id);
    const answers = await answersOf(db(), [session.id]);
    const words = await wordsOf(db(), session.id);
    const now = nowMs();
    const isOpen = session.state !== 'closed' && session.state !== 'cancelled';
    const { id, code, title, startMs, lengthSeconds, stations } = session;
    const plan = snapshot && unpackPlan(snapshot.plan);
    return {
      ok: true,
      board: {
        session: { id, code, title, state: derivedState(session, now), startMs, lengthSeconds, stations },
        offer: snapshot && (await offerOf(db(), session, snapshot)),
        span: { startMs, endMs: startMs + lengthSeconds * 1000 },
        slots:
          snapshot && plan
            ? answers.map((one) => ({
                ...slotOf(viewer, session, snapshot, plan, one, isOpen),
                words: words.get(one.station) ?? [],
              }))
            : [],
        unasked: snapshot
          ? stations.filter((station) => !answers.some((one) => one.station === station))
          : [],
        canOffer: isOpen && can(viewer, 'offer.write', subjectOf(session)),
        unsent: can(viewer, 'offer.write', subjectOf(session))
          ? (await unsentOf(db(), id)).map(({ to, trouble }) => ({ to, trouble }))
          : [],
        draft: can(viewer, 'plan.read-draft', subjectOf(session))
          ? { scans: await countDraft(db(), id) }
          : null,
        nowMs: now,
      },
    };
  });

/** Each word of each station, newest first. */
async function wordsOf(from: Database, sessionId: string): Promise<Map<string, SlotWord[]>> {
  const rows = await from
    .select({
      station: slotReplies.stationCode,
      atMs: slotReplies.atMs,
      number: offers.number,
      kind: offers.kind,
      reply: slotReplies.reply,
      hours: slotReplies.hours,
      reason: slotReplies.reason,
      role: slotReplies.role,
      isOnBehalf: slotReplies.isOnBehalf,
    })
    .from(slotReplies)
    .innerJoin(offers, eq(offers.id, slotReplies.offerId))
    .where(eq(slotReplies.sessionId, sessionId))
    .orderBy(desc(slotReplies.seq));
  const words = new Map<string, SlotWord[]>();
  for (const { station, hours, ...word } of rows)
    words.set(station, [...(words.get(station) ?? []), { ...word, hours: JSON.parse(hours) as Hours[] }]);
  return words;
}

/** A nodding group counts once. */
async function countDraft(from: Database, sessionId: string): Promise<number> {
  const [row] = await from
    .select({
      count: sql<number>`count(CASE WHEN ${scans.groupId} IS NULL THEN 1 END) + count(DISTINCT ${scans.groupId})`,
    })
    .from(scans)
    .where(eq(scans.sessionId, sessionId));
  return row?.count ?? 0;
}

async function offerOf(from: Database, session: SessionRow, snapshot: Snapshot): Promise<SlotBoard['offer']> {
  const { offerId, number, kind, madeAtMs, answerByMs, note, checksum, seq } = snapshot;
  const [newest] = await from
    .select({ seq: max(journal.seq) })
    .from(journal)
    .where(eq(journal.sessionId, session.id));
  const isBehind = (newest?.seq ?? 0) > seq;
  return { id: offerId, number, kind, madeAtMs, answerByMs, note, checksum, isBehind };
}

function slotOf(
  viewer: Viewer,
  session: SessionRow,
  snapshot: Snapshot,
  plan: Plan,
  one: StationAnswer,
  isOpen: boolean,
): Omit<SlotDto, 'words'> {
  const station = snapshot.stations.find(({ code }) => code === one.station);
  const subject = { sessionId: session.id, stationCodes: [one.station] };
  const numbers = scanNumbers(plan);
  return {
    stationCode: one.station,
    stationName: station?.name ?? one.station,
    timeZone: station?.timeZone ?? 'UTC',
    longitudeDeg: station?.site.longitudeDeg ?? 0,
    startMs: one.startMs,
    endMs: one.endMs,
    answer: one.answer,
    hours: one.hours,
    without: one.without,
    reason: one.reason,
    answeredAtMs: one.answeredAtMs,
    role: one.role,
    isOnBehalf: one.isOnBehalf,
    scans: plan.scans.flatMap((scan) => {
      const member = scan.stations.find(({ station: code }) => code === one.station);
      if (!member) return [];
      const source = snapshot.sources.find(({ id }) => id === scan.sourceId)?.name ?? '';
      return [{ ...stationOnMs(scan, member), number: numbers.get(scan.id) ?? '', source }];
    }),
    scanCount: countBlocks(plan, one.station),
    modes: snapshot.modes.filter(({ id }) => one.modeIds.includes(id)).map(({ name }) => name),
    canReply: isOpen && can(viewer, 'slot.reply', subject),
    isOwn: viewer.grants.some(({ role, stationCode }) => role === 'operator' && stationCode === one.station),
  };
}
