import type { NoddingGroup, PlanSpan, Scan, ScanStation, StationCode } from './plan';
import { CommandRefused } from './refused';
import { clockText, lengthText } from './words';

/** Long enough for any scan and any session; without a bound one slip of the finger would take hours to check. */
const LONGEST_SCAN_SECONDS = 86_400;
const LONGEST_SESSION_SECONDS = 14 * 86_400;
/** Where positions are worked out (src/sky/position.ts), a year inside both ends. */
const FIRST_MS = Date.UTC(1901, 0, 1);
const LAST_MS = Date.UTC(2099, 0, 1);
const YEARS = 'must lie between the years 1901 and 2098. Look at the year.';

const isInRange = (ms: number) => ms >= FIRST_MS && ms < LAST_MS;

/**
 * The scan as a plan keeps it (stations by code), or a refusal by what the scan itself shows.
 * Overlap, slew, horizon and the session's ends are problems of a plan, not reasons to refuse.
 *
 * @param stations  codes of the session; the scan may use no other
 * @throws CommandRefused  part-second, length, time, double-station, nothing-left, unknown-station, leg
 */
export function acceptScan(scan: Scan, stations: readonly StationCode[]): Scan {
  const who = scanWho(scan);
  if (!Number.isSafeInteger(scan.startMs) || scan.startMs % 1000 !== 0) {
    throw new CommandRefused('part-second', scan.id, `${who} must start on a whole second.`);
  }
  if (!Number.isSafeInteger(scan.lengthSeconds)) {
    const read = `not ${scan.lengthSeconds}`;
    throw new CommandRefused('part-second', scan.id, `${who} must last a number of whole seconds, ${read}.`);
  }
  if (scan.lengthSeconds < 1) {
    const read = `${scan.lengthSeconds < 0 ? '−' : ''}${lengthText(scan.lengthSeconds)}`;
    throw new CommandRefused('length', scan.id, `${who} cannot last ${read}. Give it 1 s or more.`);
  }
  if (scan.lengthSeconds > LONGEST_SCAN_SECONDS) {
    throw new CommandRefused(
      'length',
      scan.id,
      `${who} cannot last longer than 24 h. Give a shorter length.`,
    );
  }
  if (!isInRange(scan.startMs)) throw new CommandRefused('time', scan.id, `${who} ${YEARS}`);
  if ((scan.groupId === null) !== (scan.leg === null)) {
    const message = `${who} must be a target or calibrator leg of a nodding group, or belong to no group.`;
    throw new CommandRefused('leg', scan.id, message);
  }
  const seen = new Set<StationCode>();
  for (const member of scan.stations) {
    if (seen.has(member.station)) {
      const message = `${who} names ${member.station} twice. Name each station once.`;
      throw new CommandRefused('double-station', scan.id, message);
    }
    seen.add(member.station);
    acceptMember(scan, member, stations, who);
  }
  return { ...scan, stations: [...scan.stations].sort((a, b) => (a.station < b.station ? -1 : 1)) };
}

/**
 * A nodding group's recipe, or a refusal.
 *
 * @throws CommandRefused  part-second, length
 */
export function acceptGroup(group: NoddingGroup): NoddingGroup {
  const lengths = [group.targetOnSeconds, group.calibratorOnSeconds, group.turnSeconds];
  if (!lengths.every(Number.isSafeInteger)) {
    const message = 'A nodding group needs whole seconds on target, on calibrator and for the turn.';
    throw new CommandRefused('part-second', group.id, message);
  }
  if (group.targetOnSeconds < 1 || group.calibratorOnSeconds < 1 || group.turnSeconds < 0) {
    const message = 'A nodding group needs 1 s or more on target and on calibrator, and no negative turn.';
    throw new CommandRefused('length', group.id, message);
  }
  return group;
}

/**
 * The session's span, or a refusal.
 *
 * @throws CommandRefused  part-second, length, time
 */
export function acceptSpan(span: PlanSpan): PlanSpan {
  const whole = Number.isSafeInteger(span.startMs) && span.startMs % 1000 === 0;
  if (!whole || !Number.isSafeInteger(span.lengthSeconds)) {
    throw new CommandRefused('part-second', 'span', 'The session must start and end on whole seconds.');
  }
  if (span.lengthSeconds < 1) {
    const message = `The session ends before it starts. Set an end after ${safeClock(span.startMs)} UT.`;
    throw new CommandRefused('length', 'span', message);
  }
  if (span.lengthSeconds > LONGEST_SESSION_SECONDS) {
    throw new CommandRefused(
      'length',
      'span',
      'A session cannot last longer than 14 days. Set an earlier end.',
    );
  }
  if (!isInRange(span.startMs)) throw new CommandRefused('time', 'span', `The session ${YEARS}`);
  return span;
}

/**
 * How a refusal names a scan; its number is not known to a plan that holds only some scans.
 *
 * @returns "The scan at 01:03:00"
 */
export function scanWho(scan: Pick<Scan, 'startMs'>): string {
  return `The scan at ${safeClock(scan.startMs)}`;
}

function acceptMember(scan: Scan, member: ScanStation, stations: readonly StationCode[], who: string): void {
  const { station, lateSeconds, earlySeconds } = member;
  if (!stations.includes(station)) {
    const message = `${who} names ${station}, which is not a station of this session.`;
    throw new CommandRefused('unknown-station', scan.id, message);
  }
  if (!Number.isSafeInteger(lateSeconds) || !Number.isSafeInteger(earlySeconds)) {
    const message = `${station} must join and leave ${lowerFirst(who)} on whole seconds.`;
    throw new CommandRefused('part-second', scan.id, message);
  }
  if (lateSeconds < 0 || earlySeconds < 0) {
    const message = `${station} cannot join before ${lowerFirst(who)} starts or leave after it ends.`;
    throw new CommandRefused('nothing-left', scan.id, message);
  }
  if (lateSeconds + earlySeconds >= scan.lengthSeconds) {
    const lost = `${lengthText(lateSeconds)} late and ${lengthText(earlySeconds)} early`;
    const message = `${station} has nothing left of ${lowerFirst(who)}: ${lost} of ${lengthText(scan.lengthSeconds)}. Leave ${station} out, or shorten what it misses.`;
    throw new CommandRefused('nothing-left', scan.id, message);
  }
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}

/** A clock time, or the bare figure where it is no date (it is refused for that). */
function safeClock(ms: number): string {
  return Number.isNaN(new Date(ms).getTime()) ? String(ms) : clockText(ms);
}
