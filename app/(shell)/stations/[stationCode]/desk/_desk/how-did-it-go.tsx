'use client';

import { useId, useState } from 'react';
import { Field } from '@/app/_ui/field';
import { fieldWords } from '@/app/_ui/use-sending';
import type { DeskScan } from '@/src/data/desk/dto';
import type { Reason } from '@/src/data/outcome/read';
import { clockText } from '@/src/schedule/words';
import { readTimeEntry } from '@/src/units/entry';
import { OutcomeMark, OUTCOMES, REASON_WORDS } from './outcome-words';
import type { Saying } from './use-saying';

/** One tap for good, six seconds to take it back; partly and lost ask for times and one reason. */
export function HowDidItGo({ scan, saying, onDone }: { scan: DeskScan; saying: Saying; onDone: () => void }) {
  const [asked, setAsked] = useState<'partly' | 'lost' | null>(null);
  const said = saying.outcomeOf(scan.scanId);
  return (
    <section aria-labelledby="went-title" className="desk-went">
      <h2 id="went-title">
        Scan {scan.number} ended {clockText(scan.stopMs)}. How did it go?
      </h2>
      {said && <p className="help">Said so far: {said.outcome}. What you say now amends it.</p>}
      {saying.trouble !== null && (
        <p role="alert" className="error-box">
          {saying.trouble}
        </p>
      )}
      <div className="desk-three">
        {OUTCOMES.map(([outcome, word]) => (
          <button
            key={outcome}
            type="button"
            className="btn desk-big"
            aria-expanded={outcome === 'good' ? undefined : asked === outcome}
            onClick={() => {
              if (outcome !== 'good') return setAsked(asked === outcome ? null : outcome);
              saying.sayGood(scan);
              onDone();
            }}
          >
            <OutcomeMark outcome={outcome} />
            {word}
          </button>
        ))}
      </div>
      {asked ? (
        <Why
          key={asked}
          scan={scan}
          outcome={asked}
          saying={saying}
          onDone={onDone}
          onStop={() => setAsked(null)}
        />
      ) : (
        <p className="help">Partly and Lost ask for the times and one reason.</p>
      )}
    </section>
  );
}

type WhyProps = {
  scan: DeskScan;
  outcome: 'partly' | 'lost';
  saying: Saying;
  onDone: () => void;
  onStop: () => void;
};

function Why({ scan, outcome, saying, onDone, onStop }: WhyProps) {
  const name = useId();
  const [from, setFrom] = useState(clockText(scan.startMs));
  const [until, setUntil] = useState(clockText(scan.stopMs));
  const [reason, setReason] = useState<Reason | null>(null);
  const [text, setText] = useState('');
  const [fields, setFields] = useState<Record<string, string>>({});
  const [isSending, setIsSending] = useState(false);

  const send = async () => {
    if (isSending) return;
    const times = [readTimeEntry(from, scan.startMs), readTimeEntry(until, scan.stopMs)] as const;
    const wrong: Record<string, string> = {};
    if (outcome === 'partly' && !times[0].ok) wrong.from = times[0].message;
    if (outcome === 'partly' && !times[1].ok) wrong.until = times[1].message;
    if (reason === null) wrong.reason = 'Choose one reason of the eight.';
    setFields(wrong);
    if (Object.keys(wrong).length > 0 || reason === null) return;
    const lost = times[0].ok && times[1].ok ? ([times[0].value, times[1].value] as [number, number]) : null;
    setIsSending(true);
    const answer = await saying.say(
      scan,
      outcome === 'partly' && lost
        ? { outcome: 'partly', lost, reason, text }
        : { outcome: 'lost', reason, text },
    );
    setIsSending(false);
    if (answer.ok) return onDone();
    setFields(fieldWords(answer.fields));
  };

  return (
    <form
      className="desk-why"
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      {outcome === 'partly' && (
        <div className="grid grid-cols-2 gap-2.5">
          <Field
            label="Off source from, UT"
            value={from}
            onChange={(event) => setFrom(event.target.value)}
            error={fields.from ?? fields.lost}
            inputMode="numeric"
          />
          <Field
            label="until, UT"
            value={until}
            onChange={(event) => setUntil(event.target.value)}
            error={fields.until}
            inputMode="numeric"
          />
        </div>
      )}
      <fieldset aria-describedby={fields.reason ? `${name}-error` : undefined}>
        <legend className="label">Why</legend>
        <div className="desk-reasons">
          {REASON_WORDS.map(([value, word]) => (
            <label key={value} className="desk-reason">
              <input type="radio" name={name} checked={reason === value} onChange={() => setReason(value)} />
              {word}
            </label>
          ))}
        </div>
        {fields.reason && (
          <p id={`${name}-error`} className="mt-1 text-small font-strong text-verm">
            {fields.reason}
          </p>
        )}
      </fieldset>
      <Field
        label={reason === 'other' ? 'In a few words' : 'In a few words, if it helps'}
        value={text}
        onChange={(event) => setText(event.target.value)}
        error={fields.text}
        maxLength={500}
      />
      <div className="flex gap-2">
        <button type="submit" className="btn btn-primary desk-big" aria-disabled={isSending}>
          {isSending ? 'Sending' : `Say scan ${scan.number} was ${outcome}`}
        </button>
        <button type="button" className="btn desk-big" onClick={onStop}>
          Leave
        </button>
      </div>
    </form>
  );
}
