'use client';

import { angleText } from '@/app/_ui/format';
import type { PlanSettings, PlanSource, PlanStation } from '@/src/schedule/context';
import { scanStopMs, type PlanSpan, type Scan } from '@/src/schedule/plan';
import { trackNear } from '@/src/schedule/sight';
import { skyStation } from '@/src/schedule/sky-station';
import { prepareSite, trackElevationDeg } from '@/src/sky/track';
import { utcParts } from '@/src/units/time';

const WIDTH = 146;
const HEIGHT = 74;
const BASE = HEIGHT - 14;
const HOUR = 3_600_000;
const STEP_MS = 600_000;

type Props = { station: PlanStation; source: PlanSource; scan: Scan; span: PlanSpan; settings: PlanSettings };

/** Elevation of the source at one station, eight hours about the scan, with its limit. */
export function ElevationChart({ station, source, scan, span, settings }: Props) {
  const middleMs = scan.startMs + scan.lengthSeconds * 500;
  const fromMs = Math.max(span.startMs, Math.min(middleMs - 4 * HOUR, scanStopMs(span) - 8 * HOUR));
  const track = trackNear(source, middleMs);
  const site = prepareSite(station.site);
  const limitDeg = skyStation(station, settings).minElevationDeg;
  const at = (ms: number) => trackElevationDeg(track, site, ms);
  const x = (ms: number) => ((ms - fromMs) / (8 * HOUR)) * WIDTH;
  const y = (deg: number) => BASE - (Math.max(0, deg) / 90) * (BASE - 4);
  let path = '';
  let isDown = true;
  for (let ms = fromMs; ms <= fromMs + 8 * HOUR; ms += STEP_MS) {
    const elevation = at(ms);
    if (elevation > 0) path += `${isDown ? 'M' : 'L'}${x(ms).toFixed(1)} ${y(elevation).toFixed(1)}`;
    isDown = elevation <= 0;
  }
  const hours = [0, 4, 8].map((hour) => Math.ceil(fromMs / HOUR) * HOUR + hour * HOUR);
  return (
    <figure>
      <svg width={WIDTH} height={HEIGHT} aria-hidden="true" className="block max-w-full">
        <rect x={0} y={y(limitDeg)} width={WIDTH} height={BASE - y(limitDeg)} fill="var(--sunk)" />
        <line
          x1={0}
          x2={WIDTH}
          y1={y(limitDeg)}
          y2={y(limitDeg)}
          stroke="var(--edge)"
          strokeDasharray="3 2"
        />
        <line x1={0} x2={WIDTH} y1={BASE + 0.5} y2={BASE + 0.5} stroke="var(--ink)" />
        <path d={path} fill="none" stroke="var(--teal)" strokeWidth={1.5} />
        <rect
          x={x(scan.startMs)}
          y={4}
          width={Math.max(3, x(scanStopMs(scan)) - x(scan.startMs))}
          height={BASE - 4}
          fill="rgb(var(--shade)/.14)"
        />
        <circle cx={x(middleMs)} cy={y(at(middleMs))} r={3.5} fill="var(--ink)" />
        {hours.map((ms) => (
          <text
            key={ms}
            x={Math.max(6, Math.min(WIDTH - 7, x(ms)))}
            y={HEIGHT - 2}
            fontSize={10.5}
            textAnchor="middle"
            className="fill-ink2"
          >
            {String(utcParts(ms).hour).padStart(2, '0')}
          </text>
        ))}
      </svg>
      <figcaption className="help">
        <span className="code text-ink">{station.code}</span> {angleText(at(middleMs))}, limit{' '}
        {angleText(limitDeg)}
        {station.horizon.length > 0 && ' and mask'}
      </figcaption>
    </figure>
  );
}
