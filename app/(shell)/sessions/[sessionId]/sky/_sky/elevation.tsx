import { angleText, minuteText } from '@/app/_ui/format';
import type { SkySheet, SkySource } from '@/src/data/sky/dto';
import type { StationCode } from '@/src/schedule/plan';
import { tableElevationDeg, type SkyTable } from '@/src/schedule/sky-table';
import { highestOf, pointsIn, windowsOf, type Point } from './model';
import { ROW } from './row-grid';
import { crisp, gmstAt, gmstText, hourTicks, xOf, type Scale } from './scale';

const DASHES = ['', '7 3', '2 2.5', '9 3 2 3', '4 2', '1 3'] as const;
const HEIGHT = 128;
const TOP = 8;
const BASE = HEIGHT - 8;

type Props = {
  sheet: SkySheet;
  source: SkySource;
  codes: readonly StationCode[];
  scale: Scale;
  atMs: number | null;
};

/** How high the chosen stations see the source, on the time axis of the rows. */
export function Elevation({ sheet, source, codes, scale, atMs }: Props) {
  const { table, minElevationDeg } = sheet;
  const best = codes.map((code) => ({ code, point: highestOf(table, source.id, code) }));
  const top = best.reduce<{ code: StationCode; point: Point } | null>(
    (most, { code, point }) =>
      point && (most === null || point.elevationDeg > most.point.elevationDeg) ? { code, point } : most,
    null,
  );
  return (
    <section className={`${ROW} bg-sheet py-1`} aria-label="Elevation">
      <div className="min-w-0 desk:pl-[16px] desk:pr-[30px]">
        <h2 className="text-lead">Elevation</h2>
        <p className="text-small font-head text-teal">{source.name}</p>
        <p className="help" aria-live="polite">
          {atMs === null
            ? top
              ? `Highest: ${top.code} ${angleText(top.point.elevationDeg)} at ${minuteText(top.point.ms)}`
              : 'No station sees it in this session.'
            : `At ${minuteText(atMs)} UT, GMST ${gmstText(gmstAt(scale, atMs))}`}
        </p>
        <p className="help mt-1 hidden desk:block">Dashed: lowest for all, {angleText(minElevationDeg)}</p>
      </div>
      <div className="min-w-0 overflow-hidden desk:overflow-visible">
        <svg
          data-time=""
          width={scale.width}
          height={HEIGHT}
          aria-hidden="true"
          className="block overflow-visible"
        >
          <Frame scale={scale} minElevationDeg={minElevationDeg} />
          {codes.map((code, index) =>
            windowsOf(table, source.id, code).map((span) => (
              <path
                key={`${code}${span[0]}`}
                d={pathOf(pointsIn(table, source.id, code, span), scale)}
                fill="none"
                {...lineOf(index)}
              />
            )),
          )}
          {labelsOf(best, scale).map(({ code, x, y }) => (
            <text
              key={code}
              className="s"
              x={x}
              y={y}
              fontSize={13}
              fontWeight={600}
              textAnchor="middle"
              style={{ paintOrder: 'stroke', stroke: 'var(--sheet)', strokeWidth: 4 }}
            >
              {code}
            </text>
          ))}
        </svg>
      </div>
      <ul className="flex flex-wrap gap-x-3.5 pt-1 text-small desk:block desk:pl-[12px] desk:pt-0">
        {best.map(({ code, point }, index) => (
          <li key={code} className="flex h-[20px] items-center gap-2 whitespace-nowrap">
            <svg width={32} height={4} aria-hidden="true">
              <line x1={0} x2={32} y1={2} y2={2} {...lineOf(index)} />
            </svg>
            <span className="code text-[13px]">{code}</span>
            <span className="text-ink2">{said(table, source.id, code, point, atMs)}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

function Frame({ scale, minElevationDeg }: { scale: Scale; minElevationDeg: number }) {
  // on a phone the drawing begins at the edge of the screen
  const isNarrow = scale.width < 500;
  return (
    <>
      {hourTicks(scale).map(({ x, ms, isMidnight }) => (
        <line
          key={ms}
          x1={crisp(x)}
          x2={crisp(x)}
          y1={TOP}
          y2={BASE}
          stroke={isMidnight ? 'var(--ink)' : 'var(--hair)'}
          strokeWidth={isMidnight ? 1.75 : 1}
        />
      ))}
      {[0, 30, 60, 90].map((deg) => (
        <g key={deg}>
          <line
            x1={0}
            x2={scale.width}
            y1={crisp(yOf(deg))}
            y2={crisp(yOf(deg))}
            stroke={deg === 0 ? 'var(--ink)' : 'var(--rule)'}
            strokeWidth={deg === 0 ? 1 : 0.75}
          />
          <text
            x={isNarrow ? 3 : -6}
            y={isNarrow ? Math.max(11, yOf(deg) - 3) : yOf(deg) + 4}
            fontSize={10.5}
            textAnchor={isNarrow ? 'start' : 'end'}
            className="fill-ink2"
          >
            {deg}°
          </text>
        </g>
      ))}
      <line
        x1={0}
        x2={scale.width}
        y1={yOf(minElevationDeg)}
        y2={yOf(minElevationDeg)}
        stroke="var(--ink3)"
        strokeDasharray="3 3"
      />
    </>
  );
}

const yOf = (deg: number) => BASE - (Math.max(0, Math.min(90, deg)) / 90) * (BASE - TOP);

/** Stations differ by dash first, by colour from the seventh on. */
const lineOf = (index: number) => ({
  stroke: index < DASHES.length ? 'var(--ink)' : 'var(--teal)',
  strokeWidth: 1.25,
  strokeDasharray: DASHES[index % DASHES.length],
});

const pathOf = (points: readonly Point[], scale: Scale) =>
  points
    .map(
      ({ ms, elevationDeg }, index) =>
        `${index === 0 ? 'M' : 'L'}${xOf(scale, ms).toFixed(1)} ${yOf(elevationDeg).toFixed(1)}`,
    )
    .join('');

/** Codes at the highest points, moved down where they would stand on each other. */
function labelsOf(best: readonly { code: StationCode; point: Point | null }[], scale: Scale) {
  const placed: { code: StationCode; x: number; y: number }[] = [];
  const seen = best.flatMap(({ code, point }) => (point ? [{ code, point }] : []));
  for (const { code, point } of seen.sort((a, b) => b.point.elevationDeg - a.point.elevationDeg)) {
    const x = Math.max(10, Math.min(scale.width - 10, xOf(scale, point.ms)));
    let y = Math.max(TOP + 10, yOf(point.elevationDeg) - 4);
    for (const other of placed)
      if (Math.abs(other.x - x) < 24 && Math.abs(other.y - y) < 13) y = other.y + 14;
    placed.push({ code, x, y });
  }
  return placed;
}

function said(
  table: SkyTable,
  sourceId: string,
  code: StationCode,
  point: Point | null,
  atMs: number | null,
): string {
  if (atMs === null) return point ? `up to ${angleText(point.elevationDeg)}` : 'never';
  const isUp = windowsOf(table, sourceId, code).some(([from, to]) => from <= atMs && atMs < to);
  const elevation = isUp ? tableElevationDeg(table, sourceId, code, atMs) : null;
  return elevation === null ? 'not up' : angleText(elevation);
}
