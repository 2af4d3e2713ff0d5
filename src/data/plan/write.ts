import 'server-only';
import { sql } from 'drizzle-orm';
import { transact, type Tx } from '../../../db/client';
import { journal } from '../../../db/schema/journal';
import { modes } from '../../../db/schema/modes';
import { sessionSources } from '../../../db/schema/session-sources';
import { subjects } from '../../../db/schema/subjects';
import { actingRole, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { applyCommand, CommandRefused, subjectsOf, type Command } from '../../schedule/commands';
import { changedSince } from '../../schedule/journal';
import type { Plan, SubjectId } from '../../schedule/plan';
import { answer, forbiddenFor, invalid, Refusal } from '../errors';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import type { ActFailure, Revs, Taken } from './dto';
import { parseAct, type ActInput } from './input';
import { commandOf, decideStep, findAct, readChanges, readSteps, revsOf, subjectState } from './journal';
import { readSubjects, readTouched } from './rows';
import { saveDifference } from './save';
import { changeSentence, subjectWords } from './sentences';
import { isEnded } from '../../schedule/ended';

type Acting = { tx: Tx; session: SessionRow; viewer: Viewer; role: string };
type Ready = {
  actId: string;
  kind: 'do' | 'undo' | 'redo';
  of: number | null;
  before: Plan;
  command: Command;
  subjects: readonly SubjectId[];
  topsBefore: Revs;
  /** null: the row itself becomes the top */
  topAfter: Revs | null;
};

/** Takes one act of the viewer on a session's plan: all of it and its journal row, or nothing. */
export const takeAct = (viewer: Viewer, key: string, body: unknown): Promise<Taken | ActFailure> =>
  answer(async () => {
    const act = parseAct(body);
    return transact((tx) => takeIn(tx, viewer, key, act));
  });

/** The same inside a transaction that does more. */
export async function takeIn(tx: Tx, viewer: Viewer, key: string, act: ActInput): Promise<Taken> {
  const session = await fetchSession(tx, viewer, key);
  const role = actingRole(viewer, 'plan.edit', subjectOf(session));
  if (role === null) throw forbiddenFor('plan.edit');
  const acting = { tx, session, viewer, role };
  const known = await findAct(tx, session.id, act.actId);
  if (known) return resent(acting, known);
  if (isEnded(session.state)) {
    throw conflict({ reason: 'closed', message: `${session.code} is ${session.state}: its plan stays.` });
  }
  return take(acting, act.kind === 'do' ? await readyDo(acting, act) : await readyStep(acting, act));
}

async function readyDo(
  { tx, session, viewer }: Acting,
  act: Extract<ActInput, { kind: 'do' }>,
): Promise<Ready> {
  const { actId, command } = act;
  const before = await readTouched(tx, session, command);
  const touched = subjectsOf(before, command);
  const { revs, tops } = await subjectState(tx, session.id, touched);
  const changed = changedSince(
    act.seen,
    touched.map((id) => ({ id, rev: revs[id] ?? 0 })),
  );
  if (changed.length > 0) {
    const changes = await readChanges(tx, { sessionId: session.id, userId: viewer.userId }, changed);
    const theirs = await readSubjects(tx, session, touched);
    const [first = 'span'] = changed;
    const what = subjectWords(first, startIn(theirs, first) ?? startIn(command, first));
    const said = changeSentence(
      what,
      changes.find(({ subjectId }) => subjectId === first),
    );
    const message = `${said} Yours was not taken. Look at the plan and do it again if you still want it.`;
    const { span, scans, groups } = theirs;
    throw conflict({ reason: 'changed', message, changes, theirs: { span, scans, groups }, revs });
  }
  await refuseUnknown(tx, session, command);
  return {
    actId,
    kind: 'do',
    of: null,
    before,
    command,
    subjects: touched,
    topsBefore: tops,
    topAfter: null,
  };
}

async function readyStep(
  { tx, session, viewer }: Acting,
  { kind, actId }: Extract<ActInput, { kind: 'undo' | 'redo' }>,
): Promise<Ready> {
  const person = { sessionId: session.id, userId: viewer.userId };
  const { decision, tops } = await decideStep(tx, kind, person);
  if (!decision.ok && decision.reason === 'nothing') {
    throw conflict({ reason: 'nothing', message: `There is nothing of yours to ${kind}.` });
  }
  if (!decision.ok) {
    const changes = await readChanges(tx, person, decision.by);
    const { span, scans, groups } = await readSubjects(tx, session, decision.by);
    const [first = 'span'] = decision.by;
    const said = changeSentence(
      subjectWords(first, startIn({ scans }, first)),
      changes.find(({ subjectId }) => subjectId === first),
    );
    const message = `${said} So ${kind} stops here; nothing was changed.`;
    throw conflict({ reason: 'blocked', message, changes, theirs: { span, scans, groups } });
  }
  const { of, command, subjects: touched, topAfter } = decision;
  const before = await readTouched(tx, session, command);
  return { actId, kind, of, before, command, subjects: touched, topsBefore: tops, topAfter };
}

async function take({ tx, session, viewer, role }: Acting, ready: Ready): Promise<Taken> {
  const { before, command, kind, of, actId } = ready;
  const { plan, inverse } = applied(before, command);
  await saveDifference(tx, before, plan);
  const [row] = await tx
    .insert(journal)
    .values({
      sessionId: session.id,
      actId,
      userId: viewer.userId,
      role,
      atMs: nowMs(),
      area: 'plan',
      verb: command.verb,
      kind,
      ofSeq: of,
      command: JSON.stringify(command),
      inverse: JSON.stringify(inverse),
      subjects: JSON.stringify(ready.subjects),
      topsBefore: JSON.stringify(
        Object.fromEntries(ready.subjects.map((id) => [id, ready.topsBefore[id] ?? 0])),
      ),
    })
    .returning();
  if (!row) throw new Error('The journal gave no row back.');
  const tops = Object.fromEntries(ready.subjects.map((id) => [id, ready.topAfter?.[id] ?? row.seq]));
  await tx.run(sql`
    INSERT INTO ${subjects} (session_id, id, rev, top)
    SELECT ${session.id}, key, ${row.seq}, value FROM json_each(${JSON.stringify(tops)}) WHERE true
    ON CONFLICT (session_id, id) DO UPDATE SET rev = excluded.rev, top = excluded.top`);
  return takenOf({ tx, session, viewer, role }, row);
}

function applied(before: Plan, command: Command): ReturnType<typeof applyCommand> {
  try {
    return applyCommand(before, command);
  } catch (error) {
    if (error instanceof CommandRefused) throw invalid(error.message);
    throw error;
  }
}

async function resent(acting: Acting, row: typeof journal.$inferSelect): Promise<Taken> {
  if (row.userId !== acting.viewer.userId) {
    throw conflict({ reason: 'act-id', message: 'This change carries the id of another one. Do it again.' });
  }
  return takenOf(acting, row);
}

async function takenOf({ tx, session, viewer }: Acting, row: typeof journal.$inferSelect): Promise<Taken> {
  return {
    ok: true,
    seq: row.seq,
    kind: row.kind,
    of: row.ofSeq,
    command: commandOf(row),
    subjects: revsOf(row),
    steps: await readSteps(tx, { sessionId: session.id, userId: viewer.userId }),
  };
}

/** A scan names sources of its session and modes of the catalogue only. */
async function refuseUnknown(tx: Tx, session: SessionRow, command: Command): Promise<void> {
  const scans = command.edits.flatMap((edit) => ('scan' in edit ? [edit.scan] : []));
  const groups = command.edits.flatMap((edit) => ('group' in edit ? [edit.group] : []));
  const sourceIds = [
    ...scans.map((scan) => scan.sourceId),
    ...groups.flatMap((group) => [group.targetId, group.calibratorId]),
  ];
  const modeIds = scans.map((scan) => scan.modeId);
  const [unknown] = await tx.all<{ kind: string }>(sql`
    SELECT 'source' AS kind FROM json_each(${JSON.stringify(sourceIds)}) WHERE value NOT IN
      (SELECT ${sessionSources.sourceId} FROM ${sessionSources} WHERE ${sessionSources.sessionId} = ${session.id})
    UNION ALL
    SELECT 'mode' FROM json_each(${JSON.stringify(modeIds)}) WHERE value NOT IN (SELECT ${modes.id} FROM ${modes})
    LIMIT 1`);
  if (unknown?.kind === 'source') throw invalid(`A scan names a source that ${session.code} does not have.`);
  if (unknown) throw invalid('A scan names a mode that the catalogue does not have.');
  if (groups.some((group) => group.targetId === group.calibratorId)) {
    throw invalid('A nodding group needs two different sources.');
  }
}

function startIn(holder: Command | Pick<Plan, 'scans'>, id: SubjectId): number | undefined {
  const scans =
    'scans' in holder ? holder.scans : holder.edits.flatMap((edit) => ('scan' in edit ? [edit.scan] : []));
  return scans.find((scan) => scan.id === id)?.startMs;
}

const conflict = (detail: Omit<ActFailure, 'ok' | 'code'>) =>
  new Refusal<ActFailure>({ ok: false, code: 'conflict', ...detail });
