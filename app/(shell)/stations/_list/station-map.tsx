import { numberText } from '@/app/_ui/format';
import { baselineLengthM, baselinesOf } from '@/src/array/baseline';
import type { StationRow } from '@/src/data/station/dto';
import { geodeticToItrf } from '@/src/sky/site';
import './station-map.css';

const TOP = 24;
const FOOT = 176;
const LONGITUDES = Array.from({ length: 25 }, (_, index) => index * 15 - 180);

const x = (longitudeDeg: number) => `${(((longitudeDeg + 180) / 360) * 100).toFixed(3)}%`;
/** Latitudes from 56° south to 76° north: where people live and dishes stand. */
const y = (latitudeDeg: number) =>
  FOOT - ((Math.max(-56, Math.min(76, latitudeDeg)) + 56) / 132) * (FOOT - TOP);

/** Where the stations stand: longitude across, a ring as large as the dish, a dotted line for each baseline. */
export function StationMap({ stations }: { stations: readonly StationRow[] }) {
  if (stations.length === 0) return null;
  const pairs = baselinesOf(stations);
  return (
    <figure className="station-map from-narrow">
      <svg height="182" aria-hidden="true">
        {LONGITUDES.map((deg) => (
          <line
            key={deg}
            x1={x(deg)}
            x2={x(deg)}
            y1={deg % 45 ? TOP + 6 : TOP}
            y2={FOOT}
            stroke={deg % 45 ? 'var(--hair)' : 'var(--rule)'}
          />
        ))}
        {LONGITUDES.filter((deg) => deg % 45 === 0).map((deg) => (
          <text
            key={deg}
            x={x(deg)}
            y="18"
            fontSize={11.5}
            textAnchor={deg === -180 ? 'start' : deg === 180 ? 'end' : 'middle'}
            style={{ fill: 'var(--ink2)' }}
          >
            {deg === 0 ? '0°' : `${Math.abs(deg)}° ${deg < 0 ? 'W' : 'E'}`}
          </text>
        ))}
        <line x1="0" x2="100%" y1={TOP + 0.5} y2={TOP + 0.5} stroke="var(--ink)" />
        {[
          [45, '45° N'],
          [0, 'equator'],
          [-45, '45° S'],
        ].map(([deg, label]) => (
          <g key={label}>
            <line
              x1="0"
              x2="100%"
              y1={Math.round(y(Number(deg))) + 0.5}
              y2={Math.round(y(Number(deg))) + 0.5}
              stroke={deg === 0 ? 'var(--rule)' : 'var(--hair)'}
            />
            <text
              x="100%"
              y={y(Number(deg)) - 3}
              fontSize={11}
              textAnchor="end"
              style={{ fill: 'var(--ink3)' }}
            >
              {label}
            </text>
          </g>
        ))}
        {pairs.map(({ first, second }) => (
          <line
            key={`${first.code}-${second.code}`}
            x1={x(first.site.longitudeDeg)}
            y1={y(first.site.latitudeDeg)}
            x2={x(second.site.longitudeDeg)}
            y2={y(second.site.latitudeDeg)}
            stroke="var(--ink2)"
            strokeWidth={0.75}
            strokeDasharray="2 3"
          />
        ))}
        {stations.map(({ code, dishM, site }) => (
          <g key={code}>
            <circle
              cx={x(site.longitudeDeg)}
              cy={y(site.latitudeDeg)}
              r={Math.sqrt(dishM) * 1.1}
              fill="var(--sheet)"
              stroke="var(--ink)"
              strokeWidth={1.75}
            />
            <text
              className="s station-map-code"
              x={x(site.longitudeDeg)}
              y={y(site.latitudeDeg)}
              dx={11}
              dy={5}
              fontSize={13.5}
              fontWeight={600}
            >
              {code}
            </text>
          </g>
        ))}
      </svg>
      <figcaption>{sentence(pairs)}</figcaption>
    </figure>
  );
}

function sentence(pairs: ReturnType<typeof baselinesOf<StationRow>>): string {
  const lengths = pairs
    .map(({ first, second }) => ({
      name: `${first.code}–${second.code}`,
      km: baselineLengthM(geodeticToItrf(first.site), geodeticToItrf(second.site)) / 1000,
    }))
    .sort((a, b) => a.km - b.km);
  const [shortest, longest] = [lengths[0], lengths.at(-1)];
  if (!shortest || !longest) return 'One station has no baseline. The size of a ring is the dish.';
  const said = ({ name, km }: { name: string; km: number }) => `${numberText(km)} km (${name})`;
  const span =
    lengths.length === 1
      ? `1 baseline, ${said(shortest)}`
      : `${lengths.length} baselines, ${said(shortest)} to ${said(longest)}`;
  return `${span}. The size of a ring is the dish.`;
}
