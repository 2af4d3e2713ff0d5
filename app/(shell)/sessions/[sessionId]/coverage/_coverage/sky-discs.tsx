import { angleText } from '@/app/_ui/format';
import type { StationSky } from '@/src/outlook/source-sky';

const SIZE = 104;
const MIDDLE = SIZE / 2;
const RADIUS = 50;

/** The sky over each station: rim = horizon, north up, east left, dots where the scans are. */
export function SkyDiscs({ skies }: { skies: readonly StationSky[] }) {
  return (
    <ul className="grid grid-cols-[repeat(auto-fill,minmax(160px,1fr))] gap-x-3.5 gap-y-2.5">
      {skies.map((sky) => (
        <li key={sky.code} className="flex items-center gap-2.5">
          <Disc sky={sky} />
          <div>
            <span className="code">{sky.code}</span>
            <p className="help">
              {sky.scans.length} {sky.scans.length === 1 ? 'scan' : 'scans'}
              <br />
              {rangeText(sky)}
            </p>
          </div>
        </li>
      ))}
    </ul>
  );
}

function Disc({ sky: { scans, ground } }: { sky: StationSky }) {
  const free = ground.map(([azimuthDeg, elevationDeg]) => place(azimuthDeg, elevationDeg));
  const rim = `M${MIDDLE - RADIUS} ${MIDDLE}a${RADIUS} ${RADIUS} 0 1 0 ${2 * RADIUS} 0a${RADIUS} ${RADIUS} 0 1 0 ${-2 * RADIUS} 0Z`;
  return (
    <svg width={SIZE} height={SIZE} viewBox={`0 0 ${SIZE} ${SIZE}`} aria-hidden="true" className="flex-none">
      <path d={`${rim}M${free.map(textOf).join('L')}Z`} fillRule="evenodd" fill="var(--sunk)" />
      {[30, 60].map((deg) => (
        <circle key={deg} cx={MIDDLE} cy={MIDDLE} r={radiusAt(deg)} fill="none" stroke="var(--hair)" />
      ))}
      <path d={rim} fill="none" stroke="var(--ink)" />
      <line
        x1={MIDDLE}
        x2={MIDDLE}
        y1={MIDDLE - RADIUS - 2}
        y2={MIDDLE - RADIUS + 5}
        stroke="var(--ink)"
        strokeWidth={2}
      />
      {scans.map(({ scanId, points }) => {
        const [x, y] = place(...(points[1] ?? [0, 90]));
        return (
          <g key={scanId}>
            <path
              d={`M${points.map((point) => textOf(place(...point))).join('L')}`}
              fill="none"
              stroke="var(--teal)"
              strokeWidth={1.5}
            />
            <circle cx={x} cy={y} r={3} fill="var(--teal)" />
          </g>
        );
      })}
    </svg>
  );
}

const radiusAt = (elevationDeg: number) => (RADIUS * (90 - Math.max(0, elevationDeg))) / 90;

/** As one sees it looking up: north at the top, east at the left. */
function place(azimuthDeg: number, elevationDeg: number): [number, number] {
  const angle = (azimuthDeg * Math.PI) / 180;
  const radius = radiusAt(elevationDeg);
  return [MIDDLE - radius * Math.sin(angle), MIDDLE - radius * Math.cos(angle)];
}

const textOf = ([x, y]: [number, number]) => `${x.toFixed(1)} ${y.toFixed(1)}`;

function rangeText({ scans }: StationSky): string {
  const elevations = scans.flatMap(({ points }) => points.map(([, deg]) => deg));
  if (elevations.length === 0) return 'not on it';
  const [low, high] = [Math.min(...elevations), Math.max(...elevations)].map((deg) => angleText(deg));
  return low === high ? `${low}` : `${low} to ${high}`;
}
