import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { anyPair, intersect, spansOf, subtract, sweep, union, type Spans } from '@/src/sky/interval-set';

const LAST = 60;
const anySet: fc.Arbitrary<Spans> = fc
  .array(fc.tuple(fc.integer({ min: 0, max: LAST }), fc.integer({ min: 0, max: 12 })), { maxLength: 6 })
  .map((list) => union([list.map(([from, length]) => [from, from + length] as const)]));

/** Between whole numbers nothing changes: these instants tell everything. */
const INSTANTS = Array.from({ length: LAST + 14 }, (_, index) => index + 0.5);
const holds = (spans: Spans, at: number) => spans.some(([from, until]) => from <= at && at < until);
const count = (sets: readonly Spans[], at: number) => sets.filter((set) => holds(set, at)).length;

function expectSorted(spans: Spans): void {
  spans.forEach(([from, until], index) => {
    expect(until).toBeGreaterThan(from);
    expect(from).toBeGreaterThanOrEqual(spans[index - 1]?.[1] ?? -Infinity);
  });
}

describe('sets of spans', () => {
  it('hold where at least so many hold, by every operation', () => {
    fc.assert(
      fc.property(fc.array(anySet, { minLength: 2, maxLength: 5 }), (sets) => {
        const [a = [], b = []] = sets;
        const found = [union(sets), intersect(a, b), subtract(a, b), sweep(sets, 2), anyPair(sets)];
        found.forEach(expectSorted);
        const [joined = [], both = [], left = [], two = [], pair = []] = found;
        for (const at of INSTANTS) {
          expect(holds(joined, at)).toBe(count(sets, at) >= 1);
          expect(holds(both, at)).toBe(count([a, b], at) === 2);
          expect(holds(left, at)).toBe(holds(a, at) && !holds(b, at));
          expect(holds(two, at)).toBe(count(sets, at) >= 2);
          expect(holds(pair, at)).toBe(count(sets, at) >= 2);
        }
      }),
    );
  });

  it('obey the laws of sets', () => {
    fc.assert(
      fc.property(anySet, anySet, anySet, (a, b, c) => {
        expect(union([a, b])).toEqual(union([b, a]));
        expect(intersect(a, b)).toEqual(intersect(b, a));
        expect(union([a, union([b, c])])).toEqual(union([union([a, b]), c]));
        expect(intersect(a, intersect(b, c))).toEqual(intersect(intersect(a, b), c));
        expect(union([a, a])).toEqual(a);
        expect(intersect(a, a)).toEqual(a);
        expect(subtract(a, a)).toEqual([]);
        expect(union([intersect(a, b), a])).toEqual(a);
        expect(union([intersect(a, c), intersect(b, c)])).toEqual(union([intersect(union([a, b]), c)]));
        expect(union([subtract(a, b), intersect(a, b)])).toEqual(a);
      }),
    );
  });

  it('of a choice of baselines hold where one of them has both its ends', () => {
    const sets: Spans[] = [[[0, 10]], [[5, 20]], [[15, 30]]];
    expect(anyPair(sets, [[0, 1]])).toEqual([[5, 10]]);
    expect(
      anyPair(sets, [
        [0, 1],
        [1, 2],
      ]),
    ).toEqual([
      [5, 10],
      [15, 20],
    ]);
    expect(anyPair(sets, [[0, 2]])).toEqual([]);
    expect(() => anyPair(sets, [[0, 3]])).toThrow(RangeError);
  });

  it('refuse an interval that has no end', () => {
    expect(() => spansOf([{ start: new Date(0), end: new Date(NaN) }])).toThrow(RangeError);
  });
});
