import type { ActFailure, JournalPage, Revs, Taken } from '@/src/data/plan/dto';
import type { Failure } from '@/src/data/errors';
import { applyCommand, CommandRefused, subjectsOf, type Command } from '@/src/schedule/commands';
import type { Plan } from '@/src/schedule/plan';
import { newId } from './ids';
import type { PendingAct } from './state';
import type { TimelineStore } from './store';

const RETRY_SECONDS = [5, 15, 60];

/**
 * Carries acts to the server: one in flight, in order, each applied at once on the sheet and again on the
 * confirmed plan when it is taken. A lost line keeps them waiting.
 */
export function createSender(store: TimelineStore, onSignedOut: () => void) {
  let running = false;
  let wake: (() => void) | null = null;
  let catching: Promise<void> = Promise.resolve();
  /** rows newer than the last catch-up that the confirmed plan holds already */
  const applied = new Set<number>();
  const url = () => `/api/sessions/${store.getState().session.id}`;

  function dispatch(command: Command): boolean {
    const { plan, pending } = store.getState();
    try {
      const next = applyCommand(plan, command).plan;
      store.setState({
        plan: next,
        pending: [...pending, { actId: newId(), kind: 'do', command }],
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

  /** null where no answer came: the line, or a server that fell over. */
  async function post(act: PendingAct): Promise<Taken | ActFailure | null> {
    const { confirmed, revs } = store.getState();
    const body =
      act.kind === 'do'
        ? {
            ...act,
            seen: Object.fromEntries(subjectsOf(confirmed, act.command).map((id) => [id, revs[id] ?? 0])),
          }
        : act;
    try {
      const response = await fetch(`${url()}/commands`, {
        method: 'POST',
        headers: { 'content-type': 'application/json' },
        body: JSON.stringify(body),
      });
      const answer = (await response.json()) as Taken | ActFailure;
      return !answer.ok && answer.code === 'unexpected' && response.status >= 502 ? null : answer;
    } catch (error) {
      if (error instanceof TypeError || error instanceof SyntaxError) return null;
      throw error;
    }
  }

  /**
   * A do-row may be applied out of turn: the server took it only because nothing unseen touched its subjects.
   * An undo or redo may stand on rows not seen here, so the journal brings it in its turn.
   */
  async function taken(act: PendingAct, answer: Taken): Promise<boolean> {
    if (answer.kind !== 'do') await catchUp();
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

  async function refused(act: PendingAct, failure: ActFailure): Promise<boolean> {
    const { confirmed, pending } = store.getState();
    settle(
      confirmed,
      pending.filter((other) => other.actId !== act.actId),
    );
    if (failure.code === 'unauthenticated') {
      onSignedOut();
      return true;
    }
    if (failure.code === 'conflict') await catchUp();
    const mine = failure.reason === 'changed' && act.kind === 'do' ? act.command : null;
    store.setState({ notice: { message: failure.message, mine } });
    return true;
  }

  /** Brings the confirmed plan up to the journal's end: what others did, and what the page's props missed. */
  function catchUp(): Promise<void> {
    catching = catching.then(readOn, readOn);
    return catching;
  }

  async function readOn(): Promise<void> {
    for (let more = true; more;) {
      const page = await fetchPage();
      if (!page?.ok) return;
      const { confirmed, revs, pending } = store.getState();
      const news = page.entries.filter(({ seq }) => !applied.has(seq));
      const plan = news.reduce((current, { command }) => applyCommand(current, command).plan, confirmed);
      const arrived = new Set(news.map(({ actId }) => actId));
      for (const { seq } of page.entries) applied.delete(seq);
      if (page.entries.length > 0) {
        const newRevs = page.entries.reduce((current, { subjects }) => newer(current, subjects), revs);
        const waiting = pending.filter(({ kind, actId }) => kind !== 'do' || !arrived.has(actId));
        settle(plan, waiting, { revs: newRevs, seq: page.seq });
      }
      more = page.hasMore;
    }
  }

  async function fetchPage(): Promise<JournalPage | Failure | null> {
    try {
      const response = await fetch(`${url()}/journal?after=${store.getState().seq}`);
      return (await response.json()) as JournalPage | Failure;
    } catch (error) {
      if (error instanceof TypeError || error instanceof SyntaxError) return null;
      throw error;
    }
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
    const { chosen } = store.getState();
    const stillThere = chosen && plan.scans.some((scan) => scan.id === chosen.scanId);
    store.setState({
      confirmed,
      pending,
      plan,
      notice,
      ...more,
      ...(chosen && !stillThere && { chosen: null }),
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

  return { dispatch, step, catchUp, wake: () => wake?.() };
}

export type Sender = ReturnType<typeof createSender>;

function newer(revs: Revs, changed: Revs): Revs {
  const merged = { ...revs };
  for (const [id, rev] of Object.entries(changed)) merged[id] = Math.max(merged[id] ?? 0, rev);
  return merged;
}
