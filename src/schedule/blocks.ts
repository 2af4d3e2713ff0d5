import { compareScans, scanStopMs, type GroupId, type Plan, type Scan, type StationCode } from './plan';

/** What counts as one on a sheet: a scan, or a nodding group with its legs by start. */
export type Block = {
  /** of the first leg of a group */
  id: string;
  groupId: GroupId | null;
  legs: readonly [Scan, ...Scan[]];
  startMs: number;
  stopMs: number;
};

/** The blocks of a plan, by start of their first scan. */
export function blocksOf(plan: Pick<Plan, 'scans'>): Block[] {
  const blocks: Block[] = [];
  const groups = new Map<GroupId, number>();
  for (const scan of [...plan.scans].sort(compareScans)) {
    const at = scan.groupId === null ? undefined : groups.get(scan.groupId);
    const block = at === undefined ? undefined : blocks[at];
    if (at !== undefined && block) {
      const stopMs = Math.max(block.stopMs, scanStopMs(scan));
      blocks[at] = { ...block, legs: [...block.legs, scan], stopMs };
      continue;
    }
    if (scan.groupId !== null) groups.set(scan.groupId, blocks.length);
    const { id, groupId, startMs } = scan;
    blocks.push({ id, groupId, legs: [scan], startMs, stopMs: scanStopMs(scan) });
  }
  return blocks;
}

/** How many scans a plan has, a nodding group as one; of one station, those that it takes part in. */
export const countBlocks = (plan: Pick<Plan, 'scans'>, station?: StationCode): number =>
  blocksOf(plan).filter(
    ({ legs }) =>
      station === undefined || legs.some((leg) => leg.stations.some((member) => member.station === station)),
  ).length;
