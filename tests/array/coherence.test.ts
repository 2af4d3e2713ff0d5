import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { atmosphereCoherence } from '@/src/array/coherence';

// Truth: numerical integration of ⟨C²⟩ = (2/T)∫(1 − τ/T) e^(−τ/t_c) dτ, the definition behind the closed form
// (common practice, no source).
const TOLERANCE = {
  /** midpoint rule, 20 000 steps */
  integral: 1e-6,
  /** series against closed form where they meet */
  seam: 1e-9,
};

function integrated(seconds: number, coherenceSeconds: number): number {
  const steps = 20_000;
  let sum = 0;
  for (let step = 0; step < steps; step += 1) {
    const share = (step + 0.5) / steps;
    sum += (1 - share) * Math.exp((-share * seconds) / coherenceSeconds);
  }
  return Math.sqrt((2 * sum) / steps);
}

describe('atmosphereCoherence', () => {
  it('is the integral over all pairs of instants of a scan', () => {
    for (const seconds of [1, 30, 120, 600, 7200]) {
      const off = Math.abs(atmosphereCoherence(seconds, 120) - integrated(seconds, 120));
      expect(off, `${seconds} s`).toBeLessThan(TOLERANCE.integral);
    }
  });

  it('joins series and closed form without a step', () => {
    const [below, above] = [atmosphereCoherence(0.1 - 1e-9, 100), atmosphereCoherence(0.1 + 1e-9, 100)];
    expect(Math.abs(below - above)).toBeLessThan(TOLERANCE.seam);
  });

  it('falls with time, from one, and so slowly at last that a longer scan does not help', () => {
    expect(atmosphereCoherence(0, 100)).toBe(1);
    const time = fc.double({ min: 0, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(time, fc.double({ min: 1, max: 1e4, noNaN: true }), (seconds, more) => {
        expect(atmosphereCoherence(seconds + more, 100)).toBeLessThan(atmosphereCoherence(seconds, 100));
      }),
    );
    const signalToNoise = (seconds: number) => Math.sqrt(seconds) * atmosphereCoherence(seconds, 100);
    expect(signalToNoise(20_000) / signalToNoise(10_000)).toBeLessThan(1.003);
  });

  it('refuses times that are none', () => {
    expect(() => atmosphereCoherence(-1, 100)).toThrow(RangeError);
    expect(() => atmosphereCoherence(1, 0)).toThrow(RangeError);
  });
});
