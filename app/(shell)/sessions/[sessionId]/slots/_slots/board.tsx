'use client';

import { formatInTimeZone } from 'date-fns-tz';
import { AnswerBox } from '@/app/_ui/answer-box';
import { ANSWER_WORDS } from '@/app/_ui/answer-words';
import { dayText, minuteText } from '@/app/_ui/format';
import { useWidth } from '@/app/_ui/use-width';
import type { SlotBoard, SlotDto } from '@/src/data/slot/dto';
import type { Hours } from '@/src/schedule/slots';
import { Bar, type Drawn, type Scale } from './bar';

const HOUR = 3_600_000;
const EDGE = 10;
const ROW = 92;
const isDay = (ms: number): boolean => ms % (24 * HOUR) === 0;

type Props = {
  board: SlotBoard;
  slots: readonly SlotDto[];
  /** a slot as it is, or as the answer that is being made would leave it */
  drawnOf: (slot: SlotDto) => Drawn;
  chosen: string | null;
  onChoose: (code: string) => void;
};

/** One row a station: its hours on the session's axis, in UT and in its own time, and its answer. */
export function Board({ board, slots, drawnOf, chosen, onChoose }: Props) {
  const [box, width] = useWidth<HTMLDivElement>(600);
  const { span } = board;
  const fromMs = Math.min(span.startMs, ...slots.map(({ startMs }) => startMs));
  const untilMs = Math.max(span.endMs, ...slots.map(({ endMs }) => endMs));
  const x: Scale = (ms) => EDGE + ((ms - fromMs) / (untilMs - fromMs)) * (width - 2 * EDGE);
  const hours = ticksOf(fromMs, untilMs, width);
  return (
    <div className="slots-grid">
      <div className="slots-row slots-axis" aria-hidden="true">
        <span className="slots-name">Station</span>
        <div ref={box}>
          <svg width={width} height={38} className="block">
            {daysOf(hours, fromMs, x).map(({ ms, at, hasYear }) => (
              <text key={ms} x={at} y={13} fontSize={12} fontWeight={600}>
                {hasYear && `${new Date(ms).getUTCFullYear()} `}day {dayText(ms)}
              </text>
            ))}
            {hours.map((ms) => (
              <text key={ms} x={x(ms)} y={32} fontSize={12} fontWeight={600} textAnchor="middle">
                {minuteText(ms).slice(0, 2)}
              </text>
            ))}
          </svg>
        </div>
        <span className="slots-answer">Answer</span>
      </div>
      {slots.map((slot) => (
        <button
          key={slot.stationCode}
          type="button"
          className="slots-row slots-pick"
          aria-pressed={slot.stationCode === chosen}
          aria-label={`${slot.stationName}: ${ANSWER_WORDS[slot.answer]}, ${minuteText(slot.startMs)} to ${minuteText(slot.endMs)} UT`}
          onClick={() => onChoose(slot.stationCode)}
        >
          <span className="slots-name">
            <b className="font-serif text-[19px]">{slot.stationCode}</b>
            <span>{slot.stationName}</span>
            <span className="text-ink2">{slot.timeZone}</span>
          </span>
          <svg width={width} height={ROW} className="block" aria-hidden="true">
            {hours.map((ms) => (
              <line
                key={ms}
                x1={x(ms)}
                x2={x(ms)}
                y1={0}
                y2={ROW}
                stroke={ms % (24 * HOUR) === 0 ? 'var(--ink)' : 'var(--hair)'}
                strokeWidth={ms % (24 * HOUR) === 0 ? 1.75 : 1}
              />
            ))}
            <Bar slot={drawnOf(slot)} x={x} />
            <Night slot={slot} x={x} fromMs={fromMs} untilMs={untilMs} />
          </svg>
          <span className="slots-answer">
            <span className="flex items-center gap-2">
              <AnswerBox code={slot.stationCode} name={slot.stationName} answer={slot.answer} />
              <b className="first-letter:uppercase">{ANSWER_WORDS[slot.answer]}</b>
            </span>
            {slot.answeredAtMs !== null && (
              <span className="text-ink2">
                day {dayText(slot.answeredAtMs)}, {minuteText(slot.answeredAtMs)} UT
                {slot.isOnBehalf && ', on behalf'}
              </span>
            )}
            {slot.answer === 'stale' && (
              <span className="text-ink2">said yes to {hoursText(slot.hours)}</span>
            )}
            {slot.answer === 'partly' && <span className="text-ink2">cannot {hoursText(slot.without)}</span>}
            {slot.reason !== '' && <span className="text-ink2">“{slot.reason}”</span>}
          </span>
        </button>
      ))}
    </div>
  );
}

/** "22:50–23:40" */
const hoursText = (hours: readonly Hours[]): string =>
  hours.map(([from, until]) => `${minuteText(from)}–${minuteText(until)}`).join(', ');

/** 22 to 06 in the station's own time: a thick line under the hours. */
function Night({ slot, x, fromMs, untilMs }: { slot: SlotDto; x: Scale; fromMs: number; untilMs: number }) {
  const hourAt = (ms: number) => Number(formatInTimeZone(ms, slot.timeZone, 'H'));
  const first = Math.floor(fromMs / HOUR) * HOUR;
  const count = Math.ceil((untilMs - first) / HOUR);
  const nights = Array.from({ length: count }, (_, k) => first + k * HOUR).filter((ms) => {
    const hour = hourAt(ms);
    return hour >= 22 || hour < 6;
  });
  const path = nights
    .map((ms) => `M${x(Math.max(ms, fromMs)).toFixed(1)} 76H${x(Math.min(ms + HOUR, untilMs)).toFixed(1)}`)
    .join('');
  return (
    <g>
      <line x1={x(fromMs)} x2={x(untilMs)} y1={76} y2={76} stroke="var(--rule)" />
      <path d={path} stroke="var(--ink2)" strokeWidth={4} />
    </g>
  );
}

const DAY_WORD = 56;
const DAY_WITH_YEAR = 100;

/** The day at the left edge and at each midnight; the first with its year where there is room. */
function daysOf(hours: readonly number[], fromMs: number, x: Scale) {
  const midnights = hours.filter(isDay);
  const room = x(midnights[0] ?? Infinity) - x(fromMs);
  return [
    ...(room > DAY_WORD ? [{ ms: fromMs, at: x(fromMs), hasYear: room > DAY_WITH_YEAR }] : []),
    ...midnights.map((ms) => ({ ms, at: x(ms), hasYear: false })),
  ];
}

function ticksOf(fromMs: number, untilMs: number, width: number): number[] {
  const hours = (untilMs - fromMs) / HOUR;
  const every = [1, 2, 4, 6, 12, 24].find((step) => (hours / step) * 34 <= width) ?? 24;
  const first = Math.ceil(fromMs / (every * HOUR));
  const last = Math.floor(untilMs / (every * HOUR));
  return Array.from({ length: last - first + 1 }, (_, k) => (first + k) * every * HOUR);
}
