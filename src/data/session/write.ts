import 'server-only';
import { and, eq, inArray, notInArray, sql } from 'drizzle-orm';
import { z } from 'zod';
import { transact, type Tx } from '../../../db/client';
import { modes } from '../../../db/schema/modes';
import { noddingGroups } from '../../../db/schema/nodding-groups';
import { scanStations } from '../../../db/schema/scan-stations';
import { scans } from '../../../db/schema/scans';
import { sessionSources } from '../../../db/schema/session-sources';
import { sessionStations } from '../../../db/schema/session-stations';
import { sessions } from '../../../db/schema/sessions';
import { sources } from '../../../db/schema/sources';
import { stations } from '../../../db/schema/stations';
import { subjects } from '../../../db/schema/subjects';
import { can, type Viewer } from '../../access/policy';
import { readSession, type SessionTyped, type SessionValues } from '../../exchange/session-form';
import { SPAN_SUBJECT } from '../../schedule/commands';
import { ID_PATTERN } from '../../schedule/plan-ids';
import { answer, forbiddenFor, invalid, Refusal, type Failure } from '../errors';
import { parsed } from '../input';
import { oneOf } from '../plan/rows';
import { takeIn } from '../plan/write';
import { fetchEditable } from './editable';
import { fetchSession, subjectOf, type SessionRow } from './scope';
import { isEnded } from '../../schedule/ended';

const id = z.string().regex(ID_PATTERN, 'The form has no id. Load the page again.');
const block = z.record(z.string().max(40), z.string().max(4000));
const form = {
  code: z.string().max(80),
  what: block,
  when: block,
  rules: block,
  modeId: z.string().max(32),
  stations: z.array(z.string().max(8)).max(64, 'At most 64 stations.'),
  sources: z.array(z.strictObject({ id: z.string().max(32), wanted: z.string().max(20) })).max(2000),
};
const newInput = z.strictObject({ id, typed: z.strictObject(form) });
const editInput = z.strictObject({
  actId: id,
  rev: z.number().int(),
  typed: z.strictObject(form),
});
const stateInput = z.strictObject({ state: z.enum(['closed', 'cancelled', 'open']) });

/** A new session, a draft without scans; the same form sent twice makes one. */
export const makeSession = (viewer: Viewer, body: unknown): Promise<{ ok: true; code: string } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'session.make')) throw forbiddenFor('session.make');
    const given = parsed(newInput, body);
    const value = valuesOf(given.typed);
    return transact(async (tx) => {
      const [known] = await tx.select().from(sessions).where(eq(sessions.id, given.id));
      if (known) return { ok: true, code: known.code };
      await refuseTaken(tx, value.code, given.id);
      await refuseUnknown(tx, value);
      const { startMs, lengthSeconds } = value.when;
      await tx.insert(sessions).values({
        id: given.id,
        code: value.code,
        state: 'draft',
        modeId: value.modeId,
        ...value.what,
        ...value.rules,
        startMs,
        lengthSeconds,
        dut1Seconds: value.when.dut1Seconds,
      });
      await tx
        .insert(sessionStations)
        .values(value.stations.map((stationCode) => ({ sessionId: given.id, stationCode })));
      await saveSources(tx, given.id, value);
      await tx.insert(subjects).values({ sessionId: given.id, id: SPAN_SUBJECT, rev: 0, top: 0 });
      return { ok: true, code: value.code };
    });
  });

/** Changes a session's form; its hours go through the plan's journal, so that they can be undone there. */
export const editSession = (
  viewer: Viewer,
  key: string,
  body: unknown,
): Promise<{ ok: true; code: string } | Failure> =>
  answer(async () => {
    const given = parsed(editInput, body);
    const value = valuesOf(given.typed);
    return transact(async (tx) => {
      const session = await fetchEditable(tx, viewer, key);
      if (session.rev !== given.rev) {
        const message = `${session.code} was changed by someone else meanwhile. Load the page again, look at what stands there, and do yours again.`;
        throw new Refusal({ ok: false, code: 'conflict', message });
      }
      await refuseTaken(tx, value.code, session.id);
      await refuseUnknown(tx, value, session);
      await refuseUsed(tx, session, value);
      const { startMs, lengthSeconds, dut1Seconds } = value.when;
      if (startMs !== session.startMs || lengthSeconds !== session.lengthSeconds) {
        const [span] = await tx
          .select()
          .from(subjects)
          .where(and(eq(subjects.sessionId, session.id), eq(subjects.id, SPAN_SUBJECT)));
        await takeIn(tx, viewer, session.id, {
          kind: 'do',
          actId: given.actId,
          command: {
            verb: 'change-span',
            edits: [{ kind: 'change-span', span: { startMs, lengthSeconds } }],
          },
          seen: { [SPAN_SUBJECT]: span?.rev ?? 0 },
        });
      }
      await tx
        .update(sessions)
        .set({
          code: value.code,
          modeId: value.modeId,
          ...value.what,
          ...value.rules,
          dut1Seconds,
          rev: session.rev + 1,
        })
        .where(eq(sessions.id, session.id));
      await tx
        .delete(sessionStations)
        .where(
          and(
            eq(sessionStations.sessionId, session.id),
            notInArray(sessionStations.stationCode, value.stations),
          ),
        );
      await tx
        .insert(sessionStations)
        .values(value.stations.map((stationCode) => ({ sessionId: session.id, stationCode })))
        .onConflictDoNothing();
      await tx.delete(sessionSources).where(eq(sessionSources.sessionId, session.id));
      await saveSources(tx, session.id, value);
      return { ok: true, code: value.code };
    });
  });

