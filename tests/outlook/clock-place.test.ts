import { describe, expect, it } from 'vitest';
import { fitClock } from '@/src/clock/fit';
import {
  clockJudge,
  placeInWindow,
  type ClockRules,
  type ModelledClock,
  type StationClock,
} from '@/src/outlook/clock-place';
import { MODE as mode } from '@/tests/schedule/context-maker';

const HOUR_MS = 3_600_000;
const NOW = Date.parse('2027-02-10T12:00:00Z');
/** The mode has 64 channels in 32 MHz: ±1 µs. */
const rules: ClockRules = { noteAfterHours: 24, unknownAfterDays: 7, instrumentSigmaSeconds: 0.5e-6 };
const clockOf = (offsetSeconds: number, over: Partial<StationClock> = {}, ageHours = 1): StationClock => {
  const readAtMs = NOW - ageHours * HOUR_MS;
  const readings = Array.from({ length: 40 }, (_, k) => ({
    at: new Date(readAtMs - k * 4 * HOUR_MS),
    offsetSeconds: offsetSeconds + (k % 2 === 0 ? 1e-9 : -1e-9),
  }));
  return {
    readAtMs,
    fit: fitClock(readings),
    instrument: { seconds: 1e-6, sigmaSeconds: 1e-8 },
    second: { kind: 'checked' },
    ...over,
  };
};
const at = { atMs: NOW + 10 * HOUR_MS, nowMs: NOW };
const place = (second: StationClock | undefined, modelled?: ModelledClock) =>
  placeInWindow(
    { code: 'Af', clock: clockOf(2e-6) },
    { code: 'Bm', clock: second },
    at,
    mode,
    rules,
    modelled,
  );

/** The correlator knows Af, and has Bm wrong by so much. */
const wrongBy = (seconds: number) => (code: string) =>
  code === 'Af' ? { seconds: 3e-6, rate: 0 } : { seconds: 2e-6 - seconds, rate: 0 };

describe('the place of a fringe in the search window', () => {
  it('is the middle where the correlator takes what the log says, as wide as both clocks', () => {
    const found = place(clockOf(1e-6));
    expect(found).toMatchObject({
      place: 'inside',
      meanSeconds: 0,
      amplitude: 1,
      missing: null,
      widened: [],
    });
    expect(found.windowSeconds).toBeCloseTo(1e-6, 15);
    expect(found.sigmaSeconds).toBeGreaterThan(Math.SQRT2 * 1e-8);
    expect(found.sigmaSeconds).toBeLessThan(Math.SQRT2 * 1e-8 + 2e-9);
  });

  it('is where effective less modelled puts it, second minus first', () => {
    const found = place(clockOf(1e-6), wrongBy(0.3e-6));
    expect(found.meanSeconds).toBeCloseTo(0.3e-6, 9);
    expect(found).toMatchObject({ place: 'inside', amplitude: 1 });
  });

  it('is the other side of zero with the ends the other way round', () => {
    const modelled = wrongBy(0.3e-6);
    const [af, bm] = [clockOf(2e-6), clockOf(1e-6)];
    const found = placeInWindow(
      { code: 'Bm', clock: bm },
      { code: 'Af', clock: af },
      at,
      mode,
      rules,
      modelled,
    );
    expect(found.meanSeconds).toBeCloseTo(-0.3e-6, 9);
  });

  it.each([
    [0.4e-6, 'inside', 1],
    [0.7e-6, 'inside', 0.81],
    [0.98e-6, 'edge', 0.65],
    [-0.98e-6, 'edge', 0.65],
    [1.01e-6, 'outside', 0.64],
  ])('%d s off is %s, and %d of the amplitude is left', (off, word, amplitude) => {
    const found = place(clockOf(1e-6), wrongBy(off));
    expect(found.place).toBe(word);
    expect(found.amplitude).toBeCloseTo(amplitude, 2);
  });

  it('is outside where the rate is, whatever the delay', () => {
    const fast = (code: string) => ({ seconds: code === 'Af' ? 3e-6 : 2e-6, rate: code === 'Bm' ? 1e-9 : 0 });
    expect(place(clockOf(1e-6), fast)).toMatchObject({ place: 'outside' });
  });

  it('is the edge where the instrument is not known, and says whose', () => {
    expect(place(clockOf(1e-6, { instrument: null }))).toMatchObject({ place: 'edge', widened: ['Bm'] });
  });

  it.each([
    ['never read', undefined, 'no clock reading of Bm'],
    ['read 8 days ago', clockOf(1e-6, {}, 8 * 24), 'no clock reading of Bm in 8 days'],
  ])('is not known of a clock that was %s', (_, clock, missing) => {
    expect(place(clock)).toMatchObject({ place: 'unknown', meanSeconds: null, missing });
  });

  it('counts the age of a reading from now where the scan lies ahead', () => {
    const far = { atMs: NOW + 20 * 24 * HOUR_MS, nowMs: NOW };
    const judged = clockJudge({ Af: clockOf(0), Bm: clockOf(0) }, NOW, rules)('Af', 'Bm', far.atMs, mode);
    expect(judged.place).toBe('inside');
  });
});
