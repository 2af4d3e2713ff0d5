import 'server-only';
import { z } from 'zod';
import { db } from '../../../db/client';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { clocksOf } from '../clock/read';
import { answer, forbiddenFor, invalid, type Failure } from '../errors';
import { derivedState } from '../session/dto';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import { answersOf } from '../slot/answers';
import { awayOf } from './away';
import { readModes, readSources, readStations } from './context';
import type { JournalPage, Timeline } from './dto';
import { readEntries, readSteps } from './journal';
import { readPlanRows } from './rows';
import { settingsOf } from './settings';

const PAGE = 500;

/** All that the timeline of a session starts from. */
export const readTimeline = (
  viewer: Viewer,
  key: string,
): Promise<{ ok: true; timeline: Timeline } | Failure> =>
  answer(async () => {
    const session = await fetchReadable(viewer, key);
    const { plan, revs, seq } = await readPlanRows(db(), session);
    const { id, code, title, modeId, stations } = session;
    const { startMs, lengthSeconds } = plan;
    const now = nowMs();
    const answers = await answersOf(db(), [id]);
    const timeline: Timeline = {
      session: {
        id,
        code,
        title,
        state: derivedState(session, now),
        startMs,
        lengthSeconds,
        stations,
        modeId,
      },
      plan,
      stations: await readStations(db(), stations),
      sources: await readSources(db(), id),
      modes: await readModes(db()),
      settings: settingsOf(session),
      away: await awayOf(db(), { ...session, startMs, lengthSeconds }, answers),
      clocks: await clocksOf(db(), stations, now),
      answers: Object.fromEntries(answers.map(({ station, answer: word }) => [station, word])),
      revs,
      seq,
      steps: await readSteps(db(), { sessionId: id, userId: viewer.userId }),
      canEdit: canEdit(viewer, session),
      nowMs: now,
    };
    return { ok: true, timeline };
  });

/** The journal of a session after a row: how a timeline catches up. */
export const readJournal = (viewer: Viewer, key: string, after: unknown): Promise<JournalPage | Failure> =>
  answer(async () => {
    const parsed = z.coerce
      .number()
      .int()
      .min(0)
      .safeParse(after ?? 0);
    if (!parsed.success) {
      const message = `"${String(after).slice(0, 40)}" is no number of a journal row. Give a whole number, 0 or more.`;
      throw invalid(message, { after: [message] });
    }
    const session = await fetchReadable(viewer, key);
    const person = { sessionId: session.id, userId: viewer.userId };
    const found = await readEntries(db(), person, parsed.data, PAGE + 1);
    const entries = found.slice(0, PAGE);
    return {
      ok: true,
      entries,
      seq: entries.at(-1)?.seq ?? parsed.data,
      hasMore: found.length > PAGE,
    };
  });

async function fetchReadable(viewer: Viewer, key: string): Promise<SessionRow> {
  const session = await fetchSession(db(), viewer, key);
  if (!can(viewer, 'plan.read-draft', subjectOf(session))) throw forbiddenFor('plan.read-draft');
  return session;
}

function canEdit(viewer: Viewer, session: SessionRow): boolean {
  const isOpen = session.state !== 'closed' && session.state !== 'cancelled';
  return isOpen && can(viewer, 'plan.edit', subjectOf(session));
}
