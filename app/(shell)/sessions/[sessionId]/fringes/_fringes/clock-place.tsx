import { numberText, signedText } from '@/app/_ui/format';
import type { PlaceInWindow } from '@/src/outlook/clock-place';
import type { OutlookCell } from '@/src/outlook/fringe-outlook';
import type { Scan } from '@/src/schedule/plan';
import { listText } from '@/src/schedule/words';
import type { PageContext } from '../../../_plan/plan-context';

const WIDTH = 300;
const EDGE = 52;

/** Where the clocks put the fringe in the correlator's search window, drawn and in words. */
export function ClockPlace({ cell, scan, context }: { cell: OutlookCell; scan: Scan; context: PageContext }) {
  const mode = context.modes[scan.modeId];
  if (!mode) return null;
  const middleMs = scan.startMs + scan.lengthSeconds * 500;
  const found = context.judgeClock(cell.first, cell.second, middleMs, mode);
  return (
    <section>
      <div className="flex items-baseline justify-between">
        <h2 className="mb-0.5 font-ui text-body font-strong">Clock</h2>
        <span className="help">
          {cell.second} minus {cell.first}, µs
        </span>
      </div>
      <Drawing found={found} />
      <p className="help">{wordsOf(found)}</p>
      {found.widened.length > 0 && (
        <p className="help">
          The instrument delay of {listText(found.widened)} is not known: the width is taken from the
          session’s settings.
        </p>
      )}
    </section>
  );
}

function wordsOf({ place, windowSeconds, missing }: PlaceInWindow): string {
  const window = `the search window of ±${numberText(windowSeconds * 1e6, 2)} µs`;
  switch (place) {
    case 'inside':
      return `The fringe lies inside ${window}.`;
    case 'edge':
      return `The fringe may lie outside ${window}: the middle is in it, three sigma are not.`;
    case 'outside':
      return `The fringe lies outside ${window}.`;
    case 'unknown':
      return `Not judged: ${missing ?? 'no clock reading'}.`;
  }
}

function Drawing({ found }: { found: PlaceInWindow }) {
  const { expectedSeconds, meanSeconds, sigmaSeconds, windowSeconds } = found;
  if (expectedSeconds === null || meanSeconds === null || sigmaSeconds === null) return null;
  const perSecond = (WIDTH / 2 - EDGE) / windowSeconds;
  const x = (seconds: number) => Math.max(1, Math.min(WIDTH - 1, WIDTH / 2 + seconds * perSecond));
  const centre = expectedSeconds - meanSeconds;
  const micro = (seconds: number) => signedText(seconds * 1e6, 2);
  const band = [x(meanSeconds - 2 * sigmaSeconds), x(meanSeconds + 2 * sigmaSeconds)] as const;
  return (
    <svg viewBox={`0 0 ${WIDTH} 46`} className="block w-full" role="img" aria-label={wordsOf(found)}>
      <rect
        x={x(-windowSeconds)}
        y={4}
        width={x(windowSeconds) - x(-windowSeconds)}
        height={20}
        fill="var(--teal-wash)"
      />
      <rect x={band[0]} y={4} width={Math.max(1.5, band[1] - band[0])} height={20} fill="var(--teal-mid)" />
      {[-windowSeconds, windowSeconds].map((edge) => (
        <g key={edge}>
          <line x1={x(edge)} x2={x(edge)} y1={2} y2={28} stroke="var(--teal)" strokeWidth={1.5} />
          <text x={x(edge)} y={41} fontSize={11} textAnchor="middle" className="fill-ink2">
            {micro(centre + edge)}
          </text>
        </g>
      ))}
      <line x1={x(meanSeconds)} x2={x(meanSeconds)} y1={0} y2={28} stroke="var(--ink)" strokeWidth={2} />
      <line x1={0} x2={WIDTH} y1={24.5} y2={24.5} stroke="var(--ink)" />
      <text
        x={WIDTH / 2}
        y={41}
        fontSize={11}
        textAnchor="middle"
        className="fill-ink"
        style={{ fontStretch: '78%' }}
      >
        {micro(expectedSeconds)} ± {numberText(2 * sigmaSeconds * 1e6, 2)} (95%)
      </text>
    </svg>
  );
}
