import type { Corner } from '@/src/exchange/catalogue/station-site';
import { horizonElevationDeg, prepareHorizon } from '@/src/sky/horizon';
import { degToRad } from '@/src/units/angle';

const SIZE = 232;
const CENTRE = SIZE / 2;
const RIM = 97;
/** The centre of the drawing stands for this elevation, or for the mask's highest where that is higher. */
const CENTRE_DEG = 45;
const STEP_DEG = 2;

/** The mask from above: rim 0°, north on top; below the mask is sunk. */
export function MaskDrawing({ corners }: { corners: readonly Corner[] }) {
  const horizon = prepareHorizon(corners);
  if (!horizon) return null;
  const topDeg = Math.max(CENTRE_DEG, Math.ceil(horizon.highestDeg / 15) * 15 + 15);
  const place = (azimuthDeg: number, elevationDeg: number): [number, number] => {
    const radius = RIM * (1 - elevationDeg / topDeg);
    return [
      CENTRE + radius * Math.sin(degToRad(azimuthDeg)),
      CENTRE - radius * Math.cos(degToRad(azimuthDeg)),
    ];
  };
  const outline = Array.from({ length: 360 / STEP_DEG }, (_, step) =>
    place(step * STEP_DEG, horizonElevationDeg(horizon, step * STEP_DEG))
      .map((value) => value.toFixed(1))
      .join(' '),
  ).join('L');
  const rings = [10, 20, 30, 45, 60, 75].filter((deg) => deg < topDeg);
  return (
    <svg viewBox={`0 0 ${SIZE} ${SIZE}`} className="mask-drawing" aria-hidden="true">
      <circle cx={CENTRE} cy={CENTRE} r={RIM} fill="var(--sunk)" stroke="var(--ink)" />
      <path d={`M${outline}z`} fill="var(--sheet)" stroke="var(--ink)" strokeWidth={1.75} />
      {rings.map((deg) => (
        <g key={deg}>
          <circle
            cx={CENTRE}
            cy={CENTRE}
            r={RIM * (1 - deg / topDeg)}
            fill="none"
            stroke="var(--rule)"
            strokeWidth={0.75}
          />
          <text
            x={CENTRE + 3}
            y={CENTRE - RIM * (1 - deg / topDeg) + 11}
            fontSize={10}
            style={{ fill: 'var(--ink2)' }}
          >
            {deg}°
          </text>
        </g>
      ))}
      {['N', 'E', 'S', 'W'].map((word, index) => {
        const [sin, cos] = [Math.sin((index * Math.PI) / 2), Math.cos((index * Math.PI) / 2)];
        return (
          <text
            key={word}
            x={CENTRE + (RIM + 11) * sin}
            y={CENTRE - (RIM + 11) * cos + 4.5}
            fontSize={12.5}
            fontWeight={640}
            textAnchor="middle"
          >
            {word}
          </text>
        );
      })}
      {corners.map(({ azimuthDeg, elevationDeg }, index) => {
        const [x, y] = place(azimuthDeg, elevationDeg);
        return (
          <rect
            key={index}
            x={x - 3}
            y={y - 3}
            width="6"
            height="6"
            fill="var(--sheet)"
            stroke="var(--ink)"
            strokeWidth={1.5}
          />
        );
      })}
    </svg>
  );
}
