'use client';

import { useId, useMemo, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { dayText, minuteText, numberText } from '@/app/_ui/format';
import type { SkySheet } from '@/src/data/sky/dto';
import { numberIn, numberOut } from '@/src/exchange/catalogue/field';
import { bestStart, startHours, type StartHours } from '@/src/schedule/best-start';
import type { StationCode } from '@/src/schedule/plan';
import { clockText } from '@/src/schedule/words';
import { MoveHours } from './move-hours';
import { ROW } from './row-grid';
import { gmstAt, gmstText, msAt, useWidth, type Scale } from './scale';
import { StartChart } from './start-chart';

const HOUR_MS = 3_600_000;
const DEFAULT_HOURS = 12;
const LEAST_HOURS = 0.2;

type Props = { sheet: SkySheet; codes: readonly StationCode[] };

/** When a session of some length would best start: station-hours and baseline-hours against its start. */
export function BestStart({ sheet, codes }: Props) {
  const { session, starts } = sheet;
  const sessionHours = session.lengthSeconds / 3600;
  const longest = starts.longestSeconds / 3600;
  // a session of a whole day is as good at any start
  const [typed, setTyped] = useState(
    numberOut(sessionHours < 24 ? Number(sessionHours.toFixed(2)) : DEFAULT_HOURS),
  );
  const [chosenMs, setChosenMs] = useState<number | null>(null);
  const { boxRef, width } = useWidth();
  const hours = readHours(typed, longest);
  const weighed = useMemo(
    () => (hours === null ? [] : weigh(starts.windows, codes, session.startMs, hours * HOUR_MS)),
    [starts.windows, codes, session.startMs, hours],
  );

  const best = bestStart(weighed);
  const [planned] = weighed;
  const chosen = weighed.find(({ startMs }) => startMs === chosenMs) ?? best;
  const scale: Scale = {
    startMs: session.startMs,
    endMs: weighed.at(-1)?.startMs ?? session.startMs + 24 * HOUR_MS,
    gmstStartHours: sheet.gmstStartHours,
    width,
  };
  const choose = (ms: number) => setChosenMs(nearest(weighed, ms)?.startMs ?? null);
  const step = (by: number) => {
    const at = weighed.findIndex(({ startMs }) => startMs === chosen?.startMs);
    setChosenMs(weighed[Math.max(0, Math.min(weighed.length - 1, at + by))]?.startMs ?? null);
  };
  const said = chosen ? sayStart(chosen, scale, codes.length, hours ?? 0) : '';

  return (
    <section className={`${ROW} relative border-t-head border-ink bg-sheet py-1`} aria-label="Best start">
      <Words
        targets={starts.windows.length}
        areTargets={starts.areTargets}
        typed={typed}
        onTyped={setTyped}
        longest={longest}
        isWrong={hours === null}
      />
      <div ref={boxRef} className="min-w-0 overflow-hidden desk:overflow-visible">
        <div
          role="slider"
          tabIndex={0}
          aria-label="Start to weigh, UT"
          aria-valuemin={0}
          aria-valuemax={Math.max(0, weighed.length - 1)}
          aria-valuenow={Math.max(
            0,
            weighed.findIndex(({ startMs }) => startMs === chosen?.startMs),
          )}
          aria-valuetext={said}
          onKeyDown={(event) => onKey(event, { step, best: () => setChosenMs(null) })}
          onPointerDown={(event) => choose(msAt(scale, pointerX(event)))}
          onPointerMove={(event) => event.buttons === 1 && choose(msAt(scale, pointerX(event)))}
          className="cursor-col-resize touch-pan-y"
        >
          <StartChart
            starts={weighed}
            chosen={chosen}
            planned={planned ?? null}
            most={{ stations: codes.length * (hours ?? 0), baselines: pairsOf(codes.length) * (hours ?? 0) }}
            scale={scale}
          />
        </div>
      </div>
      <div className="min-w-0 pt-1 desk:pl-[12px] desk:pr-[10px]">
        {chosen && planned && hours !== null && (
          <>
            <p className="text-lead">{numberText(chosen.stationHours, 1)} station-hours</p>
            <p className="text-ink2">{numberText(chosen.baselineHours, 1)} baseline-hours</p>
            <p className="help mb-1.5">
              At {minuteText(planned.startMs)}: {numberText(planned.stationHours, 1)} and{' '}
              {numberText(planned.baselineHours, 1)}. Means over {starts.windows.length}{' '}
              {starts.areTargets ? 'targets' : 'sources'}.
            </p>
            {starts.move && (
              <MoveHours
                session={session}
                move={starts.move}
                to={{ startMs: chosen.startMs, lengthSeconds: Math.round(hours * 3600) }}
              />
            )}
          </>
        )}
      </div>
    </section>
  );
}

type WordsProps = {
  targets: number;
  areTargets: boolean;
  typed: string;
  onTyped: (typed: string) => void;
  longest: number;
  isWrong: boolean;
};

function Words({ targets, areTargets, typed, onTyped, longest, isWrong }: WordsProps) {
  const id = useId();
  const one = areTargets ? 'target' : 'source';
  return (
    <div className="min-w-0 text-small desk:pl-[16px] desk:pr-[30px]">
      <h2 className="text-lead">Best start</h2>
      <label className="flex items-center gap-1" htmlFor={id}>
        for
        <input
          id={id}
          className="field h-[24px] w-[44px] px-1 text-right"
          inputMode="decimal"
          value={typed}
          aria-label="Length of the session, hours"
          aria-invalid={isWrong}
          aria-describedby={isWrong ? `${id}-wrong` : undefined}
          onChange={(event) => onTyped(event.target.value)}
        />
        h
      </label>
      <p>
        {targets} {targets === 1 ? one : `${one}s`}
      </p>
      {isWrong ? (
        <p id={`${id}-wrong`} role="alert" className="font-strong text-verm">
          Type hours from {LEAST_HOURS} to {numberText(longest)}.
        </p>
      ) : (
        <>
          <p className="w-[86px] border-b-[1.75px] border-teal font-head text-teal">station-hours</p>
          <p className="w-[86px] border-b border-dashed border-ink font-head">baseline-hours</p>
          <p className="help">per cent of possible</p>
        </>
      )}
      <p className="absolute left-[16px] top-[121px] hidden desk:block" aria-hidden="true">
        start, UT
        <span className="block text-tick leading-[11px] text-ink3">GMST</span>
      </p>
    </div>
  );
}

function weigh(
  windows: SkySheet['starts']['windows'],
  codes: readonly StationCode[],
  fromMs: number,
  lengthMs: number,
): StartHours[] {
  return startHours(
    windows.map((byStation) => codes.map((code) => byStation[code] ?? [])),
    fromMs,
    lengthMs,
  );
}

function readHours(typed: string, longest: number): number | null {
  const hours = numberIn(typed);
  return hours !== null && hours >= LEAST_HOURS && hours <= longest ? hours : null;
}

function nearest(starts: readonly StartHours[], ms: number): StartHours | null {
  return starts.reduce<StartHours | null>(
    (best, one) => (best === null || Math.abs(one.startMs - ms) < Math.abs(best.startMs - ms) ? one : best),
    null,
  );
}

/** "Day 044 18:30, GMST 05:32: 52.7 of 72 station-hours, 98 of 180 baseline-hours" */
function sayStart(start: StartHours, scale: Scale, count: number, hours: number): string {
  const stations = `${numberText(start.stationHours, 1)} of ${numberText(count * hours)} station-hours`;
  const baselines = `${numberText(start.baselineHours, 1)} of ${numberText(pairsOf(count) * hours)} baseline-hours`;
  const gmst = gmstText(gmstAt(scale, start.startMs));
  return `Day ${dayText(start.startMs)} ${clockText(start.startMs)}, GMST ${gmst}: ${stations}, ${baselines}`;
}

const pairsOf = (count: number) => (count * (count - 1)) / 2;

const pointerX = (event: PointerEvent<HTMLElement>) =>
  event.clientX - event.currentTarget.getBoundingClientRect().left;

type Moves = { step: (by: number) => void; best: () => void };

function onKey(event: KeyboardEvent, { step, best }: Moves) {
  if (event.ctrlKey || event.metaKey || event.altKey) return;
  const acts: Readonly<Record<string, () => void>> = {
    ArrowLeft: () => step(event.shiftKey ? -6 : -1),
    ArrowDown: () => step(-1),
    ArrowRight: () => step(event.shiftKey ? 6 : 1),
    ArrowUp: () => step(1),
    PageDown: () => step(-6),
    PageUp: () => step(6),
    Home: () => step(-Infinity),
    End: () => step(Infinity),
    Escape: best,
  };
  const act = acts[event.key];
  if (!act) return;
  act();
  event.preventDefault();
}
