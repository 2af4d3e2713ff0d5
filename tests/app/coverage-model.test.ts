import { describe, expect, it } from 'vitest';
import { uvCsv } from '@/app/(shell)/sessions/[sessionId]/coverage/_coverage/csv';
import {
  baselineHours,
  baselineRowsOf,
  pathOf,
  rightEnds,
  scansOf,
  uvScaleOf,
} from '@/app/(shell)/sessions/[sessionId]/coverage/_coverage/model';
import { coverageOf } from '@/src/outlook/coverage';
import { makeContext } from '../schedule/context-maker';
import { makePlan, makeScan, member, T0 } from '../schedule/plan-maker';

const all = ['Af', 'Bm', 'Em'].map((code) => member(code));
const plan = makePlan([makeScan('a', { stations: all }), makeScan('b', { startMs: T0 + 900_000 })]);
const coverage = coverageOf(plan, makeContext(), { sourceId: 'src-a', band: '8.4 GHz', stepSeconds: 120 });

describe('the frame of the uv plane', () => {
  it.each([
    [874, 200, [400, 800]],
    [530, 200, [200, 400]],
    [8.2, 2, [4, 8]],
    [0.31, 0.1, [0.2, 0.3]],
  ])('for %d Mλ is ruled every %d, with rings at %o', (longest, step, rings) => {
    const scale = uvScaleOf(longest);
    expect(scale.step).toBeCloseTo(step, 12);
    expect(scale.rings[0]).toBeCloseTo(rings[0] ?? 0, 9);
    expect(scale.rings[1]).toBeCloseTo(rings[1] ?? 0, 9);
    expect(scale.half).toBeGreaterThan(longest);
  });

  it('stands even where nothing is observed', () => {
    expect(Number.isFinite(uvScaleOf(0).step)).toBe(true);
  });
});

describe('the drawing', () => {
  it('has each track and its conjugate, opposite through the origin', () => {
    const [track] = coverage.tracks;
    if (!track) throw new Error('no track');
    const places: [number, number][] = [];
    const path = pathOf([track], (u, v) => {
      places.push([u, v]);
      return [u, v];
    });
    expect(path.match(/M/g)).toHaveLength(2);
    const half = places.length / 2;
    places.slice(0, half).forEach(([u, v], index) => {
      expect(places[half + index]).toEqual([-u, -v]);
    });
  });

  it('names the longest baselines at their right-hand end, where u is least', () => {
    const rows = baselineRowsOf(coverage);
    const [end] = rightEnds(coverage.tracks, rows, 1);
    const longest = [...rows].sort((a, b) => b.longest - a.longest)[0];
    expect(end).toMatchObject({ first: longest?.first, second: longest?.second });
    expect(end?.u).toBeLessThanOrEqual(0);
  });
});

describe('the tables', () => {
  it('count scans and time of each baseline and station', () => {
    const rows = baselineRowsOf(coverage);
    expect(rows.map(({ first, second, scanCount, seconds }) => [first, second, scanCount, seconds])).toEqual([
      ['Em', 'Af', 1, 600],
      ['Em', 'Bm', 1, 600],
      ['Af', 'Bm', 2, 1200],
    ]);
    expect(rows.every(({ shortest, longest }) => 0 < shortest && shortest <= longest)).toBe(true);
    expect(['Af', 'Bm', 'Em', 'Zz'].map((code) => scansOf(coverage, code))).toEqual([2, 2, 1, 0]);
    expect(baselineHours(coverage)).toBeCloseTo(2400 / 3600, 12);
  });

  it('are saved with a line for each point, ASCII only', () => {
    const lines = uvCsv(coverage, { a: '1', b: '2' }).trimEnd().split('\r\n');
    const points = coverage.tracks.reduce((sum, track) => sum + track.points.length, 0);
    expect(lines).toHaveLength(points + 1);
    expect(lines[1]).toMatch(/^1,Em,Af,-?\d+,-?\d+$/);
  });
});
