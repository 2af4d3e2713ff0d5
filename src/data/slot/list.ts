import 'server-only';
import { and, inArray, sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { offers } from '../../../db/schema/offers';
import { sessions } from '../../../db/schema/sessions';
import { stations } from '../../../db/schema/stations';
import { can, canSome, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { answer, forbiddenFor, type Failure } from '../errors';
import { readableBy } from '../session/scope';
import { answersOf } from './answers';
import type { ListedSlot } from './dto';

/** A slot that is over stays in the list this long. */
const AFTER_MS = 30 * 24 * 3_600_000;

/** The slots that the viewer may answer for, in all sessions, by start. */
export const listSlots = (
  viewer: Viewer,
): Promise<{ ok: true; slots: ListedSlot[]; nowMs: number } | Failure> =>
  answer(async () => {
    if (!canSome(viewer, 'slot.reply')) throw forbiddenFor('slot.reply');
    const now = nowMs();
    const rows = await db()
      .select({
        id: sessions.id,
        code: sessions.code,
        title: sessions.title,
        answerByMs: sql<
          number | null
        >`(SELECT ${offers.answerByMs} FROM ${offers} WHERE ${offers}.session_id = ${sessions}.id ORDER BY ${offers}.number DESC LIMIT 1)`,
      })
      .from(sessions)
      .where(
        and(
          readableBy(viewer),
          sql`${sessions.state} IN ('offered', 'published')`,
          sql`${sessions.startMs} + ${sessions.lengthSeconds} * 1000 >= ${now - AFTER_MS}`,
        ),
      );
    const own = (
      await answersOf(
        db(),
        rows.map(({ id }) => id),
      )
    ).filter(({ sessionId, station }) => can(viewer, 'slot.reply', { sessionId, stationCodes: [station] }));
    const codes = [...new Set(own.map(({ station }) => station))];
    const named = await db()
      .select({ code: stations.code, name: stations.name, timeZone: stations.timeZone })
      .from(stations)
      .where(inArray(stations.code, codes));
    const slots = own.flatMap(
      ({ sessionId, station, startMs, endMs, answer: word, hours, reason, isOnBehalf }) => {
        const session = rows.find(({ id }) => id === sessionId);
        const of = named.find(({ code }) => code === station);
        if (!session || !of) return [];
        return [
          {
            sessionCode: session.code,
            title: session.title,
            answerByMs: session.answerByMs,
            stationCode: station,
            stationName: of.name,
            timeZone: of.timeZone,
            startMs,
            endMs,
            answer: word,
            hours,
            reason,
            isOnBehalf,
          },
        ];
      },
    );
    return {
      ok: true,
      slots: slots.sort((a, b) => a.startMs - b.startMs || (a.stationCode < b.stationCode ? -1 : 1)),
      nowMs: now,
    };
  });
