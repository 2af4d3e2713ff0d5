import { blocksOf, type Block } from '@/src/schedule/blocks';
import { scanStopMs, type Plan, type Scan, type ScanId } from '@/src/schedule/plan';
import type { PlanSource } from '@/src/schedule/context';
import { crisp, xOf, type Frame } from './scale';
import { fittingLabels } from './fitting';
import { isBlockInView } from './scans';

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
  const blocks = blocksOf(plan).filter((block) => isBlockInView(frame, block));
  const isChosen = (block: Block) => block.legs.some(({ id }) => id === chosenId);
  const numberOf = (block: Block) => {
    const number = numbers.get(block.id) ?? '';
    return block.groupId === null ? number : number.replace(/\.\d+$/, '');
  };
  const fitting = fittingLabels(
    blocks.map((block) => ({
      id: block.id,
      middle: spanOf(frame, block).middle,
      half: far ? numberOf(block).length * 3.4 + 1 : block.groupId === null ? 11 : 20,
      isKept: isChosen(block),
    })),
  );
  return (
    <g>
      {blocks.map((block) => {
        const chosen = isChosen(block);
        const fits = fitting.has(block.id);
        return (
          <g key={block.id} opacity={block.id === placingId ? 0.35 : 1}>
            {fits && (
              <Words
                middle={spanOf(frame, block).middle}
                y={y}
                far={far}
                number={numberOf(block)}
                word={wordOf(block, sources)}
                isChosen={chosen}
              />
            )}
            <Beam frame={frame} block={block} />
          </g>
        );
      })}
    </g>
  );
}

function Words({
  middle,
  y,
  far,
  number,
  word,
  isChosen,
}: {
  middle: number;
  y: number;
  far: boolean;
  number: string;
  word: string;
  isChosen: boolean;
}) {
  const half = word.length > 5 ? 24 : 14;
  return (
    <>
      {isChosen && <rect x={middle - half} y={y + 3} width={2 * half} height={30} fill="var(--ink)" />}
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
      {!far && (
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
    </>
  );
}

/** A bar from start to stop; of a nodding group a beam with stems, long for the target, short for the calibrator. */
function Beam({ frame, block }: { frame: Frame; block: Block }) {
  const { x1, x2 } = spanOf(frame, block);
  const top = frame.headings + 33;
  if (block.groupId === null)
    return <rect x={x1} y={top} width={Math.max(2, x2 - x1)} height={2.5} fill="var(--ink)" />;
  const stems = block.legs
    .map((leg) => xOf(frame, leg.startMs + leg.lengthSeconds * 500))
    .map((x, index) => [x, block.legs[index]?.leg === 'target' ? 5 : 2.5] as const)
    .filter(([x]) => x >= frame.left && x <= frame.right)
    .map(([x, length]) => `M${x.toFixed(1)} ${top}v${length}`)
    .join('');
  return (
    <>
      <rect x={x1} y={top - 1.5} width={Math.max(2, x2 - x1)} height={3} fill="var(--ink)" />
      <path d={stems} stroke="var(--ink)" strokeWidth={0.8} />
    </>
  );
}

function wordOf(block: Block, sources: Props['sources']): string {
  const legs = [block.legs.find(({ leg }) => leg === 'target') ?? block.legs[0]];
  const calibrator = block.legs.find(({ leg }) => leg === 'calibrator');
  if (calibrator) legs.push(calibrator);
  return legs.map(({ sourceId }) => shortName(sources[sourceId]?.name ?? '')).join('/');
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

const barOf = (frame: Frame, scan: Scan) =>
  spanOf(frame, { startMs: scan.startMs, stopMs: scanStopMs(scan) });

function spanOf(frame: Frame, { startMs, stopMs }: { startMs: number; stopMs: number }) {
  const x1 = Math.max(frame.left, crisp(xOf(frame, startMs)));
  const x2 = Math.min(frame.right, crisp(xOf(frame, stopMs)));
  return { x1, x2, middle: (x1 + x2) / 2 };
}

/** "0738" of J0738+1742; the first letters of a name that is no J-name. */
function shortName(name: string): string {
  return /^J(\d{4})[+\-−]\d/.exec(name)?.[1] ?? name.slice(0, 5);
}
