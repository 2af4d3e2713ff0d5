import type { OutlookCell } from '@/src/outlook/fringe-outlook';
import { isExpected } from '@/src/outlook/fringe-outlook';
import { blocksOf, type Block } from '@/src/schedule/blocks';
import type { Plan, ScanId } from '@/src/schedule/plan';
import { crisp, xOf, type Frame } from './scale';
import { fittingLabels } from './fitting';
import { isBlockInView } from './scans';

const FULL_HEIGHT = 26;

/** Per scan: outline = baselines observing, filled = strong and fair, hatched = doubtful, figure = those expected. */
export function FringeStrip({
  frame,
  plan,
  outlook,
  chosenId,
}: {
  frame: Frame;
  plan: Plan;
  outlook: ReadonlyMap<ScanId, readonly OutlookCell[]>;
  chosenId: ScanId | null;
}) {
  const base = frame.fringeBase;
  const pairs = (frame.staveCount * (frame.staveCount - 1)) / 2;
  const blocks = blocksOf(plan).filter((block) => isBlockInView(frame, block));
  const boxOf = (block: Block) => {
    const x1 = Math.max(frame.left, crisp(xOf(frame, block.startMs)));
    const wanted = Math.max(frame.view.hours > 12 ? 3 : 10, xOf(frame, block.stopMs) - x1);
    const width = Math.max(1, Math.min(wanted, frame.right - x1));
    return { x1, width, middle: x1 + width / 2 };
  };
  const fitting = fittingLabels(
    blocks.map((block) => ({ id: block.id, middle: boxOf(block).middle, half: 7 })),
  );
  return (
    <g>
      <line x1={0} x2={frame.right} y1={base + 0.5} y2={base + 0.5} stroke="var(--ink)" />
      <text x={10} y={base - 32} fontSize={12} fontWeight={600}>
        Fringes
      </text>
      <text x={10} y={base - 18} fontSize={11} className="fill-ink2" style={{ fontStretch: '76%' }}>
        filled: expected
      </text>
      <text x={10} y={base - 5} fontSize={11} className="fill-ink2" style={{ fontStretch: '76%' }}>
        outline: possible
      </text>
      {blocks.map((block) => {
        const { on, good, doubtful } = worstLeg(block, outlook);
        const unit = pairs === 0 ? 0 : FULL_HEIGHT / pairs;
        const { x1, width, middle } = boxOf(block);
        return (
          <g key={block.id}>
            <rect
              x={x1}
              y={base - on * unit}
              width={width}
              height={on * unit}
              fill="var(--sheet)"
              stroke="var(--teal)"
            />
            <rect x={x1} y={base - good * unit} width={width} height={good * unit} fill="var(--teal)" />
            {doubtful > 0 && (
              <rect
                x={x1}
                y={base - (good + doubtful) * unit}
                width={width}
                height={doubtful * unit}
                fill="url(#doubtful-hatch)"
              />
            )}
            {fitting.has(block.id) && (
              <text
                x={middle}
                y={base - on * unit - 4}
                fontSize={11.5}
                fontWeight={640}
                textAnchor="middle"
                style={{
                  paintOrder: 'stroke',
                  stroke: block.legs.some(({ id }) => id === chosenId) ? 'var(--wash)' : 'var(--sheet)',
                  strokeWidth: 3,
                }}
              >
                {good}
              </text>
            )}
          </g>
        );
      })}
    </g>
  );
}

/** Of a nodding group its worst calibrator leg. */
function worstLeg(block: Block, outlook: ReadonlyMap<ScanId, readonly OutlookCell[]>) {
  const legs = block.legs.filter(({ leg }) => leg !== 'target');
  const counts = (legs.length > 0 ? legs : block.legs).map(({ id }) => countCells(outlook.get(id) ?? []));
  return counts.reduce((worst, count) => (count.good < worst.good ? count : worst));
}

export function HatchPatterns() {
  return (
    <defs>
      <pattern
        id="doubtful-hatch"
        width="4"
        height="4"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(-45)"
      >
        <rect width="4" height="4" fill="var(--sheet)" />
        <line x1="0" y1="0" x2="0" y2="4" stroke="var(--ochre)" strokeWidth="2" />
      </pattern>
    </defs>
  );
}

function countCells(cells: readonly OutlookCell[]) {
  return {
    on: cells.filter(({ verdict }) => verdict !== 'not-on').length,
    good: cells.filter(isExpected).length,
    doubtful: cells.filter(({ verdict }) => verdict === 'doubtful').length,
  };
}
