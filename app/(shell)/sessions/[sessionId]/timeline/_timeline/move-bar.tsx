'use client';

import { useDerived } from './derived';
import { sentenceOf, useKeyPlacing } from './key-placing';
import { useJudgement } from './placement';

/** Move mode by keys, for those who cannot or will not drag: the live sentence with Drop and Stop. */
export function MoveBar() {
  const judged = useJudgement();
  const { nudge, drop, cancel, sentence } = useKeyPlacing();
  const heldId = judged?.placing.scanId ?? '';
  const number = useDerived((derived) => derived.numbers.get(heldId)) ?? null;
  const isOn = judged?.placing.by === 'keys';
  return (
    <>
      <div role="status" aria-live="polite" className="sr-only">
        {sentence}
      </div>
      {isOn && (
        <div
          onKeyDown={(event) => {
            if (event.key === 'Escape') cancel();
          }}
          className="flex flex-none flex-wrap items-center gap-2 border-l-bar border-t border-l-ink border-t-rule bg-wash px-[13px] py-2"
        >
          <p aria-hidden="true" className="min-w-0 flex-1 font-serif text-[16px] font-[500] leading-[22px]">
            {sentenceOf(judged, number)}
          </p>
          <button type="button" className="btn btn-sm" onClick={() => nudge(-10)}>
            10 s {judged.placing.what === 'length' ? 'shorter' : 'earlier'}
          </button>
          <button type="button" className="btn btn-sm" onClick={() => nudge(10)}>
            10 s {judged.placing.what === 'length' ? 'longer' : 'later'}
          </button>
          <button
            type="button"
            className={`btn btn-sm ${judged.verdict === 'no' ? '' : 'btn-primary'}`}
            onClick={() => drop(judged.verdict === 'no')}
          >
            {judged.verdict === 'no' ? 'Drop all the same (Shift Enter)' : 'Drop (Enter)'}
          </button>
          <button type="button" className="btn btn-sm" onClick={cancel}>
            Stop (Esc)
          </button>
        </div>
      )}
    </>
  );
}
