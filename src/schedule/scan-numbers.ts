import { compareScans, type GroupId, type Plan, type ScanId } from './plan';

/**
 * Numbers of a draft's scans, by start from 1. A nodding group counts once, where its first leg starts; its legs are
 * numbered by start after a point.
 *
 * @returns "16", or "11.1", "11.2" for legs
 */
export function scanNumbers(plan: Pick<Plan, 'scans'>): Map<ScanId, string> {
  const numbers = new Map<ScanId, string>();
  const groups = new Map<GroupId, { rank: number; legs: number }>();
  let rank = 0;
  for (const scan of [...plan.scans].sort(compareScans)) {
    if (scan.groupId === null) {
      rank += 1;
      numbers.set(scan.id, String(rank));
      continue;
    }
    const group = groups.get(scan.groupId) ?? { rank: (rank += 1), legs: 0 };
    group.legs += 1;
    groups.set(scan.groupId, group);
    numbers.set(scan.id, `${group.rank}.${group.legs}`);
  }
  return numbers;
}
