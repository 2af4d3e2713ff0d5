'use client';

import { useId, useState } from 'react';
import { Field } from '@/app/_ui/field';
import { dayText, minuteText, numberText } from '@/app/_ui/format';
import { Segments } from '@/app/_ui/segments';
import { serverNowMs } from '@/app/_ui/server-clock';
import { showToast } from '@/app/_ui/toast';
import { Trouble } from '@/app/_ui/trouble';
import { useActId } from '@/app/_ui/use-act-id';
import { useSending } from '@/app/_ui/use-sending';
import { predictClock, segmentAt } from '@/src/clock/fit';
import { offsetFromWords, offsetWords, readSize, type SizeUnit, type Tick } from '@/src/clock/reading';
import { allowedSeconds, type Slip } from '@/src/clock/slips';
import type { StationClockDto } from '@/src/data/clock/dto';
import { fullTimeText } from '@/src/schedule/words';
import { readTimeEntry } from '@/src/units/entry';
import { report } from '../actions';
import { Offset } from './numbers';
import { TickChoice } from './tick-choice';
import { Wiring } from './wiring';

type SecondCheck = 'yes' | 'no' | 'off';
type Draft = {
  pulse: 'formatter' | 'maser';
  tick: Tick | null;
  size: string;
  unit: SizeUnit;
  /** null is now */
  time: string | null;
  secondCheck: SecondCheck | null;
  secondOff: string;
  note: string;
};

const EMPTY: Draft = {
  pulse: 'formatter',
  tick: null,
  size: '',
  unit: 'µs',
  time: null,
  secondCheck: null,
  secondOff: '',
  note: '',
};

const UNITS: readonly SizeUnit[] = ['µs', 'ns', 'ms', 's'];

