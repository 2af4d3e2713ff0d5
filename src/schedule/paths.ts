import { motionTo, startPointing, type Held } from '../sky/slew';
import { axisAngles, firstAxis, secondAxis } from '../sky/axes';
import { leavesFirstAtMs, leavesSecondAt, tooFastAtMs } from '../sky/cable';
import type { AzEl } from '../sky/types';
import type { PlanContext, PlanSource, PlanStation } from './context';
import {
  compareScans,
  stationOnMs,
  type Plan,
  type Scan,
  type ScanId,
  type ScanStation,
  type StationCode,
} from './plan';
import { axisPath, directionAt, sightOf, trackNear, type Sight } from './sight';

/** One scan at one station, and the way there from the scan before. */
export type PathLeg = {
  scanId: ScanId;
  sourceId: string;
  station: StationCode;
  /** on source, what it joins late and leaves early taken off */
  startMs: number;
  stopMs: number;
  startAzEl: AzEl;
  stopAzEl: AzEl;
  motorStartDeg: number;
  motorStopDeg: number;
  minElevationDeg: number;
  /** least room to a limit; negative outside it */
  worst: Sight['worst'];
  /** first instant outside the limits, or null */
  outFromMs: number | null;
  /** the scan it comes from: of those that began before, the one that ends last; null for the first */
  fromScanId: ScanId | null;
  fromStopMs: number | null;
  fromAzEl: AzEl | null;
  /** settling included; null for the first and where impossible */
  slewSeconds: number | null;
  /** negative where the scan before is not over yet */
  gapSeconds: number | null;
  spareSeconds: number | null;
  /** the way the first axis turns; of az–el, + clockwise from above */
  azimuthMoveDeg: number | null;
  /** elevation of the source when the dish arrives */
  arriveElevationDeg: number | null;
  /** why the dish cannot, to go on after the station's name; null if it can */
  impossible: string | null;
  /** true if it is only the mount's elevation range that stands in the way */
  isElevationOnly: boolean;
};

export type StationPaths = ReadonlyMap<StationCode, readonly PathLeg[]>;

/** Motor azimuths nearer than this are one place; far above rounding, far below a beam. */
const SAME_PLACE_DEG = 1e-6;

const ofPlan = new WeakMap<Plan, { context: PlanContext; paths: StationPaths }>();

/**
 * The way of every dish through a plan: each scan on the turn of the cable that is quickest to reach and lets the
 * whole scan be tracked, carried on from scan to scan. The session starts on the turn nearest mid-range; a dish that
 * stays on its source goes on following it, which takes no slew.
 *
 * @returns a list for each station of the plan, by start; stations and sources that the context lacks are left out
 *
 * Error   pointing as `trackAzEl`; slews as `slewBetween`. Where a leg is impossible the next starts from its place on
 *         the turn nearest mid-range, unless that is over by then: it is passed over
 */
export function stationPaths(plan: Plan, context: PlanContext): StationPaths {
  const done = ofPlan.get(plan);
  if (done && done.context === context) return done.paths;
  const paths = new Map<StationCode, PathLeg[]>();
  for (const code of plan.stations) paths.set(code, walk(partsOf(plan, code), context));
  ofPlan.set(plan, { context, paths });
  return paths;
}

type Part = { scan: Scan; member: ScanStation };

/** A station's scans in the order in which it begins them. */
function partsOf(plan: Plan, code: StationCode): Part[] {
  const parts: Part[] = [];
  for (const scan of plan.scans) {
    const member = scan.stations.find(({ station }) => station === code);
    if (member) parts.push({ scan, member });
  }
  const beginsAt = ({ scan, member }: Part) => stationOnMs(scan, member).startMs;
  return parts.sort((a, b) => beginsAt(a) - beginsAt(b) || compareScans(a.scan, b.scan));
}

