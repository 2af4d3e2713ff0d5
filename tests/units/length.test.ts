import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { frequencyHz, LIGHT_YEAR_M, M_PER_MM, PARSEC_M, wavelengthM } from '@/src/units/length';

describe('wavelength and frequency', () => {
  it('pair 1,000 GHz with 0.3 mm, to the one digit given (common practice, no source)', () => {
    expect((wavelengthM(1e12) / M_PER_MM).toFixed(1)).toBe('0.3');
    expect(Math.round(frequencyHz(0.3 * M_PER_MM) / 1e9)).toBe(999);
  });

  it('are each other’s inverse', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e6, max: 1e13, noNaN: true }), (hz) => {
        expect(frequencyHz(wavelengthM(hz)) / hz).toBeCloseTo(1, 14);
      }),
    );
  });

  it('refuse what is no wave', () => {
    for (const bad of [0, -1, NaN, Infinity]) {
      expect(() => wavelengthM(bad)).toThrow(RangeError);
      expect(() => frequencyHz(bad)).toThrow(RangeError);
    }
  });
});

describe('lengths of the sky', () => {
  it('make a parsec 3.2616 light years (memory)', () => {
    expect(PARSEC_M / LIGHT_YEAR_M).toBeCloseTo(3.2616, 4);
  });

  it('make 25,000 light years 2.4e20 m, to the two digits given (common practice, no source)', () => {
    expect((25_000 * LIGHT_YEAR_M).toPrecision(2)).toBe('2.4e+20');
  });
});
