import 'server-only';
import { and, asc, desc, eq, gt, isNull, notExists, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';
import type { Database, Tx } from '../../../db/client';
import { journal } from '../../../db/schema/journal';
import { subjects } from '../../../db/schema/subjects';
import type { Command, Verb } from '../../schedule/commands';
import { decideRedo, decideUndo, type Decision, type DecisionRow } from '../../schedule/journal';
import type { SubjectId } from '../../schedule/plan';
import type { Change, JournalEntry, Revs, Step, Steps } from './dto';
import { oneOf } from './rows';

type StoredRow = typeof journal.$inferSelect;
type Person = { sessionId: string; userId: string };

export const commandOf = (row: StoredRow): Command => JSON.parse(row.command) as Command;
export const revsOf = (row: StoredRow): Revs =>
  Object.fromEntries((JSON.parse(row.subjects) as SubjectId[]).map((id) => [id, row.seq]));

export async function findAct(tx: Tx, sessionId: string, actId: string): Promise<StoredRow | undefined> {
  const [row] = await tx
    .select()
    .from(journal)
    .where(and(eq(journal.sessionId, sessionId), eq(journal.actId, actId)));
  return row;
}

export async function decideStep(
  from: Database | Tx,
  kind: 'undo' | 'redo',
  person: Person,
): Promise<{ decision: Decision; tops: Revs }> {
  const rows = (await (kind === 'undo' ? undoRows(from, person) : redoRows(from, person))).map(decisionRow);
  const { tops } = await subjectState(from, person.sessionId, [
    ...new Set(rows.flatMap((row) => row.subjects)),
  ]);
  return { decision: kind === 'undo' ? decideUndo(rows, tops) : decideRedo(rows, tops), tops };
}

export async function readSteps(from: Database | Tx, person: Person): Promise<Steps> {
  const step = async (kind: 'undo' | 'redo'): Promise<Step | null> => {
    const { decision } = await decideStep(from, kind, person);
    if (!decision.ok && decision.reason === 'nothing') return null;
    const [row] = await from.select({ verb: journal.verb }).from(journal).where(eq(journal.seq, decision.of));
    return row ? { of: decision.of, verb: row.verb as Verb, isBlocked: !decision.ok } : null;
  };
  return { undo: await step('undo'), redo: await step('redo') };
}

export async function subjectState(
  from: Database | Tx,
  sessionId: string,
  ids: readonly SubjectId[],
): Promise<{ revs: Revs; tops: Revs }> {
  const rows = await from
    .select({ id: subjects.id, rev: subjects.rev, top: subjects.top })
    .from(subjects)
    .where(and(eq(subjects.sessionId, sessionId), sql`${subjects.id} IN ${oneOf(ids)}`));
  const zeros = ids.map((id): [SubjectId, number] => [id, 0]);
  return {
    revs: Object.fromEntries([...zeros, ...rows.map(({ id, rev }): [SubjectId, number] => [id, rev])]),
    tops: Object.fromEntries([...zeros, ...rows.map(({ id, top }): [SubjectId, number] => [id, top])]),
  };
}

/** The row that touched each of these subjects last; a subject of the seed has none. */
export async function readChanges(
  from: Database | Tx,
  person: Person,
  ids: readonly SubjectId[],
): Promise<Change[]> {
  const rows = await from
    .select({
      subjectId: subjects.id,
      rev: subjects.rev,
      verb: journal.verb,
      kind: journal.kind,
      role: journal.role,
      userId: journal.userId,
      atMs: journal.atMs,
    })
    .from(subjects)
    .innerJoin(journal, eq(journal.seq, subjects.rev))
    .where(and(eq(subjects.sessionId, person.sessionId), sql`${subjects.id} IN ${oneOf(ids)}`))
    .orderBy(subjects.id);
  return rows.map(({ userId, verb, ...row }) => ({
    ...row,
    verb: verb as Verb,
    isMine: userId === person.userId,
  }));
}

export async function readEntries(
  from: Database | Tx,
  person: Person,
  afterSeq: number,
  limit: number,
): Promise<JournalEntry[]> {
  const rows = await from
    .select()
    .from(journal)
    .where(and(eq(journal.sessionId, person.sessionId), gt(journal.seq, afterSeq)))
    .orderBy(asc(journal.seq))
    .limit(limit);
  return rows.map((row) => ({
    seq: row.seq,
    actId: row.actId,
    kind: row.kind,
    of: row.ofSeq,
    verb: row.verb as Verb,
    role: row.role,
    isMine: row.userId === person.userId,
    atMs: row.atMs,
    command: commandOf(row),
    subjects: revsOf(row),
  }));
}

const later = alias(journal, 'later');

/** The person's newest do-row that is not undone: all that a decision on undo needs. */
function undoRows(from: Database | Tx, { sessionId, userId }: Person): Promise<StoredRow[]> {
  return from
    .select()
    .from(journal)
    .where(
      and(
        eq(journal.sessionId, sessionId),
        eq(journal.userId, userId),
        eq(journal.kind, 'do'),
        sql`coalesce((SELECT ${later.kind} FROM ${journal} ${sql.raw('AS later')} WHERE ${later.ofSeq} = ${journal.seq}
          ORDER BY ${later.seq} DESC LIMIT 1), 'redo') <> 'undo'`,
      ),
    )
    .orderBy(desc(journal.seq))
    .limit(1);
}

/** The person's newest undo that no redo followed, newer than their last do-row, and the row it undid. */
async function redoRows(from: Database | Tx, { sessionId, userId }: Person): Promise<StoredRow[]> {
  const mine = and(eq(journal.sessionId, sessionId), eq(journal.userId, userId));
  const [undo] = await from
    .select()
    .from(journal)
    .where(
      and(
        mine,
        eq(journal.kind, 'undo'),
        notExists(
          from
            .select({ seq: later.seq })
            .from(later)
            .where(and(eq(later.ofSeq, journal.ofSeq), gt(later.seq, journal.seq))),
        ),
        notExists(
          from
            .select({ seq: later.seq })
            .from(later)
            .where(
              and(
                eq(later.sessionId, sessionId),
                eq(later.userId, userId),
                isNull(later.ofSeq),
                gt(later.seq, journal.seq),
              ),
            ),
        ),
      ),
    )
    .orderBy(desc(journal.seq))
    .limit(1);
  if (!undo || undo.ofSeq === null) return [];
  const [undone] = await from.select().from(journal).where(eq(journal.seq, undo.ofSeq));
  return undone ? [undone, undo] : [];
}

function decisionRow(row: StoredRow): DecisionRow {
  return {
    seq: row.seq,
    kind: row.kind,
    of: row.ofSeq,
    command: commandOf(row),
    inverse: JSON.parse(row.inverse) as Command,
    subjects: JSON.parse(row.subjects) as SubjectId[],
    topsBefore: JSON.parse(row.topsBefore) as Revs,
  };
}
