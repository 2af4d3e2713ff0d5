'use client';

import { clockText } from '@/src/schedule/words';
import { useDerived } from './derived';
import { useActs } from './acts';
import { clampView, HOUR, LEVELS, viewEndMs } from './scale';
import { SNAP_WORDS, verbWords } from './said';
import { useTimeline, useTimelineStore } from './store';

export function ToolBar() {
  return (
    <div className="min-h-bar flex flex-wrap items-stretch border-b border-rule text-table desk:h-bar desk:flex-nowrap print:hidden">
      <div className="flex h-bar w-tray items-center gap-2 px-3.5">
        <h2 className="text-lead">Sources</h2>
        <SourceCount />
        <TrayButton />
      </div>
      <ShowPart />
      <SnapPart />
      <RibbonPart />
      <EditPart />
    </div>
  );
}

function SourceCount() {
  const count = useTimeline((state) => state.sources.length);
  return <span className="text-ink3">{count}</span>;
}

function TrayButton() {
  const store = useTimelineStore();
  const isOpen = useTimeline((state) => state.isTrayOpen);
  return (
    <button
      type="button"
      className="btn btn-sm desk:hidden"
      aria-expanded={isOpen}
      aria-controls="tray"
      onClick={() => store.setState({ isTrayOpen: !isOpen })}
    >
      {isOpen ? 'Hide' : 'Show'}
    </button>
  );
}

function ShowPart() {
  const store = useTimelineStore();
  const view = useTimeline((state) => state.view);
  const plan = useTimeline((state) => state.plan);
  const move = (hours: number) =>
    store.setState({ view: clampView({ ...view, startMs: view.startMs + hours * HOUR }, plan) });
  const show = (hours: number) => {
    const chosenId = store.getState().chosen?.scanId;
    const about = plan.scans.find(({ id }) => id === chosenId)?.startMs;
    const middle = about ?? view.startMs + (view.hours * HOUR) / 2;
    store.setState({ view: clampView({ hours, startMs: middle - (hours * HOUR) / 2 }, plan) });
  };
  return (
    <div className="flex h-bar items-center gap-2 px-[12px]">
      <span className="text-ink2">Show</span>
      <div className="seg" role="group" aria-label="Hours shown">
        {LEVELS.map(({ hours, label }) => (
          <button key={hours} type="button" aria-pressed={view.hours === hours} onClick={() => show(hours)}>
            {label}
          </button>
        ))}
      </div>
      <button type="button" className="btn px-2" aria-label="Earlier" onClick={() => move(-view.hours / 2)}>
        <Chevron d="M8 2 3.5 6 8 10" />
      </button>
      <b className="min-w-[96px] text-center">
        {clockText(view.startMs).slice(0, 5)} to {clockText(viewEndMs(view)).slice(0, 5)}
      </b>
      <button type="button" className="btn px-2" aria-label="Later" onClick={() => move(view.hours / 2)}>
        <Chevron d="M4 2 8.5 6 4 10" />
      </button>
    </div>
  );
}

function Chevron({ d }: { d: string }) {
  return (
    <svg width="12" height="12" aria-hidden="true">
      <path d={d} fill="none" stroke="currentColor" strokeWidth="1.6" />
    </svg>
  );
}

function SnapPart() {
  const store = useTimelineStore();
  const snap = useTimeline((state) => state.snap);
  return (
    <div className="hidden h-bar items-center gap-2 border-l border-rule px-3.5 desk:flex">
      <span className="text-ink2">Snap to</span>
      <div className="seg" role="group" aria-label="Snap to">
        {SNAP_WORDS.map(([mode, word]) => (
          <button
            key={mode}
            type="button"
            aria-pressed={snap === mode}
            onClick={() => store.setState({ snap: mode })}
          >
            {word}
          </button>
        ))}
      </div>
    </div>
  );
}

