import type { Interval } from '../units/time';
import type { PlanContext, PlanSource } from './context';
import { neighboursOf, placedScan, type Placement } from './feasibility';
import { legOf, type StationPaths } from './paths';
import { scanStopMs, type Plan, type ScanStation, type StationCode } from './plan';
import { upWithin } from './sight';

export type SnapKind = 'slew-end' | 'next-start' | 'rise' | 'set' | 'grid';

/** A start that suits; station = the one that sets it, null for the grid. */
export type SnapCandidate = { kind: SnapKind; startMs: number; station: StationCode | null };

const TEN_SECONDS = 10_000;
/** A source moves so little in a slew that three rounds settle its length to a millisecond. */
const ROUNDS = 3;

/**
 * Starts near which a dragged scan is pulled, the strongest kind first: end of the slowest slew and start of the next
 * scan less slew less length, both with the least spare time kept and rounded to 10 s to the safe side; rise and set
 * at a station; the grid.
 *
 * @param placement    startMs = where it is held, any millisecond
 * @param gridSeconds  null for no grid
 * @returns in order of kind; all risings and settings of the session, whatever their distance
 *
 * Error   slews as `legOf`; risings and settings as `visibilityWindows`
 */
export function snapCandidates(
  plan: Plan,
  context: PlanContext,
  placement: Placement,
  paths: StationPaths,
  gridSeconds: number | null,
): SnapCandidate[] {
  const held = { ...placement, startMs: Math.round(placement.startMs / 1000) * 1000 };
  const members = placedScan(plan, held).stations.filter((member) => isTaking(member, held, plan, context));
  const candidates = [
    slewEnd(members, held, plan, context, paths),
    nextStart(members, held, plan, context, paths),
  ].filter((candidate) => candidate !== null);
  candidates.push(...risings(members, held, plan, context));
  if (gridSeconds !== null) {
    const gridMs = gridSeconds * 1000;
    candidates.push({
      kind: 'grid',
      startMs: Math.round(placement.startMs / gridMs) * gridMs,
      station: null,
    });
  }
  return candidates;
}

/**
 * The start to take for a scan held at an instant.
 *
 * @param candidates  by strength of kind
 * @param radiusMs    how far a candidate pulls; the grid pulls from anywhere
 * @returns the nearest of the strongest kind in reach; null if none: take the whole second
 */
export function snapStart(
  heldMs: number,
  candidates: readonly SnapCandidate[],
  radiusMs: number,
): SnapCandidate | null {
  const away = (candidate: SnapCandidate) => Math.abs(candidate.startMs - heldMs);
  const inReach = candidates.filter((one) => one.kind === 'grid' || away(one) <= radiusMs);
  return inReach.reduce<SnapCandidate | null>((best, one) => {
    if (!best || strength(one) < strength(best)) return one;
    return strength(one) === strength(best) && away(one) < away(best) ? one : best;
  }, null);
}

function strength({ kind }: SnapCandidate): number {
  return { 'slew-end': 0, 'next-start': 1, rise: 2, set: 2, grid: 3 }[kind];
}

/** With 'all-up' a station counts if it sees the whole scan from where it is held. */
function isTaking(member: ScanStation, held: Placement, plan: Plan, context: PlanContext): boolean {
  if (held.stations !== 'all-up') return true;
  const leg = legOf(placedScan(plan, held), member, context, null);
  return leg !== null && leg.outFromMs === null;
}

/** A start that no longer moves when its slew is worked out from it; as it is where there is no slew. */
function settled(firstMs: number, better: (startMs: number) => number | null): number {
  let startMs = firstMs;
  for (let round = 0; round < ROUNDS; round += 1) startMs = better(startMs) ?? startMs;
  return startMs;
}

