import type { PlanContext } from './context';
import { stationPaths, type PathLeg } from './paths';
import { scanStopMs, type Plan, type PlanSpan, type Scan, type ScanId, type StationCode } from './plan';

type Head = {
  /** kind:scan:station, '*' for the whole scan; the same problem keeps its key until it is solved */
  key: string;
  severity: 'fix' | 'note';
  scanId: ScanId;
  /** null where the whole scan is meant */
  station: StationCode | null;
  atMs: number;
};

export type LimitValues = {
  elevationDeg: number;
  limitDeg: number;
  /** room to the limit, negative outside it */
  marginDeg: number;
  side: 'low' | 'mask' | 'high';
};

export type SlewValues = {
  fromScanId: ScanId | null;
  slewSeconds: number | null;
  gapSeconds: number | null;
  spareSeconds: number | null;
  /** why the dish cannot, to go on after the station's name */
  impossible: string | null;
};

type OverlapValues = { otherScanId: ScanId; overlapSeconds: number };

/** How long the scan lies before the session's start and after its end. */
type OutsideValues = { beforeSeconds: number; afterSeconds: number };

/** Hours in which the station is not there, and its scans that lie in them, whole or in part, by start. */
export type AwayValues = {
  why: string;
  fromMs: number;
  untilMs: number;
  hits: readonly { scanId: ScanId; isWhole: boolean }[];
};

/** Age of the newest clock reading; null where there is none. */
export type ClockValues = { ageHours: number | null };

/** The formatter's whole second: off by so many seconds (checked at atMs), or null where it was not checked since atMs. */
export type SecondValues = { off: number | null; atMs: number | null };

/** What is wrong, or near it; the sentence and its mends are made on demand. */
export type Problem = Head &
  (
    | { kind: 'limit'; values: LimitValues }
    | { kind: 'overlap'; values: OverlapValues }
    | { kind: 'slew'; values: SlewValues }
    | { kind: 'outside'; values: OutsideValues }
    | { kind: 'away'; values: AwayValues }
    | { kind: 'clock'; values: ClockValues }
    | { kind: 'second'; values: SecondValues }
  );

/** So near above a limit is told. */
const NEAR_LIMIT_DEG = 5;

/**
 * Everything that is wrong in a plan.
 *
 * @returns what must be fixed first, then by time, then by key
 *
 * Hours away are told once for each stretch, a clock once for each station, at the first scan.
 * Left out so far: the Sun, data volume.
 */
export function checkPlan(plan: Plan, context: PlanContext): Problem[] {
  const problems: Problem[] = [];
  for (const scan of plan.scans) {
    const outside = outsideProblem(scan, plan.span);
    if (outside) problems.push(outside);
  }
  for (const legs of stationPaths(plan, context).values()) {
    for (const leg of legs) problems.push(...legProblems(leg, context));
    const [first] = legs;
    problems.push(
      ...awayProblems(legs, context),
      ...clockProblem(first, context),
      ...secondProblem(first, context),
    );
  }
  return sortProblems(problems);
}

/**
 * The problems of one scan at one station.
 */
export function legProblems(leg: PathLeg, context: PlanContext): Problem[] {
  const problems: Problem[] = [];
  const limit = limitProblem(leg);
  if (limit) problems.push(limit);
  const overlap = overlapProblem(leg);
  if (overlap) problems.push(overlap);
  const slew = overlap ? null : slewProblem(leg, context);
  if (slew) problems.push(slew);
  return problems;
}

/**
 * Whether a scan keeps within the session.
 */
export function outsideProblem(scan: Scan, span: PlanSpan): Problem | null {
  const spanStopMs = scanStopMs(span);
  const beforeSeconds = Math.max(0, (span.startMs - scan.startMs) / 1000);
  const afterSeconds = Math.max(0, (scanStopMs(scan) - spanStopMs) / 1000);
  if (beforeSeconds === 0 && afterSeconds === 0) return null;
  return {
    ...head('outside', scan.id, null, 'fix', scan.startMs),
    kind: 'outside',
    values: { beforeSeconds, afterSeconds },
  };
}

/** Must be fixed first, then by time, then by key. */
export function sortProblems(problems: readonly Problem[]): Problem[] {
  const rank = (problem: Problem) => (problem.severity === 'fix' ? 0 : 1);
  return [...problems].sort(
    (a, b) => rank(a) - rank(b) || a.atMs - b.atMs || (a.key < b.key ? -1 : a.key > b.key ? 1 : 0),
  );
}

