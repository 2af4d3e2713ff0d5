import { beforeEach, describe, expect, it } from 'vitest';
import type { Viewer } from '@/src/access/policy';
import type { ActFailure, Taken } from '@/src/data/plan/dto';
import { readJournal, readTimeline } from '@/src/data/plan/read';
import { takeAct } from '@/src/data/plan/write';
import type { Edit, Verb } from '@/src/schedule/commands';
import type { NoddingGroup, Plan, Scan } from '@/src/schedule/plan';
import { unpackPlan } from '@/src/schedule/plan-rows';
import {
  makeScan,
  makeSession,
  makeViewer,
  newId,
  sourceId,
  START_MS,
  openDatabase,
} from '@/tests/helpers/database';

openDatabase();

let session: { id: string; code: string };
let anna: Viewer;
let ben: Viewer;

beforeEach(async () => {
  session = await makeSession();
  anna = await makeViewer('scheduler');
  ben = await makeViewer('admin');
});

const act = (who: Viewer, verb: Verb, edits: Edit[], seen: Record<string, number> = {}) =>
  takeAct(who, session.id, { kind: 'do', actId: newId(), command: { verb, edits }, seen });
const step = (who: Viewer, kind: 'undo' | 'redo') => takeAct(who, session.id, { kind, actId: newId() });
const add = (who: Viewer, scan: Scan, seen = {}) =>
  act(who, 'add-scan', [{ kind: 'add-scan', scan }], seen).then(taken);
const move = (who: Viewer, scan: Scan, seconds: number, rev: number) =>
  act(
    who,
    'move-scan',
    [{ kind: 'change-scan', scan: { ...scan, startMs: scan.startMs + seconds * 1000 } }],
    { [scan.id]: rev },
  );

const taken = (answer: Taken | ActFailure): Taken => {
  if (!answer.ok) throw new Error(answer.message);
  return answer;
};
const refused = (answer: Taken | ActFailure): ActFailure => {
  if (answer.ok) throw new Error('It was taken.');
  return answer;
};
const plan = async (): Promise<Plan> => {
  const answer = await readTimeline(ben, session.id);
  if (!answer.ok) throw new Error(answer.message);
  return unpackPlan(answer.timeline.plan);
};

