import type { AwayValues, Problem } from './checks';
import type { Command } from './commands';
import type { PlanContext } from './context';
import { moveScan } from './gestures/move-scan';
import { removeScan } from './gestures/remove-scan';
import { toggleStation } from './gestures/toggle-station';
import { legOf, stationPaths, type PathLeg } from './paths';
import { scanStopMs, type Plan, type Scan, type ScanStation, type StationCode } from './plan';
import { scanNumbers } from './scan-numbers';
import { upWithin } from './sight';
import { clockText, shortLengthText } from './words';

/** A button that says its result, and what it does. */
export type Mend = { label: string; command: Command };

const TEN_SECONDS = 10_000;
const MINUTE = 60_000;
/** Part of the scan that may be given up to join on a whole minute rather than on 10 s. */
const ROUNDING_SHARE = 0.1;

/**
 * What would mend a problem, the best first. After the command the problem is gone; one below a limit may stay as a
 * note, because the edge of a window is near its limit.
 *
 * @param plan  the plan in which the problem was found
 * @returns at least one, but none for a clock and its second: they are looked after at the station
 */
export function problemMends(problem: Problem, plan: Plan, context: PlanContext): Mend[] {
  const scan = plan.scans.find(({ id }) => id === problem.scanId);
  if (!scan) return [];
  const numberOf = (id: string) => scanNumbers(plan).get(id) ?? id;
  if (problem.kind === 'clock' || problem.kind === 'second') return [];
  if (problem.kind === 'outside') return insideMends(scan, plan, numberOf(scan.id));
  const { station } = problem;
  const leg = station === null ? undefined : stationPaths(plan, context).get(station)?.find(isOf(scan));
  if (station === null || !leg) return [];
  const leaveOut = { label: `Leave ${station} out`, command: toggleStation(plan, scan.id, station) };
  switch (problem.kind) {
    case 'overlap': {
      const other = problem.values.otherScanId;
      return [
        { ...leaveOut, label: `Leave ${station} out of scan ${numberOf(scan.id)}` },
        {
          label: `Leave ${station} out of scan ${numberOf(other)}`,
          command: toggleStation(plan, other, station),
        },
      ];
    }
    case 'slew':
      return [...joinLater(scan, leg, plan, context), leaveOut];
    case 'away':
      return problem.values.hits.length > 1
        ? [leaveOutOfAll(station, problem.values, plan)]
        : [...withoutAway(scan, leg, problem.values), leaveOut];
    case 'limit':
      return [...(problem.severity === 'fix' ? withinWindow(scan, leg, context) : []), leaveOut];
  }
}

function isOf(scan: Scan): (leg: PathLeg) => boolean {
  return ({ scanId }) => scanId === scan.id;
}

/** The station joins once its dish has arrived and the least spare time has passed. */
function joinLater(scan: Scan, leg: PathLeg, plan: Plan, context: PlanContext): Mend[] {
  if (leg.spareSeconds === null) return [];
  const member = memberOf(scan, leg.station);
  const previous = stationPaths(plan, context)
    .get(leg.station)
    ?.find(({ scanId }) => scanId === leg.fromScanId);
  if (!member || !previous) return [];
  const leastSpare = context.settings.leastSpareSeconds;
  const fits = (startMs: number) => {
    const tried = legOf(scan, { ...member, lateSeconds: (startMs - scan.startMs) / 1000 }, context, previous);
    return tried !== null && tried.spareSeconds !== null && tried.spareSeconds >= leastSpare;
  };
  const firstMs = leg.startMs + (leastSpare - leg.spareSeconds) * 1000;
  for (let ms = roundUp(firstMs, TEN_SECONDS); ms < leg.stopMs; ms += TEN_SECONDS) {
    if (!fits(ms)) continue;
    const onMinute = roundUp(ms, MINUTE);
    const isCheap = onMinute - ms <= ROUNDING_SHARE * scan.lengthSeconds * 1000;
    const startMs = isCheap && onMinute < leg.stopMs && fits(onMinute) ? onMinute : ms;
    return [timesMend(scan, member, startMs, leg.stopMs)];
  }
  return [];
}

