import { describe, expect, it } from 'vitest';
import { fitClock, predictClock, segmentAt, type ClockReading, type ClockSegment } from '@/src/clock/fit';
import { valueOf } from '@/src/clock/least-squares';
import regression from '../reference/regression.json';

const DAY = 86_400;
const DAY_MS = DAY * 1000;

type Poly = {
  degree: number;
  coef: number[];
  cov: number[][];
  cov_scaled?: number[][];
  predict: { t_days: number; y_us: number; var_us2: number }[];
};
type ClockCase = {
  id: string;
  kind: 'clock';
  label: string;
  t_days: number[];
  y_us: number[];
  sigma_us: number[];
  truth: {
    rate_s_per_s: number;
    drift_s_per_s_per_day: number;
    outlier_index: number[];
    reversed_sign_index: number[];
    step: { t_days: number } | null;
  };
  fits: { segment_days: [number, number]; used_index: number[]; poly: Poly[] }[];
};
type NistCase = {
  id: string;
  kind: 'nist';
  x: number[];
  y: number[];
  certified: { b0: number; b1: number; sd_b0: number; sd_b1: number };
};

// numpy 1.24.2 and scipy 1.10.1 on synthetic clocks; NIST StRD Norris (certified values, public domain)
const cases = regression.cases as unknown as (ClockCase | NistCase)[];
const clocks = cases.filter((one): one is ClockCase => one.kind === 'clock');
const nist = cases.filter((one): one is NistCase => one.kind === 'nist');

const at = (days: number) => new Date(Math.round(days * DAY_MS));
/** Readings' times are rounded to the millisecond: what that moves stays far below the tolerance. */
const readingsOf = ({ t_days, y_us, sigma_us }: ClockCase, isStated = true): ClockReading[] =>
  t_days.map((day, index) => ({
    at: at(day),
    offsetSeconds: (y_us[index] ?? 0) * 1e-6,
    ...(isStated && { sigmaSeconds: (sigma_us[index] ?? 0) * 1e-6 }),
  }));
const fitOf = (one: ClockCase, isStated = true) =>
  fitClock(readingsOf(one, isStated), {
    events: one.truth.step === null ? [] : [at(one.truth.step.t_days)],
  });

const close = (value: number, wanted: number, relative: number, absolute = 0) =>
  expect(Math.abs(value - wanted), `${value} against ${wanted}`).toBeLessThanOrEqual(
    Math.max(absolute, relative * Math.abs(wanted)),
  );

/** Each row: what is compared, and what limits it. */
const TOLERANCE = {
  valueMicroseconds: 1e-8, // times are whole milliseconds: 1e-11 s/s · 1 ms is far below
  rateRelative: 1e-7, // the same, over the span
  covarianceRelative: 1e-6, // numpy's figures are given to 12 digits; times as above
  norrisDigits: 9,
};

describe('the fit of a clock', () => {
  it('is tried on every series of the reference', () => {
    expect(clocks).toHaveLength(14);
    expect(nist).toHaveLength(1);
  });

  it.each(nist)('agrees with the certified values of $id to nine digits', ({ x, y, certified }) => {
    const readings = x.map((day, index) => ({ at: at(day), offsetSeconds: y[index] ?? 0 }));
    const [segment] = fitClock(readings).segments;
    if (!segment) throw new Error('no fit');
    // b1 is per day here, b0 at day 0
    const perDay = segment.rate * DAY;
    const zero = valueOf(segment.polynomial.coefficients, -segment.epoch.getTime() / 1000);
    close(perDay, certified.b1, 10 ** -TOLERANCE.norrisDigits);
    close(zero, certified.b0, 10 ** -(TOLERANCE.norrisDigits - 2));
    close(segment.sigmaRate * DAY, certified.sd_b1, 10 ** -TOLERANCE.norrisDigits);
    expect(segment.setAside).toEqual([]);
  });

  it.each(clocks)('agrees with numpy on $id, $label', (one) => {
    const { segments } = fitOf(one);
    expect(segments).toHaveLength(one.fits.length);
    one.fits.forEach((wanted, index) => {
      const segment = segments[index];
      if (!segment) throw new Error('a stretch is missing');
      expect(segment.used).toEqual(wanted.used_index);
      const degree = segment.polynomial.coefficients.length - 1;
      const poly = wanted.poly.find((entry) => entry.degree === degree);
      if (!poly) throw new Error(`no reference of degree ${degree}`);
      const fit = { segments: [segment], stabilityFloor: 0, driftPerDay: 0 };
      for (const { t_days, y_us, var_us2 } of poly.predict) {
        const predicted = predictClock(fit, at(t_days));
        close(predicted.offsetSeconds * 1e6, y_us, 0, TOLERANCE.valueMicroseconds);
        close((predicted.sigmaSeconds * 1e6) ** 2, var_us2, TOLERANCE.covarianceRelative);
      }
      const slope = (poly.coef[1] ?? 0) + 2 * (poly.coef[2] ?? 0) * (segment.epoch.getTime() / DAY_MS);
      close(segment.rate * DAY * 1e6, slope, TOLERANCE.rateRelative, 1e-9);
    });
  });

  it('scales the covariance by chi square where no reading has an error of its own', () => {
    const one = clocks.find(({ id }) => id === 'reg-02');
    const scaled = one?.fits[0]?.poly[0]?.predict as { t_days: number; var_scaled_us2: number }[] | undefined;
    if (!one || !scaled) throw new Error('reg-02 is gone');
    const fit = { ...fitOf(one, false), stabilityFloor: 0, driftPerDay: 0 };
    for (const { t_days, var_scaled_us2 } of scaled)
      close(
        (predictClock(fit, at(t_days)).sigmaSeconds * 1e6) ** 2,
        var_scaled_us2,
        TOLERANCE.covarianceRelative,
      );
  });

  it.each(clocks.filter(({ t_days }) => t_days.length > 5))(
    'sets aside what was planted wrong in $id and no more, and finds the planted rate',
    (one) => {
      const fit = fitOf(one);
      const setAside = fit.segments.flatMap((segment) => segment.setAside);
      const wrong = [...one.truth.outlier_index, ...one.truth.reversed_sign_index].sort((a, b) => a - b);
      expect(setAside).toEqual(wrong);
      fit.segments.forEach((segment) => {
        const days = segment.epoch.getTime() / DAY_MS;
        const rate = one.truth.rate_s_per_s + one.truth.drift_s_per_s_per_day * days;
        expect(Math.abs(segment.rate - rate)).toBeLessThan(4 * segment.sigmaRate);
      });
    },
  );

  it('takes a drift only where the data bear it', () => {
    const curved = clocks.filter((one) =>
      fitOf(one).segments.some(({ driftPerDay }) => driftPerDay !== null),
    );
    expect(curved.map(({ id }) => id)).toEqual(
      clocks.filter(({ truth }) => truth.drift_s_per_s_per_day !== 0).map(({ id }) => id),
    );
  });
});

