'use client';

import { useState } from 'react';
import { Field } from '@/app/_ui/field';
import { minuteText, spanText } from '@/app/_ui/format';
import { Segments } from '@/app/_ui/segments';
import { stationTime } from '@/app/_ui/station-time';
import { showToast } from '@/app/_ui/toast';
import { Trouble } from '@/app/_ui/trouble';
import { useActId } from '@/app/_ui/use-act-id';
import { useSending } from '@/app/_ui/use-sending';
import type { SlotDto } from '@/src/data/slot/dto';
import { hoursWithout, within, type Hours } from '@/src/schedule/slots';
import { fullTimeText, listText } from '@/src/schedule/words';
import { readTimeEntry } from '@/src/units/entry';
import { reply } from '../actions';
import { Cost } from './cost';

const HALF_DAY_MS = 12 * 3_600_000;
const NOTHING_SAID = 'Say why, so that the scheduler can plan around it.';
const REASONS = ['Antenna', 'Receiver', 'Recorder', 'Staff', 'Power', 'Other'] as const;
const CHOICES = [
  { value: 'confirmed', label: 'Confirm' },
  { value: 'partly', label: 'In part' },
  { value: 'declined', label: 'Decline' },
] as const;

type Said = (typeof CHOICES)[number]['value'];
/** An answer that is being made, as its bar would look. */
export type Preview = Pick<SlotDto, 'answer' | 'hours' | 'without'>;
type Props = {
  sessionId: string;
  offerId: string;
  slot: SlotDto;
  onPreview: (preview: Preview | null) => void;
};
type Entered = { said: Said | null; from: string; until: string };

export function AnswerForm({ sessionId, offerId, slot, onPreview }: Props) {
  const { stationCode: code, isOwn } = slot;
  const [entered, setEntered] = useState<Entered>({ said: null, from: '', until: '' });
  const [why, setWhy] = useState<(typeof REASONS)[number] | null>(null);
  const [words, setWords] = useState('');
  const { form, fields, trouble, isSending, say, send: sendOff } = useSending();
  const act = useActId();

  const { said } = entered;
  const read = readHours(slot, entered);
  const reason = [why === 'Other' ? null : why, words.trim()].filter(Boolean).join(': ');
  const change = (over: Partial<Entered>) => {
    const next = { ...entered, ...over };
    setEntered(next);
    say();
    onPreview(previewOf(slot, next));
  };

  const send = async () => {
    const wrong: Record<string, string> = {};
    if (said === null) wrong.said = 'Choose one of the three.';
    if (said === 'partly' && !read.from.ok) wrong.from = read.from.message;
    if (said === 'partly' && !read.until.ok) wrong.until = read.until.message;
    if (said !== null && said !== 'confirmed' && reason === '') wrong.reason = NOTHING_SAID;
    say(wrong);
    if (said === null || Object.keys(wrong).length > 0) return;
    const body = {
      offerId,
      reply: said,
      ...(said !== 'confirmed' && { reason }),
      ...(said === 'partly' &&
        read.from.ok &&
        read.until.ok && { without: [read.from.value, read.until.value] }),
    };
    const answer = await sendOff(() => reply(sessionId, code, { ...body, actId: act.idOf(body) }));
    if (!answer?.ok) return;
    act.forget();
    change({ said: null, from: '', until: '' });
    setWhy(null);
    setWords('');
    onPreview(null);
    showToast({ message: `Sent: ${code} ${said === 'partly' ? 'in part' : said}.` });
  };

  return (
    <form
      ref={form}
      className="slots-form"
      noValidate
      aria-label={isOwn ? 'Your answer' : `Answer for ${code}`}
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <h3 className="font-serif text-h2">{isOwn ? 'Your answer' : `Answer for ${code}`}</h3>
      {!isOwn && <p className="help">As said by phone, for instance. It is marked “on behalf”.</p>}
      <Segments<Said | ''>
        label="Answer"
        value={said ?? ''}
        options={CHOICES}
        onChoose={(value) => value !== '' && change({ said: value })}
      />
      {fields.said && (
        <p role="alert" className="text-small font-strong text-verm">
          {fields.said}
        </p>
      )}
      {said === 'partly' && (
        <div className="grid grid-cols-2 gap-2.5">
          <TimeField
            label="Cannot from, UT"
            text={entered.from}
            entry={read.from}
            zone={slot.timeZone}
            error={fields.from ?? fields.without}
            onText={(from) => change({ from })}
          />
          <TimeField
            label="until, UT"
            text={entered.until}
            entry={read.until}
            zone={slot.timeZone}
            error={fields.until}
            onText={(until) => change({ until })}
          />
        </div>
      )}
      {(said === 'partly' || said === 'declined') && (
        <>
          <div role="group" aria-label="Reason" className="slots-why">
            {REASONS.map((one) => (
              <button key={one} type="button" aria-pressed={one === why} onClick={() => setWhy(one)}>
                {one}
              </button>
            ))}
          </div>
          <Field
            label="Why, in a few words for the scheduler"
            value={words}
            maxLength={480}
            error={fields.reason}
            onChange={(event) => setWords(event.target.value)}
          />
        </>
      )}
      {said === 'declined' && <Cost slot={slot} without={[[slot.startMs, slot.endMs]]} />}
      {said === 'partly' && read.without && <Cost slot={slot} without={[read.without]} />}
      <Outcome slot={slot} said={said} without={read.without} />
      <Trouble says={trouble} />
      <button
        type="submit"
        className={`btn slots-send ${said === 'declined' ? 'btn-danger' : 'btn-primary'}`}
        aria-disabled={isSending}
      >
        {isSending ? 'Sending' : sendWords(said)}
      </button>
      <p className="help">It can be changed by a new answer as long as the session is open.</p>
    </form>
  );
}

