import { degToRad, normalise360, radToDeg } from '@/src/units/angle';

export const SIZE = 232;
const CENTRE = SIZE / 2;
export const RIM = 97;

/** The elevation that the centre stands for; the rim is 0°. */
export type Polar = { topDeg: number };

const radiusAt = ({ topDeg }: Polar, elevationDeg: number) =>
  RIM * (1 - Math.min(topDeg, elevationDeg) / topDeg);

export function placeIn(polar: Polar, azimuthDeg: number, elevationDeg: number): [x: number, y: number] {
  const radius = radiusAt(polar, elevationDeg);
  return [CENTRE + radius * Math.sin(degToRad(azimuthDeg)), CENTRE - radius * Math.cos(degToRad(azimuthDeg))];
}

/** The direction under a point of the drawing: azimuth to whole degrees, elevation to half ones. */
export function spotIn(
  { topDeg }: Polar,
  x: number,
  y: number,
): { azimuthDeg: number; elevationDeg: number } {
  const [across, up] = [x - CENTRE, CENTRE - y];
  const elevationDeg = topDeg * (1 - Math.hypot(across, up) / RIM);
  return {
    azimuthDeg: Math.round(normalise360(radToDeg(Math.atan2(across, up)))) % 360,
    elevationDeg: Math.max(0, Math.min(90, Math.round(2 * elevationDeg) / 2)),
  };
}

export function Rings({ polar }: { polar: Polar }) {
  const every = polar.topDeg > 60 ? [15, 30, 45, 60, 75] : [10, 20, 30, 45, 60];
  return every
    .filter((deg) => deg < polar.topDeg)
    .map((deg) => (
      <g key={deg}>
        <circle
          cx={CENTRE}
          cy={CENTRE}
          r={radiusAt(polar, deg)}
          fill="none"
          stroke="var(--rule)"
          strokeWidth={0.75}
        />
        <text
          x={CENTRE + 3}
          y={CENTRE - radiusAt(polar, deg) + 11}
          fontSize={10}
          style={{ fill: 'var(--ink2)' }}
        >
          {deg}°
        </text>
      </g>
    ));
}

export function Compass() {
  return ['N', 'E', 'S', 'W'].map((word, index) => {
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
  });
}

type LimitsProps = {
  polar: Polar;
  lowestDeg: number;
  highestDeg: number;
  azimuthMinDeg: number;
  azimuthMaxDeg: number;
};

/** Where the mount cannot point: below its lowest elevation, above its highest, and where its azimuth does not reach. */
export function Limits({ polar, lowestDeg, highestDeg, azimuthMinDeg, azimuthMaxDeg }: LimitsProps) {
  const isZenithShown = polar.topDeg === 90 && highestDeg < 90;
  const deadDeg = 360 - (azimuthMaxDeg - azimuthMinDeg);
  return (
    <>
      {lowestDeg > 0 && lowestDeg < polar.topDeg && (
        <circle
          cx={CENTRE}
          cy={CENTRE}
          r={radiusAt(polar, lowestDeg)}
          fill="none"
          stroke="var(--ink2)"
          strokeDasharray="3 3"
        />
      )}
      {isZenithShown && (
        <circle
          cx={CENTRE}
          cy={CENTRE}
          r={Math.max(1.5, radiusAt(polar, highestDeg))}
          fill="var(--sunk)"
          stroke="var(--ink2)"
          strokeDasharray="3 3"
        />
      )}
      {deadDeg > 0 && (
        <path
          d={`M${CENTRE} ${CENTRE}L${placeIn(polar, azimuthMaxDeg, 0).join(' ')}A${RIM} ${RIM} 0 ${deadDeg > 180 ? 1 : 0} 1 ${placeIn(polar, azimuthMinDeg, 0).join(' ')}Z`}
          fill="var(--sunk)"
          stroke="var(--ink2)"
          strokeDasharray="3 3"
        />
      )}
    </>
  );
}