/** Which tick came first, by how much, said back in words; what the fit expects is shown only after both. */
export function ReadingForm({ clock, onChange }: { clock: StationClockDto; onChange: () => void }) {
  const { code } = clock.station;
  const [draft, setDraft] = useState<Draft>(EMPTY);
  const { form, fields, trouble, isSending, say, send: sendOff } = useSending();
  const [slip, setSlip] = useState<Slip | null>(null);
  const act = useActId();
  const unitId = useId();
  const set = (changed: Partial<Draft>) => {
    setDraft((before) => ({ ...before, ...changed }));
    say();
    setSlip(null);
  };

  const size = readSize(draft.size, draft.unit);
  const typedTime = draft.time === null ? null : readTimeEntry(draft.time, clock.nowMs);
  const readAtMs = typedTime?.ok ? typedTime.value : clock.nowMs;
  const offsetSeconds = draft.tick !== null && size.ok ? offsetFromWords(draft.tick, size.seconds) : null;

  const onSize = (text: string) => {
    const entry = readSize(text, draft.unit);
    const isSigned = !entry.ok && entry.isSigned;
    set({ size: isSigned ? text.replace(/^\s*[-+\u2212]\s*/, '') : text, ...(isSigned && { tick: null }) });
    if (isSigned) say({ size: entry.message });
  };

  const send = async (isSure: boolean, over: Partial<Draft> = {}) => {
    const held = { ...draft, ...over };
    const entry = readSize(held.size, held.unit);
    const time =
      held.time === null
        ? ({ ok: true, value: Math.floor(serverNowMs() / 1000) * 1000 } as const)
        : readTimeEntry(held.time, serverNowMs());
    const wrong: Record<string, string> = {};
    if (held.tick === null) wrong.tick = 'Which tick came first? Choose Early or Late.';
    if (!entry.ok) wrong.size = entry.message;
    if (!time.ok) wrong.atMs = time.message;
    if (held.secondCheck === null) wrong.secondCheck = 'Was the formatter’s second checked against UTC?';
    const isWhole = /^[-\u2212+]?\d{1,6}$/.test(held.secondOff.trim());
    if (held.secondCheck === 'off' && !isWhole) wrong.secondOff = 'Type whole seconds, for example 1.';
    say(wrong);
    if (Object.keys(wrong).length > 0 || !time.ok) return;
    const body = {
      actId: act.idOf(held),
      pulse: held.pulse,
      atMs: time.value,
      tick: held.tick,
      size: held.size,
      unit: held.unit,
      secondCheck: held.secondCheck,
      secondOff: held.secondCheck === 'off' ? Number(held.secondOff.trim().replace('\u2212', '-')) : null,
      note: held.note,
      isSure,
    };
    const answer = await sendOff(() => report(code, body));
    if (answer?.ok) {
      act.forget();
      setDraft({ ...EMPTY, pulse: held.pulse, unit: held.unit });
      setSlip(null);
      showToast({ message: `Stored: ${code} clock is ${offsetWords(answer.offsetSeconds)}.` });
    } else if (answer && 'slip' in answer && answer.slip) {
      say();
      setSlip(answer.slip);
    }
  };

  return (
    <form
      ref={form}
      className="clk-card clk-form"
      aria-labelledby="reading-title"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        void send(false);
      }}
    >
      <h2 id="reading-title">Clock reading</h2>
      <div className="flex flex-wrap items-center gap-2">
        <span className="font-head">Pulse</span>
        <Segments
          label="Pulse that was read"
          value={draft.pulse}
          options={[
            { value: 'formatter', label: 'Formatter' },
            { value: 'maser', label: 'Maser' },
          ]}
          onChoose={(pulse) => set({ pulse })}
        />
      </div>
      <Wiring station={clock.station} />
      <TickChoice code={code} tick={draft.tick} error={fields.tick} onChoose={(tick) => set({ tick })} />
      <div className="grid grid-cols-[1fr_72px] gap-2">
        <Field
          label="By how much?"
          className="clk-size"
          value={draft.size}
          inputMode="decimal"
          autoComplete="off"
          error={fields.size}
          onChange={(event) => onSize(event.target.value)}
        />
        <div>
          <label className="label" htmlFor={unitId}>
            Unit
          </label>
          <select
            id={unitId}
            className="field clk-size"
            value={draft.unit}
            onChange={(event) => set({ unit: UNITS.find((unit) => unit === event.target.value) ?? 'µs' })}
          >
            {UNITS.map((unit) => (
              <option key={unit}>{unit}</option>
            ))}
          </select>
        </div>
      </div>
      <p className="clk-sentence" aria-live="polite">
        {offsetSeconds === null ? (
          <span className="text-ink2">{code} clock is …</span>
        ) : (
          <>
            {code} clock is <Offset seconds={offsetSeconds} />.
          </>
        )}
      </p>
      <fieldset aria-describedby={fields.secondCheck ? `${unitId}-second` : undefined}>
        <legend className="label">Formatter second checked against UTC</legend>
        <div className="flex flex-wrap items-center gap-2">
          <div className="seg clk-touch" role="group" aria-label="Formatter second checked">
            {(
              [
                ['yes', 'Yes'],
                ['no', 'No'],
                ['off', 'Off by'],
              ] as const
            ).map(([value, label]) => (
              <button
                key={value}
                type="button"
                aria-pressed={draft.secondCheck === value}
                onClick={() => set({ secondCheck: value })}
              >
                {label}
              </button>
            ))}
          </div>
          {draft.secondCheck === 'off' && (
            <div className="w-[120px]">
              <Field
                label="Whole seconds"
                value={draft.secondOff}
                inputMode="numeric"
                error={fields.secondOff}
                end="s"
                onChange={(event) => set({ secondOff: event.target.value })}
              />
            </div>
          )}
        </div>
        {fields.secondCheck && (
          <p id={`${unitId}-second`} className="mt-1 text-small font-strong text-verm">
            {fields.secondCheck}
          </p>
        )}
      </fieldset>
      {draft.time === null ? (
        <p className="flex flex-wrap items-center gap-x-2">
          Read at <b>the moment of sending</b>
          <button type="button" className="btn btn-sm btn-quiet" onClick={() => set({ time: '' })}>
            Give another time
          </button>
        </p>
      ) : (
        <Field
          label="Read at, UT"
          value={draft.time}
          placeholder="044 00:58:20"
          error={fields.atMs}
          help="Time of day, with the day of year before it where it is not today."
          onChange={(event) => set({ time: event.target.value })}
          end={
            <button type="button" className="link" onClick={() => set({ time: null })}>
              Now
            </button>
          }
        />
      )}
      {fields.atMs && draft.time === null && (
        <p className="text-small font-strong text-verm">{fields.atMs}</p>
      )}
      <Field
        label="Note, if there is one"
        value={draft.note}
        maxLength={500}
        error={fields.note}
        onChange={(event) => set({ note: event.target.value })}
      />
      {offsetSeconds !== null && draft.pulse === 'formatter' && (
        <Expected clock={clock} offsetSeconds={offsetSeconds} atMs={readAtMs} />
      )}
      {slip && (
        <Question
          slip={slip}
          onMend={() => {
            const mended = mendOf(draft, slip);
            set(mended);
            void send(true, mended);
          }}
          onSure={() => void send(true)}
          onChange={onChange}
        />
      )}
      <Trouble says={trouble} />
      <button type="submit" className="btn btn-primary clk-send" aria-disabled={isSending}>
        {isSending ? 'Sending' : 'Send the reading'}
      </button>
    </form>
  );
}

