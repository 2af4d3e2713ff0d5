'use client';

import { minuteText } from '@/app/_ui/format';
import { useWidth } from '@/app/_ui/use-width';
import type { SlotBoard } from '@/src/data/slot/dto';
import { Bar, type Drawn } from './bar';

const HOUR = 3_600_000;
const EDGE = 12;

/** One slot on the whole session's width, where the board lies below the form: on a phone. */
export function Strip({ span, slot }: { span: SlotBoard['span']; slot: Drawn }) {
  const [box, width] = useWidth<HTMLDivElement>(320);
  const fromMs = Math.min(span.startMs, slot.startMs);
  const untilMs = Math.max(span.endMs, slot.endMs);
  const x = (ms: number) => EDGE + ((ms - fromMs) / (untilMs - fromMs)) * (width - 2 * EDGE);
  const every = [1, 2, 4, 6, 12, 24].find((step) => (untilMs - fromMs) / HOUR / step <= 8) ?? 24;
  const first = Math.ceil(fromMs / (every * HOUR));
  const count = Math.max(0, Math.floor(untilMs / (every * HOUR)) - first + 1);
  const hours = Array.from({ length: count }, (_, k) => (first + k) * every * HOUR);
  return (
    <div ref={box} className="desk:hidden" aria-hidden="true">
      <svg width={width} height={88} className="block">
        {hours.map((ms) => (
          <g key={ms}>
            <text x={x(ms)} y={11} fontSize={12} fontWeight={600} textAnchor="middle">
              {minuteText(ms).slice(0, 2)}
            </text>
            <line
              x1={x(ms)}
              x2={x(ms)}
              y1={16}
              y2={62}
              stroke={ms % (24 * HOUR) === 0 ? 'var(--ink)' : 'var(--rule)'}
            />
          </g>
        ))}
        <g transform="translate(0 8)">
          <Bar slot={slot} x={x} />
        </g>
      </svg>
      <p className="help">UT in bold, station time below</p>
    </div>
  );
}
