import { stationOnMs, type Plan, type StationCode } from './plan';

/** Before the first start and after the last stop; common practice, no source. */
export const LEAD_SECONDS = 15 * 60;
export const TAIL_SECONDS = 10 * 60;

/** Hours [startMs, endMs). */
export type Hours = readonly [startMs: number, endMs: number];

/** What a plan asks of a station. */
export type Slot = { station: StationCode; startMs: number; endMs: number; modeIds: readonly string[] };

export type Reply = {
  reply: 'confirmed' | 'partly' | 'declined';
  /** the hours the station can; none where it declined */
  hours: readonly Hours[];
  /** the slot it answered */
  asked: Pick<Slot, 'startMs' | 'endMs' | 'modeIds'>;
};

export type Answer = 'open' | 'confirmed' | 'partly' | 'declined' | 'stale';

/**
 * The slots of a plan: first start less lead to last stop plus tail, of each station that takes part in a scan.
 *
 * @returns in the order of the plan's stations; the modes sorted
 */
export function slotsOf(plan: Plan): Slot[] {
  return plan.stations.flatMap((station) => {
    const spans = plan.scans.flatMap((scan) => {
      const member = scan.stations.find((one) => one.station === station);
      return member ? [{ ...stationOnMs(scan, member), modeId: scan.modeId }] : [];
    });
    if (spans.length === 0) return [];
    return [
      {
        station,
        startMs: Math.min(...spans.map(({ startMs }) => startMs)) - LEAD_SECONDS * 1000,
        endMs: Math.max(...spans.map(({ stopMs }) => stopMs)) + TAIL_SECONDS * 1000,
        modeIds: [...new Set(spans.map(({ modeId }) => modeId))].sort(),
      },
    ];
  });
}

/**
 * How a station's word stands to what is asked now.
 *
 * @returns stale where the slot leaves the hours that were confirmed (of a partial answer, the slot that was answered) or
 *          its modes are others; a station that declined has declined, whatever moved
 */
export function answerTo(slot: Pick<Slot, 'startMs' | 'endMs' | 'modeIds'>, reply: Reply | null): Answer {
  if (reply === null) return 'open';
  if (reply.reply === 'declined') return 'declined';
  const { asked } = reply;
  const isOtherMode =
    slot.modeIds.length !== asked.modeIds.length || slot.modeIds.some((id) => !asked.modeIds.includes(id));
  const leaves = slot.startMs < asked.startMs || slot.endMs > asked.endMs;
  return isOtherMode || leaves ? 'stale' : reply.reply;
}

/**
 * The hours of a slot that a station cannot: the whole of it where it declined, else what its hours leave.
 *
 * @returns sorted, disjoint; none where it did not answer
 */
export function hoursWithout(span: Hours, reply: Pick<Reply, 'hours'> | null): Hours[] {
  if (reply === null) return [];
  const gaps: Hours[] = [];
  let fromMs = span[0];
  for (const [startMs, endMs] of [...reply.hours].sort((a, b) => a[0] - b[0])) {
    if (startMs > fromMs) gaps.push([fromMs, Math.min(startMs, span[1])]);
    fromMs = Math.max(fromMs, endMs);
  }
  if (fromMs < span[1]) gaps.push([fromMs, span[1]]);
  return gaps.filter(([startMs, endMs]) => endMs > startMs);
}

/** The part of some hours that lies in a span; none is empty. */
export function within([startMs, endMs]: Hours, hours: readonly Hours[]): Hours[] {
  return hours
    .map(([from, until]): Hours => [Math.max(from, startMs), Math.min(until, endMs)])
    .filter(([from, until]) => until > from);
}

/** What it costs that a station is away: its scans that are hit, whole or in part. */
export function scansHit(plan: Pick<Plan, 'scans'>, station: StationCode, away: readonly Hours[]) {
  return plan.scans.flatMap((scan) => {
    const member = scan.stations.find((one) => one.station === station);
    if (!member) return [];
    const { startMs, stopMs } = stationOnMs(scan, member);
    const hit = away.filter(([from, until]) => from < stopMs && until > startMs);
    if (hit.length === 0) return [];
    const isWhole = hit.some(([from, until]) => from <= startMs && until >= stopMs);
    return [{ scan, isWhole }];
  });
}