function slewEnd(
  members: readonly ScanStation[],
  held: Placement,
  plan: Plan,
  context: PlanContext,
  paths: StationPaths,
): SnapCandidate | null {
  const leastMs = context.settings.leastSpareSeconds * 1000;
  let slowest: SnapCandidate | null = null;
  for (const member of members) {
    const { previous } = neighboursOf(paths.get(member.station) ?? [], held.ignoreScanId, held.startMs);
    if (!previous) continue;
    const startMs = settled(previous.stopMs + leastMs, (fromMs) => {
      const leg = legOf(placedScan(plan, { ...held, startMs: fromMs }), member, context, previous);
      if (!leg || leg.slewSeconds === null) return null;
      const readyMs = previous.stopMs + leg.slewSeconds * 1000 + leastMs - member.lateSeconds * 1000;
      return Math.ceil(readyMs / TEN_SECONDS) * TEN_SECONDS;
    });
    if (!slowest || startMs > slowest.startMs)
      slowest = { kind: 'slew-end', startMs, station: member.station };
  }
  return slowest;
}

function nextStart(
  members: readonly ScanStation[],
  held: Placement,
  plan: Plan,
  context: PlanContext,
  paths: StationPaths,
): SnapCandidate | null {
  const leastMs = context.settings.leastSpareSeconds * 1000;
  let earliest: SnapCandidate | null = null;
  for (const member of members) {
    const { next } = neighboursOf(paths.get(member.station) ?? [], held.ignoreScanId, held.startMs);
    const scan = next && plan.scans.find(({ id }) => id === next.scanId);
    const nextMember = scan?.stations.find(({ station }) => station === member.station);
    if (!next || !scan || !nextMember) continue;
    const startMs = settled(next.startMs - leastMs - held.lengthSeconds * 1000, (fromMs) => {
      const leg = legOf(placedScan(plan, { ...held, startMs: fromMs }), member, context, null);
      const after = leg && legOf(scan, nextMember, context, leg);
      if (!after || after.slewSeconds === null) return null;
      const leaveMs = next.startMs - after.slewSeconds * 1000 - leastMs + member.earlySeconds * 1000;
      return Math.floor((leaveMs - held.lengthSeconds * 1000) / TEN_SECONDS) * TEN_SECONDS;
    });
    if (!earliest || startMs < earliest.startMs) {
      earliest = { kind: 'next-start', startMs, station: member.station };
    }
  }
  return earliest;
}

function risings(
  members: readonly ScanStation[],
  held: Placement,
  plan: Plan,
  context: PlanContext,
): SnapCandidate[] {
  const source = context.sources[held.sourceId];
  if (!source) return [];
  const codes = held.stations === 'all-up' ? plan.stations : members.map(({ station }) => station);
  const [firstMs, lastMs] = [plan.span.startMs, scanStopMs(plan.span)];
  return codes.flatMap((station) =>
    sessionWindows(station, source, plan, context).flatMap(({ start, end }): SnapCandidate[] => {
      const [riseMs, setMs] = [start.getTime(), end.getTime()];
      const rise = { kind: 'rise' as const, startMs: Math.ceil(riseMs / TEN_SECONDS) * TEN_SECONDS, station };
      const lastStartMs = setMs - held.lengthSeconds * 1000;
      const set = {
        kind: 'set' as const,
        startMs: Math.floor(lastStartMs / TEN_SECONDS) * TEN_SECONDS,
        station,
      };
      return [...(riseMs > firstMs ? [rise] : []), ...(setMs < lastMs ? [set] : [])];
    }),
  );
}

const windows = new WeakMap<PlanSource, Map<string, Interval[]>>();

/** A drag asks for the same windows at every frame. */
function sessionWindows(code: StationCode, source: PlanSource, plan: Plan, context: PlanContext): Interval[] {
  const station = context.stations[code];
  if (!station) return [];
  const ofSource = windows.get(source) ?? new Map<string, Interval[]>();
  windows.set(source, ofSource);
  const { startMs } = plan.span;
  const key = JSON.stringify([station, context.settings.minElevationDeg, plan.span]);
  const known = ofSource.get(key);
  if (known) return known;
  const made = upWithin(station, source, context.settings, startMs, scanStopMs(plan.span));
  ofSource.set(key, made);
  return made;
}
