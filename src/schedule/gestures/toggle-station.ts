import type { Command } from '../commands';
import type { Plan, ScanId, StationCode } from '../plan';
import { fetchScan } from './fetch-scan';

/**
 * A station taken out of a scan, or put in for the whole of it.
 *
 * @throws CommandRefused  gone
 */
export function toggleStation(plan: Plan, scanId: ScanId, station: StationCode): Command {
  const scan = fetchScan(plan, scanId);
  const isIn = scan.stations.some((member) => member.station === station);
  const stations = isIn
    ? scan.stations.filter((member) => member.station !== station)
    : [...scan.stations, { station, lateSeconds: 0, earlySeconds: 0 }].sort((a, b) =>
        a.station < b.station ? -1 : 1,
      );
  return {
    verb: isIn ? 'take-station-out' : 'put-station-in',
    edits: [{ kind: 'change-scan', scan: { ...scan, stations } }],
  };
}
