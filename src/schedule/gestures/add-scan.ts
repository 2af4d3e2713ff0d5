import type { Command } from '../commands';
import type { PlanContext } from '../context';
import { judgePlacement } from '../feasibility';
import { stationPaths } from '../paths';
import type { Plan, ScanId, StationCode } from '../plan';

/**
 * A new scan.
 *
 * @param args  id = new, made by the caller; startMs on a whole second; without stations: those that see the source
 *              for the whole scan and are free
 * @returns stations by code, for the whole scan
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
    stations?: readonly StationCode[];
  },
): Command {
  const { stations, ...given } = args;
  const codes =
    stations ??
    judgePlacement(
      plan,
      context,
      { ignoreScanId: null, stations: 'all-up', ...given },
      stationPaths(plan, context),
    ).stations;
  const members = [...codes].sort().map((station) => ({ station, lateSeconds: 0, earlySeconds: 0 }));
  const scan = { ...given, stations: members, groupId: null, leg: null, comment: '' };
  return { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
}
