import type { Command } from '../commands';
import type { Plan, Scan, ScanId } from '../plan';
import { fetchScan } from './fetch-scan';

/**
 * A scan with some of its fields replaced, as a form gives them.
 *
 * @param changes  only what is to change; the rest is kept
 * @throws CommandRefused  gone
 */
export function editScan(plan: Plan, scanId: ScanId, changes: Partial<Omit<Scan, 'id'>>): Command {
  const scan = fetchScan(plan, scanId);
  return { verb: 'edit-scan', edits: [{ kind: 'change-scan', scan: { ...scan, ...changes } }] };
}
