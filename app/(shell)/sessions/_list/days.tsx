import { dayText } from '@/app/_ui/format';
import { useWidth } from '@/app/_ui/use-width';
import type { SessionListItem } from '@/src/data/session/dto';
import type { Answer } from '@/src/schedule/slots';
import { MS_PER_DAY } from '@/src/units/time';
import type { ListedStation } from './listing';

const DAYS_BEFORE = 3;
const DAYS_SHOWN = 32;
const HEAD = 28.5;
const FIRST = 38;
const NAME_ROW = 14;
const NAME_ROWS = 3;
/** of a letter of a session's code */
const LETTER = 6.4;

type DaysProps = {
  sessions: readonly SessionListItem[];
  stations: readonly ListedStation[];
  nowMs: number;
};

/** Days of year from left to right, a thin stave for each station, a block for each session and station. */
export function Days({ sessions, stations, nowMs }: DaysProps) {
  const firstMs = Math.floor(nowMs / MS_PER_DAY) * MS_PER_DAY - DAYS_BEFORE * MS_PER_DAY;
  const lastMs = firstMs + DAYS_SHOWN * MS_PER_DAY;
  const x = (ms: number) => `${(((ms - firstMs) / (lastMs - firstMs)) * 100).toFixed(3)}%`;
  const pitch = stations.length > 12 ? 5 : 9;
  const foot = FIRST + Math.max(6, stations.length) * pitch + 1;
  const inView = sessions.filter((s) => s.startMs < lastMs && s.startMs + s.lengthSeconds * 1000 > firstMs);
  const [box, width] = useWidth<HTMLDivElement>(1392);
  const px = (ms: number) => ((ms - firstMs) / (lastMs - firstMs)) * width;
  const names = placed(
    [
      ...inView.map(({ id, code, startMs }) => ({ id, text: code, at: px(Math.max(firstMs, startMs)) })),
      { id: 'now', text: 'now', at: px(nowMs) },
    ],
    width,
  );
  const rows = 1 + Math.max(0, ...names.map(({ row }) => row));
  return (
    <div ref={box} className="days">
      <svg
        width="100%"
        height={foot + 6 + rows * NAME_ROW}
        className="block overflow-visible"
        aria-hidden="true"
      >
        {Array.from({ length: DAYS_SHOWN + 1 }, (_, day) => (
          <Day key={day} day={day} firstMs={firstMs} x={x} foot={foot} />
        ))}
        <line x1="0" x2="100%" y1={HEAD} y2={HEAD} stroke="var(--ink)" />
        {stations.map(({ code }, index) => {
          const y = FIRST + index * pitch + 0.5;
          return <line key={code} x1="0" x2="100%" y1={y} y2={y} stroke="var(--rule)" strokeWidth={0.75} />;
        })}
        {inView.map((session) => {
          const startMs = Math.max(firstMs, session.startMs);
          const stopMs = Math.min(lastMs, session.startMs + session.lengthSeconds * 1000);
          const width = `max(5px, ${(((stopMs - startMs) / (lastMs - firstMs)) * 100).toFixed(3)}%)`;
          return (
            <g key={session.id}>
              {stations.map(({ code }, index) =>
                session.stations.includes(code) ? (
                  <Block
                    key={code}
                    answer={session.answers[code]}
                    x={x(startMs)}
                    y={FIRST + index * pitch - pitch / 3 + 0.5}
                    height={(pitch * 2) / 3}
                    width={width}
                  />
                ) : null,
              )}
            </g>
          );
        })}
        <line x1={x(nowMs)} x2={x(nowMs)} y1="24" y2={foot} stroke="var(--ink)" strokeWidth={2} />
        {names.map(({ id, text, at, row }) => (
          <text key={id} x={at} y={foot + 13 + row * NAME_ROW} fontSize={11.5} fontWeight={600}>
            {text}
          </text>
        ))}
      </svg>
    </div>
  );
}

type Name = { id: string; text: string; at: number };

/** Each name under its block, in the first row where it stands free; one that has no room is left out. */
function placed(names: readonly Name[], width: number): (Name & { row: number })[] {
  const ends: number[] = Array.from({ length: NAME_ROWS }, () => -Infinity);
  return [...names]
    .sort((a, b) => a.at - b.at)
    .flatMap((name) => {
      const length = name.text.length * LETTER;
      const at = Math.min(name.at, width - length);
      const row = ends.findIndex((end) => end + LETTER <= at);
      if (row < 0) return [];
      ends[row] = at + length;
      return [{ ...name, at, row }];
    });
}

/** Filled, half, dashed, struck: as the station answered; plain before it was asked. */
function Block({
  answer,
  x,
  y,
  height,
  width,
}: {
  answer: Answer | undefined;
  x: string;
  y: number;
  height: number;
  width: string;
}) {
  const box = { x, y, height };
  const isFilled = answer === 'confirmed';
  const isDashed = answer === 'open' || answer === 'stale';
  const stroke = answer === 'declined' ? 'var(--verm)' : isDashed ? 'var(--ink2)' : 'var(--ink)';
  return (
    <>
      <rect
        {...box}
        style={{ width }}
        fill={isFilled ? 'var(--fill)' : answer ? 'var(--sheet)' : 'var(--sunk)'}
        stroke={answer ? stroke : 'var(--ink2)'}
        strokeDasharray={isDashed ? '2 2' : undefined}
      />
      {answer === 'partly' && <rect {...box} style={{ width: `calc(${width} / 2)` }} fill="var(--fill)" />}
    </>
  );
}

type DayProps = { day: number; firstMs: number; x: (ms: number) => string; foot: number };

/** A day and its number; weeks are counted from today, and alone are numbered where it is narrow. */
function Day({ day, firstMs, x, foot }: DayProps) {
  const ms = firstMs + day * MS_PER_DAY;
  const isWeek = (day - DAYS_BEFORE) % 7 === 0;
  return (
    <>
      <line
        x1={x(ms)}
        x2={x(ms)}
        y1={isWeek ? 4 : 24}
        y2={foot}
        stroke={isWeek ? 'var(--rule)' : 'var(--hair)'}
      />
      {day < DAYS_SHOWN && (
        <text
          x={x(ms + MS_PER_DAY / 2)}
          y="20"
          fontSize={11.5}
          textAnchor="middle"
          className={isWeek ? undefined : 'from-desk'}
          style={{ fill: 'var(--ink2)' }}
        >
          {dayText(ms)}
        </text>
      )}
    </>
  );
}
