import { CommandRefused } from '../commands';
import type { Plan, Scan, ScanId } from '../plan';

/**
 * A scan of the plan by its id.
 *
 * @throws CommandRefused  gone, with a sentence
 */
export function fetchScan(plan: Plan, scanId: ScanId): Scan {
  const scan = plan.scans.find(({ id }) => id === scanId);
  if (scan) return scan;
  throw new CommandRefused('gone', scanId, 'This scan is no longer in the plan. It was removed.');
}
