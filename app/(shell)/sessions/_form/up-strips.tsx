import { minuteText } from '@/app/_ui/format';
import type { Standing } from './standing';

type Props = { standing: Standing; stationCount: number; nameOf: (sourceId: string) => string };

const TICKS = 6;
const HOUR_MS = 3_600_000;
const WIDTH = 100;
const HEIGHT = 16;

/** How many of the chosen stations see each source, over the length of the session. */
export function UpStrips({ standing, stationCount, nameOf }: Props) {
  const { startMs, endMs, prospect } = standing;
  if (prospect.counts.length === 0) return <p className="help">Add sources to see when they are up.</p>;
  const most = Math.ceil(stationCount / 2);
  const x = (ms: number) => ((ms - startMs) / (endMs - startMs)) * WIDTH;
  return (
    <figure>
      <figcaption className="mb-1 flex items-baseline justify-between gap-2">
        <span className="font-head">Stations up, UT</span>
        <span className="help">
          teal: all {stationCount}
          {most < stationCount && `, pale: ${most} or more`}
        </span>
      </figcaption>
      <div className="sform-ups">
        <span aria-hidden="true" />
        <div className="relative h-[16px]" aria-hidden="true">
          {ticksOf(startMs, endMs).map((ms) => (
            <span key={ms} className="sform-tick" style={{ left: `${x(ms)}%` }}>
              {minuteText(ms).slice(0, 2)}
            </span>
          ))}
        </div>
        {prospect.counts.map(({ id, steps }) => (
          <Strip key={id} name={nameOf(id)} sentence={sentenceOf(steps, stationCount)}>
            {ticksOf(startMs, endMs).map((ms) => (
              <line
                key={ms}
                x1={x(ms)}
                x2={x(ms)}
                y1={0}
                y2={HEIGHT}
                stroke="var(--rule)"
                strokeWidth={0.3}
              />
            ))}
            {steps
              .filter(({ up }) => up > 0)
              .map(({ startMs: from, endMs: to, up }) => {
                const height = (up / stationCount) * HEIGHT;
                return (
                  <rect
                    key={from}
                    x={x(from)}
                    width={Math.max(0.2, x(to) - x(from))}
                    y={HEIGHT - height}
                    height={height}
                    fill={
                      up === stationCount ? 'var(--teal)' : up >= most ? 'var(--teal-mid)' : 'var(--rule)'
                    }
                  />
                );
              })}
          </Strip>
        ))}
      </div>
    </figure>
  );
}

function Strip({ name, sentence, children }: { name: string; sentence: string; children: React.ReactNode }) {
  return (
    <>
      <span className="truncate text-small">{name}</span>
      <svg
        role="img"
        aria-label={`${name}: ${sentence}`}
        viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
        preserveAspectRatio="none"
        className="h-[16px] w-full border-b border-rule"
      >
        {children}
      </svg>
    </>
  );
}

function sentenceOf(steps: Standing['prospect']['counts'][number]['steps'], all: number): string {
  const most = Math.max(0, ...steps.map(({ up }) => up));
  if (most === 0) return 'no station sees it';
  const spans = steps
    .filter(({ up }) => up === most)
    .map(({ startMs, endMs }) => `${minuteText(startMs)} to ${minuteText(endMs)}`);
  return `${most === all ? `all ${all} stations` : `at most ${most} of ${all} stations`} see it from ${spans.join(', ')}`;
}

/** Whole hours, so far apart that six or fewer stand on the axis. */
function ticksOf(startMs: number, endMs: number): number[] {
  const hours = (endMs - startMs) / HOUR_MS;
  const step = [1, 2, 3, 4, 6, 12, 24, 48, 72].find((one) => hours / one <= TICKS) ?? 96;
  const first = Math.ceil(startMs / (step * HOUR_MS)) * step * HOUR_MS;
  return Array.from(
    { length: Math.floor((endMs - first) / (step * HOUR_MS)) + 1 },
    (_, index) => first + index * step * HOUR_MS,
  );
}