/** Closes or cancels a session, or opens it again: its plan, answers and outcomes stay as they are meanwhile. */
export const setSessionState = (
  viewer: Viewer,
  key: string,
  body: unknown,
): Promise<{ ok: true } | Failure> =>
  answer(async () => {
    const { state } = parsed(stateInput, body);
    return transact(async (tx) => {
      const session = await fetchSession(tx, viewer, key);
      if (!can(viewer, 'session.edit', subjectOf(session))) throw forbiddenFor('session.edit');
      const isOver = isEnded(session.state);
      if (isOver === (state !== 'open')) {
        const message = `${session.code} is ${session.state} already.`;
        throw new Refusal({ ok: false, code: 'conflict', message });
      }
      const next = state === 'open' ? await openState(tx, session.id) : state;
      await tx
        .update(sessions)
        .set({ state: next, rev: session.rev + 1 })
        .where(eq(sessions.id, session.id));
      return { ok: true };
    });
  });

/** What a session was before it was ended: as its newest offer says. */
async function openState(tx: Tx, sessionId: string): Promise<SessionRow['state']> {
  const [row] = await tx.all<{ published: number; offered: number }>(sql`
    SELECT count(CASE WHEN kind = 'publish' THEN 1 END) AS published, count(*) AS offered
    FROM offers WHERE session_id = ${sessionId}`);
  if (!row || row.offered === 0) return 'draft';
  return row.published > 0 ? 'published' : 'offered';
}

function valuesOf(typed: SessionTyped): SessionValues {
  const read = readSession(typed);
  if (read.ok) return read.value;
  const fields: Record<string, string[]> = {};
  for (const { field, message } of read.wrong) (fields[field] ??= []).push(message);
  throw invalid(read.wrong[0]?.message ?? 'Look at the form again.', fields);
}

const refuse = (field: string, message: string) => invalid(message, { [field]: [message] });

async function refuseTaken(tx: Tx, code: string, sessionId: string): Promise<void> {
  const [other] = await tx.select({ id: sessions.id }).from(sessions).where(eq(sessions.code, code));
  if (other && other.id !== sessionId)
    throw refuse('code', `There is a session ${code} already. Give another code.`);
}

/** What is chosen exists, and is not retired unless the session has it already. */
async function refuseUnknown(tx: Tx, value: SessionValues, before?: SessionRow): Promise<void> {
  const found = await tx
    .select({ code: stations.code, retiredAtMs: stations.retiredAtMs })
    .from(stations)
    .where(inArray(stations.code, value.stations));
  for (const code of value.stations) {
    const station = found.find((one) => one.code === code);
    if (!station) throw refuse('stations', `There is no station ${code}.`);
    if (station.retiredAtMs !== null && !before?.stations.includes(code))
      throw refuse('stations', `${code} is retired. Choose another station.`);
  }
  const sourceIds = value.sources.map((source) => source.id);
  const known = await tx.$count(sources, sql`${sources.id} IN ${oneOf(sourceIds)}`);
  if (known !== new Set(sourceIds).size)
    throw refuse('sources', 'One of the sources is not in the catalogue.');
  if ((await tx.$count(modes, eq(modes.id, value.modeId))) === 0)
    throw refuse('modeId', 'That mode is not in the catalogue.');
}

/** A station or a source that scans use stays: the scans are changed first, on the timeline. */
async function refuseUsed(tx: Tx, session: SessionRow, value: SessionValues): Promise<void> {
  const gone = session.stations.filter((code) => !value.stations.includes(code));
  for (const code of gone) {
    const used = await tx.$count(
      scanStations,
      and(eq(scanStations.sessionId, session.id), eq(scanStations.stationCode, code)),
    );
    if (used > 0)
      throw refuse(
        'stations',
        `${code} takes part in ${used} ${used === 1 ? 'scan' : 'scans'}: leave it out of them on the timeline first.`,
      );
  }
  const kept = value.sources.map((source) => source.id);
  const left = await tx
    .select({ name: sources.name, count: sql<number>`count(*)` })
    .from(scans)
    .innerJoin(sources, eq(sources.id, scans.sourceId))
    .where(and(eq(scans.sessionId, session.id), sql`${scans.sourceId} NOT IN ${oneOf(kept)}`))
    .groupBy(sources.name);
  const [first] = left;
  if (first)
    throw refuse(
      'sources',
      `${first.name} has ${first.count} ${first.count === 1 ? 'scan' : 'scans'}: take them off the timeline first.`,
    );
  const grouped = await tx.$count(
    noddingGroups,
    and(
      eq(noddingGroups.sessionId, session.id),
      sql`(${noddingGroups.targetId} NOT IN ${oneOf(kept)} OR ${noddingGroups.calibratorId} NOT IN ${oneOf(kept)})`,
    ),
  );
  if (grouped > 0) throw refuse('sources', 'A nodding group uses a source that was taken out.');
}

async function saveSources(tx: Tx, sessionId: string, value: SessionValues): Promise<void> {
  if (value.sources.length === 0) return;
  await tx
    .insert(sessionSources)
    .values(
      value.sources.map((source) => ({ sessionId, sourceId: source.id, wantedScans: source.wantedScans })),
    );
}
