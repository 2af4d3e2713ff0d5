import { describe, expect, it } from 'vitest';
import { baselinesOf } from '@/src/array/baseline';
import { baselineNoiseJy, efficiency, imageNoiseJy } from '@/src/array/sensitivity';
import sensitivity from '../reference/sensitivity.json';

// Truth: numpy and scipy (reference/sensitivity.json).
const TOLERANCE = {
  /** closed forms; digits of the reference, 12 figures */
  relative: 1e-9,
  /** 0.8812 is the reference's 0.88115395 rounded to four digits */
  rounding: 5e-5,
};

function bitsOf(eta: number): 1 | 2 {
  return eta > 0.8 ? 2 : 1;
}

describe('efficiency', () => {
  it('is the reference’s for one bit and for two', () => {
    expect(efficiency(1)).toBeCloseTo(sensitivity.efficiency.one_bit.eta, 12);
    const off = Math.abs(efficiency(2) - sensitivity.efficiency.two_bit_n3.eta);
    expect(off).toBeLessThan(TOLERANCE.rounding);
  });
});

describe('baselineNoiseJy', () => {
  it('agrees with all 16 baseline cases, SNR included', () => {
    const cases = sensitivity.cases.filter((c) => c.kind === 'baseline');
    expect(cases).toHaveLength(16);
    for (const c of cases) {
      const { sefd1_jy: sefd1Jy, sefd2_jy: sefd2Jy, bandwidth_hz: bandwidthHz, t_s: seconds } = c;
      const numbers = [sefd1Jy, sefd2Jy, bandwidthHz, seconds, c.eta, c.sigma_jy, c.flux_jy, c.snr];
      const [s1 = NaN, s2 = NaN, b = NaN, t = NaN, eta = NaN, sigma = NaN, flux = NaN, snr = NaN] = numbers;
      const bits = bitsOf(eta);
      const noise = baselineNoiseJy({
        sefd1Jy: s1,
        sefd2Jy: s2,
        bandwidthHz: b,
        seconds: t,
        bits1: bits,
        bits2: bits,
      });
      expect(Math.abs(noise / sigma - 1), c.id).toBeLessThan(TOLERANCE.relative);
      expect(Math.abs(flux / noise / snr - 1), c.id).toBeLessThan(TOLERANCE.relative);
    }
  });

  it('takes the geometric mean of the efficiencies on a mixed baseline', () => {
    const both = { sefd1Jy: 300, sefd2Jy: 500, bandwidthHz: 64e6, seconds: 120 };
    const one = baselineNoiseJy({ ...both, bits1: 1, bits2: 1 });
    const two = baselineNoiseJy({ ...both, bits1: 2, bits2: 2 });
    expect(baselineNoiseJy({ ...both, bits1: 1, bits2: 2 })).toBeCloseTo(Math.sqrt(one * two), 12);
    expect(baselineNoiseJy({ ...both, bits1: 2, bits2: 1 })).toBeCloseTo(Math.sqrt(one * two), 12);
  });

  it('refuses figures that are not positive', () => {
    const good = { sefd1Jy: 300, sefd2Jy: 500, bandwidthHz: 64e6, seconds: 120, bits1: 2, bits2: 2 } as const;
    for (const key of ['sefd1Jy', 'sefd2Jy', 'bandwidthHz', 'seconds']) {
      expect(() => baselineNoiseJy({ ...good, [key]: 0 })).toThrow(RangeError);
      expect(() => baselineNoiseJy({ ...good, [key]: NaN })).toThrow(RangeError);
    }
  });
});

describe('imageNoiseJy', () => {
  it('agrees with all 10 image cases', () => {
    const cases = sensitivity.cases.filter((c) => c.kind === 'image');
    expect(cases).toHaveLength(10);
    for (const c of cases) {
      const sefds = new Map(Object.entries(c.sefd_jy ?? {}));
      const stations = [...sefds.keys()].map((code) => ({
        code,
        site: { latitudeDeg: 0, longitudeDeg: 0, heightM: 0 },
      }));
      const bits = bitsOf(c.eta ?? NaN);
      const noise = imageNoiseJy(
        baselinesOf(stations).map(({ first, second }) => ({
          sefd1Jy: sefds.get(first.code) ?? NaN,
          sefd2Jy: sefds.get(second.code) ?? NaN,
          bandwidthHz: c.bandwidth_hz ?? NaN,
          seconds: c.t_s ?? NaN,
          bits1: bits,
          bits2: bits,
          products: c.n_pol === 2 ? 2 : 1,
        })),
      );
      expect(Math.abs(noise / (c.image_rms_jy ?? NaN) - 1), c.id).toBeLessThan(TOLERANCE.relative);
    }
  });

  it('measures nothing without baselines', () => {
    expect(imageNoiseJy([])).toBe(Infinity);
  });
});
