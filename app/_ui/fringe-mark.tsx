import type { Verdict } from '@/src/outlook/fringe-outlook';

/** Upright stripes: more stripes, more certain (DESIGN §9). Drawn in a 10 × 10 box. */
export function FringeMarkShape({ verdict, x = 0, y = 0 }: { verdict: Verdict; x?: number; y?: number }) {
  switch (verdict) {
    case 'strong':
      return <path fill="var(--teal)" d={stripes(x, y, [0, 4, 8])} />;
    case 'fair':
      return <path fill="var(--teal)" d={stripes(x, y, [2, 6])} />;
    case 'doubtful':
      return (
        <path
          fill="var(--ochre)"
          d={`M${x + 4} ${y}h2v3h-2zM${x + 4} ${y + 4}h2v2.5h-2zM${x + 4} ${y + 7.5}h2v2.5h-2z`}
        />
      );
    case 'none':
      return <path fill="var(--verm)" d={`M${x} ${y + 4}h10v2h-10z`} />;
    case 'unknown':
      return <circle cx={x + 5} cy={y + 5} r={3.75} fill="none" stroke="var(--ink3)" strokeWidth={1.5} />;
    case 'not-on':
      return <path fill="var(--ink3)" d={`M${x + 4} ${y + 4}h2v2h-2z`} />;
  }
}

const stripes = (x: number, y: number, at: number[]) => at.map((dx) => `M${x + dx} ${y}h2v10h-2z`).join('');

export function FringeMark({ verdict }: { verdict: Verdict }) {
  return (
    <svg width="10" height="10" viewBox="0 0 10 10" aria-hidden="true" className="flex-none">
      <FringeMarkShape verdict={verdict} />
    </svg>
  );
}