const line = (count: number, offset: number, rate: number, noise: (index: number) => number = () => 0) =>
  Array.from({ length: count }, (_, index) => ({
    at: new Date(index * 4 * 3_600_000),
    offsetSeconds: offset + rate * index * 4 * 3600 + noise(index),
  }));
const first = (readings: ClockReading[]): ClockSegment => {
  const [segment] = fitClock(readings).segments;
  if (!segment) throw new Error('no fit');
  return segment;
};

describe('a planted clock', () => {
  it('is found again, offset and rate', () => {
    const { segments } = fitClock(line(60, 3.2e-6, 0.667e-12));
    const there = predictClock({ segments, stabilityFloor: 0, driftPerDay: 0 }, new Date(0));
    expect(there.offsetSeconds).toBeCloseTo(3.2e-6, 14);
    expect(there.rate).toBeCloseTo(0.667e-12, 18);
  });

  it('is predicted alike whatever the zero of time', () => {
    const readings = line(30, -1e-6, 2e-12, (index) => (index % 3) * 5e-9);
    const later = readings.map(({ at, offsetSeconds }) => ({
      at: new Date(at.getTime() + 1e12),
      offsetSeconds,
    }));
    const here = predictClock(fitClock(readings), new Date(1e9));
    const there = predictClock(fitClock(later), new Date(1e9 + 1e12));
    expect(there.offsetSeconds).toBeCloseTo(here.offsetSeconds, 14);
    expect(there.sigmaSeconds).toBeCloseTo(here.sigmaSeconds, 14);
  });

  it('starts anew at a change and speaks by the last stretch before a time', () => {
    const readings = line(40, 1e-6, 1e-12).map((reading, index) =>
      index < 20 ? reading : { ...reading, offsetSeconds: reading.offsetSeconds + 0.62e-6 },
    );
    const change = new Date(19.5 * 4 * 3_600_000);
    const fit = fitClock(readings, { events: [change] });
    expect(fit.segments.map(({ used }) => used.length)).toEqual([20, 20]);
    expect(segmentAt(fit, change)?.from).toEqual(change);
    const step =
      predictClock(fit, change).offsetSeconds -
      predictClock(fit, new Date(change.getTime() - 1)).offsetSeconds;
    expect(step).toBeCloseTo(0.62e-6, 12);
  });

  it('is less certain the longer ago it was read, by floor and drift', () => {
    const fit = fitClock(
      line(30, 0, 0, (index) => (index % 2) * 1e-8),
      { stabilityFloor: 2e-14, driftPerDay: 1e-15 },
    );
    const [segment] = fit.segments;
    if (!segment) throw new Error('no fit');
    const bare = { segments: fit.segments, stabilityFloor: 0, driftPerDay: 0 };
    const later = new Date(segment.lastAt.getTime() + 10 * DAY_MS);
    const grown = predictClock(fit, later).sigmaSeconds ** 2 - predictClock(bare, later).sigmaSeconds ** 2;
    expect(grown).toBeCloseTo((2e-14 * 10 * DAY) ** 2 + (0.5e-15 * 100 * DAY) ** 2, 24);
    expect(predictClock(fit, segment.lastAt)).toEqual(predictClock(bare, segment.lastAt));
  });

  it('never claims picoseconds, not even of a perfect line', () => {
    expect(first(line(200, 1e-6, 1e-12)).sigmaSeconds).toBeGreaterThan(5e-11);
  });

  it('that was read once keeps its offset, and its rate is not known', () => {
    const segment = first([{ at: new Date(0), offsetSeconds: 2e-6 }]);
    expect(segment).toMatchObject({ offsetSeconds: 2e-6, rate: 0, driftPerDay: null, sigmaSeconds: 20e-9 });
    expect(segment.sigmaRate).toBeGreaterThan(1e-12);
  });

  it('that was never read has no fit, and asking it is an error', () => {
    const fit = fitClock([]);
    expect(fit.segments).toEqual([]);
    expect(segmentAt(fit, new Date(0))).toBeUndefined();
    expect(() => predictClock(fit, new Date(0))).toThrow(RangeError);
  });

  it('is refused where a reading is no number', () => {
    expect(() => fitClock([{ at: new Date(Number.NaN), offsetSeconds: 0 }])).toThrow(RangeError);
    expect(() => fitClock([{ at: new Date(0), offsetSeconds: 0, sigmaSeconds: 0 }])).toThrow(RangeError);
  });
});
