import type { Command } from '../commands';
import type { Plan, ScanId } from '../plan';
import { fetchScan } from './fetch-scan';

/**
 * A scan made longer or shorter at its end. A station that would have nothing left is left out.
 *
 * @param lengthSeconds  whole seconds, 1 or more
 * @throws CommandRefused  gone
 */
export function changeLength(plan: Plan, scanId: ScanId, lengthSeconds: number): Command {
  const scan = fetchScan(plan, scanId);
  const stations = scan.stations.filter(
    ({ lateSeconds, earlySeconds }) => lateSeconds + earlySeconds < lengthSeconds || lengthSeconds < 1,
  );
  const changed = { ...scan, lengthSeconds, stations };
  return { verb: 'change-length', edits: [{ kind: 'change-scan', scan: changed }] };
}
