import { predictClock, type ClockFit } from '../clock/fit';
import type { SecondState } from '../clock/second';
import { delayWindowSeconds, rateWindow, windowAmplitude } from '../clock/search-window';
import type { PlanMode, PlanSettings } from '../schedule/context';
import type { StationCode } from '../schedule/plan';

/** Where the predicted clocks of a baseline put its fringe in the correlator's search window. */
export type ClockPlace = 'inside' | 'edge' | 'outside' | 'unknown';

/** What is known of a station's clock; seconds are station minus UTC, via GPS, positive = early. */
export type StationClock = {
  /** newest reading that is used; null is none */
  readAtMs: number | null;
  fit: ClockFit | null;
  /** from the pulse to the recorded signal; null is not known */
  instrument: { seconds: number; sigmaSeconds: number } | null;
  /** of the formatter's whole second; null where the clock was never read */
  second: SecondState | null;
};

export type ClockRules = PlanSettings['clockRules'];

/** Where a baseline's fringe falls in the correlator's search window, second minus first. */
export type PlaceInWindow = {
  place: ClockPlace;
  /** effective clock of second minus that of first */
  expectedSeconds: number | null;
  /** effective minus modelled clock of second, less the same of first */
  meanSeconds: number | null;
  sigmaSeconds: number | null;
  meanRate: number | null;
  /** half-widths */
  windowSeconds: number;
  windowRate: number;
  /** part of the amplitude that is left; 1 inside half the window */
  amplitude: number;
  /** what is not known, in words; null where all is */
  missing: string | null;
  /** stations whose instrument delay is not known: the width is taken from the session */
  widened: readonly StationCode[];
};

/** The correlator's model of a station's clock; without one it is the log's own prediction. */
export type ModelledClock = (code: StationCode, atMs: number) => { seconds: number; rate: number } | null;

const HOUR_MS = 3_600_000;
const HALF = 0.5;

/**
 * The place of a baseline's fringe at a time.
 *
 * @param atMs      the instant on the sky; the age of a reading is counted at the earlier of it and nowMs
 * @param modelled  what the correlator takes for a clock; without it the mean is 0 and the width remains
 * @returns inside (|mean| + 3σ within the window), edge (|mean| < window ≤ |mean| + 3σ), outside, or unknown where a
 *          clock has no reading or none within unknownAfterDays
 *
 * σ² sums both predictions and both instrument delays. Left out: positions of stations and sources, Earth orientation.
 * Source  definition of this project; windows as src/clock/search-window.ts
 */
export function placeInWindow(
  first: { code: StationCode; clock: StationClock | undefined },
  second: { code: StationCode; clock: StationClock | undefined },
  at: { atMs: number; nowMs: number },
  mode: Pick<PlanMode, 'spectralChannels' | 'channelBandwidthHz' | 'integrationSeconds' | 'skyHz'>,
  rules: ClockRules,
  modelled: ModelledClock = () => null,
): PlaceInWindow {
  const windowSeconds = delayWindowSeconds(mode.spectralChannels, mode.channelBandwidthHz);
  const windowRate = rateWindow(mode.integrationSeconds, mode.skyHz);
  const ends = [first, second].map((end) => endOf(end, at, rules, modelled));
  const missing = ends.flatMap((end) => end.missing ?? []);
  const widened = ends.flatMap((end) => (end.isWidened ? [end.code] : []));
  const [from, to] = ends;
  if (missing.length > 0 || !from || !to) {
    const unknown = {
      place: 'unknown',
      expectedSeconds: null,
      meanSeconds: null,
      sigmaSeconds: null,
      meanRate: null,
    } as const;
    return { ...unknown, windowSeconds, windowRate, amplitude: 1, missing: missing.join(', '), widened };
  }
  const meanSeconds = to.seconds - from.seconds;
  const meanRate = to.rate - from.rate;
  const sigmaSeconds = Math.hypot(from.sigmaSeconds, to.sigmaSeconds);
  const shares = [Math.abs(meanSeconds) / windowSeconds, Math.abs(meanRate) / windowRate] as const;
  return {
    place: placeOf(shares, (Math.abs(meanSeconds) + 3 * sigmaSeconds) / windowSeconds),
    expectedSeconds: to.effectiveSeconds - from.effectiveSeconds,
    meanSeconds,
    sigmaSeconds,
    meanRate,
    windowSeconds,
    windowRate,
    amplitude: windowAmplitude(
      ...(shares.map((share) => (share > HALF ? Math.min(share, 1) : 0)) as [number, number]),
    ),
    missing: null,
    widened,
  };
}

function placeOf([delay, rate]: readonly [number, number], delayAt3Sigma: number): ClockPlace {
  if (delay >= 1 || rate >= 1) return 'outside';
  return delayAt3Sigma >= 1 ? 'edge' : 'inside';
}

/** Age of a clock's newest reading, ms, as it counts for a time; null where there is none. */
function readingAgeMs(readAtMs: number | null, at: { atMs: number; nowMs: number }): number | null {
  return readAtMs === null ? null : Math.max(0, Math.min(at.atMs, at.nowMs) - readAtMs);
}

type End = {
  code: StationCode;
  effectiveSeconds: number;
  seconds: number;
  rate: number;
  sigmaSeconds: number;
  isWidened: boolean;
  missing: string | null;
};

function endOf(
  { code, clock }: { code: StationCode; clock: StationClock | undefined },
  at: { atMs: number; nowMs: number },
  rules: ClockRules,
  modelled: ModelledClock,
): End {
  const nothing = { code, effectiveSeconds: 0, seconds: 0, rate: 0, sigmaSeconds: 0, isWidened: false };
  const ageMs = readingAgeMs(clock?.readAtMs ?? null, at);
  if (!clock?.fit || clock.fit.segments.length === 0 || ageMs === null)
    return { ...nothing, missing: `no clock reading of ${code}` };
  if (ageMs > rules.unknownAfterDays * 24 * HOUR_MS) {
    const days = Math.floor(ageMs / (24 * HOUR_MS));
    return { ...nothing, missing: `no clock reading of ${code} in ${days} days` };
  }
  const predicted = predictClock(clock.fit, new Date(at.atMs));
  const model = modelled(code, at.atMs);
  const instrument = clock.instrument ?? { seconds: 0, sigmaSeconds: rules.instrumentSigmaSeconds };
  const effectiveSeconds = predicted.offsetSeconds + instrument.seconds;
  return {
    code,
    effectiveSeconds,
    seconds: model === null ? 0 : effectiveSeconds - model.seconds,
    rate: model === null ? 0 : predicted.rate - model.rate,
    sigmaSeconds: Math.hypot(predicted.sigmaSeconds, instrument.sigmaSeconds),
    isWidened: clock.instrument === null,
    missing: null,
  };
}

/** The judge that `fringeOutlook` takes, of the clocks of a session. */
export function clockJudge(
  clocks: Readonly<Record<StationCode, StationClock>>,
  nowMs: number,
  rules: ClockRules,
  modelled?: ModelledClock,
) {
  return (first: StationCode, second: StationCode, atMs: number, mode: PlanMode): PlaceInWindow =>
    placeInWindow(
      { code: first, clock: clocks[first] },
      { code: second, clock: clocks[second] },
      { atMs, nowMs },
      mode,
      rules,
      modelled,
    );
}
