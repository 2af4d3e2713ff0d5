import { minuteText } from '@/app/_ui/format';
import type { StartHours } from '@/src/schedule/best-start';
import { clockText } from '@/src/schedule/words';
import { crisp, gmstAt, gmstText, hourTicks, xOf, type Scale } from './scale';

const HEIGHT = 148;
const TOP = 28;
const BASE = 112;
const FLAG = { width: 66, height: 18 };

type Props = {
  starts: readonly StartHours[];
  chosen: StartHours | null;
  /** as the session stands */
  planned: StartHours | null;
  /** hours if every station saw every target throughout */
  most: { stations: number; baselines: number };
  scale: Scale;
};

/** Station-hours filled, baseline-hours dashed, in per cent of the most possible, on an axis of starts. */
export function StartChart({ starts, chosen, planned, most, scale }: Props) {
  const stationY = (one: StartHours) => yOf(one.stationHours, most.stations);
  const line = (y: (one: StartHours) => number) =>
    starts
      .map(
        (one, index) =>
          `${index === 0 ? 'M' : 'L'}${xOf(scale, one.startMs).toFixed(1)} ${y(one).toFixed(1)}`,
      )
      .join('');
  return (
    <svg width={scale.width} height={HEIGHT} aria-hidden="true" className="block overflow-visible">
      <Grid scale={scale} />
      {starts.length > 0 && (
        <>
          <path d={`${line(stationY)}L${scale.width} ${BASE}L0 ${BASE}Z`} fill="var(--teal-wash)" />
          <path d={line(stationY)} fill="none" stroke="var(--teal)" strokeWidth={1.75} />
          <path
            d={line((one) => yOf(one.baselineHours, most.baselines))}
            fill="none"
            stroke="var(--ink)"
            strokeWidth={1.25}
            strokeDasharray="5 3"
          />
        </>
      )}
      <Percents scale={scale} />
      <Axis scale={scale} />
      {planned && <Planned planned={planned} y={stationY(planned)} scale={scale} />}
      {chosen && <Chosen chosen={chosen} y={stationY(chosen)} scale={scale} />}
    </svg>
  );
}

function Grid({ scale }: { scale: Scale }) {
  return [0, 25, 50, 75, 100].map((percent) => (
    <line
      key={percent}
      x1={0}
      x2={scale.width}
      y1={crisp(yOf(percent, 100))}
      y2={crisp(yOf(percent, 100))}
      stroke={percent === 0 ? 'var(--ink)' : 'var(--hair)'}
    />
  ));
}

/** Beside the drawing; inside it on a phone, where it begins at the edge of the screen. */
function Percents({ scale }: { scale: Scale }) {
  const isNarrow = scale.width < 500;
  return [0, 50, 100].map((percent) => (
    <text
      key={percent}
      x={isNarrow ? 3 : -6}
      y={yOf(percent, 100) + (isNarrow ? -3 : 4)}
      fontSize={10.5}
      textAnchor={isNarrow ? 'start' : 'end'}
      className="fill-ink2"
    >
      {percent}%
    </text>
  ));
}

function Axis({ scale }: { scale: Scale }) {
  // beside the drawing there is room for half a label, on a phone there is none
  const least = scale.width < 500 ? 14 : -1;
  return hourTicks(scale).map(({ x, ms, hour, isLabelled }) => (
    <g key={ms}>
      <line x1={crisp(x)} x2={crisp(x)} y1={BASE} y2={BASE + (isLabelled ? 5 : 3)} stroke="var(--ink)" />
      {isLabelled && x > least && x < scale.width - least && (
        <>
          <text x={x} y={BASE + 17} fontSize={11.5} textAnchor="middle">
            {String(hour).padStart(2, '0')}
          </text>
          <text x={x} y={BASE + 30} fontSize={10} textAnchor="middle" className="fill-ink3">
            {gmstText(gmstAt(scale, ms))}
          </text>
        </>
      )}
    </g>
  ));
}

function Planned({ planned, y, scale }: { planned: StartHours; y: number; scale: Scale }) {
  const x = xOf(scale, planned.startMs);
  return (
    <>
      <line x1={crisp(x)} x2={crisp(x)} y1={6} y2={BASE} stroke="var(--ink)" strokeWidth={1.5} />
      <circle cx={x} cy={y} r={4} fill="var(--ink)" />
      <text x={x + 9} y={15} fontSize={11.5} fontWeight={600}>
        planned {minuteText(planned.startMs)}
      </text>
    </>
  );
}

function Chosen({ chosen, y, scale }: { chosen: StartHours; y: number; scale: Scale }) {
  const x = xOf(scale, chosen.startMs);
  // the flag flies to the left, where there is room
  const left = x < FLAG.width ? x : x - FLAG.width;
  return (
    <>
      <line
        x1={crisp(x)}
        x2={crisp(x)}
        y1={2 + FLAG.height}
        y2={BASE}
        stroke="var(--teal)"
        strokeWidth={1.5}
        strokeDasharray="6 3"
      />
      <rect x={left} y={2} width={FLAG.width} height={FLAG.height} fill="var(--teal)" />
      <text
        x={left + FLAG.width / 2}
        y={15.5}
        fontSize={12.5}
        fontWeight={640}
        textAnchor="middle"
        style={{ fill: 'var(--on-ink)' }}
      >
        {clockText(chosen.startMs)}
      </text>
      <circle cx={x} cy={y} r={4} fill="var(--sheet)" stroke="var(--teal)" strokeWidth={2} />
    </>
  );
}

const yOf = (value: number, most: number) => BASE - (most > 0 ? Math.min(1, value / most) : 0) * (BASE - TOP);
