import { minuteText } from '@/app/_ui/format';
import type { DeskScan } from '@/src/data/desk/dto';

const LEFT = 34;
const TOP = 34;
const MINUTE = 60_000;
const BACK = 20 * MINUTE;
const AHEAD = 50 * MINUTE;

type Props = { scans: readonly DeskScan[]; now: number; minElevationDeg: number };

/** Drawn twice, each at its own size, so that its words are read on a phone too; one of the two is shown. */
export function SmallStave(props: Props) {
  return (
    <>
      <Stave {...props} width={358} height={110} className="desk-stave desk-stave-phone" />
      <Stave {...props} width={560} height={190} className="desk-stave desk-stave-wide" />
    </>
  );
}

/** The station's own stave, from 20 minutes ago to 50 ahead: notes, the way between them, the now line. */
function Stave({
  scans,
  now,
  minElevationDeg,
  width,
  height,
  className,
}: Props & { width: number; height: number; className: string }) {
  const fromMs = now - BACK;
  const untilMs = now + AHEAD;
  const x = (ms: number) => LEFT + ((ms - fromMs) / (untilMs - fromMs)) * (width - LEFT);
  const y = (deg: number) => TOP + height * (1 - deg / 90);
  const clamp = (ms: number) => Math.max(fromMs, Math.min(untilMs, ms));
  const shown = scans.filter(({ startMs, stopMs }) => stopMs > fromMs && startMs < untilMs);
  const ticks = Array.from(
    { length: 8 },
    (_, k) => Math.ceil(fromMs / (10 * MINUTE)) * 10 * MINUTE + k * 10 * MINUTE,
  );
  const said = shown.map(
    ({ number, startMs, stopMs }) => `${number} from ${minuteText(startMs)} to ${minuteText(stopMs)}`,
  );
  const summary =
    shown.length === 0 ? 'No scan in the next 50 minutes' : `Scans near now: ${said.join(', ')}`;
  return (
    <svg viewBox={`0 0 ${width} ${TOP + height + 22}`} role="img" aria-label={summary} className={className}>
      <rect
        x={LEFT}
        y={y(minElevationDeg)}
        width={width - LEFT}
        height={TOP + height - y(minElevationDeg)}
        fill="var(--sunk)"
      />
      {[30, 60, 90].map((deg) => (
        <g key={deg}>
          <line x1={LEFT} x2={width} y1={y(deg)} y2={y(deg)} stroke="var(--rule)" strokeWidth={0.75} />
          <text x={LEFT - 6} y={y(deg) + 4} fontSize={11} textAnchor="end" className="fill-ink2">
            {deg}°
          </text>
        </g>
      ))}
      {ticks
        .filter((ms) => ms <= untilMs)
        .map((ms) => (
          <g key={ms}>
            <line x1={x(ms)} x2={x(ms)} y1={TOP} y2={TOP + height} stroke="var(--hair)" />
            {ms % (20 * MINUTE) === 0 && (
              <text x={x(ms)} y={TOP + height + 16} fontSize={12} textAnchor="middle" className="fill-ink2">
                {minuteText(ms)}
              </text>
            )}
          </g>
        ))}
      {shown.map((scan) => {
        const isPast = scan.stopMs <= now;
        const x1 = x(clamp(scan.startMs));
        const x2 = x(clamp(scan.stopMs));
        return (
          <g key={scan.scanId} opacity={isPast ? 0.45 : 1}>
            <rect
              x={x1}
              y={TOP}
              width={x2 - x1}
              height={height}
              fill={isPast ? 'rgb(var(--shade)/.07)' : 'var(--wash)'}
            />
            <line x1={x1} x2={x1} y1={TOP} y2={TOP + height} stroke="var(--ink)" strokeWidth={1.25} />
            <Way scan={scan} x={x} y={y} fromMs={fromMs} />
            <line
              x1={x1}
              x2={Math.max(x2, x1 + 3)}
              y1={y(scan.startElDeg)}
              y2={y(scan.stopElDeg)}
              stroke="var(--note)"
              strokeWidth={8}
            />
            {x2 - x1 > 14 && (
              <text x={(x1 + x2) / 2} y={TOP - 18} fontSize={13} fontWeight={680} textAnchor="middle">
                {scan.number}
                <tspan x={(x1 + x2) / 2} dy={13} fontSize={11} fontWeight={400} className="fill-ink2">
                  {/^J(\d{4})/.exec(scan.source)?.[1] ?? scan.source.slice(0, 5)}
                </tspan>
              </text>
            )}
          </g>
        );
      })}
      <line x1={LEFT} x2={width} y1={TOP + height} y2={TOP + height} stroke="var(--ink)" />
      <line x1={LEFT} x2={LEFT} y1={TOP} y2={TOP + height} stroke="var(--ink)" />
      <path d={`M${x(now) - 6} ${TOP - 6}h12l-6 7z`} fill="var(--verm)" />
      <line x1={x(now)} x2={x(now)} y1={TOP} y2={TOP + height} stroke="var(--verm)" strokeWidth={2} />
    </svg>
  );
}

/** Slanted while it slews, dotted while it waits. */
function Way({
  scan,
  x,
  y,
  fromMs,
}: {
  scan: DeskScan;
  x: (ms: number) => number;
  y: (deg: number) => number;
  fromMs: number;
}) {
  const { fromStopMs, fromElDeg, slewSeconds, arriveElDeg, startMs, startElDeg } = scan;
  if (fromStopMs === null || fromElDeg === null || slewSeconds === null || fromStopMs < fromMs) return null;
  const arriveMs = fromStopMs + slewSeconds * 1000;
  const arrive = arriveElDeg ?? startElDeg;
  return (
    <>
      <line x1={x(fromStopMs)} y1={y(fromElDeg)} x2={x(arriveMs)} y2={y(arrive)} stroke="var(--ink)" />
      {arriveMs < startMs && (
        <line
          x1={x(arriveMs)}
          y1={y(arrive)}
          x2={x(startMs)}
          y2={y(startElDeg)}
          stroke="var(--ink2)"
          strokeDasharray="1.5 2.5"
        />
      )}
    </>
  );
}
