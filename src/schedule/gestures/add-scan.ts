import type { Command } from '../commands';
import type { PlanContext } from '../context';
import { judgePlacement } from '../feasibility';
import { stationPaths } from '../paths';
import type { Plan, ScanId, ScanStation, StationCode } from '../plan';

/**
 * A new scan.
 *
 * @param args  id = new, made by the caller; startMs on a whole second; without stations: those that see the source
 *              for the whole scan and are free
 * @returns stations by code; a code alone takes part for the whole scan
 */
export function addScan(
  plan: Plan,
  context: PlanContext,
  args: {
    id: ScanId;
    sourceId: string;
    modeId: string;
    startMs: number;
    lengthSeconds: number;
    stations?: readonly (StationCode | ScanStation)[];
  },
): Command {
  const { stations, ...given } = args;
  const taking =
    stations ??
    judgePlacement(
      plan,
      context,
      { ignoreScanId: null, stations: 'all-up', ...given },
      stationPaths(plan, context),
    ).stations;
  const members = taking
    .map((one) => (typeof one === 'string' ? { station: one, lateSeconds: 0, earlySeconds: 0 } : one))
    .sort((a, b) => (a.station < b.station ? -1 : 1));
  const scan = { ...given, stations: members, groupId: null, leg: null, comment: '' };
  return { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
}
