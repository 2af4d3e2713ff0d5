import 'server-only';
import { eq } from 'drizzle-orm';
import { db } from '../../../db/client';
import { sessionSources } from '../../../db/schema/session-sources';
import { can, type Viewer } from '../../access/policy';
import { writeBlock } from '../../exchange/catalogue/block';
import { RULES, WHAT, WHEN, type SessionTyped } from '../../exchange/session-form';
import { nowMs } from '../../env';
import { answer, forbiddenFor, type Failure } from '../errors';
import { choicesOf, type SessionChoices } from './choices';
import { derivedState, type SessionHead } from './dto';
import { fetchSession, subjectOf, type SessionRow } from './scope';

export type SessionForm = {
  typed: SessionTyped;
  choices: SessionChoices;
  /** of the session as it was read; null for a new one */
  rev: number | null;
  session: SessionHead | null;
  nowMs: number;
};

const DAY_MS = 86_400_000;

const START = {
  minElevationDeg: 5,
  leastSpareSeconds: 10,
  pauseMinutes: null,
  pauseEveryMinutes: null,
  finderEveryMinutes: null,
  snrDoubtful: 7,
  snrFair: 10,
  snrStrong: 20,
  clockNoteHours: 24,
  clockUnknownDays: 7,
  instrumentSigmaSeconds: 5e-7,
  pairLimitDeg: 3,
};

/** The form of a new session, or of one that a scheduler may change. */
export const readSessionForm = (
  viewer: Viewer,
  key: string | null,
): Promise<{ ok: true; form: SessionForm } | Failure> =>
  answer(async () => {
    const now = nowMs();
    if (key === null) {
      if (!can(viewer, 'session.make')) throw forbiddenFor('session.make');
      const startMs = Math.ceil((now + 7 * DAY_MS) / DAY_MS) * DAY_MS;
      const choices = await choicesOf(
        viewer,
        { sessionId: null, codes: [], sourceIds: [], modeId: null },
        now,
      );
      const typed: SessionTyped = {
        code: '',
        what: writeBlock(WHAT, { title: '', purpose: '' }),
        when: writeBlock(WHEN, { startMs, lengthSeconds: 86_400, dut1Seconds: 0 }),
        rules: writeBlock(RULES, START),
        modeId: choices.modes.length === 1 ? (choices.modes[0]?.id ?? '') : '',
        stations: [],
        sources: [],
      };
      return { ok: true, form: { typed, choices, rev: null, session: null, nowMs: now } };
    }
    const session = await fetchSession(db(), viewer, key);
    if (!can(viewer, 'session.edit', subjectOf(session))) throw forbiddenFor('session.edit');
    const taken = await db()
      .select({ id: sessionSources.sourceId, wantedScans: sessionSources.wantedScans })
      .from(sessionSources)
      .where(eq(sessionSources.sessionId, session.id));
    const kept = {
      sessionId: session.id,
      codes: session.stations,
      sourceIds: taken.map(({ id: sourceId }) => sourceId),
      modeId: session.modeId,
    };
    const choices = await choicesOf(viewer, kept, now);
    const { id, code, title, startMs, lengthSeconds } = session;
    return {
      ok: true,
      form: {
        typed: typedOf(session, inOrderOf(choices.sources, taken)),
        choices,
        rev: session.rev,
        session: {
          id,
          code,
          title,
          state: derivedState(session, now),
          startMs,
          lengthSeconds,
          stations: session.stations,
        },
        nowMs: now,
      },
    };
  });

/** By name, as they are listed to choose from. */
const inOrderOf = <T extends { id: string }>(listed: readonly { id: string }[], taken: readonly T[]): T[] =>
  listed.flatMap(({ id }) => taken.filter((one) => one.id === id));

const typedOf = (
  session: SessionRow,
  taken: readonly { id: string; wantedScans: number }[],
): SessionTyped => ({
  code: session.code,
  what: writeBlock(WHAT, session),
  when: writeBlock(WHEN, session),
  rules: writeBlock(RULES, session),
  modeId: session.modeId,
  stations: session.stations,
  sources: taken.map(({ id, wantedScans }) => ({ id, wanted: String(wantedScans) })),
});