function RibbonPart() {
  const store = useTimelineStore();
  const pinned = useTimeline((state) => state.pinnedSourceId);
  const name = useTimeline((state) => {
    const id = focusOf(state);
    return id === null ? null : (state.context.sources[id]?.name ?? null);
  });
  const focus = useTimeline(focusOf);
  if (name === null) return null;
  return (
    <div className="hidden h-bar items-center gap-2 border-l border-rule px-3.5 wide:flex">
      <span className="text-ink2">Ribbons</span>
      <button
        type="button"
        className="chip border-teal"
        aria-pressed={pinned !== null}
        title={
          pinned === null ? 'Keep the ribbons on this source (F)' : 'Let the ribbons follow the choice (F)'
        }
        onClick={() => store.setState({ pinnedSourceId: pinned === null ? focus : null })}
      >
        <svg width="14" height="9" aria-hidden="true">
          <path d="M0 9Q7-5 14 9z" fill="var(--teal-mid)" />
          <path d="M0 9Q7-5 14 9" fill="none" stroke="var(--teal)" strokeWidth="1.3" />
        </svg>
        {name}
        {pinned !== null && <span className="text-ink2">pinned</span>}
      </button>
    </div>
  );
}

function EditPart() {
  const { undo, redo } = useActs();
  const canEdit = useTimeline((state) => state.canEdit);
  const undoName = useTimeline((state) => nameOfUndo(state));
  const redoName = useTimeline((state) => (state.pending.length > 0 ? null : nameOf(state.steps.redo)));
  return (
    <div className="ml-auto flex h-bar items-center gap-2 px-3.5">
      <LineState />
      {canEdit ? (
        <>
          <StepButton word="Undo" name={undoName} keys="Ctrl or ⌘ Z" run={undo} />
          <StepButton word="Redo" name={redoName} keys="Shift Ctrl or ⌘ Z" run={redo} />
        </>
      ) : (
        <span className="chip">Reading only</span>
      )}
      <ProblemCount />
    </div>
  );
}

/** What keeps changes from going out, and how many wait. */
function LineState() {
  const line = useTimeline((state) => state.line);
  const waiting = useTimeline((state) => state.pending.length);
  if (line === 'ok') return null;
  const count = `${waiting} ${waiting === 1 ? 'change' : 'changes'} waiting`;
  return (
    <span role="status" className="chip border-dashed border-ochre bg-ochre-wash">
      {line === 'lost' ? 'No line' : 'The login has ended'}
      {waiting > 0 && `: ${count}`}
      {line === 'signed-out' && (
        <a href="/sign-in" target="_blank" rel="noreferrer" className="underline">
          Sign in
        </a>
      )}
    </span>
  );
}

function StepButton({
  word,
  name,
  keys,
  run,
}: {
  word: string;
  name: string | null;
  keys: string;
  run: () => void;
}) {
  const title =
    name === null ? `There is nothing of yours to ${word.toLowerCase()}.` : `${word} ${name} (${keys})`;
  return (
    <button
      type="button"
      className="btn"
      aria-disabled={name === null}
      title={title}
      onClick={name === null ? undefined : run}
    >
      {word}
    </button>
  );
}

function ProblemCount() {
  const problems = useDerived((derived) => derived.problems);
  const letters = useDerived((derived) => derived.letters);
  const fixes = problems.filter(({ severity }) => severity === 'fix');
  const notes = problems.length - fixes.length;
  const first = problems[0];
  if (!first) return <span className="ml-2 hidden text-ink2 narrow:inline">No problems</span>;
  return (
    <span className="ml-2 hidden items-center gap-1.5 whitespace-nowrap narrow:inline-flex">
      <i className={`fn ${first.severity === 'fix' ? 'fn-must' : ''}`} aria-hidden="true">
        {letters.get(first.key) ?? '!'}
      </i>
      {fixes.length > 0 && `${fixes.length} to fix`}
      {fixes.length > 0 && notes > 0 && ', '}
      {notes > 0 && `${notes} to note`}
    </span>
  );
}

type State = ReturnType<ReturnType<typeof useTimelineStore>['getState']>;

/** The source whose elevation is drawn: the dragged one's, the pinned one's, the chosen scan's, the tray's. */
export function focusOf(state: State): string | null {
  if (state.placing) return state.placing.sourceId;
  if (state.pinnedSourceId !== null) return state.pinnedSourceId;
  const chosen = state.chosen && state.plan.scans.find(({ id }) => id === state.chosen?.scanId);
  return chosen?.sourceId ?? state.traySourceId;
}

function nameOfUndo(state: State): string | null {
  const waiting = state.pending.filter((act) => act.kind === 'do').at(-1);
  return waiting?.kind === 'do' ? verbWords(waiting.command.verb) : nameOf(state.steps.undo);
}

const nameOf = (step: State['steps']['undo']) => (step === null ? null : verbWords(step.verb));
