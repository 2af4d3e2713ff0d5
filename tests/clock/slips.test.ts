import { describe, expect, it } from 'vitest';
import { allowedSeconds, suspectSlip } from '@/src/clock/slips';

const prediction = { offsetSeconds: 3.214e-6, rate: 0, sigmaSeconds: 4e-9 };

describe('a reading that disagrees with the fit', () => {
  it.each([
    ['the wrong tick', -3.21e-6, 'sign', 3.21e-6],
    ['nanoseconds for microseconds', 3.214e-3, 'unit', 3.214e-6],
    ['microseconds for nanoseconds', 3.2e-9, 'unit', 3.2e-6],
    ['one figure too many', 32.14e-6, 'digit', 3.214e-6],
    ['a whole second', 1 + 3.214e-6, 'second', 3.214e-6],
  ])('is questioned as %s', (_, offset, kind, meant) => {
    const slip = suspectSlip(offset, prediction, 9e-9);
    expect(slip?.kind).toBe(kind);
    expect(slip?.offsetSeconds).toBeCloseTo(meant, 12);
    expect(slip?.question).toContain('The fit expects EARLY by 3.214 µs');
  });

  it('is not questioned within five times the scatter, three sigma or 30 ns', () => {
    expect(allowedSeconds(prediction, 9e-9)).toBeCloseTo(45e-9, 12);
    expect(allowedSeconds(prediction, 1e-9)).toBeCloseTo(30e-9, 12);
    expect(allowedSeconds({ ...prediction, sigmaSeconds: 1e-7 }, 1e-9)).toBeCloseTo(3e-7, 12);
    expect(suspectSlip(3.25e-6, prediction, 9e-9)).toBeNull();
  });

  it('is not questioned where no slip would explain it', () => {
    expect(suspectSlip(3.9e-6, prediction, 9e-9)).toBeNull();
  });
});
