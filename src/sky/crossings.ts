import type { Interval } from '../units/time';
import type { Spans } from './interval-set';
import { changeMs, highestMs } from './search';

/** A margin that is at least zero where something holds, as a function of epoch ms. */
export type Margin = (ms: number) => number;

/**
 * Spans in which a margin is at least zero, for nodes between which it rises or falls all the way.
 *
 * @param margin  continuous, or with jumps at the nodes only
 * @param nodes   epoch ms, rising; first and last are the ends of the span
 * @returns sorted and disjoint spans
 *
 * Error   edges ≤ 0.5 ms
 * Source  bisection between nodes of different sign
 */
export function spansBetweenTurns(margin: Margin, nodes: readonly number[]): Spans {
  return spansThrough(
    margin,
    nodes.map((ms) => ({ ms, value: margin(ms) })),
  );
}

/**
 * Spans in which a margin is at least zero, for nodes between which it turns once at most.
 *
 * @param margin  continuous, or with jumps at the nodes only
 * @param nodes   epoch ms, rising; first and last are the ends of the span
 * @returns sorted and disjoint spans
 *
 * Error   edges ≤ 0.5 ms; the height of a turn ≤ 2·10⁻⁷°
 * Source  turns by golden section where three neighbours show one, so a grazing one is neither lost nor invented;
 *         then spansBetweenTurns
 */
export function spansWhere(margin: Margin, nodes: readonly number[]): Spans {
  return spansThrough(margin, withExtrema(margin, nodes));
}

/** Whole steps over a span, both ends included. */
export function stepsOver(span: Interval, stepMs: number): number[] {
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  const count = Math.max(1, Math.ceil((endMs - startMs) / stepMs));
  return Array.from({ length: count + 1 }, (_, index) => startMs + ((endMs - startMs) * index) / count);
}

type Point = { ms: number; value: number };

function spansThrough(margin: Margin, points: readonly Point[]): Spans {
  const spans: [number, number][] = [];
  let sinceMs: number | null = null;
  points.forEach((point, index) => {
    const before = points[index - 1];
    const holds = point.value >= 0;
    if (holds && sinceMs === null) {
      sinceMs = before ? changeMs((ms) => margin(ms) >= 0, before.ms, point.ms) : point.ms;
    }
    if (!holds && sinceMs !== null && before) {
      spans.push([sinceMs, changeMs((ms) => margin(ms) < 0, before.ms, point.ms)]);
      sinceMs = null;
    }
  });
  const last = points.at(-1);
  if (sinceMs !== null && last) spans.push([sinceMs, last.ms]);
  return spans;
}

/** Adds the extremum between three neighbours where it could turn the sign of all three. */
function withExtrema(margin: Margin, nodes: readonly number[]): Point[] {
  const points = nodes.map((ms) => ({ ms, value: margin(ms) }));
  const found: Point[] = [];
  for (let index = 0; index < points.length; index += 1) {
    const [before, here, after] = [points[index - 1], points[index], points[index + 1]];
    if (!here) continue;
    const left = before ?? here;
    const right = after ?? here;
    const sign = here.value >= 0 ? -1 : 1;
    // lifted: the margin so turned that all three would be below zero
    const lifted = (point: Point) => sign * point.value;
    const turns = lifted(here) >= lifted(left) && lifted(here) >= lifted(right);
    const alike = left.value >= 0 === here.value >= 0 && right.value >= 0 === here.value >= 0;
    if (!turns || !alike || right.ms === left.ms) continue;
    const ms = highestMs((at) => sign * margin(at), left.ms, right.ms);
    const value = margin(ms);
    if (value >= 0 !== here.value >= 0) found.push({ ms, value });
  }
  return found.length === 0 ? points : [...points, ...found].sort((a, b) => a.ms - b.ms);
}
