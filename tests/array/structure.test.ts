import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { correlatedFluxJy } from '@/src/array/structure';
import type { GaussianComponent } from '@/src/array/structure';
import sensitivity from '../reference/sensitivity.json';

const TOLERANCE = {
  /** closed form; relative to the source's whole flux, digits of the reference */
  relative: 1e-9,
};
const RAD_PER_MICROARCSEC = Math.PI / 180 / 3600 / 1e6;

const point = (fluxJy: number, eastRad = 0, northRad = 0): GaussianComponent => ({
  fluxJy,
  majorRad: 0,
  minorRad: 0,
  positionAngleRad: 0,
  eastRad,
  northRad,
});

describe('correlatedFluxJy', () => {
  it('agrees with all 14 Gaussians of the reference', () => {
    const cases = sensitivity.cases.filter((c) => c.kind === 'gaussian-visibility');
    expect(cases).toHaveLength(14);
    for (const c of cases) {
      const fluxJy = c.flux_jy ?? NaN;
      const component: GaussianComponent = {
        ...point(fluxJy),
        majorRad: (c.fwhm_major_uas ?? NaN) * RAD_PER_MICROARCSEC,
        minorRad: (c.fwhm_minor_uas ?? NaN) * RAD_PER_MICROARCSEC,
        positionAngleRad: ((c.pa_deg ?? NaN) * Math.PI) / 180,
      };
      const found = correlatedFluxJy([component], c.u_wavelengths ?? NaN, c.v_wavelengths ?? NaN);
      expect(Math.abs(found - (c.amplitude_jy ?? NaN)) / fluxJy, c.id).toBeLessThan(TOLERANCE.relative);
    }
  });

  it('adds components as complex visibilities', () => {
    const apartRad = 1e-8;
    const pair = [point(2, apartRad / 2), point(1, -apartRad / 2)];
    expect(correlatedFluxJy(pair, 0, 5e7)).toBeCloseTo(3, 12);
    expect(correlatedFluxJy(pair, 1 / (2 * apartRad), 0)).toBeCloseTo(1, 9);
    expect(correlatedFluxJy(pair, 1 / apartRad, 0)).toBeCloseTo(3, 9);
  });

  it('sees the same on a baseline and its reverse, and never more than the whole flux', () => {
    const small = fc.double({ min: -1e-8, max: 1e-8, noNaN: true });
    const size = fc.double({ min: 0, max: 1e-8, noNaN: true });
    const component = fc.record({
      fluxJy: fc.double({ min: 0, max: 10, noNaN: true }),
      majorRad: size,
      minorRad: size,
      positionAngleRad: fc.double({ min: 0, max: Math.PI, noNaN: true }),
      eastRad: small,
      northRad: small,
    });
    const wavelengths = fc.double({ min: -1e9, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(fc.array(component, { maxLength: 4 }), wavelengths, wavelengths, (components, u, v) => {
        const whole = components.reduce((sum, c) => sum + c.fluxJy, 0);
        const found = correlatedFluxJy(components, u, v);
        expect(found).toBeLessThanOrEqual(whole * (1 + 1e-12));
        expect(correlatedFluxJy(components, -u, -v)).toBeCloseTo(found, 12);
      }),
    );
  });

  it('is dark without components', () => {
    expect(correlatedFluxJy([], 1e8, 1e8)).toBe(0);
  });
});
