import type { RotationOptions } from '../sky/position';
import type { Itrf, SkyPosition } from '../sky/types';
import { SPEED_OF_LIGHT } from '../units/constants';
import { extentOf } from '../units/time';
import { basisAt, uvBasisOf } from './uv-basis';
import type { UvBasis } from './uv-basis';

export type UvTracks = { u: Float64Array; v: Float64Array };
export type UvwTracks = UvTracks & { w: Float64Array };
export type DelayTracks = { seconds: Float64Array; rate: Float64Array };

export type TrackOptions = RotationOptions & {
  /** unit of the answer in metres: the wavelength for wavelengths; default 1 */
  unitM?: number;
};

/**
 * u and v of all baselines of some stations at many instants: the fast batch of baselineUvw.
 *
 * @param places   n ≥ 2 Earth-fixed places, metres, in the order their baselines are wanted in
 * @param source   ICRS place
 * @param timesMs  t ≥ 1 instants, epoch ms UTC, in any order, 1900–2100
 * @param opts     dut1Seconds; unitM
 * @returns metres, or units of unitM
 * @throws RangeError if an input is not finite, out of range or empty (programmer error)
 *
 * Shape   baselines (0,1), (0,2) … (0,n−1), (1,2) … (n−2,n−1), second − first, × times[t]
 *         → Float64Array(n(n−1)/2 · t) each, baseline-major
 * Error   ≤ 1e-9 of the length from baselineUvw (tests/array/uvw-tracks.test.ts); the rest is its own
 * Source  as baselineUvw; each station is projected once, baselines are differences
 */
export function uvTracks(
  places: readonly Itrf[],
  source: SkyPosition,
  timesMs: ArrayLike<number>,
  opts: TrackOptions = {},
): UvTracks {
  const rows = projected(places, source, timesMs, [0, 3], opts);
  return { u: differences(rows, 0), v: differences(rows, 1) };
}

/**
 * As uvTracks, with w.
 *
 * Shape   as uvTracks
 */
export function uvwTracks(
  places: readonly Itrf[],
  source: SkyPosition,
  timesMs: ArrayLike<number>,
  opts: TrackOptions = {},
): UvwTracks {
  const rows = projected(places, source, timesMs, [0, 3, 6], opts);
  return { u: differences(rows, 0), v: differences(rows, 1), w: differences(rows, 2) };
}

/**
 * Geometric delay and rate of all baselines at many instants: the fast batch of geometricDelay.
 *
 * @returns seconds; rate, s/s
 * @throws RangeError if an input is not finite, out of range or empty (programmer error)
 *
 * Shape   as uvTracks
 * Error   ≤ 1e-9 of |b|/c and |b|ω/c from geometricDelay (tests/array/uvw-tracks.test.ts); the rest is its own
 */
export function delayTracks(
  places: readonly Itrf[],
  source: SkyPosition,
  timesMs: ArrayLike<number>,
  opts: RotationOptions = {},
): DelayTracks {
  const rows = projected(places, source, timesMs, [6, 9], { ...opts, unitM: -SPEED_OF_LIGHT });
  return { seconds: differences(rows, 0), rate: differences(rows, 1) };
}

/** Components of each station along each axis: axes × stations × times. */
type Rows = { stations: number; times: number; values: Float64Array };

function projected(
  places: readonly Itrf[],
  source: SkyPosition,
  timesMs: ArrayLike<number>,
  axes: readonly number[],
  opts: TrackOptions,
): Rows {
  const [stations, times, unitM] = [places.length, timesMs.length, opts.unitM ?? 1];
  if (stations < 2) throw new RangeError(`Not a baseline: ${stations} stations`);
  if (!(Number.isFinite(unitM) && unitM !== 0)) throw new RangeError(`Not a unit: ${unitM}`);
  const turning = axesOver(uvBasisOf(source, extentOf(timesMs), opts), timesMs, axes);
  const values = new Float64Array(axes.length * stations * times);
  places.forEach(({ x, y, z }, station) => {
    const [px, py, pz] = [x / unitM, y / unitM, z / unitM];
    if (!Number.isFinite(px + py + pz)) throw new RangeError(`Not a place: ${x}, ${y}, ${z}`);
    for (let row = 0; row < axes.length; row += 1) {
      const into = (row * stations + station) * times;
      for (let time = 0, at = 3 * row * times; time < times; time += 1, at += 3) {
        values[into + time] =
          (turning[at] ?? NaN) * px + (turning[at + 1] ?? NaN) * py + (turning[at + 2] ?? NaN) * pz;
      }
    }
  });
  return { stations, times, values };
}

/** Chosen axes at all instants: axes × times × (x, y, z). */
function axesOver(basis: UvBasis, timesMs: ArrayLike<number>, axes: readonly number[]): Float64Array {
  const turning = new Float64Array(3 * axes.length * timesMs.length);
  const at = new Float64Array(12);
  for (let time = 0; time < timesMs.length; time += 1) {
    basisAt(basis, timesMs[time] ?? NaN, at);
    for (let row = 0; row < axes.length; row += 1) {
      const [from, into] = [axes[row] ?? NaN, 3 * (row * timesMs.length + time)];
      turning[into] = at[from] ?? NaN;
      turning[into + 1] = at[from + 1] ?? NaN;
      turning[into + 2] = at[from + 2] ?? NaN;
    }
  }
  return turning;
}

function differences({ stations, times, values }: Rows, row: number): Float64Array {
  const answer = new Float64Array((times * stations * (stations - 1)) / 2);
  let into = 0;
  for (let first = 0; first < stations; first += 1) {
    for (let second = first + 1; second < stations; second += 1) {
      const [from, to] = [(row * stations + first) * times, (row * stations + second) * times];
      for (let time = 0; time < times; time += 1, into += 1) {
        answer[into] = (values[to + time] ?? NaN) - (values[from + time] ?? NaN);
      }
    }
  }
  return answer;
}
