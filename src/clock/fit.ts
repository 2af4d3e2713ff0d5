import { MS_PER_DAY, MS_PER_SECOND } from '../units/time';
import { fitPolynomial, valueOf, varianceOf, type Polynomial } from './least-squares';

/** Station clock minus UTC, via GPS, positive = early; sigmaSeconds > 0 where the reading's error is known. */
export type ClockReading = { at: Date; offsetSeconds: number; sigmaSeconds?: number };

export type FitOptions = {
  /** changes at the station: the fit starts anew at each */
  events?: Date[];
  /** h: flicker floor of the clock, taken outside the data; default 2·10⁻¹⁴ (memory) */
  stabilityFloor?: number;
  /** d: drift of the rate a day that may have gone unseen; default 10⁻¹⁵ (memory) */
  driftPerDay?: number;
};

/** One stretch between changes at the station; offset and rate are those at its epoch. */
export type ClockSegment = {
  /** the change that began it; null for the first */
  from: Date | null;
  /** weighted mean of the readings' times */
  epoch: Date;
  offsetSeconds: number;
  /** s/s */
  rate: number;
  /** change of the rate a day; null where the data do not bear it */
  driftPerDay: number | null;
  sigmaSeconds: number;
  sigmaRate: number;
  /** rms of the used readings about the fit */
  scatterSeconds: number;
  firstAt: Date;
  lastAt: Date;
  /** indices into the readings given */
  used: readonly number[];
  setAside: readonly number[];
  polynomial: Polynomial;
};

export type ClockFit = {
  /** by time; only stretches that have a reading */
  segments: readonly ClockSegment[];
  stabilityFloor: number;
  driftPerDay: number;
};

export type ClockPrediction = { offsetSeconds: number; rate: number; sigmaSeconds: number };

/** Scatter of one reading without a stated error where too few readings show it, and the least a fit may claim (memory). */
const READING_SECONDS = 20e-9;
const LEAST_SCATTER_SECONDS = 1e-9;
/** Rate of a clock that was read once is not known: usual rates are within this (memory). */
const UNSEEN_RATE = 5e-12;
const FARTHEST = 5;
const NORMAL_MAD = 1.4826;
const DRIFT_GAIN = 10;

/**
 * A clock's offset and rate, and its drift where the data bear it, from its readings, one fit for each stretch between
 * changes at the station.
 *
 * Per stretch: weighted least squares about the mean epoch; readings farther than 5 · 1.4826 · MAD from the fit are set
 * aside, until the set stays the same; drift only if the corrected Akaike criterion falls by more than 10. The
 * covariance is scaled by χ²/dof where not every reading has an error of its own.
 *
 * @param readings  in any order; finite
 * @returns no segments where there are no readings; a single reading gives its offset and rate 0 ± 5·10⁻¹² (memory)
 * @throws RangeError if a reading is not finite or an error is not positive (programmer error)
 *
 * Error   coefficients 1e-8 relative, covariance 1e-7 of numpy's (tests/clock/fit.test.ts)
 * Source  weighted least squares; criterion of Hurvich & Tsai 1989, Biometrika 76, 297 (memory); jumps are not looked for
 */
export function fitClock(readings: ClockReading[], opts: FitOptions = {}): ClockFit {
  const { events = [], stabilityFloor = 2e-14, driftPerDay = 1e-15 } = opts;
  for (const { at, offsetSeconds, sigmaSeconds } of readings) {
    if (!Number.isFinite(at.getTime()) || !Number.isFinite(offsetSeconds))
      throw new RangeError('A reading has no time or no offset.');
    if (sigmaSeconds !== undefined && !(sigmaSeconds > 0))
      throw new RangeError('An error of a reading is positive.');
  }
  const edges = [-Infinity, ...events.map((event) => event.getTime()).sort((a, b) => a - b), Infinity];
  const segments = edges.slice(0, -1).flatMap((fromMs, index) => {
    const untilMs = edges[index + 1] ?? Infinity;
    const indices = readings.flatMap(({ at }, k) =>
      at.getTime() >= fromMs && at.getTime() < untilMs ? [k] : [],
    );
    return indices.length === 0 ? [] : [fitSegment(readings, indices, fromMs)];
  });
  return { segments, stabilityFloor, driftPerDay };
}

