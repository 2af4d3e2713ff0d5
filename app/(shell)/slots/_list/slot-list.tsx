import type { Route } from 'next';
import Link from 'next/link';
import { AnswerBox } from '@/app/_ui/answer-box';
import { ANSWER_WORDS } from '@/app/_ui/answer-words';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { dayText, minuteText, spanText } from '@/app/_ui/format';
import { stationTime } from '@/app/_ui/station-time';
import type { ListedSlot } from '@/src/data/slot/dto';
import { fullTimeText } from '@/src/schedule/words';

type Props = { slots: readonly ListedSlot[]; nowMs: number };

/** The slots that wait for an answer, those to come, and those that are over. */
export function SlotList({ slots, nowMs }: Props) {
  if (slots.length === 0)
    return (
      <EmptySheet heading="No slot is offered">
        A slot is the hours a session asks of a station. It comes by mail and stands here from the day it is
        offered.
      </EmptySheet>
    );
  const ahead = slots.filter(({ endMs }) => endMs >= nowMs);
  const isWaiting = ({ answer }: ListedSlot) => answer === 'open' || answer === 'stale';
  const parts = [
    { title: 'To answer', slots: ahead.filter(isWaiting), none: 'Every slot ahead is answered.' },
    { title: 'Answered', slots: ahead.filter((slot) => !isWaiting(slot)), none: '' },
    { title: 'Over', slots: slots.filter(({ endMs }) => endMs < nowMs).reverse(), none: '' },
  ];
  return (
    <div className="slot-list">
      <h1>Slots</h1>
      {parts.map(
        (part) =>
          (part.slots.length > 0 || part.none !== '') && (
            <section key={part.title} aria-label={part.title}>
              <h2>
                {part.title} <span className="text-ink2">{part.slots.length}</span>
              </h2>
              {part.slots.length === 0 && <p className="help">{part.none}</p>}
              <ul>
                {part.slots.map((slot) => (
                  <Row key={`${slot.sessionCode} ${slot.stationCode}`} slot={slot} nowMs={nowMs} />
                ))}
              </ul>
            </section>
          ),
      )}
    </div>
  );
}

function Row({ slot, nowMs }: { slot: ListedSlot; nowMs: number }) {
  const { sessionCode, title, stationCode: code, stationName, timeZone, startMs, endMs, answer } = slot;
  const isToAnswer = (answer === 'open' || answer === 'stale') && endMs >= nowMs;
  const href = `/sessions/${encodeURIComponent(sessionCode)}/slots?station=${code}` as Route;
  return (
    <li>
      <AnswerBox code={code} name={stationName} answer={answer} />
      <div>
        <b className="font-serif text-h2">{title}</b>
        <p className="help">
          {sessionCode} · {stationName}
        </p>
      </div>
      <div>
        <p title={`${fullTimeText(startMs)} to ${fullTimeText(endMs)}`}>
          <b>
            day {dayText(startMs)}, {minuteText(startMs)} to day {dayText(endMs)}, {minuteText(endMs)} UT
          </b>
        </p>
        <p className="help">
          {stationTime(startMs, timeZone)} to {stationTime(endMs, timeZone)} ·{' '}
          {spanText(Math.round((endMs - startMs) / 60_000) * 60)}
        </p>
      </div>
      <div>
        <b className="inline-block first-letter:uppercase">{ANSWER_WORDS[answer]}</b>
        <p className="help">
          {slot.isOnBehalf && 'on behalf '}
          {slot.reason !== '' && `“${slot.reason}”`}
          {isToAnswer &&
            slot.answerByMs !== null &&
            `${slot.answerByMs < nowMs ? 'was due' : 'answer by'} ${fullTimeText(slot.answerByMs)}`}
        </p>
      </div>
      <Link
        className={`btn ${isToAnswer ? 'btn-primary' : ''}`}
        href={href}
        aria-label={`${isToAnswer ? 'Answer' : 'Open'}: ${stationName} in ${sessionCode}`}
      >
        {isToAnswer ? 'Answer' : 'Open'}
      </Link>
    </li>
  );
}