function walk(parts: readonly Part[], context: PlanContext): PathLeg[] {
  const legs: PathLeg[] = [];
  const before: Before = { last: null, lastPossible: null };
  for (const { scan, member } of parts) {
    const leg = legOf(scan, member, context, comingFrom(before, stationOnMs(scan, member).startMs));
    if (!leg) continue;
    legs.push(leg);
    passOn(before, leg);
  }
  return legs;
}

/** Of the legs begun so far those that end last: of all, and of those the dish can do. */
export type Before = { last: PathLeg | null; lastPossible: PathLeg | null };

/** Takes a leg into account for those that follow. */
export function passOn(before: Before, leg: PathLeg): void {
  if (!before.last || leg.stopMs >= before.last.stopMs) before.last = leg;
  const { lastPossible } = before;
  if (leg.impossible === null && (!lastPossible || leg.stopMs >= lastPossible.stopMs))
    before.lastPossible = leg;
}

/**
 * The leg a dish comes from: one it cannot do is passed over, unless it still lasts at the start.
 */
export function comingFrom({ last, lastPossible }: Before, startMs: number): PathLeg | null {
  return last && (last.impossible === null || last.stopMs > startMs) ? last : lastPossible;
}

/**
 * One leg after another.
 *
 * @param previous  where the dish comes from; null at the session's start
 * @returns null if the context lacks the station or the source
 */
export function legOf(
  scan: Scan,
  member: ScanStation,
  context: PlanContext,
  previous: PathLeg | null,
): PathLeg | null {
  const station = context.stations[member.station];
  const source = context.sources[scan.sourceId];
  if (!station || !source) return null;
  const { startMs, stopMs } = stationOnMs(scan, member);
  const cached = cachedFor(scan, member, station, source, context);
  if (cached.leg && cached.previous !== undefined && isSameEnd(cached.previous, previous)) return cached.leg;
  const { sight } = cached;
  const way = wayTo(station, source, { startMs, stopMs }, sight, previous);
  const leg: PathLeg = {
    scanId: scan.id,
    sourceId: scan.sourceId,
    station: member.station,
    startMs,
    stopMs,
    startAzEl: sight.startAzEl,
    stopAzEl: sight.stopAzEl,
    minElevationDeg: sight.minElevationDeg,
    worst: sight.worst,
    outFromMs: sight.outFromMs,
    fromScanId: previous?.scanId ?? null,
    fromStopMs: previous?.stopMs ?? null,
    fromAzEl: previous?.stopAzEl ?? null,
    ...way,
  };
  cached.leg = leg;
  cached.previous = previous;
  return leg;
}

type Way = Pick<
  PathLeg,
  | 'motorStartDeg'
  | 'motorStopDeg'
  | 'slewSeconds'
  | 'gapSeconds'
  | 'spareSeconds'
  | 'azimuthMoveDeg'
  | 'arriveElevationDeg'
  | 'impossible'
  | 'isElevationOnly'
>;

function wayTo(
  station: PlanStation,
  source: PlanSource,
  on: { startMs: number; stopMs: number },
  sight: Sight,
  previous: PathLeg | null,
): Way {
  const gapSeconds = previous ? (on.startMs - previous.stopMs) / 1000 : null;
  const motion = motionTo(station.mount, sight.path, previous && heldAfter(station, previous));
  if ('impossible' in motion) return impossible(station, sight, previous, gapSeconds, motion);
  const way = { ...still(motion.motorDeg, sight), gapSeconds };
  if (!previous) return way;
  const seconds = staysOn(station, source, previous, on, motion.motorDeg) ? 0 : motion.seconds;
  const arrive = directionAt(station, source, on.startMs)(previous.stopMs + seconds * 1000);
  return {
    ...way,
    slewSeconds: seconds,
    spareSeconds: gapSeconds === null ? null : gapSeconds - seconds,
    azimuthMoveDeg: motion.motorDeg - previous.motorStopDeg,
    arriveElevationDeg: arrive.elevationDeg,
  };
}

function heldAfter({ mount, site }: PlanStation, { motorStopDeg, stopAzEl }: PathLeg): Held {
  return {
    motorDeg: motorStopDeg,
    secondDeg: axisAngles(mount.kind, site.latitudeDeg, stopAzEl).secondDeg,
  };
}

