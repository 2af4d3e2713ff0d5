import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { overlap, windowsFor } from '@/src/sky/windows';
import common from '../reference/common.json';

// Truth: ERFA atco13 windows swept edge by edge (reference/common.json).
const TOLERANCE = {
  /** 0.1″ of direction and two edges rounded to 0.1 s; slow edges near culmination are not in these cases */
  edgeSeconds: 1,
};

const sites = new Map(
  common.stations.map((s) => [s.code, { latitudeDeg: s.lat, longitudeDeg: s.lon, heightM: s.height }]),
);
const places = new Map(common.sources.map((s) => [s.name, { raDeg: s.ra, decDeg: s.dec }]));

const ms = (from: number, to: number) => ({ start: new Date(from), end: new Date(to) });

describe('common windows', () => {
  it('agree with the reference for every k and every baseline of all 12 cases', () => {
    expect(common.cases).toHaveLength(12);
    let compared = 0;
    for (const c of common.cases) {
      const startMs = Date.parse(c.start);
      const source = places.get(c.source);
      const limits = new Map(Object.entries(c.el_min));
      const stations = c.stations.map((code) => {
        const site = sites.get(code);
        const minElevationDeg = limits.get(code);
        if (!site || minElevationDeg === undefined) throw new Error(`${c.id}: no station ${code}`);
        return { site, minElevationDeg };
      });
      if (!source) throw new Error(`${c.id}: no source ${c.source}`);
      const span = ms(startMs, startMs + c.hours * 3_600_000);
      const sets = windowsFor([source], stations, span)[0] ?? [];
      const setOf = (code: string) => sets[c.stations.indexOf(code)] ?? [];
      const expectSame = (found: { start: Date; end: Date }[], expected: number[][], label: string) => {
        expect(found, label).toHaveLength(expected.length);
        expected.forEach(([from = NaN, to = NaN], index) => {
          const window = found[index];
          expect(Math.abs((window?.start.getTime() ?? NaN) - startMs - from * 1000), label).toBeLessThan(
            TOLERANCE.edgeSeconds * 1000,
          );
          expect(Math.abs((window?.end.getTime() ?? NaN) - startMs - to * 1000), label).toBeLessThan(
            TOLERANCE.edgeSeconds * 1000,
          );
          compared += 1;
        });
      };
      for (const [code, expected] of Object.entries(c.station_windows)) {
        expectSame(setOf(code), expected, `${c.id} ${code}`);
      }
      for (const [k, expected] of Object.entries(c.at_least)) {
        expectSame(overlap(sets, Number(k)), expected, `${c.id} at least ${k}`);
      }
      expectSame(overlap(sets, 6), c.all, `${c.id} all`);
      for (const [pair, expected] of Object.entries(c.baselines)) {
        const [first = '', second = ''] = pair.split('-');
        expectSame(overlap([setOf(first), setOf(second)], 2), expected, `${c.id} ${pair}`);
      }
    }
    expect(compared).toBeGreaterThan(300);
  });
});

describe('overlap', () => {
  it('joins touching intervals and drops empty ones', () => {
    expect(overlap([[ms(0, 10), ms(20, 30)], [ms(10, 20)], [ms(40, 40)]], 1)).toEqual([ms(0, 30)]);
    expect(overlap([[ms(0, 10)], [ms(10, 20)]], 2)).toEqual([]);
    expect(overlap([[ms(0, 10), ms(10, 20)], [ms(5, 15)]], 2)).toEqual([ms(5, 15)]);
  });

  it('has nothing to hold without sets, or with fewer than asked for', () => {
    expect(overlap([], 1)).toEqual([]);
    expect(overlap([[ms(0, 10)]], 2)).toEqual([]);
  });

  it('refuses a count that is not a count', () => {
    expect(() => overlap([[ms(0, 1)]], 0)).toThrow(RangeError);
    expect(() => overlap([[ms(0, 1)]], 1.5)).toThrow(RangeError);
  });

  it('holds exactly where at least k sets hold', () => {
    const set = fc
      .uniqueArray(fc.integer({ min: 0, max: 40 }), { maxLength: 10 })
      .map((edges) => edges.sort((a, b) => a - b))
      .map((edges) =>
        edges.flatMap((edge, index) => {
          const next = edges[index + 1];
          return index % 2 === 0 && next !== undefined ? [ms(edge, next)] : [];
        }),
      );
    fc.assert(
      fc.property(fc.array(set, { maxLength: 5 }), fc.integer({ min: 1, max: 5 }), (sets, k) => {
        const found = overlap(sets, k);
        const within = (list: { start: Date; end: Date }[], at: number) =>
          list.some(({ start, end }) => start.getTime() <= at && at < end.getTime());
        for (let at = 0; at < 41; at += 1) {
          expect(within(found, at)).toBe(sets.filter((one) => within(one, at)).length >= k);
        }
        found.slice(1).forEach((one, index) => {
          expect(one.start.getTime()).toBeGreaterThan(found[index]?.end.getTime() ?? Infinity);
        });
      }),
    );
  });
});
