import 'server-only';
import { asc, eq, isNull, or, inArray } from 'drizzle-orm';
import { db } from '../../../db/client';
import { modes } from '../../../db/schema/modes';
import { sessionSources } from '../../../db/schema/session-sources';
import { sources } from '../../../db/schema/sources';
import { stations } from '../../../db/schema/stations';
import { can, type Viewer } from '../../access/policy';
import { writeBlock } from '../../exchange/catalogue/block';
import { RULES, WHAT, WHEN, type SessionTyped } from '../../exchange/session-form';
import { nowMs } from '../../env';
import type { SourceRole } from '../../schedule/context';
import { answer, forbiddenFor, type Failure } from '../errors';
import { derivedState, type SessionHead } from './dto';
import { fetchSession, subjectOf, type SessionRow } from './scope';

export type SessionChoices = {
  stations: { code: string; name: string; longitudeDeg: number; isRetired: boolean }[];
  sources: { id: string; name: string; role: SourceRole; isRetired: boolean }[];
  modes: { id: string; name: string; isRetired: boolean }[];
};

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
      const choices = await choicesOf([], [], null);
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
    const choices = await choicesOf(
      session.stations,
      taken.map(({ id }) => id),
      session.modeId,
    );
    const { id, code, title, startMs, lengthSeconds } = session;
    return {
      ok: true,
      form: {
        typed: typedOf(session, taken),
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

/** What may be chosen: all that is not retired, and what the session has already. */
async function choicesOf(
  codes: readonly string[],
  sourceIds: readonly string[],
  modeId: string | null,
): Promise<SessionChoices> {
  const [stationRows, sourceRows, modeRows] = await Promise.all([
    db()
      .select({
        code: stations.code,
        name: stations.name,
        longitudeDeg: stations.longitudeDeg,
        retiredAtMs: stations.retiredAtMs,
      })
      .from(stations)
      .where(or(isNull(stations.retiredAtMs), inArray(stations.code, [...codes])))
      .orderBy(asc(stations.longitudeDeg), asc(stations.code)),
    db()
      .select({ id: sources.id, name: sources.name, role: sources.role, retiredAtMs: sources.retiredAtMs })
      .from(sources)
      .where(or(isNull(sources.retiredAtMs), inArray(sources.id, [...sourceIds])))
      .orderBy(asc(sources.name)),
    db()
      .select({ id: modes.id, name: modes.name, retiredAtMs: modes.retiredAtMs })
      .from(modes)
      .where(or(isNull(modes.retiredAtMs), eq(modes.id, modeId ?? '')))
      .orderBy(asc(modes.name)),
  ]);
  const plain = <T extends { retiredAtMs: number | null }>({ retiredAtMs, ...row }: T) => ({
    ...row,
    isRetired: retiredAtMs !== null,
  });
  return { stations: stationRows.map(plain), sources: sourceRows.map(plain), modes: modeRows.map(plain) };
}
