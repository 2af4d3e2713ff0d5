import type { Command } from '../commands';
import type { Plan, ScanId } from '../plan';
import { fetchScan } from './fetch-scan';

/**
 * A scan removed; the last leg takes its nodding group along.
 *
 * @throws CommandRefused  gone
 */
export function removeScan(plan: Plan, scanId: ScanId): Command {
  const { groupId } = fetchScan(plan, scanId);
  const isLastLeg =
    groupId !== null && !plan.scans.some((scan) => scan.id !== scanId && scan.groupId === groupId);
  return {
    verb: 'remove-scan',
    edits: [
      { kind: 'remove-scan', scanId },
      ...(isLastLeg ? [{ kind: 'remove-group' as const, groupId }] : []),
    ],
  };
}
