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

/** Times in which any of the sets holds; also brings one unsorted list of spans into order. */
export function union(sets: readonly Spans[]): [number, number][] {
  return sweep(sets, 1);
}

/**
 * Times in which both sets hold.
 *
 * @param a  sorted and disjoint, as b
 * @returns sorted and disjoint, empty ones dropped
 *
 * Source  one walk through both, ahead in the set whose span ends first
 */
export function intersect(a: Spans, b: Spans): [number, number][] {
  const held: [number, number][] = [];
  let [atA, atB] = [0, 0];
  for (;;) {
    const [one, other] = [a[atA], b[atB]];
    if (!one || !other) return held;
    const startMs = Math.max(one[0], other[0]);
    const endMs = Math.min(one[1], other[1]);
    if (endMs > startMs) held.push([startMs, endMs]);
    if (one[1] < other[1]) atA += 1;
    else atB += 1;
  }
}

/**
 * Times in which the first set holds and the second does not.
 *
 * @param a  sorted and disjoint, as b
 * @returns sorted and disjoint, empty ones dropped
 */
export function subtract(a: Spans, b: Spans): [number, number][] {
  const left: [number, number][] = [];
  let at = 0;
  for (const [startMs, endMs] of a) {
    let fromMs = startMs;
    // what ends before this span begins is past for the later ones too
    while ((b[at]?.[1] ?? Infinity) <= startMs) at += 1;
    for (let next = at; ; next += 1) {
      const cut = b[next];
      if (!cut || cut[0] >= endMs) break;
      if (cut[0] > fromMs) left.push([fromMs, cut[0]]);
      fromMs = Math.max(fromMs, cut[1]);
    }
    if (endMs > fromMs) left.push([fromMs, endMs]);
  }
  return left;
}

/**
 * Times in which at least one of the given pairs of sets holds together: a baseline of an array.
 *
 * @param sets   each sorted and disjoint
 * @param pairs  indices of two sets each; without it every pair, which is sweep(sets, 2)
 * @returns sorted and disjoint; touching spans joined
 * @throws RangeError if a pair names a set that is not there (programmer error)
 */
export function anyPair(sets: readonly Spans[], pairs?: readonly (readonly [number, number])[]): Spans {
  if (!pairs) return sweep(sets, 2);
  return union(
    pairs.map(([first, second]) => {
      const [one, other] = [sets[first], sets[second]];
      if (!one || !other) throw new RangeError(`No such pair of sets: ${first}, ${second}`);
      return intersect(one, other);
    }),
  );
}

/**
 * Intervals as spans of epoch ms.
 *
 * @throws RangeError if an end is not an instant (programmer error)
 */
export function spansOf(intervals: readonly Interval[]): Spans {
  return intervals.map(({ start, end }) => {
    const span = [start.getTime(), end.getTime()] as const;
    if (!Number.isFinite(span[1] - span[0]))
      throw new RangeError('An interval has an end that is no instant');
    return span;
  });
}

/** Spans as intervals, edges on whole milliseconds, those that vanish dropped. */
export function intervalsOf(spans: Spans): Interval[] {
  return intervalsWithin(spans, null);
}

/**
 * The same for spans of one interval: edges at its ends are its own dates, so that many results share them.
 *
 * @param whole  ends on whole milliseconds; null shares nothing
 */
export function intervalsWithin(spans: Spans, whole: Interval | null): Interval[] {
  const only = spans[0];
  // one of exact size: most sets have one span, and a list that grows is ten times as large
  if (only && spans.length === 1) {
    const interval = intervalOf(only, whole);
    return interval ? [interval] : [];
  }
  const intervals: Interval[] = [];
  for (const span of spans) {
    const interval = intervalOf(span, whole);
    if (interval) intervals.push(interval);
  }
  return intervals;
}

function intervalOf(span: readonly [number, number], whole: Interval | null): Interval | null {
  const startMs = Math.round(span[0]);
  const endMs = Math.round(span[1]);
  if (!(endMs > startMs)) return null;
  return {
    start: whole && startMs === whole.start.getTime() ? whole.start : new Date(startMs),
    end: whole && endMs === whole.end.getTime() ? whole.end : new Date(endMs),
  };
}