describe('a command', () => {
  it('is written whole: the plan, the journal row and the revisions', async () => {
    const scan = makeScan({ comment: 'wind' });
    const answer = await add(anna, scan);
    expect(answer.subjects).toEqual({ [scan.id]: answer.seq });
    expect((await plan()).scans).toEqual([scan]);
    const timeline = await readTimeline(anna, session.id);
    expect(timeline).toMatchObject({
      ok: true,
      timeline: { seq: answer.seq, revs: { [scan.id]: answer.seq }, canEdit: true },
    });
  });

  it('that is sent again gets the stored answer and is done once', async () => {
    const scan = makeScan();
    const body = {
      kind: 'do',
      actId: newId(),
      command: { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] },
      seen: {},
    };
    const first = taken(await takeAct(anna, session.id, body));
    const second = taken(await takeAct(anna, session.id, body));
    expect(second).toEqual(first);
    expect((await plan()).scans).toHaveLength(1);
  });

  it('that carries the id of someone else’s act is not taken for a resend', async () => {
    const actId = newId();
    const scan = makeScan();
    const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
    taken(await takeAct(anna, session.id, { kind: 'do', actId, command, seen: {} }));
    const answer = refused(await takeAct(ben, session.id, { kind: 'do', actId, command, seen: {} }));
    expect(answer).toMatchObject({ code: 'conflict', reason: 'act-id' });
  });

  it('that stands on an older revision comes back with what changed and theirs', async () => {
    const scan = makeScan();
    const { seq } = await add(anna, scan);
    const moved = taken(await move(ben, scan, 60, seq));
    const answer = refused(await move(anna, scan, 120, seq));
    expect(answer).toMatchObject({
      code: 'conflict',
      reason: 'changed',
      changes: [{ subjectId: scan.id, rev: moved.seq, verb: 'move-scan', role: 'admin', isMine: false }],
      revs: { [scan.id]: moved.seq },
    });
    expect(answer.theirs?.scans).toEqual([{ ...scan, startMs: scan.startMs + 60_000 }]);
    expect(answer.message).toContain('The scan at 13:01:00 was moved by an administrator at 14:3');
    expect((await plan()).scans[0]?.startMs).toBe(scan.startMs + 60_000);
  });

  it('on a scan that someone removed says so, and by whom', async () => {
    const scan = makeScan();
    const { seq } = await add(anna, scan);
    taken(await act(ben, 'remove-scan', [{ kind: 'remove-scan', scanId: scan.id }], { [scan.id]: seq }));
    const answer = refused(await move(anna, scan, 120, seq));
    expect(answer.code).toBe('conflict');
    expect(answer.message).toMatch(/^The scan at 13:02:00 was removed by an administrator at /);
    expect(answer.theirs?.scans).toEqual([]);
  });

  it('on a scan known to be removed, or never there, is refused with a sentence', async () => {
    const answer = refused(await move(anna, makeScan(), 60, 0));
    expect(answer).toMatchObject({
      code: 'invalid',
      message: 'This scan is no longer in the plan. It was removed.',
    });
  });

  it('with a scan of zero length is refused with a sentence, and nothing is stored', async () => {
    const edits: Edit[] = [
      { kind: 'add-scan', scan: makeScan() },
      { kind: 'add-scan', scan: makeScan({ lengthSeconds: 0 }) },
    ];
    const answer = refused(await act(anna, 'add-scan', edits));
    expect(answer).toMatchObject({
      code: 'invalid',
      message: 'The scan at 13:00:00 cannot last 0 s. Give it 1 s or more.',
    });
    expect((await plan()).scans).toEqual([]);
  });

  it.each([
    ['a source of no part in the session', { sourceId: sourceId('J0555+3948') }, 'a source that'],
    ['a mode that is not there', { modeId: 'm'.repeat(16) }, 'a mode that the catalogue'],
    [
      'a station of no part in the session',
      { stations: [{ station: 'Cf', lateSeconds: 0, earlySeconds: 0 }] },
      'not a station of this session',
    ],
  ])('that names %s is refused with a sentence', async (_, over, sentence) => {
    const answer = refused(await act(anna, 'add-scan', [{ kind: 'add-scan', scan: makeScan(over) }]));
    expect(answer.code).toBe('invalid');
    expect(answer.message).toContain(sentence);
  });

  it('that cannot be read says where', async () => {
    const body = { kind: 'do', actId: 'short', command: { verb: 'fly', edits: [] }, seen: {} };
    const answer = refused(await takeAct(anna, session.id, body));
    expect(answer.code).toBe('invalid');
    expect(Object.keys(answer.fields ?? {})).toEqual(['actId', 'command.verb']);
  });

  it('on a closed session is refused with a sentence', async () => {
    const closed = await makeSession('closed');
    const body = {
      kind: 'do',
      actId: newId(),
      command: { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] },
      seen: {},
    };
    const answer = refused(await takeAct(anna, closed.code, body));
    expect(answer).toMatchObject({ code: 'conflict', reason: 'closed' });
  });

  it('moves the session’s span', async () => {
    const span = { startMs: START_MS + 60_000, lengthSeconds: 3600 };
    taken(await act(anna, 'change-span', [{ kind: 'change-span', span }]));
    expect((await plan()).span).toEqual(span);
  });

  it('takes a group with its legs in and out, whatever the order of its edits', async () => {
    const group: NoddingGroup = {
      id: newId(),
      targetId: sourceId('J0738+1742'),
      calibratorId: sourceId('J0927+3902'),
      targetOnSeconds: 40,
      calibratorOnSeconds: 20,
      turnSeconds: 24,
      first: 'calibrator',
    };
    const legs = [0, 1].map((k) =>
      makeScan({
        groupId: group.id,
        leg: k === 0 ? 'calibrator' : 'target',
        startMs: START_MS + k * 60_000,
        lengthSeconds: 20,
      }),
    );
    const adds: Edit[] = [
      ...legs.map((scan): Edit => ({ kind: 'add-scan', scan })),
      { kind: 'add-group', group },
    ];
    const added = taken(await act(anna, 'add-group', adds));
    expect(await plan()).toMatchObject({ scans: legs, groups: [group] });
    const removes: Edit[] = [
      { kind: 'remove-group', groupId: group.id },
      ...legs.map((scan): Edit => ({ kind: 'remove-scan', scanId: scan.id })),
    ];
    taken(await act(anna, 'remove-group', removes, added.subjects));
    expect(await plan()).toMatchObject({ scans: [], groups: [] });
    taken(await step(anna, 'undo'));
    expect(await plan()).toMatchObject({ scans: legs, groups: [group] });
  });
});

