import type { Interval } from '../units/time';

/** Sorted, disjoint spans in epoch ms: pairs of start and end, in one flat list. */
export type Spans = readonly (readonly [startMs: number, endMs: number])[];

/**
 * Spans of time in which at least k of several sets hold.
 *
 * @param sets     each sorted and disjoint (touching spans of one set count as one)
 * @param atLeast  k ≥ 1
 * @returns sorted and disjoint; touching spans joined, empty ones dropped
 * @throws RangeError if k is not a whole number of at least 1 (programmer error)
 *
 * Source  sweep over the edges, ends before starts only where nothing is joined by it
 */
export function sweep(sets: readonly Spans[], atLeast: number): [number, number][] {
  if (!(Number.isInteger(atLeast) && atLeast >= 1)) throw new RangeError(`At least how many? ${atLeast}`);
  const edges: { ms: number; step: 1 | -1 }[] = [];
  for (const set of sets) {
    for (const [startMs, endMs] of set) {
      if (endMs > startMs) edges.push({ ms: startMs, step: 1 }, { ms: endMs, step: -1 });
    }
  }
  edges.sort((a, b) => a.ms - b.ms);
  const held: [number, number][] = [];
  let count = 0;
  let sinceMs: number | null = null;
  for (let index = 0; index < edges.length;) {
    const ms = edges[index]?.ms ?? NaN;
    for (; edges[index]?.ms === ms; index += 1) count += edges[index]?.step ?? 0;
    if (count >= atLeast && sinceMs === null) sinceMs = ms;
    if (count < atLeast && sinceMs !== null) {
      held.push([sinceMs, ms]);
      sinceMs = null;
    }
  }
  return held;
}

/** Intervals as spans of epoch ms. */
export function spansOf(intervals: readonly Interval[]): Spans {
  return intervals.map(({ start, end }) => [start.getTime(), end.getTime()] as const);
}

/** Spans as intervals, edges on whole milliseconds, those that vanish dropped. */
export function intervalsOf(spans: Spans): Interval[] {
  return spans
    .map(([startMs, endMs]) => ({ start: new Date(Math.round(startMs)), end: new Date(Math.round(endMs)) }))
    .filter(({ start, end }) => end > start);
}