/** The station takes the longest part of the scan that it can see. */
function withinWindow(scan: Scan, leg: PathLeg, context: PlanContext): Mend[] {
  const member = memberOf(scan, leg.station);
  const station = context.stations[leg.station];
  const source = context.sources[scan.sourceId];
  if (!member || !station || !source) return [];
  const windows = upWithin(station, source, context.settings, leg.startMs, leg.stopMs);
  const parts = windows
    .map(({ start, end }) => {
      const startMs = start.getTime() <= leg.startMs ? leg.startMs : roundUp(start.getTime(), TEN_SECONDS);
      const isToEnd = end.getTime() >= leg.stopMs;
      const stopMs = isToEnd ? leg.stopMs : Math.floor(end.getTime() / TEN_SECONDS) * TEN_SECONDS;
      return { startMs, stopMs };
    })
    .filter(({ startMs, stopMs }) => stopMs > startMs)
    .sort((a, b) => b.stopMs - b.startMs - (a.stopMs - a.startMs));
  const longest = parts[0];
  const isAll = longest?.startMs === leg.startMs && longest.stopMs === leg.stopMs;
  return longest && !isAll ? [timesMend(scan, member, longest.startMs, longest.stopMs)] : [];
}

/** The station takes the longer part of the scan in which it is there. */
function withoutAway(scan: Scan, leg: PathLeg, { fromMs, untilMs }: AwayValues): Mend[] {
  const member = memberOf(scan, leg.station);
  const parts = [
    [leg.startMs, Math.floor(fromMs / TEN_SECONDS) * TEN_SECONDS],
    [roundUp(untilMs, TEN_SECONDS), leg.stopMs],
  ] as const;
  const [startMs, stopMs] = parts[1][1] - parts[1][0] > parts[0][1] - parts[0][0] ? parts[1] : parts[0];
  return member && stopMs > startMs ? [timesMend(scan, member, startMs, stopMs)] : [];
}

/** The station is left out of every scan that lies in its hours away, whole or in part. */
function leaveOutOfAll(station: StationCode, { hits }: AwayValues, plan: Plan): Mend {
  const edits = hits.flatMap(({ scanId }) => toggleStation(plan, scanId, station).edits);
  return {
    label: `Leave ${station} out of ${hits.length} scans`,
    command: { verb: 'take-station-out', edits },
  };
}

function timesMend(scan: Scan, member: ScanStation, startMs: number, stopMs: number): Mend {
  const { station } = member;
  const lateSeconds = (startMs - scan.startMs) / 1000;
  const earlySeconds = (scanStopMs(scan) - stopMs) / 1000;
  const joins = `${station} joins at ${clockText(startMs)}, ${shortLengthText(lateSeconds)} late`;
  const leaves = `${station} leaves at ${clockText(stopMs)}, ${shortLengthText(earlySeconds)} early`;
  const both = `${station} watches from ${clockText(startMs)} to ${clockText(stopMs)}`;
  const isLater = lateSeconds > member.lateSeconds;
  const isEarlier = earlySeconds > member.earlySeconds;
  const stations = scan.stations.map((one) =>
    one.station === station ? { station, lateSeconds, earlySeconds } : one,
  );
  return {
    label: isLater && isEarlier ? both : isLater ? joins : leaves,
    command: {
      verb: 'change-station-times',
      edits: [{ kind: 'change-scan', scan: { ...scan, stations } }],
    },
  };
}

function insideMends(scan: Scan, plan: Plan, number: string): Mend[] {
  const remove = { label: `Remove scan ${number}`, command: removeScan(plan, scan.id) };
  const { span } = plan;
  if (scan.lengthSeconds > span.lengthSeconds) {
    const stations = scan.stations.filter(
      ({ lateSeconds, earlySeconds }) => lateSeconds + earlySeconds < span.lengthSeconds,
    );
    const cut = { ...scan, ...span, stations };
    const command: Command = { verb: 'edit-scan', edits: [{ kind: 'change-scan', scan: cut }] };
    return [{ label: `Cut scan ${number} to the session`, command }, remove];
  }
  const latestMs = scanStopMs(span) - scan.lengthSeconds * 1000;
  const startMs = Math.min(Math.max(scan.startMs, span.startMs), latestMs);
  const label = `Move scan ${number} to ${clockText(startMs)}`;
  return [{ label, command: moveScan(plan, scan.id, startMs) }, remove];
}

function memberOf(scan: Scan, station: StationCode): ScanStation | null {
  return scan.stations.find((member) => member.station === station) ?? null;
}

function roundUp(ms: number, stepMs: number): number {
  return Math.ceil(ms / stepMs) * stepMs;
}
