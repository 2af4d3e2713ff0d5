import { legProblems, outsideProblem, sortProblems, type Problem } from './checks';
import type { PlanContext } from './context';
import { comingFrom, legOf, passOn, type Before, type PathLeg, type StationPaths } from './paths';
import { stationOnMs, type Plan, type Scan, type ScanId, type ScanStation, type StationCode } from './plan';
import { placementReason, sightWhy } from './placement-words';
import { scanNumbers } from './scan-numbers';

/** A scan as it would be placed. */
export type Placement = {
  /** the scan that is moved, whose old place does not count; null for a new one */
  ignoreScanId: ScanId | null;
  sourceId: string;
  modeId: string;
  startMs: number;
  lengthSeconds: number;
  /** who is to watch; 'all-up' takes those that see the source all the time and are free */
  stations: 'all-up' | readonly (StationCode | ScanStation)[];
};

type PlacementSlew = {
  station: StationCode;
  /** from the end of the scan before to the dish's arrival; null at the session's start */
  from: { startMs: number; stopMs: number; startElevationDeg: number; stopElevationDeg: number } | null;
  slewSeconds: number | null;
  spareSeconds: number | null;
  /** spare time after the slew to the station's next scan; null if there is none */
  nextSpareSeconds: number | null;
};

export type Judgement = {
  /** who can watch, by code */
  stations: StationCode[];
  cannot: { station: StationCode; why: string }[];
  slews: PlacementSlew[];
  tightest: { station: StationCode; spareSeconds: number } | null;
  verdict: 'fits' | 'note' | 'no';
  /** empty if it fits; a sentence without its point */
  reason: string;
  problems: Problem[];
};

/** The scan's id in problems of a scan that does not exist yet. */
const NEW_SCAN_ID: ScanId = 'new';

/**
 * Whether a scan could stand where it is held. Only the scan and its neighbours at each station are worked out.
 *
 * @param paths  of the plan as it is
 * @returns problems of the scan and, where the placement makes them or makes them worse, of the scans after it
 *
 * Left out: that a turn of the cable changed here may change later scans' turns; the check of the whole plan tells.
 * Cost    0.3 ms for six stations
 */
export function judgePlacement(
  plan: Plan,
  context: PlanContext,
  placement: Placement,
  paths: StationPaths,
): Judgement {
  const scan = placedScan(plan, placement);
  const judged = scan.stations.flatMap((member) =>
    judgeMember(scan, member, plan, context, placement, paths),
  );
  const takesAll = placement.stations !== 'all-up';
  const taking = judged.filter(({ why }) => takesAll || why === null);
  const outside = outsideProblem(scan, plan.span);
  const problems = sortProblems([...(outside ? [outside] : []), ...taking.flatMap((one) => one.problems)]);
  const stations = judged.filter(({ why }) => why === null).map(({ leg }) => leg.station);
  const cannot = judged.flatMap(({ leg, why }) => (why === null ? [] : [{ station: leg.station, why }]));
  const slews = taking.map(({ slew }) => slew);
  const hasFix = problems.some(({ severity }) => severity === 'fix');
  const isRefused = hasFix || stations.length === 0 || (takesAll && cannot.length > 0);
  const isNoted = problems.length > 0 || stations.length === 1;
  const verdict = isRefused ? 'no' : isNoted ? 'note' : 'fits';
  const reason =
    verdict === 'fits' ? '' : placementReason({ problems, stations, cannot, scanId: scan.id, verdict }, plan);
  return { stations, cannot, slews, tightest: tightestOf(slews), verdict, reason, problems };
}

/**
 * The scan a placement stands for; with 'all-up' every station of the plan is in it.
 */
export function placedScan(plan: Plan, placement: Placement): Scan {
  const { ignoreScanId, sourceId, modeId, startMs, lengthSeconds } = placement;
  const wanted = placement.stations === 'all-up' ? plan.stations : placement.stations;
  const members = wanted.map((one) =>
    typeof one === 'string' ? { station: one, lateSeconds: 0, earlySeconds: 0 } : one,
  );
  return {
    id: ignoreScanId ?? NEW_SCAN_ID,
    sourceId,
    modeId,
    startMs,
    lengthSeconds,
    stations: members.sort((a, b) => (a.station < b.station ? -1 : 1)),
    groupId: null,
    leg: null,
    comment: '',
  };
}

