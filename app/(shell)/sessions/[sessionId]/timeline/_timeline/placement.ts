import { useStore } from 'zustand';
import { staveOrder } from '@/app/_ui/stave-order';
import { isExpected, scanOutlook } from '@/src/outlook/fringe-outlook';
import type { PlanContext } from '@/src/schedule/context';
import { judgePlacement, neighboursOf, placedScan, type Placement } from '@/src/schedule/feasibility';
import { legOf, stationPaths, type PathLeg } from '@/src/schedule/paths';
import type { Plan, StationCode } from '@/src/schedule/plan';
import { snapCandidates, snapStart, type SnapCandidate, type SnapKind } from '@/src/schedule/snap';
import { msPerPx, type Frame } from './scale';
import type { Placing, TimelineState } from './state';
import { useTimelineStore } from './store';

/** What is held, judged: all that ghost, read-out and live sentence say. */
export type Judged = {
  placing: Placing;
  sourceName: string;
  can: readonly StationCode[];
  cannot: readonly { station: StationCode; why: string }[];
  ways: readonly { leg: PathLeg; from: { stopMs: number; elevationDeg: number } | null }[];
  expected: number;
  possible: number;
  tightest: { station: StationCode; spareSeconds: number } | null;
  verdict: 'fits' | 'note' | 'no';
  /** a sentence with its point; empty if it fits */
  reason: string;
};

const SNAP_RADIUS_PX = 8;
/** By keys the next start that fits may be farther away than a pointer's pull. */
const KEY_RADIUS_MS = 3_600_000;
const TEN_SECONDS = 10_000;

export function judge(placing: Placing, plan: Plan, context: PlanContext): Judged {
  const paths = stationPaths(plan, context);
  const judgement = judgePlacement(plan, context, asPlacement(placing), paths);
  const scan = placedScan(plan, { ...asPlacement(placing), stations: judgement.stations });
  const cells = scanOutlook(scan, plan, context);
  const ways = scan.stations.flatMap((member) => {
    const atMs = placing.startMs + member.lateSeconds * 1000;
    const { previous } = neighboursOf(
      paths.get(member.station) ?? [],
      asPlacement(placing).ignoreScanId,
      atMs,
    );
    const leg = legOf(scan, member, context, previous);
    const from = previous && { stopMs: previous.stopMs, elevationDeg: previous.stopAzEl.elevationDeg };
    return leg ? [{ leg, from }] : [];
  });
  return {
    placing,
    sourceName: context.sources[placing.sourceId]?.name ?? '',
    can: inStaveOrder(judgement.stations, (code) => code, context),
    cannot: inStaveOrder(judgement.cannot, ({ station }) => station, context),
    ways,
    expected: cells.filter(isExpected).length,
    possible: cells.filter(({ verdict }) => verdict !== 'not-on').length,
    tightest: judgement.tightest,
    verdict: judgement.verdict,
    reason: judgement.reason === '' ? '' : `${judgement.reason}.`,
  };
}

/** West to east, as the staves stand. */
function inStaveOrder<T>(items: readonly T[], codeOf: (item: T) => StationCode, context: PlanContext): T[] {
  const order = staveOrder(Object.values(context.stations)).map(({ code }) => code);
  return [...items].sort((a, b) => order.indexOf(codeOf(a)) - order.indexOf(codeOf(b)));
}

/** The judgement of what is held now, or null. */
export function useJudgement(): Judged | null {
  const store = useTimelineStore();
  const placing = useStore(store, (state) => state.placing);
  const plan = useStore(store, (state) => state.plan);
  const context = useStore(store, (state) => state.context);
  return placing && judge(placing, plan, context);
}

/** A held scan pulled to the end of the slowest slew, the next scan, rise or set, or the grid. */
export function snapped(state: TimelineState, frame: Frame, isFree: boolean, placing: Placing): Placing {
  const whole = { ...placing, startMs: Math.round(placing.startMs / 1000) * 1000, snappedTo: null };
  if (isFree || state.snap === 'off') return whole;
  const gridMs = frame.level.gridMs;
  if (state.snap === 'grid') return { ...whole, startMs: Math.round(placing.startMs / gridMs) * gridMs };
  const candidates = candidatesFor(state, placing, gridMs / 1000);
  const best = snapStart(placing.startMs, candidates, SNAP_RADIUS_PX * msPerPx(frame));
  return best ? { ...whole, startMs: best.startMs, snappedTo: wordsOf(best) } : whole;
}

/** The stop pulled to the grid; never shorter than a second. */
export function snappedLength(
  state: TimelineState,
  frame: Frame,
  isFree: boolean,
  placing: Placing,
  stopMs: number,
): Placing {
  const gridMs = isFree || state.snap === 'off' ? 1000 : frame.level.gridMs;
  const rounded = Math.round(stopMs / gridMs) * gridMs;
  return { ...placing, lengthSeconds: Math.max(1, (rounded - placing.startMs) / 1000) };
}

/** A new scan by keys begins where it fits, if that is near: at the end of the slowest slew. */
export function firstFitting(state: TimelineState, placing: Placing): Placing {
  const candidates = candidatesFor(state, placing, null).filter(({ kind }) => kind === 'slew-end');
  const best = snapStart(placing.startMs, candidates, KEY_RADIUS_MS);
  if (!best || best.startMs < placing.startMs) return placing;
  return { ...placing, startMs: best.startMs, snappedTo: wordsOf(best) };
}

/** The next snap in a direction; where there is none, ten seconds on. */
export function nextSnap(state: TimelineState, placing: Placing, direction: 1 | -1): Placing {
  if (placing.what === 'length') {
    return { ...placing, lengthSeconds: Math.max(1, placing.lengthSeconds + direction * 60) };
  }
  const ahead = candidatesFor(state, placing, null)
    .filter(({ startMs }) => (startMs - placing.startMs) * direction > 0)
    .sort((a, b) => (a.startMs - b.startMs) * direction);
  const [best] = ahead;
  if (!best) return { ...placing, startMs: placing.startMs + direction * TEN_SECONDS, snappedTo: null };
  return { ...placing, startMs: best.startMs, snappedTo: wordsOf(best) };
}

function candidatesFor(
  { plan, context }: TimelineState,
  placing: Placing,
  gridSeconds: number | null,
): SnapCandidate[] {
  return snapCandidates(plan, context, asPlacement(placing), stationPaths(plan, context), gridSeconds);
}

/** A moved scan keeps who joins late and leaves early. */
function asPlacement(placing: Placing): Placement {
  const { scanId, isCopy, sourceId, modeId, startMs, lengthSeconds, stations } = placing;
  return { ignoreScanId: isCopy ? null : scanId, sourceId, modeId, startMs, lengthSeconds, stations };
}

const SNAP_WORDS: Readonly<Record<Exclude<SnapKind, 'grid'>, (station: StationCode) => string>> = {
  'slew-end': (station) => `the end of the ${station} slew`,
  'next-start': (station) => `the next scan of ${station}`,
  rise: (station) => `the rise at ${station}`,
  set: (station) => `the set at ${station}`,
};

function wordsOf({ kind, station }: SnapCandidate): string | null {
  return kind === 'grid' || station === null ? null : SNAP_WORDS[kind](station);
}