function still(motorDeg: number, sight: Sight): Way {
  return {
    motorStartDeg: motorDeg,
    motorStopDeg: motorDeg + sight.path.endTurnDeg,
    slewSeconds: null,
    gapSeconds: null,
    spareSeconds: null,
    azimuthMoveDeg: null,
    arriveElevationDeg: null,
    impossible: null,
    isElevationOnly: false,
  };
}

function impossible(
  station: PlanStation,
  sight: Sight,
  previous: PathLeg | null,
  gapSeconds: number | null,
  why: { impossible: string; limit: 'first' | 'second' },
): Way {
  const start = startPointing(station, sight.startAzEl);
  const motorDeg =
    'impossible' in start ? (previous?.motorStopDeg ?? middleOf(station)) : start.motorAzimuthDeg;
  return {
    ...still(motorDeg, sight),
    gapSeconds,
    impossible: why.impossible,
    isElevationOnly: why.limit === 'second' && station.mount.kind === 'az-el',
  };
}

/** Whether the dish follows one source through the gap and comes out on the turn it would slew to. */
function staysOn(
  station: PlanStation,
  source: PlanSource,
  previous: PathLeg,
  on: { startMs: number },
  reachedMotorDeg: number,
): boolean {
  if (previous.sourceId !== source.id) return false;
  if (on.startMs <= previous.stopMs) return on.startMs === previous.stopMs;
  const path = axisPath(station, trackNear(source, previous.stopMs), previous.stopMs, on.startMs);
  return (
    Math.abs(previous.motorStopDeg + path.endTurnDeg - reachedMotorDeg) < SAME_PLACE_DEG &&
    leavesSecondAt(path, secondAxis(station.mount)) === null &&
    leavesFirstAtMs(path, firstAxis(station.mount), previous.motorStopDeg) === null &&
    tooFastAtMs(path, firstAxis(station.mount).rateDegPerS) === null
  );
}

function middleOf(station: PlanStation): number {
  const { minDeg, maxDeg } = firstAxis(station.mount);
  return (minDeg + maxDeg) / 2;
}

type Cached = {
  station: PlanStation;
  source: PlanSource;
  lowestDeg: number;
  late: number;
  early: number;
  sight: Sight;
  leg?: PathLeg;
  previous?: PathLeg | null;
};

const cache = new WeakMap<Scan, Map<StationCode, Cached>>();

/** What was worked out for a scan at a station; a scan never changes, so only its surroundings are compared. */
function cachedFor(
  scan: Scan,
  member: ScanStation,
  station: PlanStation,
  source: PlanSource,
  { settings }: PlanContext,
): Cached {
  const ofScan = cache.get(scan) ?? new Map<StationCode, Cached>();
  cache.set(scan, ofScan);
  const { lateSeconds: late, earlySeconds: early } = member;
  const lowestDeg = settings.minElevationDeg;
  const known = ofScan.get(member.station);
  const isSame =
    known?.station === station &&
    known.source === source &&
    known.lowestDeg === lowestDeg &&
    known.late === late &&
    known.early === early;
  if (known && isSame) return known;
  const { startMs, stopMs } = stationOnMs(scan, member);
  const sight = sightOf(station, source, settings, startMs, stopMs);
  const made: Cached = { station, source, lowestDeg, late, early, sight };
  ofScan.set(member.station, made);
  return made;
}

/** Whether two legs leave the dish in the same place at the same time. */
function isSameEnd(a: PathLeg | null, b: PathLeg | null): boolean {
  if (a === b) return true;
  return (
    a !== null &&
    b !== null &&
    a.scanId === b.scanId &&
    a.sourceId === b.sourceId &&
    a.stopMs === b.stopMs &&
    a.motorStopDeg === b.motorStopDeg &&
    a.stopAzEl.azimuthDeg === b.stopAzEl.azimuthDeg &&
    a.stopAzEl.elevationDeg === b.stopAzEl.elevationDeg
  );
}