/**
 * What a station does before and after an instant, one scan left aside.
 *
 * @returns previous: of those begun by then the one that ends last; next: the first to begin later
 */
export function neighboursOf(
  legs: readonly PathLeg[],
  ignoreScanId: ScanId | null,
  atMs: number,
): { previous: PathLeg | null; next: PathLeg | null } {
  const before: Before = { last: null, lastPossible: null };
  for (const leg of legs) {
    if (leg.scanId === ignoreScanId) continue;
    if (leg.startMs > atMs) return { previous: comingFrom(before, atMs), next: leg };
    passOn(before, leg);
  }
  return { previous: comingFrom(before, atMs), next: null };
}

type Judged = { leg: PathLeg; why: string | null; slew: PlacementSlew; problems: Problem[] };

function judgeMember(
  scan: Scan,
  member: ScanStation,
  plan: Plan,
  context: PlanContext,
  placement: Placement,
  paths: StationPaths,
): Judged[] {
  const on = stationOnMs(scan, member);
  const legs = paths.get(member.station) ?? [];
  const { previous, next } = neighboursOf(legs, placement.ignoreScanId, on.startMs);
  const leg = legOf(scan, member, context, previous);
  if (!leg) return [];
  const nextLeg = next && legAfter(next, plan, context, leg);
  const busyWith =
    previous && previous.stopMs > leg.startMs ? previous : next && next.startMs < leg.stopMs ? next : null;
  const slew = {
    station: member.station,
    from:
      leg.fromStopMs === null || !leg.fromAzEl
        ? null
        : motionOf(leg, leg.fromStopMs, leg.fromAzEl.elevationDeg),
    slewSeconds: leg.slewSeconds,
    spareSeconds: leg.spareSeconds,
    nextSpareSeconds: nextLeg?.spareSeconds ?? null,
  };
  const problems = legProblems(leg, context);
  if (next && nextLeg) problems.push(...newProblems(next, nextLeg, context));
  const why = sightWhy(leg) ?? busyWhy(busyWith, plan) ?? awayWhy(context, member.station, on);
  return [{ leg, why, slew, problems }];
}

function legAfter(next: PathLeg, plan: Plan, context: PlanContext, previous: PathLeg): PathLeg | null {
  const scan = plan.scans.find(({ id }) => id === next.scanId);
  const member = scan?.stations.find(({ station }) => station === next.station);
  return scan && member ? legOf(scan, member, context, previous) : null;
}

function motionOf(leg: PathLeg, startMs: number, startElevationDeg: number): PlacementSlew['from'] {
  return {
    startMs,
    stopMs: startMs + (leg.slewSeconds ?? 0) * 1000,
    startElevationDeg,
    stopElevationDeg: leg.arriveElevationDeg ?? leg.startAzEl.elevationDeg,
  };
}

/** Problems of the way to the next scan that were not there, or not as bad, before. */
function newProblems(before: PathLeg, after: PathLeg, context: PlanContext): Problem[] {
  const old = legProblems(before, context);
  return legProblems(after, context).filter((problem) => {
    if (problem.kind === 'limit') return false;
    const known = old.find(({ key }) => key === problem.key);
    if (!known || known.severity !== problem.severity) return true;
    return (after.spareSeconds ?? -Infinity) < (before.spareSeconds ?? -Infinity);
  });
}

function busyWhy(leg: PathLeg | null, plan: Plan): string | null {
  return leg && `busy with scan ${scanNumbers(plan).get(leg.scanId) ?? leg.scanId}`;
}

function awayWhy(
  context: PlanContext,
  station: StationCode,
  on: { startMs: number; stopMs: number },
): string | null {
  const away = (context.away[station] ?? []).find(
    ({ start, end }) => start.getTime() < on.stopMs && end.getTime() > on.startMs,
  );
  return away ? `away: ${away.why}` : null;
}

function tightestOf(slews: readonly PlacementSlew[]): Judgement['tightest'] {
  const spares = slews.flatMap(({ station, spareSeconds, nextSpareSeconds }) =>
    [spareSeconds, nextSpareSeconds].flatMap((spare) =>
      spare === null ? [] : [{ station, spareSeconds: spare }],
    ),
  );
  return spares.reduce<Judgement['tightest']>(
    (least, one) => (least && least.spareSeconds <= one.spareSeconds ? least : one),
    null,
  );
}