/**
 * Where the clock is at a time, by the stretch that holds it or the last before it (before the first, by the first).
 *
 * @returns rate in s/s; σ² = gᵀ Cov g + (h·Δt)² + (½·d·Δt²)², Δt the time outside the stretch's data
 * @throws RangeError if the fit has no segment (programmer error: ask `fit.segments.length` first)
 */
export function predictClock(fit: ClockFit, at: Date): ClockPrediction {
  const segment = segmentAt(fit, at);
  if (!segment) throw new RangeError('There is no reading to predict from.');
  const { polynomial, epoch, firstAt, lastAt } = segment;
  const t = secondsBetween(epoch, at);
  const degree = polynomial.coefficients.length - 1;
  const outside = Math.max(0, secondsBetween(lastAt, at), secondsBetween(at, firstAt));
  const floor = fit.stabilityFloor * outside;
  const drift = 0.5 * (fit.driftPerDay / (MS_PER_DAY / MS_PER_SECOND)) * outside * outside;
  return {
    offsetSeconds: valueOf(polynomial.coefficients, t),
    rate: (polynomial.coefficients[1] ?? 0) + 2 * (polynomial.coefficients[2] ?? 0) * t,
    sigmaSeconds: Math.sqrt(varianceOf(polynomial.covariance, degree, t) + floor * floor + drift * drift),
  };
}

/** The stretch that speaks for a time; undefined where the fit has none. */
export function segmentAt(fit: Pick<ClockFit, 'segments'>, at: Date): ClockSegment | undefined {
  const before = fit.segments.filter(({ from }) => from === null || from.getTime() <= at.getTime());
  return before.at(-1) ?? fit.segments[0];
}

const secondsBetween = (from: Date, to: Date): number => (to.getTime() - from.getTime()) / MS_PER_SECOND;

function fitSegment(
  readings: readonly ClockReading[],
  indices: readonly number[],
  fromMs: number,
): ClockSegment {
  const isStated = indices.every((index) => readings[index]?.sigmaSeconds !== undefined);
  let used = indices;
  let fitted = fitReadings(readings, used, isStated);
  for (let round = 0; round < 20; round++) {
    const kept = withoutFar(readings, indices, used, fitted, isStated);
    if (kept.length === used.length && kept.every((index, k) => index === used[k])) break;
    used = kept;
    fitted = fitReadings(readings, used, isStated);
  }
  const times = indices.map((index) => readings[index]?.at.getTime() ?? 0);
  const [offsetSeconds = 0, rate = 0, quadratic] = fitted.polynomial.coefficients;
  const size = fitted.polynomial.coefficients.length;
  return {
    from: Number.isFinite(fromMs) ? new Date(fromMs) : null,
    epoch: fitted.epoch,
    offsetSeconds,
    rate,
    driftPerDay: quadratic === undefined ? null : 2 * quadratic * (MS_PER_DAY / MS_PER_SECOND),
    sigmaSeconds: Math.sqrt(fitted.polynomial.covariance[0] ?? 0),
    sigmaRate: Math.sqrt(fitted.polynomial.covariance[size + 1] ?? 0),
    scatterSeconds: rms(used.map((index) => residualOf(readings, index, fitted))),
    firstAt: new Date(Math.min(...times)),
    lastAt: new Date(Math.max(...times)),
    used,
    setAside: indices.filter((index) => !used.includes(index)),
    polynomial: fitted.polynomial,
  };
}

type Fitted = { epoch: Date; polynomial: Polynomial };

