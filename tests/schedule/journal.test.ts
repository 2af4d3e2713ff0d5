import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Command } from '@/src/schedule/commands';
import { subjectsOf } from '@/src/schedule/commands';
import { changedSince, decideRedo, decideUndo, replay } from '@/src/schedule/journal';
import {
  emptyJournal,
  takeDo,
  takeRedo,
  takeUndo,
  type Actor,
  type Journal,
  type Taken,
} from '@/src/schedule/journal-memory';
import { commandArb, makePlan, makeScan, planArb, T0 } from './plan-maker';

const ann: Actor = { userId: 'u1', role: 'scheduler', atMs: T0, area: 'plan' };
const ben: Actor = { userId: 'u2', role: 'scheduler', atMs: T0, area: 'plan' };

function seenNow(journal: Journal, command: Command): Record<string, number> {
  const ids = subjectsOf(journal.plan, command);
  return Object.fromEntries(ids.map((id) => [id, journal.subjects.get(id)?.rev ?? 0]));
}

let nextAct = 0;
function actId(): string {
  nextAct += 1;
  return `act-${nextAct}`;
}

function doIt(journal: Journal, command: Command, actor: Actor): Taken {
  return takeDo(journal, { actId: actId(), command, seen: seenNow(journal, command) }, actor);
}

function must(taken: Taken): Journal {
  if (!taken.ok) throw new Error(`not taken: ${taken.reason}`);
  return taken.journal;
}

function move(id: string, minutes: number): Command {
  const scan = makeScan(id, { startMs: T0 + minutes * 60_000 });
  return { verb: 'move-scan', edits: [{ kind: 'change-scan', scan }] };
}

const start = makePlan([makeScan('a'), makeScan('b')]);
const startOf = (journal: Journal, id: string) => journal.plan.scans.find((scan) => scan.id === id)?.startMs;

describe('random histories of two people', () => {
  const stepArb = fc.record({
    who: fc.constantFrom(ann, ben),
    what: fc.oneof(
      { weight: 3, arbitrary: commandArb.map((command) => ({ kind: 'do' as const, command })) },
      { weight: 2, arbitrary: fc.constant({ kind: 'undo' as const }) },
      { weight: 2, arbitrary: fc.constant({ kind: 'redo' as const }) },
    ),
    stale: fc.boolean(),
  });

  it('replay from the journal to the same plan, and undo and redo never throw', () => {
    const counts = { done: 0, undone: 0, redone: 0, blocked: 0, conflicts: 0 };
    fc.assert(
      fc.property(planArb, fc.array(stepArb, { maxLength: 40, size: 'max' }), (plan, steps) => {
        let journal = emptyJournal(plan);
        for (const { who, what, stale } of steps) {
          const before = journal;
          if (what.kind === 'do') {
            const seen = stale ? {} : seenNow(journal, what.command);
            const taken = takeDo(journal, { actId: actId(), command: what.command, seen }, who);
            if (taken.ok) journal = taken.journal;
            else if (taken.reason === 'conflict') counts.conflicts += 1;
            counts.done += taken.ok ? 1 : 0;
          } else {
            const taken = (what.kind === 'undo' ? takeUndo : takeRedo)(journal, actId(), who);
            if (taken.ok) journal = taken.journal;
            else if (taken.reason === 'blocked') counts.blocked += 1;
            if (taken.ok) counts[what.kind === 'undo' ? 'undone' : 'redone'] += 1;
          }
          expect(journal.rows.length - before.rows.length).toBeLessThanOrEqual(1);
        }
        expect(replay(plan, journal.rows)).toEqual(journal.plan);
        const backwards = [...journal.rows].reverse().map((row) => ({ command: row.inverse }));
        expect(replay(journal.plan, backwards)).toEqual(plan);
      }),
      { numRuns: 600 },
    );
    for (const count of Object.values(counts)) expect(count).toBeGreaterThan(20);
  });

  it('a person alone can undo everything and then redo everything', () => {
    fc.assert(
      fc.property(planArb, fc.array(commandArb, { maxLength: 15, size: 'max' }), (plan, commands) => {
        let journal = emptyJournal(plan);
        let done = 0;
        for (const command of commands) {
          const taken = doIt(journal, command, ann);
          if (!taken.ok) continue;
          journal = taken.journal;
          done += 1;
        }
        const after = journal.plan;
        for (let i = 0; i < done; i += 1) journal = must(takeUndo(journal, actId(), ann));
        expect(journal.plan).toEqual(plan);
        expect(takeUndo(journal, actId(), ann)).toEqual({ ok: false, reason: 'nothing' });
        for (let i = 0; i < done; i += 1) journal = must(takeRedo(journal, actId(), ann));
        expect(journal.plan).toEqual(after);
        expect(takeRedo(journal, actId(), ann)).toEqual({ ok: false, reason: 'nothing' });
      }),
      { numRuns: 300 },
    );
  });
});

