import type { Route } from 'next';
import Link from 'next/link';
import { Chip } from '@/app/_ui/chip';
import { dayText, minuteText, spanText } from '@/app/_ui/format';
import { offsetWords } from '@/src/clock/reading';
import type { DeskDto } from '@/src/data/desk/dto';
import { ANSWER_WORDS } from '@/app/_ui/answer-words';

const HOUR_MS = 3_600_000;

/** The station's slots and its clock, each with the page where it is answered. */
export function Slots({ desk, now }: { desk: DeskDto; now: number }) {
  const { code } = desk.station;
  return (
    <>
      <section aria-labelledby="slot-title" className="desk-card">
        <h2 id="slot-title">Your slots</h2>
        {desk.slots.length === 0 && <p className="help">No slot is offered to {code} from now on.</p>}
        {desk.slots.map(({ sessionCode, title, startMs, endMs, answer }) => (
          <div key={sessionCode} className="flex flex-col gap-1 border-b border-hair pb-2">
            <div className="flex items-center justify-between gap-2">
              <b>
                {sessionCode} {title}
              </b>
              <Chip tone={answer === 'confirmed' ? 'ok' : answer === 'declined' ? 'bad' : 'warn'}>
                {ANSWER_WORDS[answer]}
              </Chip>
            </div>
            <p className="help">
              Day {dayText(startMs)}, {minuteText(startMs)} to day {dayText(endMs)}, {minuteText(endMs)} UT ·{' '}
              {spanText((endMs - startMs) / 1000)}
            </p>
            <Link
              className="btn desk-link"
              href={`/sessions/${encodeURIComponent(sessionCode)}/slots` as Route}
            >
              {answer === 'open' || answer === 'stale' ? 'Answer for the slot' : 'Look at the slot'}
            </Link>
          </div>
        ))}
      </section>
      <section aria-labelledby="clock-title" className="desk-card">
        <h2 id="clock-title">Clock</h2>
        {desk.clock ? (
          <p>
            {code} clock was <b>{offsetWords(desk.clock.offsetSeconds)}</b>,{' '}
            {Math.floor((now - desk.clock.readAtMs) / HOUR_MS)} h ago.
          </p>
        ) : (
          <p className="help">The clock of {code} was not read yet.</p>
        )}
        <Link className="btn desk-link" href={`/stations/${code}/clock` as Route}>
          {desk.canRead ? 'Report a reading' : 'Open the clock log'}
        </Link>
      </section>
    </>
  );
}
