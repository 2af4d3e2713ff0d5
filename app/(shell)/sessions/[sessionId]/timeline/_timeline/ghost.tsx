'use client';

import { clockText } from '@/src/schedule/words';
import type { SkyTable } from '@/src/schedule/sky-table';
import { useJudgement, type Judged } from './placement';
import { crisp, staveTop, xOf, yOf, type Frame } from './scale';
import { notePath } from './scans';
import { useTimeline } from './store';

const TONE = { fits: 'var(--teal)', note: 'var(--ochre)', no: 'var(--verm)' } as const;

/** What would be dropped: hollow notes on every stave that can take part, its slews, the snap line and its flag. */
export function Ghost({ frame, table }: { frame: Frame; table: SkyTable }) {
  const judged = useJudgement();
  const stations = useTimeline((state) => state.stations);
  if (!judged) return null;
  const { placing } = judged;
  const tone = TONE[judged.verdict];
  const x1 = crisp(xOf(frame, placing.startMs));
  const x2 = crisp(xOf(frame, placing.startMs + placing.lengthSeconds * 1000));
  const rows = stations.flatMap(({ code }, index) => {
    const way = judged.ways.find(({ leg }) => leg.station === code);
    return way ? [{ index, ...way }] : [];
  });
  return (
    <g>
      <g clipPath="url(#sheet-clip)">
        {rows.map(({ index, leg, from }) => (
          <g key={leg.station} fill="none">
            {from && leg.slewSeconds !== null && (
              <path
                d={`M${xOf(frame, from.stopMs)} ${yOf(frame, index, from.elevationDeg)}L${xOf(frame, from.stopMs + leg.slewSeconds * 1000)} ${yOf(frame, index, leg.arriveElevationDeg ?? leg.startAzEl.elevationDeg)}`}
                stroke={tone}
                strokeWidth={1.25}
              />
            )}
            <rect
              x={x1}
              y={staveTop(frame, index)}
              width={Math.max(1, x2 - x1)}
              height={frame.staveHeight}
              fill="var(--sheet)"
              fillOpacity={0.55}
              stroke={tone}
              strokeDasharray="3 2"
            />
            <path d={notePath(frame, table, placing.sourceId, leg, index, 0)} stroke={tone} strokeWidth={8} />
            <path
              d={notePath(frame, table, placing.sourceId, leg, index, 1.5)}
              stroke="var(--sheet)"
              strokeWidth={5}
            />
            {judged.verdict === 'no' && (
              <CrossStroke x1={x1} x2={x2} y={yOf(frame, index, leg.startAzEl.elevationDeg)} />
            )}
          </g>
        ))}
      </g>
      <SnapLine frame={frame} judged={judged} x={x1} width={Math.max(2, x2 - x1)} tone={tone} />
    </g>
  );
}

function CrossStroke({ x1, x2, y }: { x1: number; x2: number; y: number }) {
  const middle = (x1 + x2) / 2;
  return <path d={`M${middle - 6} ${y + 6}L${middle + 6} ${y - 6}`} stroke="var(--verm)" strokeWidth={1.5} />;
}

function SnapLine({
  frame,
  judged,
  x,
  width,
  tone,
}: {
  frame: Frame;
  judged: Judged;
  x: number;
  width: number;
  tone: string;
}) {
  if (x < frame.left || x > frame.right) return null;
  const isRight = x - 64 < frame.left;
  const flag = isRight ? `M${x + 64} 20h-60l-4 10 4 10h60z` : `M${x - 64} 20h60l4 10-4 10h-60z`;
  return (
    <g>
      <line
        x1={x}
        x2={x}
        y1={40}
        y2={frame.fringeBase}
        stroke={tone}
        strokeWidth={1.5}
        strokeDasharray="6 3"
      />
      <path d={flag} fill={tone} />
      <text
        x={isRight ? x + 35 : x - 35}
        y={34.5}
        fontSize={12.5}
        fontWeight={640}
        textAnchor="middle"
        className="fill-on-ink"
      >
        {clockText(judged.placing.startMs)}
      </text>
      <rect x={x} y={frame.headings + 33} width={width} height={2.5} fill={tone} />
    </g>
  );
}
