import type { Problem } from '@/src/schedule/checks';
import type { PlanStation } from '@/src/schedule/context';
import { staveTop, viewEndMs, xOf, yOf, type Frame } from './scale';
import type { Derived } from './derived';

/** A problem's letter at the spot and again in the right margin of its stave. */
export function ProblemMarks({
  frame,
  derived,
  stations,
  loudKey,
}: {
  frame: Frame;
  derived: Derived;
  stations: readonly PlanStation[];
  loudKey: string | null;
}) {
  const shown = derived.problems.filter(
    ({ key, atMs }) =>
      derived.letters.has(key) && atMs >= frame.view.startMs && atMs <= viewEndMs(frame.view),
  );
  const inMargin = new Map<number, number>();
  return (
    <g>
      {shown.map((problem) => {
        const index = stations.findIndex(({ code }) => code === problem.station);
        const letter = derived.letters.get(problem.key) ?? '';
        const loud = problem.key === loudKey;
        const spot = spotOf(frame, derived, problem, index);
        const slot = inMargin.get(index) ?? 0;
        inMargin.set(index, slot + 1);
        const fits = index >= 0 && (slot + 1) * 19 <= frame.staveHeight + 4;
        return (
          <g key={problem.key}>
            <Letter x={spot.x} y={spot.y} letter={letter} must={problem.severity === 'fix'} loud={loud} />
            {fits && (
              <Letter
                x={frame.right + 13}
                y={staveTop(frame, index) + 10 + slot * 19}
                letter={letter}
                must={problem.severity === 'fix'}
                loud={loud}
              />
            )}
          </g>
        );
      })}
    </g>
  );
}

function spotOf(frame: Frame, { legs }: Derived, problem: Problem, index: number) {
  const leg = (problem.station === null ? undefined : legs.get(problem.station))?.find(
    ({ scanId }) => scanId === problem.scanId,
  );
  if (index < 0 || !leg) return { x: within(frame, xOf(frame, problem.atMs) + 9), y: frame.headings + 8 };
  if (problem.kind === 'slew' || problem.kind === 'overlap' || problem.kind === 'outside') {
    return { x: within(frame, xOf(frame, leg.startMs) + 9), y: staveTop(frame, index) + 9 };
  }
  const y = yOf(frame, index, leg.stopAzEl.elevationDeg) - 15;
  return { x: within(frame, xOf(frame, leg.stopMs) - 9), y: Math.max(y, staveTop(frame, index) + 9) };
}

const within = (frame: Frame, x: number) => Math.max(frame.left + 9, Math.min(frame.right - 9, x));

function Letter({
  x,
  y,
  letter,
  must,
  loud,
}: {
  x: number;
  y: number;
  letter: string;
  must: boolean;
  loud: boolean;
}) {
  const size = 16 + Math.max(0, letter.length - 1) * 7;
  return (
    <g>
      <rect
        x={x - size / 2}
        y={y - 8}
        width={size}
        height={16}
        fill={must ? 'var(--verm)' : 'var(--sheet)'}
        stroke={must ? 'var(--verm)' : 'var(--ink)'}
        strokeWidth={loud ? 3 : 1.25}
      />
      <text
        className={`s ${must ? 'fill-on-verm' : 'fill-ink'}`}
        x={x}
        y={y + 4}
        fontSize={13}
        fontStyle="italic"
        fontWeight={600}
        textAnchor="middle"
      >
        {letter}
      </text>
    </g>
  );
}
