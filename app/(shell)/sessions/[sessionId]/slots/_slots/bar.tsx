import { minuteText, spanText } from '@/app/_ui/format';
import { stationTime } from '@/app/_ui/station-time';
import type { SlotDto } from '@/src/data/slot/dto';
import { within, type Hours } from '@/src/schedule/slots';

export type Scale = (ms: number) => number;
/** A slot as it is drawn: as it was answered, or as it would be. */
export type Drawn = Pick<
  SlotDto,
  'startMs' | 'endMs' | 'answer' | 'hours' | 'without' | 'scanCount' | 'timeZone'
>;

const TOP = 14;
const HEIGHT = 24;
/** The room that a label needs, about: letters of 12 px. */
const LETTER = 6.4;

/** Hatch of the hours a station cannot; once for all bars of a page. */
export const Hatch = () => (
  <svg width={0} height={0} className="absolute" aria-hidden="true">
    <defs>
      <pattern
        id="slot-hatch"
        width="5"
        height="5"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(45)"
      >
        <rect width="5" height="5" fill="var(--sheet)" />
        <line x1="0" y1="0" x2="0" y2="5" stroke="var(--ink2)" strokeWidth="1.4" />
      </pattern>
    </defs>
  </svg>
);

/** A slot in the look of its answer, its ends in UT and in the station's time. */
export function Bar({ slot, x }: { slot: Drawn; x: Scale }) {
  const { startMs, endMs, answer, without, timeZone } = slot;
  const [x1, x2] = [x(startMs), x(endMs)];
  const filled = answer === 'open' || answer === 'declined' ? [] : within([startMs, endMs], slot.hours);
  const box = { y: TOP, height: HEIGHT };
  const rect = ([from, until]: Hours) => ({ ...box, x: x(from), width: Math.max(2, x(until) - x(from)) });
  const isAsked = answer === 'open' || answer === 'stale';
  const widest = [...filled].sort((a, b) => b[1] - b[0] - (a[1] - a[0]))[0] ?? [startMs, endMs];
  const words = barWords(slot, filled);
  const ends = [
    [x1, startMs, 'start'],
    [x2, endMs, 'end'],
  ] as const;
  const isNarrow = x2 - x1 < 190;
  return (
    <g>
      <rect
        {...rect([startMs, endMs])}
        fill="var(--sheet)"
        stroke={answer === 'declined' ? 'var(--verm)' : 'var(--ink)'}
        strokeWidth={isAsked ? 1.5 : 1}
        strokeDasharray={isAsked ? '4 3' : undefined}
      />
      {filled.map((span) => (
        <rect key={span[0]} {...rect(span)} fill="var(--fill)" />
      ))}
      {without.map((span) => (
        <rect key={span[0]} {...rect(span)} fill="url(#slot-hatch)" stroke="var(--ink2)" />
      ))}
      {answer === 'declined' && (
        <line x1={x1} x2={x2} y1={TOP + HEIGHT} y2={TOP} stroke="var(--verm)" strokeWidth={1.75} />
      )}
      {answer === 'stale' && <Corner slot={slot} x={x} />}
      {x(widest[1]) - x(widest[0]) > words.length * LETTER + 12 && (
        <text
          x={(x(widest[0]) + x(widest[1])) / 2}
          y={TOP + 16}
          fontSize={12}
          fontWeight={600}
          textAnchor="middle"
          style={{
            fill: filled.length > 0 ? 'var(--on-ink)' : 'var(--ink)',
            ...(answer === 'declined' && {
              paintOrder: 'stroke',
              stroke: 'var(--sheet)',
              strokeWidth: 6,
            }),
          }}
        >
          {words}
        </text>
      )}
      {ends.map(([at, ms, anchor]) => (
        <g key={anchor} textAnchor={anchor}>
          <text x={at} y={52} fontSize={12} fontWeight={640}>
            {minuteText(ms)}
          </text>
          <text x={at} y={66} fontSize={11} className="fill-ink2">
            {isNarrow ? stationTime(ms, timeZone).slice(0, 5) : stationTime(ms, timeZone)}
          </text>
        </g>
      ))}
    </g>
  );
}

/** What moved after the yes is marked where it moved. */
function Corner({ slot, x }: { slot: Drawn; x: Scale }) {
  const [given] = slot.hours;
  const isStart = given !== undefined && slot.startMs < given[0] && slot.endMs <= given[1];
  const at = isStart ? Math.min(x(given[0]), x(slot.endMs)) : x(slot.endMs);
  return <path d={`M${at} ${TOP}h-12l12 12z`} fill="var(--ink)" stroke="var(--sheet)" strokeWidth={0.75} />;
}

function barWords({ answer, startMs, endMs, scanCount }: Drawn, filled: readonly Hours[]): string {
  const whole = spanText(Math.round((endMs - startMs) / 60_000) * 60);
  const given = spanText(
    Math.round(filled.reduce((sum, [from, until]) => sum + until - from, 0) / 60_000) * 60,
  );
  if (answer === 'stale') return `yes to ${given}`;
  if (answer === 'partly') return `${given} of ${whole}`;
  return `${whole}, ${scanCount} ${scanCount === 1 ? 'scan' : 'scans'}`;
}
