import fc from 'fast-check';
import { expect, it } from 'vitest';
import type { Viewer } from '@/src/access/policy';
import { readJournal, readTimeline } from '@/src/data/plan/read';
import { takeAct } from '@/src/data/plan/write';
import type { Command } from '@/src/schedule/commands';
import { replay } from '@/src/schedule/journal';
import { emptyJournal, takeDo, takeRedo, takeUndo, type Journal } from '@/src/schedule/journal-memory';
import type { Plan, Scan } from '@/src/schedule/plan';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { makeScan, makeSession, makeViewer, newId, START_MS, openDatabase } from '@/tests/helpers/database';

openDatabase();

type Move = { who: 0 | 1; what: 'add' | 'move' | 'remove' | 'undo' | 'redo'; scan: number; seconds: number };

const moves = fc.array(
  fc.record<Move>({
    who: fc.constantFrom(0, 1),
    what: fc.constantFrom('add', 'move', 'move', 'remove', 'undo', 'undo', 'redo'),
    scan: fc.integer({ min: 0, max: 2 }),
    seconds: fc.integer({ min: 1, max: 3000 }),
  }),
  { minLength: 5, maxLength: 30 },
);

const read = async (viewer: Viewer, id: string): Promise<Plan> => {
  const answer = await readTimeline(viewer, id);
  if (!answer.ok) throw new Error(answer.message);
  return unpackPlan(answer.timeline.plan);
};

const commandOf = ({ what, seconds }: Move, scan: Scan): Command => {
  if (what === 'remove') return { verb: 'remove-scan', edits: [{ kind: 'remove-scan', scanId: scan.id }] };
  const moved = { ...scan, startMs: START_MS + seconds * 1000 };
  return what === 'add'
    ? { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: moved }] }
    : { verb: 'move-scan', edits: [{ kind: 'change-scan', scan: moved }] };
};

it('random histories of two people end in the database as they do in memory, and replay to the same plan', async () => {
  const people = [await makeViewer('scheduler'), await makeViewer('admin')] as const;
  await fc.assert(
    fc.asyncProperty(moves, async (history) => {
      const session = await makeSession();
      const before = await read(people[0], session.id);
      const scans = [makeScan(), makeScan(), makeScan()];
      let memory: Journal = emptyJournal(before);
      let revs: Record<string, number> = {};
      for (const move of history) {
        const viewer = people[move.who];
        const scan = scans[move.scan] ?? makeScan();
        const actId = newId();
        const actor = { userId: viewer.userId, role: 'any', atMs: 0, area: 'plan' };
        const command = commandOf(move, scan);
        const isStep = move.what === 'undo' || move.what === 'redo';
        const seenHere = { [scan.id]: memory.subjects.get(scan.id)?.rev ?? 0 };
        const inMemory = !isStep
          ? takeDo(memory, { actId, command, seen: seenHere }, actor)
          : (move.what === 'undo' ? takeUndo : takeRedo)(memory, actId, actor);
        const stored = await takeAct(
          viewer,
          session.id,
          isStep ? { kind: move.what, actId } : { kind: 'do', actId, command, seen: revs },
        );
        expect(stored.ok).toBe(inMemory.ok);
        if (!inMemory.ok || !stored.ok) {
          if (!inMemory.ok && inMemory.reason !== 'refused')
            expect(stored).toMatchObject({ reason: inMemory.reason });
          continue;
        }
        expect(stored.command).toEqual(inMemory.row.command);
        memory = inMemory.journal;
        revs = { ...revs, ...stored.subjects };
      }
      const after = await read(people[0], session.id);
      expect(after).toEqual(memory.plan);
      const page = await readJournal(people[0], session.id, 0);
      if (!page.ok) throw new Error(page.message);
      expect(replay(before, page.entries)).toEqual(after);
    }),
    { numRuns: 25 },
  );
});