describe('undo is each person’s own', () => {
  it('takes back my last act and leaves the other’s alone', () => {
    let journal = must(doIt(emptyJournal(start), move('a', 5), ann));
    journal = must(doIt(journal, move('b', 7), ben));
    journal = must(takeUndo(journal, actId(), ann));
    expect(startOf(journal, 'a')).toBe(T0);
    expect(startOf(journal, 'b')).toBe(T0 + 7 * 60_000);
  });

  it('is blocked, and says by what and whose, when the other changed the same scan since', () => {
    let journal = must(doIt(emptyJournal(start), move('a', 5), ann));
    journal = must(doIt(journal, move('a', 9), ben));
    const taken = takeUndo(journal, actId(), ann);
    expect(taken).toMatchObject({ ok: false, reason: 'blocked', of: 1, by: ['a'] });
    expect(!taken.ok && taken.reason === 'blocked' && taken.theirs.map((row) => row.userId)).toEqual(['u2']);
  });

  it('is free again once the other has undone', () => {
    let journal = must(doIt(emptyJournal(start), move('a', 5), ann));
    journal = must(doIt(journal, move('a', 9), ben));
    journal = must(takeUndo(journal, actId(), ben));
    journal = must(takeUndo(journal, actId(), ann));
    expect(journal.plan).toEqual(start);
    expect(takeRedo(journal, actId(), ben)).toMatchObject({ ok: false, reason: 'blocked', by: ['a'] });
  });

  it('a new act of mine ends what I could redo, an act of the other elsewhere does not', () => {
    let journal = must(doIt(emptyJournal(start), move('a', 5), ann));
    journal = must(takeUndo(journal, actId(), ann));
    journal = must(doIt(journal, move('b', 3), ben));
    expect(takeRedo(journal, actId(), ann).ok).toBe(true);
    journal = must(doIt(journal, move('a', 2), ann));
    expect(takeRedo(journal, actId(), ann)).toEqual({ ok: false, reason: 'nothing' });
  });

  it('brings acts back in the reverse of the order they were undone', () => {
    let journal = must(doIt(emptyJournal(start), move('a', 5), ann));
    journal = must(doIt(journal, move('b', 6), ann));
    journal = must(takeUndo(journal, actId(), ann));
    journal = must(takeUndo(journal, actId(), ann));
    journal = must(takeRedo(journal, actId(), ann));
    expect([startOf(journal, 'a'), startOf(journal, 'b')]).toEqual([T0 + 5 * 60_000, T0]);
    journal = must(takeRedo(journal, actId(), ann));
    expect(startOf(journal, 'b')).toBe(T0 + 6 * 60_000);
  });

  it('is decided from my own rows and the tops of the subjects alone', () => {
    const journal = must(doIt(emptyJournal(start), move('a', 5), ann));
    const undo = decideUndo(journal.rows, { a: 1 });
    expect(undo).toMatchObject({ ok: true, of: 1, subjects: ['a'], topAfter: { a: 0 } });
    expect(undo.ok && undo.command).toEqual(journal.rows[0]?.inverse);
    expect(decideUndo(journal.rows, { a: 7 })).toEqual({ ok: false, reason: 'blocked', of: 1, by: ['a'] });
    expect(decideUndo([], {})).toEqual({ ok: false, reason: 'nothing' });
    const undone = must(takeUndo(journal, actId(), ann));
    expect(decideRedo(undone.rows, {})).toMatchObject({ ok: true, of: 1, topAfter: { a: 1 } });
    expect(decideRedo(undone.rows, { a: 4 })).toEqual({ ok: false, reason: 'blocked', of: 1, by: ['a'] });
  });
});

describe('a conflict', () => {
  it('is every subject whose revision is not the one seen', () => {
    const subjects = [
      { id: 'a', rev: 3 },
      { id: 'b', rev: 0 },
      { id: 'c', rev: 5 },
    ];
    expect(changedSince({ a: 3 }, subjects)).toEqual(['c']);
    expect(changedSince({ a: 2, b: 1, c: 5 }, subjects)).toEqual(['a', 'b']);
  });

  it('changes nothing and shows their row', () => {
    const journal = must(doIt(emptyJournal(start), move('a', 5), ben));
    const taken = takeDo(journal, { actId: actId(), command: move('a', 4), seen: {} }, ann);
    expect(taken).toMatchObject({ ok: false, reason: 'conflict', changed: ['a'] });
    expect(!taken.ok && taken.reason === 'conflict' && taken.theirs.map((row) => row.seq)).toEqual([1]);
  });

  it('an act on a scan that the other removed comes back as a conflict, and as gone when seen', () => {
    const remove: Command = { verb: 'remove-scan', edits: [{ kind: 'remove-scan', scanId: 'a' }] };
    const journal = must(doIt(emptyJournal(start), remove, ben));
    const stale = takeDo(journal, { actId: actId(), command: move('a', 4), seen: {} }, ann);
    expect(stale).toMatchObject({ ok: false, reason: 'conflict' });
    const informed = takeDo(journal, { actId: actId(), command: move('a', 4), seen: { a: 1 } }, ann);
    expect(informed).toMatchObject({ ok: false, reason: 'refused', refusal: { code: 'gone' } });
  });

  it('an act sent twice is taken once', () => {
    const act = { actId: 'act-twice', command: move('a', 5), seen: {} };
    const journal = must(takeDo(emptyJournal(start), act, ann));
    const again = takeDo(journal, act, ann);
    expect(again).toMatchObject({ ok: true, isResend: true, row: { seq: 1 } });
    expect(must(again).rows).toHaveLength(1);
  });
});
