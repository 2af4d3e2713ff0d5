import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fringeRateHz, geometricDelay } from '@/src/array/delay';
import { baselineUvw } from '@/src/array/uvw';
import { EARTH_ROTATION_RAD_PER_S, SPEED_OF_LIGHT } from '@/src/units/constants';
import delay from '../reference/delay.json';
import { anyInstantMs, anyPlace, anySource } from './place-maker';

// Truth: ERFA c2t06a with the catalogue direction (reference/delay.json), so annual aberration is the difference.
const TOLERANCE = {
  /** annual aberration, 20.5″, relative to |b|/c */
  delay: 2e-4,
  /** the same, relative to |b|ω/c */
  rate: 2e-4,
  /** the numerical derivative over 2 s, relative to |b|ω/c */
  ownRate: 1e-6,
};

const stations = new Map(
  delay.stations.map(({ code, xyz: [x = NaN, y = NaN, z = NaN] }) => [code, { x, y, z }]),
);
const places = new Map(delay.sources.map((s) => [s.name, { raDeg: s.ra, decDeg: s.dec }]));

function setUp(c: (typeof delay.cases)[number]) {
  const [first, second, source] = [stations.get(c.st1), stations.get(c.st2), places.get(c.source)];
  if (!first || !second || !source) throw new Error(`${c.id}: no such station or source`);
  const lightSeconds = Math.hypot(...c.baseline_itrf) / SPEED_OF_LIGHT;
  return { first, second, source, at: new Date(c.utc), lightSeconds };
}

describe('geometricDelay', () => {
  it('agrees with ERFA in all 40 cases, sign included', () => {
    expect(delay.cases).toHaveLength(40);
    for (const c of delay.cases) {
      const { first, second, source, at, lightSeconds } = setUp(c);
      const found = geometricDelay(first, second, source, at);
      expect(Math.abs(found.seconds - c.tau_s) / lightSeconds, c.id).toBeLessThan(TOLERANCE.delay);
      const fastest = lightSeconds * EARTH_ROTATION_RAD_PER_S;
      expect(Math.abs(found.rate - c.rate_s_per_s) / fastest, c.id).toBeLessThan(TOLERANCE.rate);
      if (Math.abs(c.tau_s) > 0.01 * lightSeconds) expect(Math.sign(found.seconds)).toBe(Math.sign(c.tau_s));
    }
  });

  it('is −w/c, and its rate is its derivative', () => {
    for (const c of delay.cases) {
      const { first, second, source, at, lightSeconds } = setUp(c);
      const { seconds, rate } = geometricDelay(first, second, source, at);
      const { w } = baselineUvw(first, second, source, at);
      expect(seconds + w / SPEED_OF_LIGHT).toBeCloseTo(0, 14);
      const shifted = (ms: number) =>
        geometricDelay(first, second, source, new Date(at.getTime() + ms)).seconds;
      const numerical = (shifted(1000) - shifted(-1000)) / 2;
      const fastest = lightSeconds * EARTH_ROTATION_RAD_PER_S;
      expect(Math.abs(numerical - rate) / fastest, c.id).toBeLessThan(TOLERANCE.ownRate);
    }
  });

  it('changes its sign with the order of the stations', () => {
    for (const c of delay.cases) {
      const { first, second, source, at } = setUp(c);
      const there = geometricDelay(first, second, source, at);
      const back = geometricDelay(second, first, source, at);
      expect(there.seconds + back.seconds).toBeCloseTo(0, 15);
      expect(there.rate + back.rate).toBeCloseTo(0, 18);
    }
  });

  it('closes around a triangle, delay and rate', () => {
    fc.assert(
      fc.property(anyPlace, anyPlace, anyPlace, anySource, anyInstantMs, (a, b, c, source, ms) => {
        const at = new Date(ms);
        const sides = [
          geometricDelay(a, b, source, at),
          geometricDelay(b, c, source, at),
          geometricDelay(c, a, source, at),
        ];
        const sum = (key: 'seconds' | 'rate') => sides.reduce((total, side) => total + side[key], 0);
        expect(Math.abs(sum('seconds'))).toBeLessThan(1e-16);
        expect(Math.abs(sum('rate'))).toBeLessThan(1e-20);
      }),
    );
  });

  it('is nil for two stations at one place, and refuses a place that is none', () => {
    const one = { x: 6e6, y: 1e6, z: 0 };
    const [source, at] = [{ raDeg: 187, decDeg: 12 }, new Date('2029-03-20T18:00:00Z')];
    const { seconds, rate } = geometricDelay(one, one, source, at);
    expect([Math.abs(seconds), Math.abs(rate)]).toEqual([0, 0]);
    expect(() => geometricDelay(one, { ...one, z: NaN }, source, at)).toThrow(RangeError);
    expect(() => geometricDelay(one, one, { raDeg: 0, decDeg: 91 }, at)).toThrow(RangeError);
    expect(() => geometricDelay(one, one, source, new Date(NaN))).toThrow(RangeError);
  });
});

describe('fringeRateHz', () => {
  it('is the delay’s rate in turns of the sky frequency, at most 3.1·10⁻⁶ of it on the ground', () => {
    // two stations on opposite sides of the equator, source in the equator at right angles: 2 ω a / c
    const fastest = (2 * EARTH_ROTATION_RAD_PER_S * 6_378_137) / SPEED_OF_LIGHT;
    expect(fastest).toBeLessThan(3.11e-6);
    expect(fringeRateHz(fastest, 43e9)).toBeCloseTo(fastest * 43e9, 6);
    expect(fringeRateHz(-1e-6, 5e9)).toBe(-5000);
  });

  it('refuses what is no rate and no frequency', () => {
    expect(() => fringeRateHz(NaN, 5e9)).toThrow(RangeError);
    expect(() => fringeRateHz(1e-6, 0)).toThrow(RangeError);
  });
});
