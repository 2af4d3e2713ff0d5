'use client';

import { useState, type PointerEvent } from 'react';
import type { Corner } from '@/src/exchange/catalogue/station-site';
import { diurnalPath } from '@/src/sky/diurnal-path';
import { horizonElevationDeg, prepareHorizon, type Horizon } from '@/src/sky/horizon';
import { Compass, Limits, placeIn, RIM, Rings, SIZE, spotIn, type Polar } from './polar';

/** The centre of a drawing without tracks stands for this elevation, or for more where the mask is higher. */
const CENTRE_DEG = 45;
const STEP_DEG = 2;
/** Where names stand: steps of hour angle from the meridian, and above or below the line. */
const NAMES = [
  { step: 0, dy: -4 },
  { step: -22, dy: -4 },
  { step: 22, dy: 13 },
  { step: -30, dy: 13 },
  { step: 30, dy: -4 },
] as const;

export type SkyPath = { id: string; name: string; decDeg: number };

type Props = {
  corners: readonly Corner[];
  limits: { lowestDeg: number; highestDeg: number; azimuthMinDeg: number; azimuthMaxDeg: number };
  latitudeDeg: number;
  paths: readonly SkyPath[];
  /** a corner is moved: its place among the corners, and where it is put */
  onMove?: (index: number, corner: Corner) => void;
};

/** The sky from above: rim 0°, north on top; below the mask is sunk, and paths are drawn through where it is free. */
export function MaskDrawing({ corners, limits, latitudeDeg, paths, onMove }: Props) {
  const [held, setHeld] = useState<number | null>(null);
  const horizon = prepareHorizon(corners);
  const highest = horizon?.highestDeg ?? 0;
  const topDeg =
    paths.length > 0 ? 90 : Math.min(90, Math.max(CENTRE_DEG, Math.ceil(highest / 15) * 15 + 15));
  const polar: Polar = { topDeg };
  const floorAt = (azimuthDeg: number) =>
    Math.max(limits.lowestDeg, horizon ? horizonElevationDeg(horizon, azimuthDeg) : 0);
  const move = (event: PointerEvent<SVGSVGElement>) => {
    if (held === null || !onMove) return;
    const box = event.currentTarget.getBoundingClientRect();
    const scale = SIZE / box.width;
    onMove(held, spotIn(polar, (event.clientX - box.left) * scale, (event.clientY - box.top) * scale));
  };
  return (
    <svg
      viewBox={`0 0 ${SIZE} ${SIZE}`}
      className="mask-drawing"
      aria-hidden="true"
      style={onMove && { touchAction: 'none' }}
      onPointerMove={move}
      onPointerUp={() => setHeld(null)}
      onPointerCancel={() => setHeld(null)}
    >
      <circle
        cx={SIZE / 2}
        cy={SIZE / 2}
        r={RIM}
        fill={horizon ? 'var(--sunk)' : 'var(--sheet)'}
        stroke="var(--ink)"
      />
      {horizon && (
        <path d={outline(polar, horizon)} fill="var(--sheet)" stroke="var(--ink)" strokeWidth={1.75} />
      )}
      <Limits polar={polar} {...limits} />
      <Rings polar={polar} />
      {paths.map((path, index) => (
        <Path
          key={path.id}
          polar={polar}
          path={path}
          at={index}
          {...{ latitudeDeg, floorAt, highestDeg: limits.highestDeg }}
        />
      ))}
      <Compass />
      {corners.map((corner, index) => {
        const [x, y] = placeIn(polar, corner.azimuthDeg, corner.elevationDeg);
        return (
          <g key={index}>
            <rect
              x={x - 3}
              y={y - 3}
              width="6"
              height="6"
              fill={held === index ? 'var(--ink)' : 'var(--sheet)'}
              stroke="var(--ink)"
              strokeWidth={1.5}
            />
            {onMove && (
              <circle
                cx={x}
                cy={y}
                r={9}
                fill="transparent"
                className="cursor-grab"
                onPointerDown={(event) => {
                  event.currentTarget.ownerSVGElement?.setPointerCapture(event.pointerId);
                  setHeld(index);
                }}
              />
            )}
          </g>
        );
      })}
      {held !== null && corners[held] && <HeldWords polar={polar} corner={corners[held]} />}
    </svg>
  );
}

function HeldWords({ polar, corner }: { polar: Polar; corner: Corner }) {
  const [x, y] = placeIn(polar, corner.azimuthDeg, corner.elevationDeg);
  const left = Math.max(2, Math.min(SIZE - 76, x - 37));
  const top = y > SIZE / 2 ? y - 26 : y + 10;
  return (
    <>
      <rect x={left} y={top} width={74} height={17} fill="var(--sheet)" stroke="var(--ink)" />
      <text x={left + 37} y={top + 12.5} fontSize={11} fontWeight={640} textAnchor="middle">
        {corner.azimuthDeg}°, {corner.elevationDeg.toFixed(1)}°
      </text>
    </>
  );
}

type PathProps = {
  polar: Polar;
  path: SkyPath;
  at: number;
  latitudeDeg: number;
  floorAt: (azimuthDeg: number) => number;
  highestDeg: number;
};

/** Seen parts drawn through, hidden ones above the horizon dashed; the name where it stands highest. */
function Path({ polar, path, at, latitudeDeg, floorAt, highestDeg }: PathProps) {
  const points = diurnalPath(path.decDeg, latitudeDeg);
  const best = points.reduce((top, point) => (point.elevationDeg > top.elevationDeg ? point : top));
  if (best.elevationDeg <= 0) return null;
  const seen: string[] = [];
  const hidden: string[] = [];
  points.slice(1).forEach((point, index) => {
    const before = points[index];
    if (!before || before.elevationDeg < 0 || point.elevationDeg < 0) return;
    const isSeen = [before, point].every(
      ({ azimuthDeg, elevationDeg }) => elevationDeg >= floorAt(azimuthDeg) && elevationDeg <= highestDeg,
    );
    const [from, to] = [before, point].map(({ azimuthDeg, elevationDeg }) =>
      placeIn(polar, azimuthDeg, elevationDeg)
        .map((value) => value.toFixed(1))
        .join(' '),
    );
    (isSeen ? seen : hidden).push(`M${from}L${to}`);
  });
  // so that they do not cover each other
  const { step, dy } = NAMES[at % NAMES.length] ?? NAMES[0];
  const aside = points[90 + step];
  const named = aside && aside.elevationDeg > 5 ? aside : best;
  const [x, y] = placeIn(polar, named.azimuthDeg, named.elevationDeg);
  return (
    <>
      <path d={hidden.join('')} fill="none" stroke="var(--ink3)" strokeWidth={1} strokeDasharray="2 2" />
      <path d={seen.join('')} fill="none" stroke="var(--teal)" strokeWidth={1.75} />
      <text
        x={Math.max(56, Math.min(SIZE - 56, x))}
        y={y + dy}
        fontSize={10}
        fontWeight={600}
        textAnchor="middle"
        style={{ fill: 'var(--teal)', paintOrder: 'stroke', stroke: 'var(--sheet)', strokeWidth: 3 }}
      >
        {path.name}
      </text>
    </>
  );
}

function outline(polar: Polar, horizon: Horizon): string {
  const points = Array.from({ length: 360 / STEP_DEG }, (_, step) =>
    placeIn(polar, step * STEP_DEG, horizonElevationDeg(horizon, step * STEP_DEG))
      .map((value) => value.toFixed(1))
      .join(' '),
  );
  return `M${points.join('L')}z`;
}
