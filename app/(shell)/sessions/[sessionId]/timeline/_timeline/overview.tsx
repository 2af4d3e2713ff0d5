'use client';

import { blocksOf } from '@/src/schedule/blocks';
import { useDerived } from './derived';
import { clampView, HEAD, HOUR, MARGIN, ticks, viewEndMs, type View } from './scale';
import { useTimeline, useTimelineStore } from './store';

const HEIGHT = 44;

/** The whole session as a map; the thick frame is what is shown and can be dragged. */
export function Overview({ width }: { width: number }) {
  const store = useTimelineStore();
  const view = useTimeline((state) => state.view);
  const plan = useDerived((derived) => derived.plan);
  const staves = useTimeline((state) => state.stations.length);
  const { startMs, lengthSeconds } = plan.span;
  const drawWidth = width - HEAD - MARGIN;
  const spanMs = lengthSeconds * 1000;
  const x = (ms: number) => HEAD + ((ms - startMs) / spanMs) * drawWidth;
  const count = blocksOf(plan).length;
  const hours = lengthSeconds / 3600;
  const every = hours > 12 ? 2 : 1;
  const centre = (clientX: number, box: DOMRect, grab: number) => {
    const ms = startMs + ((clientX - box.left - HEAD - grab) / drawWidth) * spanMs;
    store.setState((state) => ({ view: clampView({ ...state.view, startMs: ms }, plan) }));
  };
  const bars = plan.scans
    .map((scan) => {
      const height = (scan.stations.length / Math.max(1, staves)) * 14;
      return `M${x(scan.startMs).toFixed(1)} 27v${-height.toFixed(1)}h${Math.max(2, (scan.lengthSeconds * 1000 * drawWidth) / spanMs).toFixed(1)}v${height.toFixed(1)}z`;
    })
    .join('');
  return (
    <svg
      width={width}
      height={HEIGHT}
      aria-hidden="true"
      className="block flex-none touch-none border-t border-rule bg-paper"
      onPointerDown={(event) => {
        const svg = event.currentTarget;
        const box = svg.getBoundingClientRect();
        const grab = grabOf(event.clientX - box.left, view, x);
        svg.setPointerCapture(event.pointerId);
        centre(event.clientX, box, grab);
        const move = (moved: PointerEvent) => centre(moved.clientX, box, grab);
        svg.addEventListener('pointermove', move);
        svg.addEventListener('pointerup', () => svg.removeEventListener('pointermove', move), { once: true });
        svg.addEventListener('pointercancel', () => svg.removeEventListener('pointermove', move), {
          once: true,
        });
      }}
    >
      {ticks(startMs, startMs + spanMs, HOUR).map((ms) => {
        const hour = Math.round(ms / HOUR) % 24;
        const strong = hour % every === 0;
        const at = Math.round(x(ms)) + 0.5;
        return (
          <g key={ms}>
            <line x1={at} x2={at} y1={strong ? 20 : 24} y2={28} stroke="var(--rule)" />
            {strong && (
              <text x={at} y={40} fontSize={10.5} textAnchor="middle" className="fill-ink2">
                {String(hour).padStart(2, '0')}
              </text>
            )}
          </g>
        );
      })}
      <path d={bars} fill="var(--ink)" fillOpacity={0.72} />
      <rect
        x={Math.max(HEAD, x(view.startMs))}
        y={4.5}
        width={Math.max(6, Math.min(HEAD + drawWidth, x(viewEndMs(view))) - Math.max(HEAD, x(view.startMs)))}
        height={25}
        fill="var(--wash)"
        fillOpacity={0.35}
        stroke="var(--ink)"
        strokeWidth={2}
        className="cursor-grab"
      />
      <line x1={HEAD} x2={HEAD + drawWidth} y1={28.5} y2={28.5} stroke="var(--ink)" />
      <text x={10} y={19} fontSize={12} fontWeight={600}>
        Whole {Number(hours.toFixed(1))} h
      </text>
      <text x={10} y={34} fontSize={11} className="fill-ink2">
        {count} {count === 1 ? 'scan' : 'scans'}
      </text>
    </svg>
  );
}

/** Where the frame was taken hold of; a press outside it brings its middle there. */
function grabOf(pressX: number, view: View, x: (ms: number) => number): number {
  const left = x(view.startMs);
  const right = x(viewEndMs(view));
  return pressX >= left && pressX <= right ? pressX - left : (right - left) / 2;
}