/** A line, or a parabola where it is that much better; the covariance as it may be claimed. */
function fitReadings(
  readings: readonly ClockReading[],
  indices: readonly number[],
  isStated: boolean,
): Fitted {
  const picked = indices.flatMap((index) => readings[index] ?? []);
  const weights = picked.map(({ sigmaSeconds }) => (isStated && sigmaSeconds ? 1 / sigmaSeconds ** 2 : 1));
  const epoch = meanTime(picked, weights);
  const t = picked.map(({ at }) => secondsBetween(epoch, at));
  const y = picked.map(({ offsetSeconds }) => offsetSeconds);
  const different = new Set(t).size;
  if (different < 2) {
    const mean = fitPolynomial(t, y, weights, 0);
    const variance = isStated ? (mean.covariance[0] ?? 0) : READING_SECONDS ** 2 / picked.length;
    return {
      epoch,
      polynomial: {
        ...mean,
        coefficients: [mean.coefficients[0] ?? 0, 0],
        covariance: [variance, 0, 0, UNSEEN_RATE ** 2],
      },
    };
  }
  const line = fitPolynomial(t, y, weights, 1);
  const curve = different > 5 ? fitPolynomial(t, y, weights, 2) : null;
  const isCurved = curve !== null && aicc(line, t.length) - aicc(curve, t.length) > DRIFT_GAIN;
  return { epoch, polynomial: claimed(isCurved ? curve : line, isStated) };
}

function claimed(polynomial: Polynomial, isStated: boolean): Polynomial {
  if (isStated) return polynomial;
  const { chiSquare, degreesOfFreedom } = polynomial;
  const variance =
    degreesOfFreedom > 0
      ? Math.max(chiSquare / degreesOfFreedom, LEAST_SCATTER_SECONDS ** 2)
      : READING_SECONDS ** 2;
  return { ...polynomial, covariance: polynomial.covariance.map((value) => value * variance) };
}

/** Corrected Akaike criterion of a fit whose weights may be relative: the variance counts as a parameter. */
function aicc({ chiSquare, coefficients }: Polynomial, count: number): number {
  const parameters = coefficients.length + 1;
  const penalty = (2 * parameters * (parameters + 1)) / (count - parameters - 1);
  return count * Math.log(Math.max(chiSquare, Number.MIN_VALUE) / count) + 2 * parameters + penalty;
}

function withoutFar(
  readings: readonly ClockReading[],
  indices: readonly number[],
  used: readonly number[],
  fitted: Fitted,
  isStated: boolean,
): readonly number[] {
  if (indices.length < 5) return indices;
  const errorOf = (index: number) => (isStated ? (readings[index]?.sigmaSeconds ?? 1) : 1);
  const sizeOf = (index: number) => Math.abs(residualOf(readings, index, fitted)) / errorOf(index);
  const least = isStated ? 1 : LEAST_SCATTER_SECONDS;
  const limit = FARTHEST * Math.max(least, NORMAL_MAD * median(used.map(sizeOf)));
  const kept = indices.filter((index) => sizeOf(index) <= limit);
  return kept.length > indices.length / 2 ? kept : indices;
}

function residualOf(readings: readonly ClockReading[], index: number, { epoch, polynomial }: Fitted): number {
  const reading = readings[index];
  return reading
    ? reading.offsetSeconds - valueOf(polynomial.coefficients, secondsBetween(epoch, reading.at))
    : 0;
}

function meanTime(picked: readonly ClockReading[], weights: readonly number[]): Date {
  const zero = picked[0]?.at.getTime() ?? 0;
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const mean = picked.reduce((sum, { at }, k) => sum + (weights[k] ?? 1) * (at.getTime() - zero), 0) / total;
  return new Date(Math.round(zero + mean));
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const half = Math.floor(sorted.length / 2);
  const upper = sorted[half] ?? 0;
  return sorted.length % 2 === 1 ? upper : (upper + (sorted[half - 1] ?? 0)) / 2;
}

const rms = (values: readonly number[]): number =>
  Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / Math.max(1, values.length));
