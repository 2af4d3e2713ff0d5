import type { ActFailure, JournalPage, Revs, Taken } from '@/src/data/plan/dto';
import type { Failure } from '@/src/data/errors';
import { applyCommand, CommandRefused, subjectsOf, type Command } from '@/src/schedule/commands';
import type { Plan, SubjectId } from '@/src/schedule/plan';
import { newId } from '@/app/_ui/new-id';
import { createOwnRevs } from './own-revs';
import type { PendingAct, TimelineState } from './state';
import type { TimelineStore } from './store';

const RETRY_SECONDS = [5, 15, 60];

/** What to do, or how to make it from the plan as it is now. */
export type Doing = Command | ((plan: Plan) => Command);

/**
 * Carries acts to the server: one in flight, in order, each applied at once on the sheet and again on the
 * confirmed plan when it is taken. An act stands on the revisions its person saw; only answers to this window's
 * own acts move them on. A lost line or an ended login keeps acts waiting.
 */
export function createSender(store: TimelineStore) {
  let running = false;
  let wake: (() => void) | null = null;
  let catching: Promise<void> = Promise.resolve();
  /** rows newer than the last catch-up that the confirmed plan holds already */
  const applied = new Set<number>();
  const own = createOwnRevs();
  const url = () => `/api/sessions/${store.getState().session.id}`;

  /** @param seenRevs  what the person saw when the gesture began; now, if it took no time */
  function dispatch(doing: Doing, seenRevs: Revs = store.getState().revs): boolean {
    const { plan, pending } = store.getState();
    try {
      const command = typeof doing === 'function' ? doing(plan) : doing;
      const seen = Object.fromEntries(subjectsOf(plan, command).map((id) => [id, seenRevs[id] ?? 0]));
      store.setState({
        plan: applyCommand(plan, command).plan,
        pending: [...pending, { actId: newId(), kind: 'do', command, seen }],
        notice: null,
      });
    } catch (error) {
      if (!(error instanceof CommandRefused)) throw error;
      store.setState({ notice: { message: error.message, mine: null } });
      return false;
    }
    void pump();
    return true;
  }

  function step(kind: 'undo' | 'redo') {
    const { pending } = store.getState();
    if (!canStep(store.getState(), kind)) return;
    store.setState({ pending: [...pending, { actId: newId(), kind }], notice: null });
    void pump();
  }

  async function pump() {
    if (running) return;
    running = true;
    try {
      let failures = 0;
      for (let [act] = store.getState().pending; act; [act] = store.getState().pending) {
        const answer = await post(act);
        if (answer && !answer.ok && answer.code === 'unauthenticated') {
          store.setState({ line: 'signed-out' });
          return;
        }
        const isDone = answer !== null && (answer.ok ? await taken(act, answer) : await refused(act, answer));
        if (!isDone) {
          store.setState({ line: 'lost' });
          await pause(RETRY_SECONDS[Math.min(failures++, RETRY_SECONDS.length - 1)] ?? 60);
          continue;
        }
        failures = 0;
        store.setState({ line: 'ok' });
      }
    } finally {
      running = false;
    }
  }

  /** null where no answer of ours came: the line, or something between that answers in its own words. */
  async function post(act: PendingAct): Promise<Taken | ActFailure | null> {
    const { actId, kind } = act;
    const body =
      act.kind === 'do'
        ? { actId, kind, command: act.command, seen: own.advanced(act.seen) }
        : { actId, kind };
    return ask<Taken | ActFailure>(`${url()}/commands`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
    });
  }

  /**
   * A do-row may be applied out of turn: the server took it only because nothing unseen touched its subjects.
   * An undo or redo may stand on rows not seen here, so the journal brings it in its turn.
   */
  async function taken(act: PendingAct, answer: Taken): Promise<boolean> {
    if (act.kind === 'do') own.note(own.advanced(act.seen), answer.subjects);
    else await catchUp();
    const { confirmed, revs, seq, pending } = store.getState();
    const isIn = answer.seq <= seq || applied.has(answer.seq);
    if (!isIn && answer.kind !== 'do') return false;
    if (!isIn) applied.add(answer.seq);
    settle(
      isIn ? confirmed : applyCommand(confirmed, answer.command).plan,
      pending.filter((other) => other.actId !== act.actId),
      { revs: newer(revs, answer.subjects), steps: answer.steps },
    );
    return true;
  }

  /** Takes the act off the sheet, and with it what was done on top of it: later acts on the same, and steps behind. */
  async function refused(act: PendingAct, failure: ActFailure): Promise<boolean> {
    const { confirmed, pending } = store.getState();
    const behind = pending.slice(pending.findIndex(({ actId }) => actId === act.actId) + 1);
    const touched = new Set<SubjectId>(act.kind === 'do' ? Object.keys(act.seen) : []);
    const kept = behind.filter((other) => {
      if (other.kind !== 'do') return act.kind !== 'do';
      const subjects = Object.keys(other.seen);
      if (!subjects.some((id) => touched.has(id))) return true;
      subjects.forEach((id) => touched.add(id));
      return false;
    });
    settle(confirmed, kept);
    // pressed once too often: nothing happened, so nothing is said
    if (failure.reason === 'nothing') return true;
    if (failure.code === 'conflict') await catchUp();
    const lost = behind.length - kept.length;
    const more = lost > 0 ? ` ${lost} later ${lost === 1 ? 'step' : 'steps'} of yours went with it.` : '';
    const mine = failure.reason === 'changed' && act.kind === 'do' ? act.command : null;
    store.setState({ notice: { message: `${failure.message}${more}`, mine } });
    return true;
  }

  /** Brings the confirmed plan up to the journal's end: what others did, and what the page's props missed. */
  function catchUp(): Promise<void> {
    catching = catching.then(readOn, readOn);
    return catching;
  }

  async function readOn(): Promise<void> {
    for (let more = true; more;) {
      const page = await ask<JournalPage | Failure>(`${url()}/journal?after=${store.getState().seq}`);
      if (page === null) return store.setState({ line: 'lost' });
      if (!page.ok) return unread(page);
      if (store.getState().line !== 'ok' && !running) store.setState({ line: 'ok' });
      if (page.entries.length > 0) takeIn(page);
      more = page.hasMore;
    }
  }

  function takeIn(page: JournalPage) {
    const { confirmed, revs, pending } = store.getState();
    const news = page.entries.filter(({ seq }) => !applied.has(seq));
    const plan = news.reduce((current, { command }) => applyCommand(current, command).plan, confirmed);
    const mine = new Set(pending.map(({ actId }) => actId));
    let newRevs = revs;
    for (const { seq, actId, subjects } of page.entries) {
      if (mine.has(actId)) own.note(pick(newRevs, Object.keys(subjects)), subjects);
      newRevs = newer(newRevs, subjects);
      applied.delete(seq);
    }
    const arrived = new Set(news.map(({ actId }) => actId));
    const waiting = pending.filter(({ kind, actId }) => kind !== 'do' || !arrived.has(actId));
    settle(plan, waiting, { revs: newRevs, seq: page.seq });
  }

  /** Others' changes could not be read: the sheet may be old, and says so. */
  function unread(failure: Failure) {
    if (failure.code === 'unauthenticated') store.setState({ line: 'signed-out' });
    else
      store.setState({
        notice: { message: `The plan could not be brought up to date. ${failure.message}`, mine: null },
      });
  }

  /** The confirmed plan with the waiting acts on top; one that no longer fits is dropped with its reason. */
  function settle(
    confirmed: Plan,
    waiting: readonly PendingAct[],
    more: Partial<Pick<ReturnType<TimelineStore['getState']>, 'revs' | 'steps' | 'seq'>> = {},
  ) {
    let plan = confirmed;
    let notice = store.getState().notice;
    const pending = waiting.filter((act) => {
      if (act.kind !== 'do') return true;
      try {
        plan = applyCommand(plan, act.command).plan;
        return true;
      } catch (error) {
        if (!(error instanceof CommandRefused)) throw error;
        notice = { message: error.message, mine: null };
        return false;
      }
    });
    const { chosen, placing } = store.getState();
    const heldId = placing?.scanId ?? null;
    const isHeldGone = heldId !== null && !plan.scans.some(({ id }) => id === heldId);
    if (isHeldGone) notice = { message: 'The scan you were moving was removed.', mine: null };
    const stillThere = chosen && plan.scans.some((scan) => scan.id === chosen.scanId);
    store.setState({
      confirmed,
      pending,
      plan,
      notice,
      ...more,
      ...(chosen && !stillThere && { chosen: null }),
      ...(isHeldGone && { placing: null }),
    });
  }

  function pause(seconds: number) {
    return new Promise<void>((resolve) => {
      const timer = setTimeout(resolve, seconds * 1000);
      wake = () => {
        clearTimeout(timer);
        resolve();
      };
    });
  }

  /** Sends what waits at once: the line is back, or someone signed in again. */
  function resume() {
    wake?.();
    void pump();
  }

  return { dispatch, step, catchUp, resume };
}

