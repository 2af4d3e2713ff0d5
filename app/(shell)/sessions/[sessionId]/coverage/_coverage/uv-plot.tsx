import { numberText } from '@/app/_ui/format';
import type { UvTrack } from '@/src/outlook/coverage';
import { endsText, pathOf, rightEnds, uvScaleOf, type BaselineRow, type Ends } from './model';

const LEFT = 46;
const TOP = 6;
const SIDE = 404;
const UV_SIZE = { width: LEFT + SIDE + 36, height: TOP + SIDE + 48 };

type Props = {
  tracks: readonly UvTrack[];
  rows: readonly BaselineRow[];
  /** in wavelengths */
  longest: number;
  lit: Ends | null;
};

/** The uv plane: square, u to the left is east, both conjugates, in millions of wavelengths. */
export function UvPlot({ tracks, rows, longest, lit }: Props) {
  const scale = uvScaleOf(longest / 1e6);
  const middle = SIDE / 2;
  const x = (u: number) => LEFT + middle - (u / scale.half) * middle;
  const y = (v: number) => TOP + middle - (v / scale.half) * middle;
  const place = (u: number, v: number): [number, number] => [x(u), y(v)];
  const isLit = (track: Ends) => track.first === lit?.first && track.second === lit.second;
  const lines: number[] = [];
  for (let k = -Math.floor(scale.half / scale.step); k * scale.step <= scale.half; k++) lines.push(k);
  const decimals = scale.step < 1 ? Math.ceil(-Math.log10(scale.step)) : 0;
  const named = lit ? rightEnds(tracks, rows.filter(isLit), 1) : spread(rightEnds(tracks, rows, 5), y);
  return (
    <svg
      viewBox={`0 0 ${UV_SIZE.width} ${UV_SIZE.height}`}
      aria-hidden="true"
      className="block w-full max-w-[486px]"
      data-figure="uv"
    >
      {lines.map((k) => {
        const value = k * scale.step;
        const stroke = k === 0 ? 'var(--rule)' : 'var(--hair)';
        return (
          <g key={k} fontSize={12} style={{ fill: 'var(--ink2)' }}>
            <line x1={x(value)} x2={x(value)} y1={TOP} y2={TOP + SIDE} stroke={stroke} />
            <line x1={LEFT} x2={LEFT + SIDE} y1={y(value)} y2={y(value)} stroke={stroke} />
            {k % 2 === 0 && (
              <>
                <text x={x(value)} y={TOP + SIDE + 17} textAnchor="middle" style={{ fill: 'var(--ink2)' }}>
                  {numberText(value, decimals)}
                </text>
                <text x={LEFT - 8} y={y(value) + 4} textAnchor="end" style={{ fill: 'var(--ink2)' }}>
                  {numberText(value, decimals)}
                </text>
              </>
            )}
          </g>
        );
      })}
      {scale.rings.map((ring) => (
        <circle
          key={ring}
          cx={x(0)}
          cy={y(0)}
          r={(ring / scale.half) * middle}
          fill="none"
          stroke="var(--edge)"
          strokeDasharray="2 3"
        />
      ))}
      <rect x={LEFT + 0.5} y={TOP + 0.5} width={SIDE} height={SIDE} fill="none" stroke="var(--ink)" />
      <path
        d={pathOf(
          tracks.filter((track) => !isLit(track)),
          place,
        )}
        fill="none"
        stroke={lit ? 'var(--edge)' : 'var(--ink)'}
        strokeWidth={3.4}
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      <path
        d={pathOf(tracks.filter(isLit), place)}
        fill="none"
        stroke="var(--teal)"
        strokeWidth={5}
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      {named.map(({ first, second, u, v }) => (
        <text
          key={`${first}${second}`}
          x={Math.min(x(u) + 6, LEFT + SIDE - 40)}
          y={y(v) + 4}
          fontSize={11.5}
          fontWeight={560}
          style={{ paintOrder: 'stroke', stroke: 'var(--sheet)', strokeWidth: 3.5 }}
        >
          {endsText({ first, second })}
        </text>
      ))}
      <text x={LEFT + 6} y={TOP + 16} fontSize={12} style={{ fill: 'var(--ink2)' }}>
        v, Mλ
      </text>
      <text
        x={LEFT + middle}
        y={TOP + SIDE + 40}
        fontSize={12}
        textAnchor="middle"
        style={{ fill: 'var(--ink2)' }}
      >
        u, Mλ, east to the left
      </text>
    </svg>
  );
}

/** Of names that would stand on each other the one of the longer baseline stays. */
function spread<T extends { u: number; v: number }>(ends: readonly T[], y: (v: number) => number): T[] {
  return ends.filter((end, index) =>
    ends.slice(0, index).every((other) => Math.abs(y(other.v) - y(end.v)) >= 13),
  );
}
