import type { Timeline } from '@/src/data/plan/dto';
import type { PlanStation } from '@/src/schedule/context';
import type { Answer } from '@/src/schedule/slots';
import { clockText } from '@/src/schedule/words';
import { crisp, staveTop, viewEndMs, xOf, type Frame } from './scale';

/** Hours in which a station is not there: hatched over its stave, they win over every scan. */
export function Away({
  frame,
  stations,
  away,
}: {
  frame: Frame;
  stations: readonly PlanStation[];
  away: Timeline['away'];
}) {
  return (
    <g>
      <defs>
        <pattern
          id="away-hatch"
          width="5"
          height="5"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <line x1="0" y1="0" x2="0" y2="5" stroke="var(--ink2)" strokeWidth="1.4" />
        </pattern>
      </defs>
      {stations.flatMap(({ code }, index) =>
        (away[code] ?? [])
          .filter(({ startMs, endMs }) => endMs > frame.view.startMs && startMs < viewEndMs(frame.view))
          .map(({ startMs, endMs, why, isDeclined }) => {
            const x1 = Math.max(frame.left, crisp(xOf(frame, startMs)));
            const width = Math.min(frame.right, crisp(xOf(frame, endMs))) - x1;
            const word = isDeclined ? 'declined' : why;
            const label = `${word} ${clockText(startMs).slice(0, 5)}–${clockText(endMs).slice(0, 5)}`;
            const box = { x: x1, y: staveTop(frame, index), width, height: frame.staveHeight };
            return (
              <g key={`${code} ${startMs}`}>
                <rect {...box} fill="var(--sheet)" fillOpacity={0.8} />
                <rect {...box} fill="url(#away-hatch)" stroke="var(--ink2)" />
                {width > 24 && (
                  <text
                    x={x1 + width / 2}
                    y={box.y + frame.staveHeight / 2 + 4}
                    fontSize={11}
                    textAnchor="middle"
                    style={{
                      fontStretch: '80%',
                      paintOrder: 'stroke',
                      stroke: 'var(--paper)',
                      strokeWidth: 5,
                    }}
                  >
                    {width > 120 ? label : word}
                  </text>
                )}
              </g>
            );
          }),
      )}
    </g>
  );
}

/** Round the code of a station that has not answered, or must be asked again; one that declined is struck. */
export function AnswerMark({ answer, top, isTight }: { answer: Answer; top: number; isTight: boolean }) {
  const box = { x: 6.5, y: top - (isTight ? 1 : 0.5), width: isTight ? 27 : 31, height: isTight ? 20 : 20 };
  if (answer === 'declined') {
    return (
      <>
        <rect {...box} fill="none" stroke="var(--verm)" strokeWidth={1.5} />
        <line
          x1={box.x}
          x2={box.x + box.width}
          y1={box.y + box.height}
          y2={box.y}
          stroke="var(--verm)"
          strokeWidth={1.5}
        />
      </>
    );
  }
  if (answer !== 'open' && answer !== 'stale') return null;
  const right = box.x + box.width;
  return (
    <>
      <rect {...box} fill="none" stroke="var(--ink2)" strokeDasharray="3 2" />
      {answer === 'stale' && <path d={`M${right} ${box.y}h-8l8 8z`} fill="var(--ink)" />}
    </>
  );
}
