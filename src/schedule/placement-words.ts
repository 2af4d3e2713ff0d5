import type { Problem } from './checks';
import type { PathLeg } from './paths';
import type { Plan, ScanId, StationCode } from './plan';
import { scanNumbers } from './scan-numbers';
import { lengthText, listText } from './words';

/**
 * Why a station cannot follow a source, to go on after its code.
 *
 * @returns "below the horizon", "source at 3°", "below the mask", "source at 89°, too high"; null if it can
 */
export function sightWhy(leg: Pick<PathLeg, 'worst' | 'outFromMs'>): string | null {
  if (leg.outFromMs === null) return null;
  const { elevationDeg, side } = leg.worst;
  if (elevationDeg < 0) return 'below the horizon';
  if (side === 'mask') return 'below the mask';
  const degrees = `source at ${Math.floor(elevationDeg)}°`;
  return side === 'high' ? `${degrees}, too high` : degrees;
}

/**
 * The one reason that is told for a placement that does not fit, or fits with a note.
 *
 * @returns a sentence without its point
 */
export function placementReason(
  judged: {
    problems: readonly Problem[];
    stations: readonly StationCode[];
    cannot: readonly { station: StationCode; why: string }[];
    scanId: ScanId;
    verdict: 'note' | 'no';
  },
  plan: Plan,
): string {
  const { problems, stations, cannot, scanId, verdict } = judged;
  const outside = problems.find(({ kind }) => kind === 'outside');
  if (outside) return shortly(outside, scanId, plan);
  const first = problems[0];
  if (first && (first.severity === 'fix' || verdict === 'note')) return shortly(first, scanId, plan);
  if (stations.length === 0) return 'No station can watch';
  const blocked = cannot[0];
  if (verdict === 'no' && blocked) return `${blocked.station} cannot: ${blocked.why}`;
  return `Only ${listText(stations)} can watch, so there is no baseline`;
}

function shortly(problem: Problem, scanId: ScanId, plan: Plan): string {
  const who = problem.station ?? 'The scan';
  const numbers = scanNumbers(plan);
  const goal = problem.scanId === scanId ? '' : ` at scan ${numbers.get(problem.scanId) ?? problem.scanId}`;
  switch (problem.kind) {
    case 'outside':
      return problem.values.beforeSeconds > 0
        ? `It starts ${lengthText(problem.values.beforeSeconds)} before the session`
        : `It ends ${lengthText(problem.values.afterSeconds)} after the session`;
    case 'overlap': {
      const other = problem.scanId === scanId ? problem.values.otherScanId : problem.scanId;
      return `${who} is busy with scan ${numbers.get(other) ?? other}`;
    }
    case 'limit': {
      const { marginDeg, side } = problem.values;
      const limit = side === 'mask' ? 'the mask' : 'its limit';
      if (problem.severity === 'note') return `${who} is ${marginDeg.toFixed(1)}° above ${limit}`;
      return `${who} is ${side === 'high' ? 'above' : 'below'} ${limit}`;
    }
    case 'slew': {
      const { impossible, spareSeconds } = problem.values;
      if (impossible !== null) return `${who} ${impossible}${goal}`;
      if (problem.severity === 'fix')
        return `${who} arrives ${lengthText(Math.ceil(-(spareSeconds ?? 0)))} late${goal}`;
      return `${who} has only ${Math.floor(spareSeconds ?? 0)} s spare${goal}`;
    }
    case 'away':
      return `${who} is away: ${problem.values.why}`;
    case 'clock':
      return `${who} has no recent clock reading`;
    case 'second':
      return problem.values.off === null
        ? `${who} has not checked its second`
        : `${who} has its second off by ${problem.values.off} s`;
  }
}
