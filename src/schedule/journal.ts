import { applyCommand, type Command, type Verb } from './commands';
import type { Plan, SubjectId } from './plan';

/** What a client sends: a command with the revisions it stood on (a subject never seen is 0). */
export type Act = { actId: string; command: Command; seen: Readonly<Record<SubjectId, number>> };

/** One line of the journal; rows are never changed and never deleted. */
export type JournalRow = {
  /** one rising number over the whole journal, from 1 */
  seq: number;
  sessionId: string;
  actId: string;
  userId: string;
  role: string;
  atMs: number;
  area: string;
  verb: Verb;
  kind: 'do' | 'undo' | 'redo';
  /** the do-row that an undo or redo is about; null for a do-row */
  of: number | null;
  /** what was applied by this row */
  command: Command;
  /** what takes this row back */
  inverse: Command;
  subjects: readonly SubjectId[];
  /** tops of the subjects just before this row */
  topsBefore: Readonly<Record<SubjectId, number>>;
};

/** rev = last row that touched it; top = its last live do-row; both 0 when none did. */
export type Subject = { sessionId: string; id: SubjectId; rev: number; top: number };

export type Tops = Readonly<Record<SubjectId, number>>;

/** What the decisions read of a journal row. */
export type DecisionRow = Pick<
  JournalRow,
  'seq' | 'kind' | 'of' | 'command' | 'inverse' | 'subjects' | 'topsBefore'
>;

export type Decision =
  | {
      ok: true;
      /** the do-row taken back or brought again */
      of: number;
      /** what to apply now */
      command: Command;
      /** what takes that back */
      inverse: Command;
      subjects: readonly SubjectId[];
      /** top of each subject once the row is written */
      topAfter: Tops;
    }
  | { ok: false; reason: 'nothing' }
  | { ok: false; reason: 'blocked'; of: number; by: readonly SubjectId[] };

/**
 * Subjects that changed since a client last saw them; none means the act may be taken.
 *
 * @param seen      revisions the client stood on; absent = 0
 * @param subjects  every subject of the command as it is now, rev 0 for one never touched
 * @returns ids in the order of subjects
 */
export function changedSince(
  seen: Readonly<Record<SubjectId, number>>,
  subjects: readonly Pick<Subject, 'id' | 'rev'>[],
): SubjectId[] {
  return subjects.filter(({ id, rev }) => (seen[id] ?? 0) !== rev).map(({ id }) => id);
}

/**
 * The do-row that undo would take back: the person's newest that is not undone.
 *
 * @param myRows  the person's rows in this session, in any order
 */
function undoCandidate<Row extends DecisionRow>(myRows: readonly Row[]): Row | null {
  const latest = latestAbout(myRows);
  return newest(myRows.filter((row) => row.kind === 'do' && latest.get(row.seq)?.kind !== 'undo'));
}

/**
 * The do-row that redo would bring again: the person's most recently undone, its undo newer than the
 * person's last do-row.
 *
 * @param myRows  the person's rows in this session, in any order
 */
function redoCandidate<Row extends DecisionRow>(myRows: readonly Row[]): Row | null {
  const latest = latestAbout(myRows);
  const lastDo = newest(myRows.filter((row) => row.kind === 'do'))?.seq ?? 0;
  const undo = newest([...latest.values()].filter((row) => row.kind === 'undo' && row.seq > lastDo));
  return undo ? (myRows.find((row) => row.seq === undo.of) ?? null) : null;
}

/**
 * Undo of one person: takes back the newest live do-row, if it is still the top of all its subjects.
 *
 * @param myRows  the person's rows in this session, in any order
 * @param tops    top of at least the candidate's subjects; absent = 0
 */
export function decideUndo(myRows: readonly DecisionRow[], tops: Tops): Decision {
  const row = undoCandidate(myRows);
  if (!row) return { ok: false, reason: 'nothing' };
  const by = row.subjects.filter((id) => (tops[id] ?? 0) !== row.seq);
  if (by.length > 0) return { ok: false, reason: 'blocked', of: row.seq, by };
  const topAfter = Object.fromEntries(row.subjects.map((id) => [id, row.topsBefore[id] ?? 0]));
  const { inverse: command, command: inverse, subjects } = row;
  return { ok: true, of: row.seq, command, inverse, subjects, topAfter };
}

/**
 * Redo of one person: brings again what was undone last, if all its subjects stand where it found them.
 *
 * @param myRows  the person's rows in this session, in any order
 * @param tops    top of at least the candidate's subjects; absent = 0
 */
export function decideRedo(myRows: readonly DecisionRow[], tops: Tops): Decision {
  const row = redoCandidate(myRows);
  if (!row) return { ok: false, reason: 'nothing' };
  const by = row.subjects.filter((id) => (tops[id] ?? 0) !== (row.topsBefore[id] ?? 0));
  if (by.length > 0) return { ok: false, reason: 'blocked', of: row.seq, by };
  const topAfter = Object.fromEntries(row.subjects.map((id) => [id, row.seq]));
  const { command, inverse, subjects } = row;
  return { ok: true, of: row.seq, command, inverse, subjects, topAfter };
}

/**
 * A plan brought forward by journal rows.
 *
 * @param plan  as it stood before the first of the rows
 * @param rows  in rising seq, none left out
 * @throws CommandRefused if the rows do not belong to the plan
 */
export function replay(plan: Plan, rows: readonly Pick<JournalRow, 'command'>[]): Plan {
  return rows.reduce((current, row) => applyCommand(current, row.command).plan, plan);
}

/** Newest undo or redo row about each do-row, by the do-row's seq. */
function latestAbout<Row extends DecisionRow>(rows: readonly Row[]): Map<number, Row> {
  const latest = new Map<number, Row>();
  for (const row of rows) {
    if (row.of === null) continue;
    const known = latest.get(row.of);
    if (!known || known.seq < row.seq) latest.set(row.of, row);
  }
  return latest;
}

function newest<Row extends DecisionRow>(rows: readonly Row[]): Row | null {
  return rows.reduce<Row | null>((best, row) => (best && best.seq > row.seq ? best : row), null);
}
