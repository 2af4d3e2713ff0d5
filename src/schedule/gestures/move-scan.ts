import type { Command } from '../commands';
import type { Plan, ScanId, StationCode } from '../plan';
import { fetchScan } from './fetch-scan';

/**
 * A scan moved to another start; a leg takes its whole nodding group along.
 *
 * @param startMs   the scan's new start, on a whole second
 * @param stations  who takes part from now on; those who did keep their late and early; without it nobody changes
 * @throws CommandRefused  gone
 */
export function moveScan(
  plan: Plan,
  scanId: ScanId,
  startMs: number,
  stations?: readonly StationCode[],
): Command {
  const scan = fetchScan(plan, scanId);
  const byMs = startMs - scan.startMs;
  const moved = scan.groupId === null ? [scan] : plan.scans.filter(({ groupId }) => groupId === scan.groupId);
  return {
    verb: 'move-scan',
    edits: moved.map((one) => {
      const members = stations?.map(
        (station) =>
          one.stations.find((member) => member.station === station) ?? {
            station,
            lateSeconds: 0,
            earlySeconds: 0,
          },
      );
      const changed = { ...one, startMs: one.startMs + byMs, stations: members ?? one.stations };
      return { kind: 'change-scan' as const, scan: changed };
    }),
  };
}
