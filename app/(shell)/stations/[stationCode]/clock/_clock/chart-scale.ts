import { scaleLinear } from 'd3-scale';
import { predictClock, segmentAt, type ClockFit } from '@/src/clock/fit';
import type { ReadingDto, StationClockDto } from '@/src/data/clock/dto';

export const LEFT = 58;
export const TOP = 14;
export const PLOT = 250;
export const STRIP_TOP = TOP + PLOT + 26;
export const STRIP = 58;
const DAY_MS = 86_400_000;
const STEPS = 160;
const DAY_ROOM = 34;
const NORMAL_95 = 1.96;

export type Line = { atMs: number; offsetSeconds: number; halfSeconds: number }[];

/** The fit in the shown span, one line for each stretch, and the part ahead of now apart. */
function fitLines(fit: ClockFit, fromMs: number, untilMs: number, nowMs: number) {
  const edges = fit.segments.map(({ from, firstAt }) => from?.getTime() ?? firstAt.getTime());
  return fit.segments.flatMap((segment, index) => {
    const start = Math.max(fromMs, Math.min(edges[index] ?? fromMs, segment.firstAt.getTime()));
    const end = Math.min(untilMs, edges[index + 1] ?? untilMs);
    if (end <= start) return [];
    const at = (ms: number) => {
      // a moment before the next stretch still belongs to this one
      const { offsetSeconds, sigmaSeconds } = predictClock({ ...fit, segments: [segment] }, new Date(ms));
      return {
        atMs: ms,
        offsetSeconds,
        halfSeconds: NORMAL_95 * Math.hypot(sigmaSeconds, segment.scatterSeconds),
      };
    };
    const between = (a: number, b: number): Line =>
      b <= a ? [] : Array.from({ length: STEPS + 1 }, (_, k) => at(a + ((b - a) * k) / STEPS));
    const split = Math.min(Math.max(nowMs, start), end);
    return [{ behind: between(start, split), ahead: between(split, end) }];
  });
}

export type Step = { seconds: number; fromSeconds: number; toSeconds: number };

/** How much the clock stepped at a change: what the stretch after says there less what the one before says. */
export function stepAt(fit: ClockFit, atMs: number): Step | null {
  const index = fit.segments.findIndex(({ from }) => from?.getTime() === atMs);
  const [before, after] = [fit.segments[index - 1], fit.segments[index]];
  if (!before || !after) return null;
  const of = (segment: typeof before) =>
    predictClock({ ...fit, segments: [segment] }, new Date(atMs)).offsetSeconds;
  return { seconds: of(after) - of(before), fromSeconds: of(before), toSeconds: of(after) };
}

export function scalesOf(clock: StationClockDto, fromMs: number, width: number) {
  const { fit, nowMs, readings } = clock;
  const untilMs = nowMs + Math.max(DAY_MS / 2, (nowMs - fromMs) * 0.1);
  const shown = readings.filter(({ atMs }) => atMs >= fromMs);
  const lines = fit ? fitLines(fit, fromMs, untilMs, nowMs) : [];
  const values = [
    ...shown.map(({ offsetSeconds }) => offsetSeconds),
    ...lines.flatMap(({ behind, ahead }) =>
      [...behind, ...ahead].flatMap(({ offsetSeconds, halfSeconds }) => [
        offsetSeconds - halfSeconds,
        offsetSeconds + halfSeconds,
      ]),
    ),
  ].map((seconds) => seconds * 1e6);
  const low = Math.min(...values, values.length === 0 ? -1 : Infinity);
  const high = Math.max(...values, values.length === 0 ? 1 : -Infinity);
  const room = (high - low) * 0.06 || 0.05;
  const x = scaleLinear([fromMs, untilMs], [LEFT, width - 1]);
  const y = scaleLinear([low - room, high + room], [TOP + PLOT, TOP]).nice(5);
  const scatter = (fit && segmentAt(fit, new Date(nowMs))?.scatterSeconds) ?? 0;
  const reach = Math.max(30, Math.ceil((4 * scatter * 1e9) / 10) * 10);
  const strip = scaleLinear([-reach, reach], [STRIP_TOP + STRIP, STRIP_TOP]);
  return { x, y, strip, reach, untilMs, shown, lines };
}

/** Days of UT in a span, as many as have room for their three figures. */
export function dayTicks(fromMs: number, untilMs: number, width: number): number[] {
  const days = (untilMs - fromMs) / DAY_MS;
  const room = Math.min(16, Math.max(2, Math.floor((width - LEFT) / DAY_ROOM)));
  const every = [1, 2, 5, 10, 20, 50].find((step) => days / step <= room) ?? 100;
  const first = Math.ceil(fromMs / DAY_MS);
  const count = Math.floor(untilMs / DAY_MS) - first + 1;
  return Array.from({ length: Math.max(0, count) }, (_, k) => first + k)
    .filter((day) => day % every === 0)
    .map((day) => day * DAY_MS);
}

export const isUsed = ({ state, isFar }: ReadingDto): boolean => state === 'used' && !isFar;