describe('undo and redo', () => {
  it('take back and bring again one’s own last act, step by step', async () => {
    const scan = makeScan();
    const { seq } = await add(anna, scan);
    const moved = taken(await move(anna, scan, 60, seq));
    expect(moved.steps.undo).toEqual({ of: moved.seq, verb: 'move-scan', isBlocked: false });
    const undone = taken(await step(anna, 'undo'));
    expect(undone).toMatchObject({ kind: 'undo', of: moved.seq, command: { verb: 'move-scan' } });
    expect((await plan()).scans).toEqual([scan]);
    taken(await step(anna, 'undo'));
    expect((await plan()).scans).toEqual([]);
    taken(await step(anna, 'redo'));
    const redone = taken(await step(anna, 'redo'));
    expect((await plan()).scans[0]?.startMs).toBe(scan.startMs + 60_000);
    expect(redone.steps.redo).toBeNull();
    expect(taken(await step(anna, 'undo')).steps.redo).toMatchObject({ of: moved.seq });
  });

  it('leave the work of others alone', async () => {
    const hers = makeScan();
    const his = makeScan({ startMs: START_MS });
    await add(anna, hers);
    await add(ben, his);
    taken(await step(anna, 'undo'));
    expect((await plan()).scans).toEqual([his]);
    expect(refused(await step(anna, 'undo'))).toMatchObject({
      code: 'conflict',
      reason: 'nothing',
      message: 'There is nothing of yours to undo.',
    });
  });

  it('stop where someone changed the same scan since, say who and what, and change nothing', async () => {
    const scan = makeScan();
    const { seq } = await add(anna, scan);
    taken(await move(ben, scan, 60, seq));
    const answer = refused(await step(anna, 'undo'));
    expect(answer).toMatchObject({
      code: 'conflict',
      reason: 'blocked',
      changes: [{ subjectId: scan.id, role: 'admin', verb: 'move-scan', isMine: false }],
    });
    expect(answer.message).toMatch(/was moved by an administrator at .* UT\. So undo stops here/);
    expect((await plan()).scans[0]?.startMs).toBe(scan.startMs + 60_000);
    taken(await step(ben, 'undo'));
    taken(await step(anna, 'undo'));
    expect((await plan()).scans).toEqual([]);
  });

  it('forget what was undone once something new is done', async () => {
    const scan = makeScan();
    await add(anna, scan);
    taken(await step(anna, 'undo'));
    await add(anna, makeScan({ startMs: START_MS }));
    expect(refused(await step(anna, 'redo'))).toMatchObject({ reason: 'nothing' });
  });

  it('sent twice are done once', async () => {
    await add(anna, makeScan());
    await add(anna, makeScan({ startMs: START_MS }));
    const body = { kind: 'undo', actId: newId() };
    const first = taken(await takeAct(anna, session.id, body));
    expect(taken(await takeAct(anna, session.id, body)).seq).toBe(first.seq);
    expect((await plan()).scans).toHaveLength(1);
  });
});

describe('two people at once', () => {
  it('of thirty parallel moves of one scan that stood on the same revision, one is taken', async () => {
    const scan = makeScan();
    const { seq } = await add(anna, scan);
    const answers = await Promise.all(
      Array.from({ length: 30 }, (_, k) => move(k % 2 ? anna : ben, scan, k + 1, seq)),
    );
    expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
    expect(answers.filter((answer) => !answer.ok && answer.code === 'conflict')).toHaveLength(29);
  });

  it('the journal after a row brings the other’s plan up to date', async () => {
    const scan = makeScan();
    const { seq } = await add(anna, scan);
    taken(await move(ben, scan, 60, seq));
    const page = await readJournal(anna, session.id, String(seq));
    expect(page).toMatchObject({
      ok: true,
      hasMore: false,
      entries: [{ kind: 'do', verb: 'move-scan', role: 'admin', isMine: false }],
    });
    const none = await readJournal(anna, session.id, '999999');
    expect(none).toMatchObject({ ok: true, entries: [], seq: 999999 });
  });
});
