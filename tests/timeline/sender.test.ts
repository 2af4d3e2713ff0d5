import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createSender } from '@/app/(shell)/sessions/[sessionId]/timeline/_timeline/sender';
import { createTimelineStore } from '@/app/(shell)/sessions/[sessionId]/timeline/_timeline/store';
import type { JournalEntry, Timeline } from '@/src/data/plan/dto';
import type { Command } from '@/src/schedule/commands';
import { moveScan } from '@/src/schedule/gestures/move-scan';
import { removeScan } from '@/src/schedule/gestures/remove-scan';
import { emptyJournal, takeDo, takeUndo, type Journal } from '@/src/schedule/journal-memory';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { makeContext, MODE, SOURCES, STATIONS } from '../schedule/context-maker';

const startMs = Date.UTC(2027, 1, 12, 20);
const ONE = 'scan000000000001';
const TWO = 'scan000000000002';

const timeline: Timeline = {
  session: {
    id: 'session000000001',
    code: 'T-1',
    title: 'Test',
    state: 'draft',
    startMs,
    lengthSeconds: 86_400,
    stations: ['Af', 'Bm'],
    modeId: MODE.id,
  },
  plan: {
    sessionId: 'session000000001',
    startMs,
    lengthSeconds: 86_400,
    stations: ['Af', 'Bm'],
    scans: [ONE, TWO].map((id, index) => [
      id,
      'src-b',
      MODE.id,
      600 + index * 3600,
      600,
      [
        ['Af', 0, 0],
        ['Bm', 0, 0],
      ],
      null,
      null,
      '',
    ]),
    groups: [],
  },
  stations: Object.values(STATIONS)
    .filter(({ code }) => code === 'Af' || code === 'Bm')
    .map((station) => ({ ...station, timeZone: 'UTC', dishM: 20 })),
  sources: Object.values(SOURCES).map((source) => ({ ...source, wantedScans: 1 })),
  modes: [MODE],
  settings: makeContext().settings,
  away: {},
  clocks: {},
  answers: {},
  revs: {},
  seq: 0,
  steps: { undo: null, redo: null },
  canEdit: true,
  nowMs: startMs,
};

/** A server that keeps the rules of the journal, with faults on demand. */
class Server {
  journal: Journal = emptyJournal(unpackPlan(timeline.plan));
  down = false;
  signedOut = false;
  posts: { actId: string; kind: string }[] = [];
  private acts = new Map<string, number>();

  fetch = (address: string, init?: { body?: string }): Promise<Response> => {
    if (this.down) return Promise.reject(new TypeError('no line'));
    if (this.signedOut)
      return Promise.resolve(json({ ok: false, code: 'unauthenticated', message: 'Sign in.' }));
    return Promise.resolve(
      json(init?.body ? this.post(init.body) : this.page(Number(address.split('after=')[1]))),
    );
  };

  /** Someone else's command, on what is there now. */
  theirs(command: Command): void {
    const answer = this.take('other', `act${this.journal.rows.length}`.padEnd(16, '0'), command, null);
    if (!answer.ok) throw new Error('theirs was refused');
  }

  private post(body: string) {
    const act = JSON.parse(body) as {
      actId: string;
      kind: 'do' | 'undo' | 'redo';
      command: Command;
      seen: Record<string, number>;
    };
    this.posts.push({ actId: act.actId, kind: act.kind });
    const known = this.acts.get(act.actId);
    if (known !== undefined) return this.taken(known);
    return act.kind === 'do'
      ? this.take('me', act.actId, act.command, act.seen)
      : this.settle(takeUndo(this.journal, act.actId, actor('me')), act.actId);
  }

  private take(userId: string, actId: string, command: Command, seen: Record<string, number> | null) {
    const now = Object.fromEntries([...this.journal.subjects].map(([id, { rev }]) => [id, rev]));
    return this.settle(takeDo(this.journal, { actId, command, seen: seen ?? now }, actor(userId)), actId);
  }

  private settle(result: ReturnType<typeof takeDo> | ReturnType<typeof takeUndo>, actId: string) {
    if (!result.ok) {
      const reason = result.reason === 'nothing' ? 'nothing' : 'changed';
      return { ok: false, code: 'conflict', reason, message: 'It was changed meanwhile.' } as const;
    }
    this.journal = result.journal;
    const seq = this.journal.rows.at(-1)?.seq ?? 0;
    this.acts.set(actId, seq);
    return this.taken(seq);
  }

  private taken(seq: number) {
    const row = this.entry(seq);
    return { ...row, ok: true, steps: { undo: null, redo: null } } as const;
  }

  private page(after: number) {
    const entries = this.journal.rows.filter(({ seq }) => seq > after).map(({ seq }) => this.entry(seq));
    return { ok: true, entries, seq: entries.at(-1)?.seq ?? after, hasMore: false };
  }

  private entry(seq: number): JournalEntry {
    const row = this.journal.rows.find((one) => one.seq === seq);
    if (!row) throw new Error(`no row ${seq}`);
    const { actId, kind, of, verb, role, atMs, command } = row;
    const subjects = Object.fromEntries(row.subjects.map((id) => [id, seq]));
    return { seq, actId, kind, of, verb, role, isMine: row.userId === 'me', atMs, command, subjects };
  }
}

const actor = (userId: string) => ({ userId, role: 'scheduler', atMs: startMs, area: 'plan' });
const json = (body: unknown) => new Response(JSON.stringify(body), { status: 200 });

