'use client';

import { formatInTimeZone } from 'date-fns-tz';
import { useRef, useState } from 'react';
import { AnswerBox } from '@/app/_ui/answer-box';
import { Field } from '@/app/_ui/field';
import { minuteText, spanText } from '@/app/_ui/format';
import { newId } from '@/app/_ui/new-id';
import { Segments } from '@/app/_ui/segments';
import { showToast } from '@/app/_ui/toast';
import type { SlotDto } from '@/src/data/slot/dto';
import { hoursWithout, type Hours } from '@/src/schedule/slots';
import { fullTimeText, listText } from '@/src/schedule/words';
import { readTimeEntry } from '@/src/units/entry';
import { reply } from '../actions';

const HALF_DAY_MS = 12 * 3_600_000;

type Said = 'confirmed' | 'partly' | 'declined';
type Props = { sessionId: string; offerId: string; slot: SlotDto };

const CHOICES = [
  { value: 'confirmed', label: 'Confirm' },
  { value: 'partly', label: 'In part' },
  { value: 'declined', label: 'Decline' },
] as const;

/** The hours asked of a station in UT and in its own time, what it said, and the form of its answer. */
export function AnswerPanel({ sessionId, offerId, slot }: Props) {
  const { stationCode: code, stationName, timeZone, startMs, endMs, scans } = slot;
  const zone = (ms: number) => `${formatInTimeZone(ms, timeZone, 'HH:mm zzz')}, ${timeZone}`;
  return (
    <>
      <header className="flex items-center justify-between gap-2">
        <h2 className="text-[22px] leading-[26px]">{stationName}</h2>
        <AnswerBox code={code} name={stationName} answer={slot.answer} />
      </header>
      <dl className="slots-facts">
        <div>
          <dt>From</dt>
          <dd>
            <b>{fullTimeText(startMs)}</b>
            <span>{zone(startMs)}</span>
          </dd>
        </div>
        <div>
          <dt>To</dt>
          <dd>
            <b>{fullTimeText(endMs)}</b>
            <span>{zone(endMs)}</span>
          </dd>
        </div>
        <div>
          <dt>Scans</dt>
          <dd>
            {slot.scanCount}, on source{' '}
            {spanText(scans.reduce((sum, scan) => sum + (scan.stopMs - scan.startMs) / 1000, 0))}
          </dd>
        </div>
        <div>
          <dt>Lead and tail</dt>
          <dd>15 min and 5 min, inside</dd>
        </div>
      </dl>
      {slot.answer === 'stale' && (
        <p className="slots-asked">
          What is asked has moved out of the hours {code} said yes to. {code} is asked again.
        </p>
      )}
      {slot.canReply ? (
        <AnswerForm sessionId={sessionId} offerId={offerId} slot={slot} />
      ) : (
        <p className="help">The operators of {stationName} answer for it, or a scheduler on their behalf.</p>
      )}
    </>
  );
}