/** The draft as it would be without the slip: the other tick, or the size that agrees. */
function mendOf(draft: Draft, slip: Slip): Partial<Draft> {
  const tick: Tick = slip.offsetSeconds >= 0 ? 'early' : 'late';
  if (slip.kind === 'sign') return { tick };
  const micro = Math.abs(slip.offsetSeconds) * 1e6;
  return { tick, unit: 'µs', size: String(Number(micro.toFixed(4))) };
}

function Question({
  slip,
  onMend,
  onSure,
  onChange,
}: {
  slip: Slip;
  onMend: () => void;
  onSure: () => void;
  onChange: () => void;
}) {
  return (
    <div role="alert" className="clk-question">
      <p>{slip.question}</p>
      <div className="flex flex-wrap gap-2">
        <button type="button" className="btn" onClick={onMend}>
          It is {offsetWords(slip.offsetSeconds)}
        </button>
        <button type="button" className="btn" onClick={onSure}>
          It is right as typed
        </button>
        <button type="button" className="btn btn-quiet" onClick={onChange}>
          It is right, something changed
        </button>
      </div>
    </div>
  );
}

/** Only after the tick and the size are given: the person is not led. */
type ExpectedProps = { clock: StationClockDto; offsetSeconds: number; /** when it was read */ atMs: number };

function Expected({ clock, offsetSeconds, atMs }: ExpectedProps) {
  const { fit, readings } = clock;
  const before = readings.filter((one) => one.state === 'used' && one.atMs < atMs).slice(0, 2);
  const at = new Date(atMs);
  const expected = fit && predictClock(fit, at);
  const scatter = (fit && segmentAt(fit, at)?.scatterSeconds) ?? 0;
  const allowed = expected && allowedSeconds(expected, scatter);
  const difference = expected && offsetSeconds - expected.offsetSeconds;
  return (
    <dl className="clk-numbers" aria-label="Against the fit">
      {expected && difference !== null && allowed !== null && (
        <>
          <div>
            <dt>Expected from the fit</dt>
            <dd>{lower(expected.offsetSeconds)}</dd>
          </div>
          <div>
            <dt>Difference</dt>
            <dd>
              <b>{numberText(Math.abs(difference) * 1e6, 3)} µs</b>,{' '}
              {Math.abs(difference) <= allowed ? 'inside' : 'outside'} ±{numberText(allowed * 1e6, 3)}
            </dd>
          </div>
        </>
      )}
      {before.map((one) => (
        <div key={one.id}>
          <dt title={fullTimeText(one.atMs)}>
            Before: day {dayText(one.atMs)}, {minuteText(one.atMs)}
          </dt>
          <dd>{lower(one.offsetSeconds)}</dd>
        </div>
      ))}
    </dl>
  );
}

const lower = (seconds: number) => offsetWords(seconds).replace('EARLY', 'early').replace('LATE', 'late');
