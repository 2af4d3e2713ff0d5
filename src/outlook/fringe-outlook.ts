import { baselinesOf } from '../array/baseline';
import type { PlanContext, PlanMode, PlanSettings } from '../schedule/context';
import type { Plan, Scan, ScanId, StationCode } from '../schedule/plan';
import type { ClockPlace, PlaceInWindow } from './clock-place';
import { signalOf, type Lack, type Signal } from './signal';
import { scanEnd, togetherOn, type ScanEnd } from './together';

export type Verdict = 'strong' | 'fair' | 'doubtful' | 'none' | 'unknown' | 'not-on';

/**
 * Why, where the verdict is not by SNR alone: low, out, declined or mode for not-on; snr or clock for none; sefd, flux
 * or clock for unknown; clock where it holds a verdict down to doubtful.
 */
type Reason = 'low' | 'out' | 'declined' | 'mode' | 'snr' | 'sefd' | 'flux' | 'clock';

/** The outlook of one baseline in one scan, with the numbers behind it (null where not worked out). */
export type OutlookCell = Signal & {
  scanId: ScanId;
  /** the western station */
  first: StationCode;
  second: StationCode;
  verdict: Verdict;
  reason: Reason | null;
  /** what is not known, in words: "SEFD of Cf at 8.4 GHz" */
  missing: string | null;
  /** time that counts: both on source, neither declined; 0 for not-on */
  overlapSeconds: number;
};

/** A plan's context, and a judge of clocks where there is a clock log. */
export type OutlookContext = PlanContext & {
  judgeClock?: (
    first: StationCode,
    second: StationCode,
    atMs: number,
    mode: PlanMode,
  ) => Pick<PlaceInWindow, 'place' | 'amplitude' | 'missing'>;
};

/**
 * Which baselines should show fringes, scan by scan.
 *
 * @param context  without judgeClock the clock is not judged, as if every fringe fell inside the window; with it the
 *                 SNR is that which is left where the fringe stands in the window
 * @returns for each scan in the plan's order all baselines of the plan's stations, west to east by first, then second
 *
 * Left out: opacity and gain curves (zenith SEFDs, f = 1), feeds that do not match, the rule of nodding groups (each
 * leg is judged alone).
 * Error   SNR 1e-9 relative of its inputs (tests/outlook/signal.test.ts)
 * Source  definition of this project: not-on, then none, then unknown, then by SNR, at most doubtful at the clock's edge
 */
export function fringeOutlook(plan: Plan, context: OutlookContext): OutlookCell[] {
  return plan.scans.flatMap((scan) => scanOutlook(scan, plan, context));
}

/**
 * The outlook of one scan.
 *
 * @returns as `fringeOutlook`; a scan that has not changed gives the same array again, for the same plan's stations
 *          and context
 */
export function scanOutlook(
  scan: Scan,
  plan: Pick<Plan, 'stations'>,
  context: OutlookContext,
): readonly OutlookCell[] {
  const before = known.get(scan);
  if (before && before.stations === plan.stations && before.context === context) return before.cells;
  const stations = plan.stations.flatMap((code) => context.stations[code] ?? []);
  const ends = stations.map((station) => scanEnd(scan, station, context));
  const cells = baselinesOf(ends).map(({ first, second }) => cellOf(scan, first, second, context));
  known.set(scan, { stations: plan.stations, context, cells });
  return cells;
}

/** Whether fringes are expected: strong or fair. */
export function isExpected(cell: Pick<OutlookCell, 'verdict'>): boolean {
  return cell.verdict === 'strong' || cell.verdict === 'fair';
}

/** How many of some baselines should show fringes. */
export function sumExpected(cells: readonly Pick<OutlookCell, 'verdict'>[]): number {
  return cells.filter(isExpected).length;
}

/**
 * An SNR as screens write it: cut, never rounded up, so that a figure below a limit never reads as the limit.
 *
 * @param snr  ≥ 0
 * @returns whole from 10 up, one decimal below ("6.9")
 */
export function snrText(snr: number): string {
  if (snr >= 10) return String(Math.floor(snr));
  const tenths = Math.floor(snr * 10);
  return ((tenths / 10 > snr ? tenths - 1 : tenths) / 10).toFixed(1);
}

type Known = { stations: Plan['stations']; context: OutlookContext; cells: readonly OutlookCell[] };

const known = new WeakMap<Scan, Known>();

const NO_NUMBERS: Signal = {
  snr: null,
  sefd1Jy: null,
  sefd2Jy: null,
  correlatedFluxJy: null,
  baselineM: null,
  sigmaJy: null,
  coherence: null,
};

function cellOf(scan: Scan, first: ScanEnd, second: ScanEnd, context: OutlookContext): OutlookCell {
  const together = togetherOn(first, second);
  const mode = context.modes[scan.modeId];
  if (together.reason !== null || !mode) {
    const judged = { verdict: 'not-on', reason: together.reason ?? 'mode', missing: null } as const;
    return cellFrom(scan, first, second, judged, 0, NO_NUMBERS);
  }
  const { numbers, lack } = signalOf(first, second, context.sources[scan.sourceId], mode, together);
  const clock = context.judgeClock?.(first.code, second.code, together.midMs, mode) ?? UNJUDGED;
  const snr = numbers.snr === null ? null : numbers.snr * clock.amplitude;
  const judged = judge(snr, lack, clock.place, clock.missing, context.settings.snrLimits);
  return cellFrom(
    scan,
    first,
    second,
    judged,
    together.seconds,
    snr === numbers.snr ? numbers : { ...numbers, snr },
  );
}

const UNJUDGED = { place: 'inside', amplitude: 1, missing: null } as const;

type Judged = Pick<OutlookCell, 'verdict' | 'reason' | 'missing'>;

/** Field by field: spreading three objects into each of a thousand cells costs more than all the rest. */
function cellFrom(
  scan: Scan,
  first: ScanEnd,
  second: ScanEnd,
  { verdict, reason, missing }: Judged,
  overlapSeconds: number,
  numbers: Signal,
): OutlookCell {
  return {
    scanId: scan.id,
    first: first.code,
    second: second.code,
    verdict,
    reason,
    missing,
    overlapSeconds,
    snr: numbers.snr,
    sefd1Jy: numbers.sefd1Jy,
    sefd2Jy: numbers.sefd2Jy,
    correlatedFluxJy: numbers.correlatedFluxJy,
    baselineM: numbers.baselineM,
    sigmaJy: numbers.sigmaJy,
    coherence: numbers.coherence,
  };
}

function judge(
  snr: number | null,
  lack: Lack | null,
  clock: ClockPlace,
  missing: string | null,
  limits: PlanSettings['snrLimits'],
): Judged {
  const verdict = (word: Verdict, reason: Reason | null = null) => ({ verdict: word, reason, missing: null });
  if (snr !== null && snr < limits.doubtful) return verdict('none', 'snr');
  if (clock === 'outside') return verdict('none', 'clock');
  if (snr === null) {
    return { verdict: 'unknown', reason: lack?.reason ?? null, missing: lack?.missing ?? null };
  }
  if (clock === 'unknown') return { verdict: 'unknown', reason: 'clock', missing };
  if (snr < limits.fair) return verdict('doubtful');
  if (clock === 'edge') return verdict('doubtful', 'clock');
  return verdict(snr >= limits.strong ? 'strong' : 'fair');
}
