import 'server-only';
import { and, eq, inArray } from 'drizzle-orm';
import { formatInTimeZone } from 'date-fns-tz';
import { z } from 'zod';
import { db, transact, type Tx } from '../../../db/client';
import { grants } from '../../../db/schema/grants';
import { offers } from '../../../db/schema/offers';
import { sessions } from '../../../db/schema/sessions';
import { users } from '../../../db/schema/users';
import { can, type Viewer } from '../../access/policy';
import { env, nowMs } from '../../env';
import { offerMessage } from '../../mail/offer-message';
import { countBlocks } from '../../schedule/blocks';
import { ID_PATTERN } from '../../schedule/plan-ids';
import { unpackPlan } from '../../schedule/plan-rows';
import type { Slot } from '../../schedule/slots';
import { fullTimeText, listText } from '../../schedule/words';
import { answer, forbiddenFor, invalid, Refusal, type Failure } from '../errors';
import { parsed } from '../input';
import { queueMail, sendQueued, unsentOf, type Queued } from '../mail/outbox';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import type { StoredSnapshot } from './read';
import { saveOffer, type OfferRow } from './save';
import { isEnded } from '../../schedule/ended';

const input = z.strictObject({
  /** made by the client: the same offer is made once */
  id: z.string().regex(ID_PATTERN, 'The offer has no id. Load the page again.'),
  kind: z.enum(['offer', 'publish']),
  note: z.string().trim().max(500, 'The note is longer than 500 letters. Shorten it.').default(''),
  answerByMs: z.number().int().nullable().default(null),
});

export type Offered = {
  ok: true;
  number: number;
  slots: number;
  sent: number;
  failed: { to: string; trouble: string }[];
};

/** Offers or publishes the plan as it stands: snapshot, slots and messages in one step; the messages go out after it. */
export const offerPlan = (viewer: Viewer, key: string, body: unknown): Promise<Offered | Failure> =>
  answer(async () => {
    const made = parsed(input, body);
    const stored = await transact((tx) => store(tx, viewer, key, made));
    const { sent, failed } = await sendQueued(stored.mailIds);
    return { ok: true, number: stored.number, slots: stored.slots, sent, failed };
  });

/** Sends once more what did not go out. */
export const resendMail = (
  viewer: Viewer,
  key: string,
): Promise<{ ok: true; sent: number; failed: { to: string; trouble: string }[] } | Failure> =>
  answer(async () => {
    const session = await fetchSession(db(), viewer, key);
    if (!can(viewer, 'offer.write', subjectOf(session))) throw forbiddenFor('offer.write');
    const unsent = await unsentOf(db(), session.id);
    return { ok: true, ...(await sendQueued(unsent.map(({ id }) => id))) };
  });

async function store(tx: Tx, viewer: Viewer, key: string, made: z.output<typeof input>) {
  const session = await fetchSession(tx, viewer, key);
  if (!can(viewer, 'offer.write', subjectOf(session))) throw forbiddenFor('offer.write');
  const [known] = await tx.select().from(offers).where(eq(offers.id, made.id));
  if (known?.sessionId === session.id) return { number: known.number, slots: 0, mailIds: [] };
  refuseWhere(session, made);
  const now = nowMs();
  const { offer, slots, scanCount } = await saveOffer(tx, session, {
    id: made.id,
    kind: made.kind,
    note: made.note,
    answerByMs: made.answerByMs,
    madeAtMs: now,
    madeBy: viewer.userId,
  });
  if (scanCount === 0) throw invalid(`${session.code} has no scan yet. Lay out the plan first.`);
  await tx
    .update(sessions)
    .set({ state: stateAfter(session.state, made.kind) })
    .where(eq(sessions.id, session.id));
  const messages = await messagesOf(tx, session, offer, slots);
  await queueMail(tx, messages, now);
  return { number: offer.number, slots: slots.length, mailIds: messages.map(({ dedupeKey }) => dedupeKey) };
}

function refuseWhere(session: SessionRow, { answerByMs }: z.output<typeof input>): void {
  if (isEnded(session.state)) {
    const message = `${session.code} is ${session.state}: nothing more is offered.`;
    throw new Refusal({ ok: false, code: 'conflict', message });
  }
  if (answerByMs !== null && answerByMs <= nowMs()) {
    const message = 'The time to answer by has passed. Give one that lies ahead, or leave it empty.';
    throw invalid(message, { answerByMs: [message] });
  }
}

const stateAfter = (state: SessionRow['state'], kind: OfferRow['kind']): SessionRow['state'] =>
  kind === 'publish' || state === 'published' ? 'published' : 'offered';

/** One message for each operator of a station that has a slot. */
async function messagesOf(
  tx: Tx,
  session: SessionRow,
  offer: OfferRow,
  asked: readonly Slot[],
): Promise<Queued[]> {
  const codes = asked.map(({ station }) => station);
  const operators = await tx
    .select({ email: users.email, stationCode: grants.stationCode })
    .from(grants)
    .innerJoin(users, eq(users.id, grants.userId))
    .where(and(eq(grants.role, 'operator'), inArray(grants.stationCode, codes)));
  const { plan: rows, stations, modes } = JSON.parse(offer.snapshot) as StoredSnapshot;
  const plan = unpackPlan(rows);
  const messages: Queued[] = [];
  for (const slot of asked) {
    const station = stations.find(({ code }) => code === slot.station);
    const to = operators.filter(({ stationCode }) => stationCode === slot.station);
    if (!station || to.length === 0) continue;
    const local = (ms: number) =>
      `${formatInTimeZone(ms, station.timeZone, 'yyyy-MM-dd HH:mm')} ${station.timeZone}`;
    const { subject, text, html } = await offerMessage({
      kind: offer.kind,
      sessionCode: session.code,
      title: session.title,
      number: offer.number,
      stationCode: slot.station,
      stationName: station.name,
      from: fullTimeText(slot.startMs),
      until: fullTimeText(slot.endMs),
      localFrom: local(slot.startMs),
      localUntil: local(slot.endMs),
      scans: countBlocks(plan, slot.station),
      mode: listText(modes.filter(({ id }) => slot.modeIds.includes(id)).map(({ name }) => name)),
      answerBy: offer.answerByMs === null ? null : fullTimeText(offer.answerByMs),
      note: offer.note,
      link: `${env().appUrl}/sessions/${encodeURIComponent(session.code)}/slots`,
    });
    for (const { email } of to) {
      const dedupeKey = `${offer.id}:${slot.station}:${email}`;
      messages.push({
        dedupeKey,
        to: email,
        subject,
        text,
        html,
        sessionId: session.id,
        stationCode: slot.station,
      });
    }
  }
  return messages;
}