const sendWords = (said: Said | null): string => {
  if (said === 'confirmed') return 'Confirm the slot';
  if (said === 'declined') return 'Decline the whole slot';
  return said === 'partly' ? 'Send: in part' : 'Send the answer';
};

/** The answer said back in full before it is sent. */
function Outcome({ slot, said, without }: { slot: SlotDto; said: Said | null; without: Hours | null }) {
  const { stationCode: code, startMs, endMs, scanCount } = slot;
  if (said === null || (said === 'partly' && without === null)) return null;
  if (said === 'declined') return <p className="slots-asked">{code} does not observe.</p>;
  if (said === 'confirmed')
    return (
      <>
        <p className="slots-asked" aria-live="polite">
          {code} observes {fullTimeText(startMs)} to {fullTimeText(endMs)}:{' '}
          {scanCount === 1 ? 'its one scan' : `all ${scanCount} scans`}.
        </p>
        <p className="help">
          If the plan moves outside these hours or the mode changes, {code} is asked again.
        </p>
      </>
    );
  const lost = without === null ? [] : within([startMs, endMs], [without]);
  const rest = freeOf(slot, without);
  if (rest.length === 0) return <p className="slots-asked">That is the whole slot: decline it instead.</p>;
  if (lost.length === 0) return <p className="slots-asked">These hours lie outside the slot.</p>;
  return (
    <p className="slots-asked" aria-live="polite">
      {code} observes {listText(rest.map(([from, until]) => `${minuteText(from)} to ${minuteText(until)}`))}{' '}
      UT: {spanText(lengthOf(rest))} of {spanText((endMs - startMs) / 1000)}.
    </p>
  );
}

type TimeFieldProps = {
  label: string;
  text: string;
  entry: ReturnType<typeof readTimeEntry>;
  zone: string;
  error: string | undefined;
  onText: (text: string) => void;
};

function TimeField({ label, text, entry, zone, error, onText }: TimeFieldProps) {
  return (
    <Field
      label={label}
      value={text}
      placeholder="22:50"
      inputMode="numeric"
      error={error}
      help={entry.ok ? stationTime(entry.value, zone) : undefined}
      onChange={(event) => onText(event.target.value)}
    />
  );
}

/** The two times as typed: without a day, the first such times in the slot. */
function readHours({ startMs, endMs }: SlotDto, { from, until }: Entered) {
  const start = readTimeEntry(from, startMs + HALF_DAY_MS);
  const end = readTimeEntry(until, start.ok ? start.value + HALF_DAY_MS : endMs - HALF_DAY_MS);
  const without: Hours | null =
    start.ok && end.ok && end.value > start.value ? [start.value, end.value] : null;
  return { from: start, until: end, without };
}

/** What a slot keeps without some hours. */
const freeOf = ({ startMs, endMs }: SlotDto, without: Hours | null): Hours[] =>
  without === null ? [[startMs, endMs]] : hoursWithout([startMs, endMs], { hours: [without] });

function previewOf(slot: SlotDto, entered: Entered): Preview | null {
  const span: Hours = [slot.startMs, slot.endMs];
  if (entered.said === 'confirmed') return { answer: 'confirmed', hours: [span], without: [] };
  if (entered.said === 'declined') return { answer: 'declined', hours: [], without: [span] };
  const { without } = readHours(slot, entered);
  if (entered.said === null || without === null) return null;
  return { answer: 'partly', hours: freeOf(slot, without), without: within(span, [without]) };
}

const lengthOf = (hours: readonly Hours[]): number =>
  hours.reduce((total, [from, until]) => total + (until - from) / 1000, 0);
