import type { Sector } from '@/src/exchange/catalogue/station-site';
import { degToRad } from '@/src/units/angle';

type Props = { minDeg: number; maxDeg: number; sectors: readonly Sector[] };

const CX = 182;
const CY = 128;
const IN = 60;
const OUT = 100;
const HALF_BAND = 8.5;

/** The cable's range as a spiral, north on top; outward is clockwise. */
export function WrapSpiral({ minDeg, maxDeg, sectors }: Props) {
  const place = (deg: number, shift = 0): [number, number] => {
    const radius = IN + ((deg - minDeg) / (maxDeg - minDeg)) * (OUT - IN) + shift;
    return [CX + radius * Math.sin(degToRad(deg)), CY - radius * Math.cos(degToRad(deg))];
  };
  const run = (fromDeg: number, toDeg: number, shift = 0) => {
    const steps = Math.max(2, Math.ceil((toDeg - fromDeg) / 3));
    const points = Array.from({ length: steps + 1 }, (_, step) =>
      place(fromDeg + ((toDeg - fromDeg) * step) / steps, shift)
        .map((value) => value.toFixed(1))
        .join(' '),
    );
    return `M${points.join('L')}`;
  };
  const shown = sectors
    .map((sector) => ({
      ...sector,
      minDeg: Math.max(minDeg, sector.minDeg),
      maxDeg: Math.min(maxDeg, sector.maxDeg),
    }))
    .filter((sector) => sector.minDeg < sector.maxDeg);
  return (
    <svg viewBox="40 2 284 254" className="wrap-spiral" aria-hidden="true">
      {[0, 90, 180, 270].map((deg) => {
        const [sin, cos] = [Math.sin(degToRad(deg)), Math.cos(degToRad(deg))];
        return (
          <g key={deg}>
            <line
              x1={CX + 40 * sin}
              y1={CY - 40 * cos}
              x2={CX + 112 * sin}
              y2={CY - 112 * cos}
              stroke="var(--rule)"
              strokeWidth={0.75}
            />
            <text
              x={CX + 121 * sin}
              y={CY - 121 * cos + 4.5}
              fontSize={12.5}
              fontWeight={640}
              textAnchor="middle"
            >
              {{ 0: 'N', 90: 'E', 180: 'S', 270: 'W' }[deg]}
            </text>
          </g>
        );
      })}
      <path d={run(minDeg, maxDeg)} fill="none" stroke="rgb(var(--shade) / .07)" strokeWidth={17} />
      {shown.map((sector, index) => (
        <path
          key={`${sector.name} ${sector.minDeg}`}
          d={run(sector.minDeg, sector.maxDeg)}
          fill="none"
          stroke={index % 2 === 0 ? 'rgb(var(--shade) / .12)' : 'transparent'}
          strokeWidth={17}
        />
      ))}
      <path d={run(minDeg, maxDeg, -HALF_BAND)} fill="none" stroke="var(--ink)" />
      <path d={run(minDeg, maxDeg, HALF_BAND)} fill="none" stroke="var(--ink)" />
      {[minDeg, maxDeg].map((deg) => {
        const [[x1, y1], [x2, y2]] = [place(deg, -9), place(deg, 9)];
        return <line key={deg} x1={x1} y1={y1} x2={x2} y2={y2} stroke="var(--ink)" strokeWidth={3} />;
      })}
      {shown.map((sector) => {
        const middle = (sector.minDeg + sector.maxDeg) / 2;
        const [x, y] = place(middle);
        const turned = ((middle % 360) + 360) % 360;
        const angle = turned > 90 && turned < 270 ? turned - 180 : turned;
        return (
          <text
            key={`${sector.name} ${sector.minDeg}`}
            x={x}
            y={y + 4}
            fontSize={11.5}
            fontWeight={600}
            textAnchor="middle"
            transform={`rotate(${angle.toFixed(1)} ${x.toFixed(1)} ${y.toFixed(1)})`}
          >
            {sector.name}
          </text>
        );
      })}
    </svg>
  );
}
