import { angleText, dayText, minuteText } from '@/app/_ui/format';
import type { CoverageSheet } from '@/src/data/coverage/dto';
import type { StationSky } from '@/src/outlook/source-sky';
import { hourTicks } from './time-axis';

const LEFT = 40;
const TOP = 20;
const WIDTH = 404;
const PLOT = 210;
const SIZE = { width: LEFT + WIDTH + 42, height: TOP + PLOT + 26 };
const DASHES = ['', '7 3', '2 2.5', '9 3 2 3', '4 2', '1 3'] as const;
const APART = 14;

type Props = {
  skies: readonly StationSky[];
  span: CoverageSheet['span'];
  numbers: CoverageSheet['scanNumbers'];
};

/** How high each station sees the source over the session: thick where it is on it, scans as tint with their number. */
export function ElevationChart({ skies, span, numbers }: Props) {
  const { startMs, endMs } = span;
  const x = (ms: number) => LEFT + ((ms - startMs) / (endMs - startMs)) * WIDTH;
  const y = (deg: number) => TOP + PLOT - (Math.max(0, deg) / 90) * PLOT;
  const ticks = hourTicks(startMs, endMs, WIDTH);
  return (
    <figure className="min-w-0">
      <svg
        viewBox={`0 0 ${SIZE.width} ${SIZE.height}`}
        role="img"
        aria-label={summaryOf(skies)}
        className="block w-full max-w-[486px]"
        data-figure="elevation"
      >
        <Tints skies={skies} numbers={numbers} x={x} />
        {[0, 30, 60, 90].map((deg) => (
          <g key={deg}>
            <line
              x1={LEFT}
              x2={LEFT + WIDTH}
              y1={y(deg)}
              y2={y(deg)}
              stroke={deg === 0 ? 'var(--ink)' : 'var(--rule)'}
              strokeWidth={deg === 0 ? 1 : 0.75}
            />
            <text x={LEFT - 7} y={y(deg) + 4} fontSize={12} textAnchor="end" style={{ fill: 'var(--ink2)' }}>
              {angleText(deg)}
            </text>
          </g>
        ))}
        {ticks.map(({ ms, isMidnight }) => (
          <g key={ms}>
            <line
              x1={x(ms)}
              x2={x(ms)}
              y1={TOP}
              y2={TOP + PLOT}
              stroke={isMidnight ? 'var(--ink)' : 'var(--hair)'}
              strokeWidth={isMidnight ? 1.5 : 1}
            />
            <text
              x={x(ms)}
              y={TOP + PLOT + 17}
              fontSize={12}
              textAnchor="middle"
              style={{ fill: 'var(--ink2)' }}
            >
              {minuteText(ms).slice(0, 2)}
            </text>
          </g>
        ))}
        {skies.map(({ code, lines, scans }, index) => (
          <g key={code} fill="none" stroke="var(--ink)">
            <path
              d={lines.map((line) => pathOf(line.map(([ms, deg]) => [x(ms), y(deg)]))).join('')}
              strokeWidth={1.25}
              strokeDasharray={DASHES[index % DASHES.length]}
            />
            <path
              d={scans
                .map(({ startMs: on, stopMs, points }) =>
                  pathOf(
                    points.map(([, deg], k) => [x(on + ((stopMs - on) * k) / (points.length - 1)), y(deg)]),
                  ),
                )
                .join('')}
              stroke="var(--teal)"
              strokeWidth={5}
            />
          </g>
        ))}
        {namesOf(skies, x, y).map(({ code, at, up }) => (
          <text
            key={code}
            className="s"
            x={at}
            y={up}
            fontSize={13}
            fontWeight={600}
            style={{ paintOrder: 'stroke', stroke: 'var(--sheet)', strokeWidth: 3 }}
          >
            {code}
          </text>
        ))}
      </svg>
      <figcaption className="help">
        UT from day {dayText(startMs)}, {minuteText(startMs)}
      </figcaption>
    </figure>
  );
}

function Tints({ skies, numbers, x }: Omit<Props, 'span'> & { x: (ms: number) => number }) {
  const spans = new Map<string, { from: number; until: number }>();
  for (const { scanId, startMs, stopMs } of skies.flatMap(({ scans }) => scans)) {
    const before = spans.get(scanId) ?? { from: startMs, until: stopMs };
    spans.set(scanId, { from: Math.min(before.from, startMs), until: Math.max(before.until, stopMs) });
  }
  let free = -Infinity;
  const inTime = [...spans].sort(([, a], [, b]) => a.from - b.from);
  return inTime.map(([scanId, { from, until }]) => {
    const middle = (x(from) + x(until)) / 2;
    const words = numbers[scanId] ?? '';
    const isRoom = middle - words.length * 3.6 > free;
    if (isRoom) free = middle + words.length * 3.6 + 2;
    return (
      <g key={scanId}>
        <rect
          x={x(from)}
          y={TOP}
          width={Math.max(2, x(until) - x(from))}
          height={PLOT}
          fill="rgb(var(--shade) / 0.09)"
        />
        {isRoom && (
          <text x={middle} y={TOP - 6} fontSize={11} fontWeight={640} textAnchor="middle">
            {words}
          </text>
        )}
      </g>
    );
  });
}

/** Codes at the right ends of their lines, moved down where they would stand on each other. */
function namesOf(skies: readonly StationSky[], x: (ms: number) => number, y: (deg: number) => number) {
  const ends = skies.flatMap(({ code, lines }) => {
    const last = lines.at(-1)?.at(-1);
    return last ? [{ code, at: x(last[0]) + 4, up: y(last[1]) + 4 }] : [];
  });
  const placed: typeof ends = [];
  for (const end of ends.sort((a, b) => a.up - b.up)) {
    let { up } = end;
    for (const other of placed)
      if (Math.abs(other.at - end.at) < 24 && up - other.up < APART) up = other.up + APART;
    placed.push({ ...end, up });
  }
  return placed;
}

const pathOf = (points: readonly (readonly [number, number])[]) =>
  points.map(([px, py], index) => `${index === 0 ? 'M' : 'L'}${px.toFixed(1)} ${py.toFixed(1)}`).join('');

function summaryOf(skies: readonly StationSky[]): string {
  const said = skies.map(({ code, scans }) => {
    const elevations = scans.flatMap(({ points }) => points.map(([, deg]) => deg));
    if (elevations.length === 0) return `${code}: no scan`;
    return `${code}: on source at ${angleText(Math.min(...elevations))} to ${angleText(Math.max(...elevations))}`;
  });
  return `Elevation over the session. ${said.join('; ')}.`;
}