let server: Server;
beforeEach(() => {
  vi.useFakeTimers();
  server = new Server();
  vi.stubGlobal('fetch', server.fetch);
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

function open() {
  const store = createTimelineStore(timeline);
  const sender = createSender(store);
  const startOf = (id: string) => {
    const scan = store.getState().plan.scans.find((one) => one.id === id);
    return scan ? (scan.startMs - startMs) / 1000 : null;
  };
  const settled = () => vi.advanceTimersByTimeAsync(50);
  const move = (id: string, seconds: number) =>
    sender.dispatch((plan) => moveScan(plan, id, startMs + seconds * 1000));
  return { store, sender, startOf, settled, move };
}

const serverStart = (id: string) => {
  const scan = server.journal.plan.scans.find((one) => one.id === id);
  return scan ? (scan.startMs - startMs) / 1000 : null;
};

describe('acts on their way to the server', () => {
  it('are on the sheet at once, and go one at a time in order', async () => {
    const { startOf, settled, move } = open();
    move(ONE, 700);
    move(TWO, 5000);
    expect([startOf(ONE), startOf(TWO)]).toEqual([700, 5000]);
    await settled();
    expect([serverStart(ONE), serverStart(TWO)]).toEqual([700, 5000]);
    expect(server.posts).toHaveLength(2);
  });

  it('on the same scan do not conflict with each other', async () => {
    const { store, settled, move } = open();
    move(ONE, 700);
    move(ONE, 800);
    await settled();
    move(ONE, 900);
    await settled();
    expect(serverStart(ONE)).toBe(900);
    expect(store.getState().notice).toBeNull();
  });

  it('that wait for the line never write over what someone else did meanwhile', async () => {
    const { store, sender, startOf, settled, move } = open();
    server.down = true;
    move(ONE, 700);
    await settled();
    expect(store.getState().line).toBe('lost');
    server.down = false;
    server.theirs(moveScan(server.journal.plan, ONE, startMs + 900_000));
    await sender.catchUp();
    sender.resume();
    await settled();
    expect(serverStart(ONE)).toBe(900);
    expect(startOf(ONE)).toBe(900);
    expect(store.getState().notice?.mine).not.toBeNull();
  });

  it('that were made on a refused act go with it, and so do the steps behind', async () => {
    const { store, sender, settled, move } = open();
    server.theirs(moveScan(server.journal.plan, ONE, startMs + 900_000));
    move(ONE, 700);
    move(ONE, 800);
    move(TWO, 5000);
    sender.step('undo');
    await settled();
    expect([serverStart(ONE), serverStart(TWO)]).toEqual([900, 5000]);
    expect(store.getState().notice?.message).toContain('2 later steps of yours went with it.');
    expect(server.posts.filter(({ kind }) => kind === 'undo')).toEqual([]);
  });

  it('stand on what was seen when the gesture began, not when it ended', async () => {
    const { store, sender, settled } = open();
    const seen = store.getState().revs;
    server.theirs(moveScan(server.journal.plan, ONE, startMs + 900_000));
    await sender.catchUp();
    sender.dispatch((plan) => moveScan(plan, ONE, startMs + 700_000), seen);
    await settled();
    expect(serverStart(ONE)).toBe(900);
    expect(store.getState().notice?.message).toContain('It was changed meanwhile.');
  });

  it('keep one id through every resend', async () => {
    const { settled, move } = open();
    server.down = true;
    move(ONE, 700);
    await settled();
    server.down = false;
    await vi.advanceTimersByTimeAsync(5000);
    await settled();
    expect(serverStart(ONE)).toBe(700);
    expect(new Set(server.posts.map(({ actId }) => actId)).size).toBe(1);
  });

  it('wait when the login has ended, and go once someone signs in again', async () => {
    const { store, sender, startOf, settled, move } = open();
    server.signedOut = true;
    move(ONE, 700);
    await settled();
    expect(store.getState().line).toBe('signed-out');
    expect(startOf(ONE)).toBe(700);
    server.signedOut = false;
    sender.resume();
    await settled();
    expect(serverStart(ONE)).toBe(700);
    expect(store.getState().line).toBe('ok');
  });
});

describe('the plan and the journal', () => {
  it('hold a row once, whichever brings it first', async () => {
    const { store, sender, startOf, settled, move } = open();
    move(ONE, 700);
    await settled();
    await sender.catchUp();
    server.theirs(removeScan(server.journal.plan, TWO));
    await sender.catchUp();
    expect([startOf(ONE), startOf(TWO)]).toEqual([700, null]);
    expect(store.getState().confirmed).toEqual(server.journal.plan);
  });

  it('agree after an undo', async () => {
    const { store, sender, startOf, settled, move } = open();
    move(ONE, 700);
    sender.step('undo');
    await settled();
    expect(startOf(ONE)).toBe(600);
    move(ONE, 750);
    await settled();
    expect(serverStart(ONE)).toBe(750);
    expect(store.getState().notice).toBeNull();
  });

  it('say a removed scan is gone instead of failing', async () => {
    const { store, sender, move } = open();
    server.theirs(removeScan(server.journal.plan, ONE));
    await sender.catchUp();
    expect(move(ONE, 700)).toBe(false);
    expect(store.getState().notice?.message).toBe('This scan is no longer in the plan. It was removed.');
  });
});

describe('a step', () => {
  it('is not asked for when there is nothing of one’s own to take back', async () => {
    const { sender, settled } = open();
    sender.step('undo');
    await settled();
    expect(server.posts).toEqual([]);
  });

  it('pressed once too often leaves no error behind', async () => {
    const { store, sender, startOf, settled, move } = open();
    move(ONE, 700);
    for (let press = 0; press < 3; press++) sender.step('undo');
    await settled();
    expect(startOf(ONE)).toBe(600);
    expect(store.getState().pending).toEqual([]);
    expect(store.getState().notice).toBeNull();
  });
});