/** Whether a step is worth asking for; how far back steps that wait will go is the server's to say. */
function canStep(
  { pending, steps }: Pick<TimelineState, 'pending' | 'steps'>,
  kind: 'undo' | 'redo',
): boolean {
  if (pending.some((act) => act.kind !== 'do')) return true;
  const hasWaiting = pending.length > 0;
  return kind === 'undo' ? hasWaiting || steps.undo !== null : !hasWaiting && steps.redo !== null;
}

export type Sender = ReturnType<typeof createSender>;

const CODES = new Set(['invalid', 'unauthenticated', 'forbidden', 'not_found', 'conflict', 'unexpected']);

/** An answer of ours, or null. */
async function ask<T extends { ok: true } | Failure>(address: string, init?: RequestInit): Promise<T | null> {
  try {
    const response = await fetch(address, init);
    const answer = (await response.json()) as T;
    return answer.ok === true || ('code' in answer && CODES.has(answer.code)) ? answer : null;
  } catch (error) {
    if (error instanceof TypeError || error instanceof SyntaxError) return null;
    throw error;
  }
}

const pick = (revs: Revs, ids: readonly SubjectId[]): Revs =>
  Object.fromEntries(ids.map((id) => [id, revs[id] ?? 0]));

function newer(revs: Revs, changed: Revs): Revs {
  const merged = { ...revs };
  for (const [id, rev] of Object.entries(changed)) merged[id] = Math.max(merged[id] ?? 0, rev);
  return merged;
}
