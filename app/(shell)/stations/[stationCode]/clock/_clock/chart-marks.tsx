import { dayText, minuteText, numberText, signedText } from '@/app/_ui/format';
import type { StationClockDto } from '@/src/data/clock/dto';
import { CHANGE_WORDS } from './change-words';
import { LEFT, PLOT, stepAt, STRIP, STRIP_TOP, TOP, type scalesOf, type Step } from './chart-scale';

type Scales = ReturnType<typeof scalesOf>;
type Props = { clock: StationClockDto; scales: Scales; fromMs: number };

const CHAR = 5.7;
const BOX_PAD = 10;
const LINE = 16;

/** Changes at the station: a dotted line, an arrow from old to new, and a box with size, day and cause. */
export function Changes({ clock, scales, fromMs }: Props) {
  return (
    <g>
      {clock.changes
        .filter(({ atMs }) => atMs >= fromMs)
        .map((change) => (
          <ChangeMark
            key={change.id}
            change={change}
            step={clock.fit && stepAt(clock.fit, change.atMs)}
            scales={scales}
          />
        ))}
    </g>
  );
}

type ChangeMarkProps = { change: StationClockDto['changes'][number]; step: Step | null; scales: Scales };

function ChangeMark({ change: { atMs, kind, note }, step, scales: { x, y } }: ChangeMarkProps) {
  const right = x.range()[1] ?? LEFT;
  const label = step === null ? 'Changed' : `Jump ${signedText(step.seconds * 1e6, 3)} µs`;
  const most = Math.min(280, right - LEFT - 2 * BOX_PAD);
  const lines = wrapped(
    `day ${dayText(atMs)}, ${minuteText(atMs)}. ${note || CHANGE_WORDS[kind]}`,
    Math.floor((most - 2 * BOX_PAD) / CHAR),
  );
  const widest = Math.max(label.length * 6.6, ...lines.map((line) => line.length * CHAR));
  const width = Math.min(most, widest + 2 * BOX_PAD);
  const height = 24 + lines.length * LINE;
  const top = TOP + PLOT - height - 14;
  // a step upward leaves the right lower corner free, a step downward the left one
  const wantsLeft = (step?.seconds ?? 0) < 0;
  const fits = { right: x(atMs) + BOX_PAD + width < right, left: x(atMs) - BOX_PAD - width > LEFT };
  const isLeft = wantsLeft ? fits.left || !fits.right : !fits.right && fits.left;
  const left = Math.max(
    LEFT + 4,
    Math.min(right - width, isLeft ? x(atMs) - BOX_PAD - width : x(atMs) + BOX_PAD),
  );
  return (
    <g>
      <line
        x1={x(atMs)}
        x2={x(atMs)}
        y1={TOP}
        y2={STRIP_TOP + STRIP}
        stroke="var(--ink)"
        strokeWidth={1.25}
        strokeDasharray="2 3"
      />
      {step && <Arrow x={x(atMs)} from={y(step.fromSeconds * 1e6)} to={y(step.toSeconds * 1e6)} />}
      <rect x={left} y={top} width={width} height={height} fill="var(--paper)" stroke="var(--rule)" />
      <text x={left + BOX_PAD} y={top + 17} fontSize={12.5} fontWeight={640}>
        {label}
      </text>
      {lines.map((line, index) => (
        <text key={line} x={left + BOX_PAD} y={top + 33 + index * LINE} fontSize={12}>
          {line}
        </text>
      ))}
    </g>
  );
}

function Arrow({ x, from, to }: { x: number; from: number; to: number }) {
  if (Math.abs(to - from) < 12) return null;
  const back = to < from ? 6 : -6;
  return (
    <g>
      <line x1={x} x2={x} y1={from} y2={to + back} stroke="var(--ink)" strokeWidth={1.75} />
      <path d={`M${x} ${to}l-4 ${back * 1.2}h8z`} fill="var(--ink)" />
    </g>
  );
}

/** One or two readings that were set aside say so beside their mark. */
export function SetAside({ scales: { x, y, shown } }: { scales: Scales }) {
  const aside = shown.filter(({ state, isFar }) => state !== 'used' || isFar);
  if (aside.length > 2) return null;
  const right = x.range()[1] ?? LEFT;
  return (
    <g>
      {aside.map(({ id, atMs, offsetSeconds, fromFitSeconds }) => {
        const far =
          fromFitSeconds === null ? '' : `, ${numberText(Math.abs(fromFitSeconds) * 1e6, 3)} µs off the fit`;
        const words = `day ${dayText(atMs)}${far}`;
        const room = (words.length + 11) * CHAR;
        const isLeft = x(atMs) - room > LEFT;
        if (!isLeft && x(atMs) + room > right) return null;
        return (
          <text
            key={id}
            x={x(atMs) + (isLeft ? -8 : 8)}
            y={y(offsetSeconds * 1e6) - 6}
            fontSize={12}
            textAnchor={isLeft ? 'end' : 'start'}
            style={{ paintOrder: 'stroke', stroke: 'var(--sheet)', strokeWidth: 3 }}
          >
            <tspan fontWeight={640}>Set aside:</tspan> {words}
          </text>
        );
      })}
    </g>
  );
}

/** The sessions as boxes, so that one sees which of them a jump hurts. */
export function SessionBoxes({ clock, scales, fromMs }: Props) {
  const { x, untilMs } = scales;
  const top = STRIP_TOP + STRIP + 26;
  return (
    <g>
      <text x={0} y={top + 14} fontSize={12} className="fill-ink2">
        Sessions
      </text>
      {clock.sessions
        .filter(({ startMs, endMs }) => endMs > fromMs && startMs < untilMs)
        .map(({ code, startMs, endMs }) => {
          const x1 = x(Math.max(startMs, fromMs));
          const width = Math.max(3, x(Math.min(endMs, untilMs)) - x1);
          const isInside = width > code.length * CHAR;
          return (
            <g key={code}>
              <title>{code}</title>
              <rect x={x1} y={top} width={width} height={20} fill="var(--sunk)" stroke="var(--edge)" />
              <text
                x={isInside ? x1 + width / 2 : x1 - 4}
                y={top + 14}
                fontSize={11}
                textAnchor={isInside ? 'middle' : 'end'}
                style={{ fontStretch: '78%' }}
              >
                {code}
              </text>
            </g>
          );
        })}
    </g>
  );
}

/** Words in lines of at most so many letters; a longer word keeps its line. */
function wrapped(text: string, most: number): string[] {
  return text.split(' ').reduce<string[]>((lines, word) => {
    const last = lines.at(-1);
    if (last === undefined || last.length + 1 + word.length > most) return [...lines, word];
    return [...lines.slice(0, -1), `${last} ${word}`];
  }, []);
}
