import { applyCommand, CommandRefused, subjectsOf } from './commands';
import {
  changedSince,
  decideRedo,
  decideUndo,
  type Act,
  type Decision,
  type JournalRow,
  type Tops,
} from './journal';
import type { Plan, SubjectId } from './plan';

/** A whole journal in memory: what the stored one must do, in its shortest form. */
export type Journal = {
  plan: Plan;
  rows: readonly JournalRow[];
  subjects: ReadonlyMap<SubjectId, { rev: number; top: number }>;
};

/** Who acts, in which role, when and in which area. */
export type Actor = Pick<JournalRow, 'userId' | 'role' | 'atMs' | 'area'>;

export type Taken =
  | { ok: true; journal: Journal; row: JournalRow; isResend: boolean }
  | { ok: false; reason: 'conflict'; changed: readonly SubjectId[]; theirs: readonly JournalRow[] }
  | { ok: false; reason: 'refused'; refusal: CommandRefused }
  | { ok: false; reason: 'nothing' }
  | { ok: false; reason: 'blocked'; of: number; by: readonly SubjectId[]; theirs: readonly JournalRow[] };

/**
 * A journal without rows.
 *
 * @param plan  what its first row will stand on
 */
export function emptyJournal(plan: Plan): Journal {
  return { plan, rows: [], subjects: new Map() };
}

/**
 * Takes an act if nothing it touches changed since it was seen; an act id known already gets its row again.
 *
 * @returns the journal with the new row; or what changed and the rows that did it; or why it is refused
 */
export function takeDo(journal: Journal, act: Act, actor: Actor): Taken {
  const known = resent(journal, act.actId);
  if (known) return known;
  const subjects = subjectsOf(journal.plan, act.command);
  const changed = changedSince(
    act.seen,
    subjects.map((id) => ({ id, rev: revOf(journal, id) })),
  );
  if (changed.length > 0) return { ok: false, reason: 'conflict', changed, theirs: rowsAt(journal, changed) };
  const applied = attempt(journal.plan, act);
  if (applied instanceof CommandRefused) return { ok: false, reason: 'refused', refusal: applied };
  const seq = journal.rows.length + 1;
  const row: JournalRow = {
    ...rowBase(journal, act.actId, actor, subjects),
    verb: act.command.verb,
    kind: 'do',
    of: null,
    command: act.command,
    inverse: applied.inverse,
  };
  const topAfter = Object.fromEntries(subjects.map((id) => [id, seq]));
  return { ok: true, journal: withRow(journal, row, applied.plan, topAfter), row, isResend: false };
}

/**
 * Takes back the actor's own newest live act.
 *
 * @returns the journal with an undo row; or 'nothing'; or who stands in the way. It never throws a refusal.
 */
export function takeUndo(journal: Journal, actId: string, actor: Actor): Taken {
  return resent(journal, actId) ?? takeDecision(journal, actId, actor, 'undo', decideUndo);
}

/**
 * Brings again what the actor undid last.
 *
 * @returns the journal with a redo row; or 'nothing'; or who stands in the way. It never throws a refusal.
 */
export function takeRedo(journal: Journal, actId: string, actor: Actor): Taken {
  return resent(journal, actId) ?? takeDecision(journal, actId, actor, 'redo', decideRedo);
}

function takeDecision(
  journal: Journal,
  actId: string,
  actor: Actor,
  kind: 'undo' | 'redo',
  decide: (myRows: readonly JournalRow[], tops: Tops) => Decision,
): Taken {
  const mine = journal.rows.filter((row) => row.userId === actor.userId);
  const tops = Object.fromEntries([...journal.subjects].map(([id, subject]) => [id, subject.top]));
  const decision = decide(mine, tops);
  if (!decision.ok) {
    return decision.reason === 'nothing' ? decision : { ...decision, theirs: rowsAt(journal, decision.by) };
  }
  const row: JournalRow = {
    ...rowBase(journal, actId, actor, decision.subjects),
    verb: decision.command.verb,
    kind,
    of: decision.of,
    command: decision.command,
    inverse: decision.inverse,
  };
  const plan = applyCommand(journal.plan, decision.command).plan;
  return { ok: true, journal: withRow(journal, row, plan, decision.topAfter), row, isResend: false };
}

function resent(journal: Journal, actId: string): Taken | null {
  const row = journal.rows.find((known) => known.actId === actId);
  return row ? { ok: true, journal, row, isResend: true } : null;
}

function attempt(plan: Plan, act: Act): ReturnType<typeof applyCommand> | CommandRefused {
  try {
    return applyCommand(plan, act.command);
  } catch (error) {
    if (error instanceof CommandRefused) return error;
    throw error;
  }
}

function rowBase(journal: Journal, actId: string, actor: Actor, subjects: readonly SubjectId[]) {
  return {
    seq: journal.rows.length + 1,
    sessionId: journal.plan.sessionId,
    actId,
    ...actor,
    subjects,
    topsBefore: Object.fromEntries(subjects.map((id) => [id, journal.subjects.get(id)?.top ?? 0])),
  };
}

function withRow(journal: Journal, row: JournalRow, plan: Plan, topAfter: Tops): Journal {
  const subjects = new Map(journal.subjects);
  for (const id of row.subjects) subjects.set(id, { rev: row.seq, top: topAfter[id] ?? 0 });
  return { plan, rows: [...journal.rows, row], subjects };
}

function revOf(journal: Journal, id: SubjectId): number {
  return journal.subjects.get(id)?.rev ?? 0;
}

/** The rows that touched these subjects last. */
function rowsAt(journal: Journal, ids: readonly SubjectId[]): JournalRow[] {
  const seqs = new Set(ids.map((id) => revOf(journal, id)));
  return journal.rows.filter((row) => seqs.has(row.seq));
}
