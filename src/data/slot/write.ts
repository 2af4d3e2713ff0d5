import 'server-only';
import { and, eq } from 'drizzle-orm';
import { z } from 'zod';
import { transact } from '../../../db/client';
import { slotReplies } from '../../../db/schema/slot-replies';
import { actingRole, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { ID_PATTERN } from '../../schedule/plan-ids';
import type { Hours } from '../../schedule/slots';
import { fullTimeText } from '../../schedule/words';
import { answer, forbiddenFor, invalid, notFound, Refusal, type Failure } from '../errors';
import { parsed } from '../input';
import { fetchSession } from '../session/scope';
import { answersOf, type StationAnswer } from './answers';
import { isEnded } from '../../schedule/ended';

const REASON = 'Say why, so that the scheduler can plan around it.';
const actId = z.string().regex(ID_PATTERN, 'The answer has no id. Load the page again.');
const common = { actId, offerId: z.string().max(32) };
const reason = z
  .string()
  .trim()
  .min(1, REASON)
  .max(500, 'The reason is longer than 500 letters. Shorten it.');

const input = z.discriminatedUnion('reply', [
  z.strictObject({ ...common, reply: z.literal('confirmed') }),
  z.strictObject({ ...common, reply: z.literal('declined'), reason }),
  z.strictObject({
    ...common,
    reply: z.literal('partly'),
    reason,
    /** the hours it cannot */
    without: z.tuple([z.number().int(), z.number().int()]),
  }),
]);

/** A station's word on its slot; the same act stored twice stands once. */
export const replySlot = (
  viewer: Viewer,
  key: string,
  station: string,
  body: unknown,
): Promise<{ ok: true; answer: StationAnswer } | Failure> =>
  answer(async () => {
    const said = parsed(input, body);
    return transact(async (tx) => {
      const session = await fetchSession(tx, viewer, key);
      const find = async () => (await answersOf(tx, [session.id])).find((one) => one.station === station);
      const slot = await find();
      if (!slot) throw notFound(`${station.slice(0, 8)} has no slot in ${session.code}.`);
      const subject = { sessionId: session.id, stationCodes: [station] };
      const role = actingRole(viewer, 'slot.reply', subject);
      if (role === null) throw forbiddenFor('slot.reply');
      const isOwn = viewer.grants.some((held) => held.role === 'operator' && held.stationCode === station);
      const where = and(eq(slotReplies.sessionId, session.id), eq(slotReplies.actId, said.actId));
      if ((await tx.$count(slotReplies, where)) > 0) return { ok: true, answer: slot };
      if (isEnded(session.state)) throw conflict(`${session.code} is ${session.state}: answers are closed.`);
      if (said.offerId !== slot.offerId)
        throw conflict('The plan was offered anew meanwhile. Look at the new slot and answer that.');
      await tx.insert(slotReplies).values({
        sessionId: session.id,
        stationCode: station,
        offerId: slot.offerId,
        reply: said.reply,
        hours: JSON.stringify(hoursOf(said, slot)),
        reason: said.reply === 'confirmed' ? '' : said.reason,
        userId: viewer.userId,
        role: isOwn ? 'operator' : role,
        isOnBehalf: !isOwn,
        atMs: nowMs(),
        actId: said.actId,
      });
      const answered = await find();
      if (!answered) throw new Error('The slot went away while it was answered.');
      return { ok: true, answer: answered };
    });
  });

const conflict = (message: string) => new Refusal({ ok: false, code: 'conflict', message });

function hoursOf(said: z.output<typeof input>, slot: StationAnswer): Hours[] {
  const { startMs, endMs } = slot;
  if (said.reply === 'declined') return [];
  if (said.reply === 'confirmed') return [[startMs, endMs]];
  const [from, until] = said.without;
  const refuse = (message: string) => invalid(message, { without: [message] });
  if (until <= from) throw refuse('The hours you cannot end before they start. Set an end after the start.');
  if (until <= startMs || from >= endMs)
    throw refuse(`These hours lie outside the slot, ${fullTimeText(startMs)} to ${fullTimeText(endMs)}.`);
  const rest = [
    [startMs, from],
    [until, endMs],
  ] as const;
  const hours = rest.filter(([start, end]) => end > start);
  if (hours.length === 0) throw refuse('That is the whole slot. Decline it instead.');
  return [...hours];
}
