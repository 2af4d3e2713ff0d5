'use client';

import { clockText, shortLengthText } from '@/src/schedule/words';
import { useJudgement, type Judged } from './placement';
import { HEAD, staveTop, xOf, type Frame } from './scale';

const WIDTH = 203;

/** Beside the ghost: who can watch, who cannot and why, fringes, the tightest station, one verdict. */
export function ReadOut({ frame }: { frame: Frame }) {
  const judged = useJudgement();
  if (!judged || !judged.placing.pointer) return null;
  const { placing } = judged;
  const stopX = xOf(frame, placing.startMs + placing.lengthSeconds * 1000);
  const startX = xOf(frame, placing.startMs);
  const pointerX = placing.pointer?.x ?? startX;
  const right = Math.max(stopX, pointerX) + 14;
  const left = right + WIDTH < frame.right ? right : Math.min(startX, pointerX) - WIDTH - 14;
  return (
    <div
      aria-hidden="true"
      className="pointer-events-none absolute z-ghost border-frame border-ink bg-sheet px-[11px] py-[9px] text-table leading-[17px] shadow-cut"
      style={{
        width: WIDTH,
        left: Math.max(HEAD, left),
        top: staveTop(frame, Math.min(2, frame.staveCount - 1)) + 38,
      }}
    >
      <h3 className="mb-[3px] text-[13.5px]">
        {placing.isCopy && 'Copy of '}
        {judged.sourceName}
      </h3>
      <ReadOutRows judged={judged} />
      <Verdict judged={judged} />
    </div>
  );
}

function ReadOutRows({ judged }: { judged: Judged }) {
  const { placing, can, cannot, expected, possible, tightest } = judged;
  return (
    <dl className="grid grid-cols-[70px_1fr] gap-x-1.5 gap-y-px [&>dt]:text-ink2">
      <dt>Start</dt>
      <dd>
        <b>{clockText(placing.startMs)}</b>, {shortLengthText(placing.lengthSeconds)}
      </dd>
      <dt>Can watch</dt>
      <dd>
        <b>{can.length === 0 ? 'none' : can.join(' ')}</b>
      </dd>
      {cannot.length > 0 && (
        <>
          <dt>Cannot</dt>
          <dd>
            {byReason(cannot).map(([why, codes]) => (
              <div key={why}>
                <b>{codes.join(' ')}</b>, {why}
              </div>
            ))}
          </dd>
        </>
      )}
      <dt>Fringes</dt>
      <dd>
        <b>
          {expected} of {possible}
        </b>{' '}
        baselines
      </dd>
      {tightest && (
        <>
          <dt>Tightest</dt>
          <dd>
            <b>{tightest.station}</b>, {spareWords(tightest.spareSeconds)}
          </dd>
        </>
      )}
    </dl>
  );
}

function Verdict({ judged }: { judged: Judged }) {
  const tone = { fits: 'text-teal', note: 'text-ink', no: 'text-verm' }[judged.verdict];
  return (
    <div className={`mt-1 border-t border-rule pt-1 ${tone}`}>
      <b>{VERDICT_WORDS[judged.verdict]}</b> {judged.reason}
      {judged.reason === '' && judged.placing.snappedTo !== null && `Snapped to ${judged.placing.snappedTo}.`}
    </div>
  );
}

export const VERDICT_WORDS = { fits: 'Fits.', note: 'Fits, with a note.', no: 'Does not fit.' } as const;

export const spareWords = (seconds: number) =>
  seconds < 0 ? `${shortLengthText(seconds)} short` : `${shortLengthText(Math.floor(seconds))} spare`;

/** Stations that cannot for the same reason share a line. */
function byReason(cannot: Judged['cannot']): [why: string, codes: string[]][] {
  const lines = new Map<string, string[]>();
  for (const { station, why } of cannot) lines.set(why, [...(lines.get(why) ?? []), station]);
  return [...lines];
}
