import type { Point, Scene, Stave } from './scene';
import { FIRST, HEIGHT, LEFT, PITCH, WIDTH, heightOf, type Across } from './sizes';

type StaveDrawingProps = {
  index: number;
  stave: Stave | null;
  across: Across;
  scans: Scene['scans'];
  /** for each scan the first stave that takes part */
  tops: readonly number[];
};

export function StaveDrawing({ index, stave, across, scans, tops }: StaveDrawingProps) {
  const top = FIRST + index * PITCH;
  const spot = ({ ms, elevationDeg }: Point) =>
    `${across(ms).toFixed(1)} ${(top + heightOf(elevationDeg)).toFixed(1)}`;
  return (
    <g>
      {stave?.ribbons.map((points) => {
        const [first, last] = [points[0], points.at(-1)];
        if (!first || !last) return null;
        const edge = `M${points.map(spot).join('L')}`;
        const base = `L${across(last.ms).toFixed(1)} ${top + HEIGHT}L${across(first.ms).toFixed(1)} ${top + HEIGHT}z`;
        return (
          <g key={first.ms}>
            <path d={edge + base} fill="var(--teal-wash)" />
            <path d={edge} fill="none" stroke="var(--teal)" strokeWidth={1.25} />
          </g>
        );
      })}
      {[0, 30, 60, 90].map((elevation) => {
        const y = Math.round(top + heightOf(elevation)) + 0.5;
        const isBase = elevation === 0;
        return (
          <line
            key={elevation}
            x1={LEFT}
            x2={WIDTH}
            y1={y}
            y2={y}
            stroke={isBase ? 'var(--ink)' : 'var(--rule)'}
            strokeWidth={isBase ? 1 : 0.75}
          />
        );
      })}
      <text className="s" x="22" y={top + HEIGHT / 2 + 7} fontSize={19} fontWeight={600}>
        {stave?.code ?? ''}
      </text>
      {scans.map((scan, number) => {
        const note = stave?.notes.find((entry) => entry.scan === number);
        const highest = tops[number] ?? -1;
        const x = across(scan.startMs);
        if (highest < 0 || index < highest) return null;
        const above = highest === index ? top - 7 : top - PITCH + HEIGHT;
        if (!note) {
          return (
            <line
              key={number}
              x1={x}
              x2={x}
              y1={above}
              y2={top + HEIGHT}
              stroke="var(--ink2)"
              strokeDasharray="1 3"
            />
          );
        }
        return (
          <g key={number}>
            <rect
              x={x}
              y={top}
              width={across(note.to.ms) - x}
              height={HEIGHT}
              fill="rgb(var(--shade) / .08)"
            />
            <path d={`M${spot(note.from)}L${spot(note.to)}`} stroke="var(--note)" strokeWidth={8} />
            <line x1={x} x2={x} y1={above} y2={top + HEIGHT} stroke="var(--ink)" strokeWidth={1.25} />
          </g>
        );
      })}
    </g>
  );
}
