import { scanStopMs, type Plan, type Scan, type ScanId } from '@/src/schedule/plan';
import type { PlanSource } from '@/src/schedule/context';
import { crisp, xOf, type Frame } from './scale';
import { fittingLabels } from './fitting';
import { inView } from './scans';

type Props = {
  frame: Frame;
  plan: Plan;
  numbers: ReadonlyMap<ScanId, string>;
  sources: Readonly<Record<string, PlanSource>>;
  chosenId: ScanId | null;
  placingId: ScanId | null;
};

/** Number over the source, and a bar from start to stop. A number that would touch its neighbour is left out. */
export function Headings({ frame, plan, numbers, sources, chosenId, placingId }: Props) {
  const y = frame.headings;
  const far = frame.view.hours > 12;
  const scans = plan.scans.filter((scan) => inView(frame, scan));
  const fitting = fittingLabels(
    scans.map((scan) => ({
      id: scan.id,
      middle: barOf(frame, scan).middle,
      half: far ? (numbers.get(scan.id) ?? '').length * 3.4 + 1 : 11,
      isKept: scan.id === chosenId,
    })),
  );
  return (
    <g>
      {scans.map((scan) => {
        const { x1, x2, middle } = barOf(frame, scan);
        const number = numbers.get(scan.id) ?? '';
        const isChosen = scan.id === chosenId;
        const fits = fitting.has(scan.id);
        const word = shortName(sources[scan.sourceId]?.name ?? '');
        return (
          <g key={scan.id} opacity={scan.id === placingId ? 0.35 : 1}>
            {isChosen && <rect x={middle - 14} y={y + 3} width={28} height={30} fill="var(--ink)" />}
            {fits && (
              <text
                x={middle}
                y={y + (far ? 28 : 15)}
                fontSize={12}
                fontWeight={680}
                textAnchor="middle"
                className={isChosen ? 'fill-on-ink' : ''}
                style={{ fontStretch: far ? '76%' : undefined }}
              >
                {number}
              </text>
            )}
            {fits && !far && (
              <text
                x={middle}
                y={y + 28}
                fontSize={11}
                textAnchor="middle"
                className={isChosen ? 'fill-on-ink' : 'fill-ink2'}
                style={{ fontStretch: '70%' }}
              >
                {word}
              </text>
            )}
            <rect x={x1} y={y + 33} width={Math.max(2, x2 - x1)} height={2.5} fill="var(--ink)" />
          </g>
        );
      })}
    </g>
  );
}

/** The chosen scan stands between thick–thin bar lines, on wash. */
export function ChosenWash({ frame, scan }: { frame: Frame; scan: Scan }) {
  const { x1, x2 } = barOf(frame, scan);
  return (
    <rect
      x={x1 - 4}
      y={frame.headings + 2}
      width={x2 - x1 + 8}
      height={frame.fringeBase - frame.headings - 2}
      fill="var(--wash)"
    />
  );
}

export function ChosenBars({ frame, scan }: { frame: Frame; scan: Scan }) {
  const { x1, x2 } = barOf(frame, scan);
  const top = frame.headings + 33;
  const height = frame.fringeBase - top;
  return (
    <g>
      <rect x={x1 - 7} y={top} width={3} height={height} fill="var(--ink)" />
      <line x1={x1 - 1.5} x2={x1 - 1.5} y1={top} y2={top + height} stroke="var(--ink)" />
      <rect x={x2 + 4} y={top} width={3} height={height} fill="var(--ink)" />
      <line x1={x2 + 1.5} x2={x2 + 1.5} y1={top} y2={top + height} stroke="var(--ink)" />
    </g>
  );
}

function barOf(frame: Frame, scan: Scan) {
  const x1 = Math.max(frame.left, crisp(xOf(frame, scan.startMs)));
  const x2 = Math.min(frame.right, crisp(xOf(frame, scanStopMs(scan))));
  return { x1, x2, middle: (x1 + x2) / 2 };
}

/** "0738" of J0738+1742; the first letters of a name that is no J-name. */
export function shortName(name: string): string {
  return /^J(\d{4})[+\-−]\d/.exec(name)?.[1] ?? name.slice(0, 5);
}