function limitProblem(leg: PathLeg): Problem | null {
  const { marginDeg, elevationDeg, limitDeg, side, atMs } = leg.worst;
  if (marginDeg >= NEAR_LIMIT_DEG) return null;
  const isOut = leg.outFromMs !== null;
  return {
    ...head('limit', leg.scanId, leg.station, isOut ? 'fix' : 'note', leg.outFromMs ?? atMs),
    kind: 'limit',
    values: { marginDeg, elevationDeg, limitDeg, side },
  };
}

function overlapProblem(leg: PathLeg): Problem | null {
  if (leg.fromScanId === null || leg.fromStopMs === null || leg.fromStopMs <= leg.startMs) return null;
  const overlapSeconds = (Math.min(leg.stopMs, leg.fromStopMs) - leg.startMs) / 1000;
  return {
    ...head('overlap', leg.scanId, leg.station, 'fix', leg.startMs),
    kind: 'overlap',
    values: { otherScanId: leg.fromScanId, overlapSeconds },
  };
}

function slewProblem(leg: PathLeg, { settings }: PlanContext): Problem | null {
  const { fromScanId, slewSeconds, gapSeconds, spareSeconds, impossible } = leg;
  // outside the mount's elevations is told as a limit
  if (leg.isElevationOnly && leg.outFromMs !== null) return null;
  const isFix = impossible !== null || (spareSeconds !== null && spareSeconds < 0);
  const isNote = spareSeconds !== null && spareSeconds < settings.leastSpareSeconds;
  if (!isFix && !isNote) return null;
  return {
    ...head('slew', leg.scanId, leg.station, isFix ? 'fix' : 'note', leg.startMs),
    kind: 'slew',
    values: { fromScanId, slewSeconds, gapSeconds, spareSeconds, impossible },
  };
}

/** One for each stretch of hours that a station is away and has scans in. */
function awayProblems(legs: readonly PathLeg[], { away }: PlanContext): Problem[] {
  const station = legs[0]?.station;
  if (station === undefined) return [];
  return (away[station] ?? []).flatMap(({ start, end, why }) => {
    const [fromMs, untilMs] = [start.getTime(), end.getTime()];
    const inside = legs.filter(({ startMs, stopMs }) => fromMs < stopMs && untilMs > startMs);
    const [first] = inside;
    if (!first) return [];
    const hits = inside.map(({ scanId, startMs, stopMs }) => ({
      scanId,
      isWhole: fromMs <= startMs && untilMs >= stopMs,
    }));
    return [
      {
        ...head('away', first.scanId, station, 'fix', Math.max(fromMs, first.startMs)),
        kind: 'away' as const,
        values: { why, fromMs, untilMs, hits },
      },
    ];
  });
}

function clockProblem(
  first: PathLeg | undefined,
  { clockReadAtMs, nowMs, settings }: PlanContext,
): Problem[] {
  const readAtMs = first && clockReadAtMs[first.station];
  if (!first || readAtMs === undefined) return [];
  const ageHours = readAtMs === null ? null : (Math.min(nowMs, first.startMs) - readAtMs) / 3_600_000;
  if (ageHours !== null && ageHours <= settings.clockRules.noteAfterHours) return [];
  const { station, scanId, startMs } = first;
  return [
    {
      ...head('clock', scanId, station, 'note', startMs),
      key: `clock:*:${station}`,
      kind: 'clock',
      values: { ageHours },
    },
  ];
}

function secondProblem(first: PathLeg | undefined, { clockSecond }: PlanContext): Problem[] {
  const values = first && clockSecond?.[first.station];
  if (!first || !values) return [];
  const { station, scanId, startMs } = first;
  return [
    {
      ...head('second', scanId, station, values.off === null ? 'note' : 'fix', startMs),
      key: `second:*:${station}`,
      kind: 'second',
      values,
    },
  ];
}

function head(
  kind: Problem['kind'],
  scanId: ScanId,
  station: StationCode | null,
  severity: Head['severity'],
  atMs: number,
): Head {
  return { key: `${kind}:${scanId}:${station ?? '*'}`, severity, scanId, station, atMs };
}
