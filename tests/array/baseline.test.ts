import { describe, expect, it } from 'vitest';
import { baselineLengthM, baselinesOf, baselineVector, orderBaseline } from '@/src/array/baseline';

const station = (code: string, longitudeDeg: number) => ({
  code,
  site: { latitudeDeg: 0, longitudeDeg, heightM: 0 },
});

describe('baselines', () => {
  it('run from the western to the eastern station, whichever comes first', () => {
    const [west, east] = [station('Zz', -70), station('Aa', 20)];
    expect(orderBaseline(west, east)).toEqual({ first: west, second: east });
    expect(orderBaseline(east, west)).toEqual({ first: west, second: east });
  });

  it('take longitudes of 0…360 for what they are', () => {
    const [west, east] = [station('Zz', 290), station('Aa', 20)];
    expect(orderBaseline(east, west).first).toBe(west);
  });

  it('do not wrap over the date line', () => {
    expect(orderBaseline(station('Aa', 179), station('Bb', -179)).first.code).toBe('Bb');
  });

  it('take the code where longitudes are equal', () => {
    expect(orderBaseline(station('Bb', 10), station('Aa', 10)).first.code).toBe('Aa');
  });

  it('are n(n − 1)/2, each ordered, none twice', () => {
    const stations = [station('Dd', 100), station('Aa', -80), station('Cc', 3), station('Bb', 3)];
    const labels = baselinesOf(stations).map(({ first, second }) => `${first.code}–${second.code}`);
    expect(labels).toEqual(['Aa–Bb', 'Aa–Cc', 'Aa–Dd', 'Bb–Cc', 'Bb–Dd', 'Cc–Dd']);
  });

  it('point from first to second', () => {
    const [first, second] = [
      { x: 1, y: 2, z: 3 },
      { x: 4, y: 6, z: 3 },
    ];
    expect(baselineVector(first, second)).toEqual([3, 4, 0]);
    expect(baselineLengthM(first, second)).toBe(5);
  });
});
