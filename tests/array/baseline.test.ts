import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  baselineDirection,
  baselineLengthM,
  baselinesOf,
  baselineVector,
  orderBaseline,
} from '@/src/array/baseline';
import { chordM } from '@/src/sky/site';
import { directionOf } from '@/src/units/vector';

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

const place = (latitudeDeg: number, longitudeDeg: number, heightM = 0) => ({
  latitudeDeg,
  longitudeDeg,
  heightM,
});

describe('the direction of a baseline', () => {
  it('dips by half the angle between the stations, along the equator', () => {
    const found = baselineDirection(place(0, 10), place(0, 70));
    expect(found.azimuthDeg).toBeCloseTo(90, 9);
    expect(found.elevationDeg).toBeCloseTo(-30, 9);
    expect(found.declinationDeg).toBeCloseTo(0, 9);
    // the chord is square to the meridian half-way, 40° east: it points 130° east of Greenwich
    expect(found.greenwichHourAngleDeg).toBeCloseTo(-130, 9);
    expect(found.lengthM).toBeCloseTo(6_378_137, 6);
  });

  it('is straight down and along the axis from pole to pole', () => {
    const found = baselineDirection(place(-90, 0), place(90, 0));
    expect(found.elevationDeg).toBeCloseTo(-90, 9);
    expect(found.declinationDeg).toBeCloseTo(90, 9);
    expect(found.lengthM).toBeCloseTo(2 * 6_356_752.314245, 5);
  });

  it('with its length is the vector, and turns about with the order of the stations', () => {
    const anywhere = fc.record({
      latitudeDeg: fc.double({ min: -90, max: 90, noNaN: true }),
      longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
      heightM: fc.double({ min: 0, max: 5000, noNaN: true }),
    });
    fc.assert(
      fc.property(anywhere, anywhere, (a, b) => {
        fc.pre(chordM(a, b) > 1000);
        const [there, back] = [baselineDirection(a, b), baselineDirection(b, a)];
        const unit = (d: typeof there) =>
          directionOf((-d.greenwichHourAngleDeg * Math.PI) / 180, (d.declinationDeg * Math.PI) / 180);
        const [p, q] = [unit(there), unit(back)];
        expect(Math.hypot(p[0] + q[0], p[1] + q[1], p[2] + q[2])).toBeLessThan(1e-9);
        expect(there.lengthM).toBe(chordM(a, b));
      }),
    );
  });

  it('is refused where there is none', () => {
    expect(() => baselineDirection(place(20, 30), place(20, 30))).toThrow(RangeError);
    expect(() => baselineDirection(place(20, 30), place(NaN, 30))).toThrow(RangeError);
    expect(() => baselineVector({ x: NaN, y: 0, z: 0 }, { x: 0, y: 0, z: 0 })).toThrow(RangeError);
  });
});
