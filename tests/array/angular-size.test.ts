import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  angularSizeRad,
  fringeSpacingRad,
  linearSizeM,
  schwarzschildAngleRad,
  schwarzschildRadiusM,
} from '@/src/array/angular-size';
import { LIGHT_YEAR_M, M_PER_MM, SOLAR_RADIUS_M } from '@/src/units/length';

const TOLERANCE = {
  /** closed forms */
  relative: 1e-12,
  /** R_s of the Sun from G and M apart: G is known to 2e-5 (CODATA 2018), M as well */
  nominal: 1e-4,
};

describe('facts of the trade (common practice, no source), to the digits given', () => {
  it('0.33 mm over 10⁷ m resolves 3.3·10⁻¹¹ rad', () => {
    expect(fringeSpacingRad(0.33 * M_PER_MM, 1e7).toPrecision(2)).toBe('3.3e-11');
  });

  it('4·10⁶ solar masses have a Schwarzschild radius of 1.2·10¹⁰ m, 17 solar radii', () => {
    const radiusM = schwarzschildRadiusM(4e6);
    expect(radiusM.toPrecision(2)).toBe('1.2e+10');
    expect(Math.round(radiusM / SOLAR_RADIUS_M)).toBe(17);
  });

  it('and it lies under 0.5·10⁻¹⁰ rad at 2.4·10²⁰ m, 25,000 light years', () => {
    expect((schwarzschildAngleRad(4e6, 2.4e20) * 1e10).toFixed(1)).toBe('0.5');
    expect((schwarzschildAngleRad(4e6, 25_000 * LIGHT_YEAR_M) * 1e10).toFixed(1)).toBe('0.5');
  });
});

describe('schwarzschildRadiusM', () => {
  it('is 2GM/c² with G of CODATA 2018 and 1.98841·10³⁰ kg (memory)', () => {
    const apart = (2 * 6.6743e-11 * 1.98841e30) / 299_792_458 ** 2;
    expect(Math.abs(schwarzschildRadiusM(1) / apart - 1)).toBeLessThan(TOLERANCE.nominal);
  });
});

describe('angularSizeRad', () => {
  it('is a right angle where the half length is the distance, and nil for no length', () => {
    expect(Math.abs(angularSizeRad(2, 1) / (Math.PI / 2) - 1)).toBeLessThan(TOLERANCE.relative);
    expect(angularSizeRad(0, 1)).toBe(0);
  });

  it('is undone by linearSizeM', () => {
    const length = fc.double({ min: 1, max: 1e15, noNaN: true });
    fc.assert(
      fc.property(length, length, (linearM, distanceM) => {
        fc.pre(linearM < 100 * distanceM);
        const back = linearSizeM(angularSizeRad(linearM, distanceM), distanceM);
        expect(Math.abs(back / linearM - 1)).toBeLessThan(TOLERANCE.relative);
      }),
    );
  });

  it('and its neighbours refuse what is out of range', () => {
    for (const bad of [NaN, Infinity, -1]) {
      expect(() => angularSizeRad(bad, 1)).toThrow(RangeError);
      expect(() => angularSizeRad(1, bad)).toThrow(RangeError);
      expect(() => linearSizeM(bad, 1)).toThrow(RangeError);
      expect(() => schwarzschildRadiusM(bad)).toThrow(RangeError);
      expect(() => fringeSpacingRad(bad, 1)).toThrow(RangeError);
      expect(() => fringeSpacingRad(1, bad)).toThrow(RangeError);
    }
    expect(() => angularSizeRad(1, 0)).toThrow(RangeError);
    expect(() => linearSizeM(Math.PI, 1)).toThrow(RangeError);
  });
});
