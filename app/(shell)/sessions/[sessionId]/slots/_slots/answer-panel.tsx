'use client';

import { AnswerBox } from '@/app/_ui/answer-box';
import { dayText, minuteText, spanText } from '@/app/_ui/format';
import { stationTime } from '@/app/_ui/station-time';
import type { SlotBoard, SlotDto, SlotWord } from '@/src/data/slot/dto';
import { LEAD_SECONDS, TAIL_SECONDS } from '@/src/schedule/slots';
import { fullTimeText } from '@/src/schedule/words';
import { AnswerForm, type Preview } from './answer-form';
import type { Drawn } from './bar';
import { Strip } from './strip';

type Props = {
  sessionId: string;
  offerId: string;
  span: SlotBoard['span'];
  slot: SlotDto;
  drawn: Drawn;
  onPreview: (preview: Preview | null) => void;
};

/** The hours asked of a station in UT and in its own time, what it said, and the form of its answer. */
export function AnswerPanel({ sessionId, offerId, span, slot, drawn, onPreview }: Props) {
  const { stationCode: code, stationName, timeZone, startMs, endMs, scans } = slot;
  const zone = (ms: number) => `${stationTime(ms, timeZone)}, ${timeZone}`;
  const onSource = scans.reduce((sum, scan) => sum + (scan.stopMs - scan.startMs) / 1000, 0);
  return (
    <>
      <header className="flex items-center justify-between gap-2">
        <h2 className="text-[22px] leading-[26px]">{stationName}</h2>
        <AnswerBox code={code} name={stationName} answer={slot.answer} />
      </header>
      <Strip span={span} slot={drawn} />
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
          <dt>Lead and tail</dt>
          <dd>
            {spanText(LEAD_SECONDS)} and {spanText(TAIL_SECONDS)}, inside
          </dd>
        </div>
        <div>
          <dt>Scans</dt>
          <dd>
            {slot.scanCount}, recording {spanText(Math.round(onSource / 60) * 60)}
          </dd>
        </div>
        <div>
          <dt>{slot.modes.length === 1 ? 'Mode' : 'Modes'}</dt>
          <dd>{slot.modes.join(', ')}</dd>
        </div>
      </dl>
      {slot.answer === 'stale' && (
        <p className="slots-asked">
          What is asked has left the hours {code} said yes to, or a mode came in. {code} is asked again.
        </p>
      )}
      {slot.canReply ? (
        <AnswerForm sessionId={sessionId} offerId={offerId} slot={slot} onPreview={onPreview} />
      ) : (
        <p className="help">The operators of {stationName} answer for it, or a scheduler on their behalf.</p>
      )}
      {slot.words.length > 0 && <Words words={slot.words} />}
    </>
  );
}

const SAID = { confirmed: 'Confirmed', partly: 'Partly', declined: 'Declined' } as const;
const KINDS = { offer: 'offer', publish: 'version' } as const;

/** All that was said, newest first; nothing that was said goes away. */
function Words({ words }: { words: readonly SlotWord[] }) {
  return (
    <section aria-label="What was said" className="slots-words">
      <h3 className="font-serif text-h2">What was said</h3>
      <ol>
        {words.map((word) => (
          <li key={`${word.atMs} ${word.reply}`}>
            <span className="text-ink2">
              day {dayText(word.atMs)}, {minuteText(word.atMs)}
            </span>
            <span>
              <b>{SAID[word.reply]}</b>
              {word.reply !== 'declined' &&
                ` ${word.hours.map(([from, until]) => `${minuteText(from)} to ${minuteText(until)}`).join(', ')}`}
              {`, ${KINDS[word.kind]} ${word.number}, `}
              {word.isOnBehalf ? `by a ${word.role} on behalf` : `by an ${word.role}`}.
              {word.reason !== '' && ` “${word.reason}”`}
            </span>
          </li>
        ))}
      </ol>
    </section>
  );
}
