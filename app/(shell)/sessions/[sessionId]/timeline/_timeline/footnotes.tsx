'use client';

import { useEffect, useState } from 'react';
import type { Problem } from '@/src/schedule/checks';
import type { problemMends } from '@/src/schedule/problem-mends';
import { problemSentence } from '@/src/schedule/problem-words';
import { useActs } from './acts';
import { useDerived } from './derived';
import { focusGrid } from './places';
import { useTimeline, useTimelineStore } from './store';

/** The problems of the plan in words, must-fix first, each with what would mend it. */
export function Footnotes({ onLoud }: { onLoud: (key: string | null) => void }) {
  const problems = useDerived((derived) => derived.problems);
  const letters = useDerived((derived) => derived.letters);
  const shown = problems.filter(({ key }) => letters.has(key));
  const rest = problems.length - shown.length;
  const mendsOf = useMends();
  return (
    <section aria-labelledby="notes-title" className="flex min-h-0 flex-1 border-t-head border-ink">
      <h2 id="notes-title" className="w-head flex-none pl-[12px] pt-2 text-lead">
        Notes
      </h2>
      <div className="min-h-0 flex-1 overflow-y-auto">
        <NoticeBox />
        {shown.length === 0 ? (
          <p className="help py-2.5">
            No problems found: limits, slews, scans at once and the session’s own time are checked.
          </p>
        ) : (
          <ul className="gap-x-3.5 pr-3.5 narrow:columns-2 wide:columns-3">
            {shown.map((problem) => (
              <Footnote key={problem.key} problem={problem} mendsOf={mendsOf} onLoud={onLoud} />
            ))}
            {rest > 0 && <li className="help pt-[7px]">{rest} more to note, without a letter.</li>}
          </ul>
        )}
      </div>
    </section>
  );
}

type MendsOf = typeof problemMends;

const MENDS_AFTER_MS = 200;

/** What would mend a problem is worked out by code of its own, loaded once the sheet is drawn. */
function useMends(): MendsOf | null {
  const isReady = useDerived((derived) => derived.isReady);
  const [loaded, setLoaded] = useState<{ mendsOf: MendsOf } | null>(null);
  useEffect(() => {
    if (!isReady) return;
    let isOver = false;
    const load = async () => {
      const { problemMends: mendsOf } = await import('@/src/schedule/problem-mends');
      if (!isOver) setLoaded({ mendsOf });
    };
    const timer = setTimeout(() => void load(), MENDS_AFTER_MS);
    return () => {
      isOver = true;
      clearTimeout(timer);
    };
  }, [isReady]);
  return loaded?.mendsOf ?? null;
}

type FootnoteProps = {
  problem: Problem;
  mendsOf: MendsOf | null;
  onLoud: (key: string | null) => void;
};

function Footnote({ problem, mendsOf, onLoud }: FootnoteProps) {
  const store = useTimelineStore();
  const canEdit = useTimeline((state) => state.canEdit);
  const plan = useDerived((derived) => derived.plan);
  const context = useTimeline((state) => state.context);
  const { dispatch } = useActs();
  const mends = canEdit && mendsOf ? mendsOf(problem, plan, context) : [];
  return (
    <li
      className="break-inside-avoid pt-[7px] text-table"
      onPointerEnter={() => onLoud(problem.key)}
      onPointerLeave={() => onLoud(null)}
      onFocus={() => onLoud(problem.key)}
      onBlur={() => onLoud(null)}
    >
      <ProblemText
        problem={problem}
        onChoose={() =>
          problem.scanId !== null &&
          store.setState({ chosen: { scanId: problem.scanId, station: problem.station } })
        }
      />
      {mends.length > 0 && (
        <div className="ml-6 mt-[3px] flex flex-wrap gap-0.5">
          {mends.map(({ label, command }, index) => (
            <button
              key={label}
              type="button"
              className={`btn btn-sm ${index > 0 ? 'btn-quiet' : ''}`}
              onClick={() => {
                dispatch(command);
                // the button goes with its problem
                focusGrid();
              }}
            >
              {label}
            </button>
          ))}
        </div>
      )}
    </li>
  );
}

/** Letter, who, what, and the shortfall in vermilion. */
export function ProblemText({ problem, onChoose }: { problem: Problem; onChoose?: () => void }) {
  const letter = useDerived((derived) => derived.letters.get(problem.key)) ?? '!';
  const plan = useDerived((derived) => derived.plan);
  const context = useTimeline((state) => state.context);
  const { who, what, shortfall } = problemSentence(problem, plan, context);
  const must = problem.severity === 'fix';
  return (
    <div className="flex gap-[7px]">
      <i className={`fn ${must ? 'fn-must' : ''}`} title={must ? 'to fix' : 'to note'}>
        <span className="sr-only">{must ? 'To fix, note ' : 'To note, '}</span>
        {letter}
      </i>
      <span>
        {onChoose ? (
          <button type="button" className="text-left font-strong hover:underline" onClick={onChoose}>
            {who}
          </button>
        ) : (
          <b>{who}</b>
        )}{' '}
        {what}
        {shortfall !== null && (
          <>
            : <b className="text-verm">{shortfall}</b>
          </>
        )}
        .
      </span>
    </div>
  );
}

/** What the server did not take, said where the work is. */
function NoticeBox() {
  const store = useTimelineStore();
  const notice = useTimeline((state) => state.notice);
  const { dispatch } = useActs();
  if (!notice) return null;
  const { message, mine } = notice;
  return (
    <div role="alert" className="error-box mr-3.5 mt-2 flex flex-wrap items-center gap-2">
      <p className="min-w-0 flex-1">{message}</p>
      {mine && (
        <button
          type="button"
          className="btn btn-sm"
          onClick={() => {
            store.setState({ notice: null });
            dispatch(mine);
            focusGrid();
          }}
        >
          Do mine again
        </button>
      )}
      <button type="button" className="btn btn-sm btn-quiet" onClick={() => store.setState({ notice: null })}>
        {mine ? 'Keep theirs' : 'Close'}
      </button>
    </div>
  );
}