function AnswerForm({ sessionId, offerId, slot }: Props) {
  const { stationCode: code, startMs, endMs, isOwn } = slot;
  const [said, setSaid] = useState<Said | null>(null);
  const [from, setFrom] = useState('');
  const [until, setUntil] = useState('');
  const [reason, setReason] = useState('');
  const [fields, setFields] = useState<Record<string, string>>({});
  const [trouble, setTrouble] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const actId = useRef<string | null>(null);

  const fromEntry = readTimeEntry(from, startMs + HALF_DAY_MS);
  // the first such time after the other
  const untilNear = fromEntry.ok ? fromEntry.value + HALF_DAY_MS : endMs - HALF_DAY_MS;
  const times = [fromEntry, readTimeEntry(until, untilNear)] as const;
  const without: Hours | null =
    times[0].ok && times[1].ok && times[1].value > times[0].value ? [times[0].value, times[1].value] : null;
  const given = givenHours(slot, said, without);

  const send = async () => {
    const wrong: Record<string, string> = {};
    if (said === null) wrong.said = 'Choose one of the three.';
    if (said === 'partly' && !times[0].ok) wrong.from = times[0].message;
    if (said === 'partly' && !times[1].ok) wrong.until = times[1].message;
    if (said !== 'confirmed' && said !== null && reason.trim() === '')
      wrong.reason = 'Say why, so that the scheduler can plan around it.';
    setFields(wrong);
    setTrouble(null);
    if (Object.keys(wrong).length > 0) return;
    actId.current ??= newId();
    setIsSending(true);
    try {
      const answer = await reply(sessionId, code, {
        actId: actId.current,
        offerId,
        reply: said,
        ...(said !== 'confirmed' && { reason }),
        ...(said === 'partly' && {
          without: [times[0].ok ? times[0].value : 0, times[1].ok ? times[1].value : 0],
        }),
      });
      if (answer.ok) {
        actId.current = null;
        setSaid(null);
        showToast({ message: `Sent: ${code} ${said === 'partly' ? 'in part' : said}.` });
        return;
      }
      const back = Object.entries(answer.fields ?? {}).map(([field, words]) => [field, words.join(' ')]);
      if (back.length === 0) setTrouble(answer.message);
      setFields(Object.fromEntries(back) as Record<string, string>);
    } catch (error) {
      if (!(error instanceof TypeError)) throw error;
      setTrouble('There is no line. What you typed is kept: send it again when the line is back.');
    } finally {
      setIsSending(false);
    }
  };

  return (
    <form
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
        onChoose={(value) => {
          if (value !== '') setSaid(value);
          setFields({});
        }}
      />
      {fields.said && <p className="text-small font-strong text-verm">{fields.said}</p>}
      {said === 'partly' && (
        <div className="grid grid-cols-2 gap-2.5">
          <TimeField
            label="Cannot from, UT"
            text={from}
            near={startMs + HALF_DAY_MS}
            zone={slot.timeZone}
            error={fields.from ?? fields.without}
            onText={setFrom}
          />
          <TimeField
            label="until, UT"
            text={until}
            near={untilNear}
            zone={slot.timeZone}
            error={fields.until}
            onText={setUntil}
          />
        </div>
      )}
      {(said === 'partly' || said === 'declined') && (
        <Field
          label="Why, in a few words for the scheduler"
          value={reason}
          maxLength={500}
          error={fields.reason}
          onChange={(event) => setReason(event.target.value)}
        />
      )}
      {said !== null && <Cost slot={slot} said={said} without={without} />}
      {said !== null && given !== null && (
        <p className="slots-asked" aria-live="polite">
          {said === 'declined'
            ? `${code} does not observe.`
            : `${code} observes ${listText(given.map(([a, b]) => `${minuteText(a)} to ${minuteText(b)}`))} UT: ${spanText(sum(given))} of ${spanText((endMs - startMs) / 1000)}.`}
        </p>
      )}
      {trouble !== null && (
        <p role="alert" className="error-box">
          {trouble}
        </p>
      )}
      <button
        type="submit"
        className={`btn slots-send ${said === 'declined' ? 'btn-danger' : 'btn-primary'}`}
        disabled={isSending}
      >
        {isSending
          ? 'Sending'
          : said === null
            ? 'Send the answer'
            : `Send: ${said === 'partly' ? 'in part' : said}`}
      </button>
      <p className="help">It can be changed by a new answer as long as the session is open.</p>
    </form>
  );
}

function TimeField({
  label,
  text,
  near,
  zone,
  error,
  onText,
}: {
  label: string;
  text: string;
  near: number;
  zone: string;
  error: string | undefined;
  onText: (text: string) => void;
}) {
  const entry = readTimeEntry(text, near);
  return (
    <Field
      label={label}
      value={text}
      placeholder="22:50"
      inputMode="numeric"
      error={error}
      help={
        entry.ok
          ? formatInTimeZone(entry.value, zone, "HH:mm zzz 'day' DDD", { useAdditionalDayOfYearTokens: true })
          : undefined
      }
      onChange={(event) => onText(event.target.value)}
    />
  );
}

/** Which scans an answer costs, before it is sent. */
function Cost({ slot, said, without }: { slot: SlotDto; said: Said; without: Hours | null }) {
  const away: Hours[] =
    said === 'declined' ? [[slot.startMs, slot.endMs]] : said === 'partly' && without ? [without] : [];
  const hit = slot.scans.filter(({ startMs, stopMs }) =>
    away.some(([from, until]) => from < stopMs && until > startMs),
  );
  if (said === 'confirmed') return null;
  if (said === 'partly' && without === null) return null;
  if (hit.length === 0) return <p className="help">No scan lies in these hours.</p>;
  const whole = hit.filter(({ startMs, stopMs }) =>
    away.some(([from, until]) => from <= startMs && until >= stopMs),
  );
  const named = [...new Set(hit.map(({ number }) => number.replace(/\.\d+$/, '')))];
  return (
    <p className="slots-cost" role="status">
      <b>
        Hits {named.length} of {slot.scanCount} {slot.scanCount === 1 ? 'scan' : 'scans'}
      </b>
      : {listText(named.length > 7 ? [...named.slice(0, 6), `${named.length - 6} more`] : named)}.
      {whole.length < hit.length ? ' What lies outside these hours is kept.' : ' All of each is lost.'}
    </p>
  );
}

function givenHours(slot: SlotDto, said: Said | null, without: Hours | null): Hours[] | null {
  const span: Hours = [slot.startMs, slot.endMs];
  if (said === 'confirmed') return [span];
  if (said === 'declined') return [];
  return without && hoursWithout(span, { hours: [without] });
}

const sum = (hours: readonly Hours[]): number =>
  hours.reduce((total, [from, until]) => total + (until - from) / 1000, 0);
