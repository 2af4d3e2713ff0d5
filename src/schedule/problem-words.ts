import type { ClockValues, SecondValues, LimitValues, Problem, SlewValues } from './checks';
import type { PlanContext } from './context';
import type { Plan, ScanId } from './plan';
import { scanNumbers } from './scan-numbers';
import { dayOfYear } from '../units/time';
import { clockText, lengthText } from './words';

/** who with its point; what and shortfall without: "who what: shortfall." or "who what." */
export type ProblemSentence = { who: string; what: string; shortfall: string | null };

/**
 * A problem in plain words.
 *
 * @returns who and which scan; what is wrong with its numbers; what is short of it, null for notes
 */
export function problemSentence(problem: Problem, plan: Plan, context: PlanContext): ProblemSentence {
  const numbers = scanNumbers(plan);
  const numberOf = (id: ScanId) => `scan ${numbers.get(id) ?? id}`;
  const scan = numberOf(problem.scanId);
  const who = problem.station === null ? `S${scan.slice(1)}.` : `${problem.station}, ${scan}.`;
  switch (problem.kind) {
    case 'limit':
      return { who, ...limitWords(problem.values, problem.severity, problem.atMs) };
    case 'slew':
      return { who, ...slewWords(problem.values, problem.severity, numberOf, context) };
    case 'overlap': {
      const { otherScanId, overlapSeconds } = problem.values;
      const what = `It is still on ${numberOf(otherScanId)} when this one starts`;
      return { who, what, shortfall: `${lengthText(overlapSeconds)} in both at once` };
    }
    case 'outside': {
      const { beforeSeconds, afterSeconds } = problem.values;
      const before = beforeSeconds > 0 ? [`starts ${lengthText(beforeSeconds)} before the session`] : [];
      const after = afterSeconds > 0 ? [`ends ${lengthText(afterSeconds)} after the session`] : [];
      return { who, what: `It ${[...before, ...after].join(' and ')}`, shortfall: null };
    }
    case 'away': {
      const { why, fromMs, untilMs, hits } = problem.values;
      const hours = `from ${clockText(fromMs)} to ${clockText(untilMs)}`;
      const [only] = hits;
      const hit = hits.length > 1 ? `${hits.length} scans` : only?.isWhole ? 'all of it' : 'a part of it';
      const from = hits.length > 1 ? `${problem.station ?? ''}, from ${scan}.` : who;
      return { who: from, what: `The station is away ${hours}, ${why}`, shortfall: hit };
    }
    case 'clock':
      return { who: `${problem.station ?? ''}.`, what: clockWords(problem.values), shortfall: null };
    case 'second':
      return { who: `${problem.station ?? ''}.`, what: secondWords(problem.values), shortfall: null };
  }
}

function limitWords(
  { elevationDeg, limitDeg, marginDeg, side }: LimitValues,
  severity: Problem['severity'],
  atMs: number,
): Omit<ProblemSentence, 'who'> {
  const name = side === 'mask' ? 'the mask' : side === 'high' ? 'the highest limit' : 'the lowest limit';
  const limit = `${name} is ${limitDeg.toFixed(1)}°`;
  const reaches = `The source is at ${degrees(elevationDeg)}`;
  if (severity === 'note') {
    return {
      what: `${reaches} at ${clockText(atMs)}, ${marginDeg.toFixed(1)}° above ${name}`,
      shortfall: null,
    };
  }
  const off = Math.abs(marginDeg);
  const amount = off < 0.1 ? 'less than 0.1°' : `${off.toFixed(1)}°`;
  const what =
    elevationDeg < 0
      ? `The source is below the horizon, from ${clockText(atMs)}`
      : `${reaches} and ${limit}, from ${clockText(atMs)}`;
  return { what, shortfall: `${amount} too ${side === 'high' ? 'high' : 'low'}` };
}

function slewWords(
  { fromScanId, slewSeconds, gapSeconds, spareSeconds, impossible }: SlewValues,
  severity: Problem['severity'],
  numberOf: (id: ScanId) => string,
  { settings }: PlanContext,
): Omit<ProblemSentence, 'who'> {
  if (impossible !== null) return { what: `The dish ${impossible}`, shortfall: null };
  const from = fromScanId === null ? '' : ` from ${numberOf(fromScanId)}`;
  const slew = `The slew${from} takes ${lengthText(Math.ceil(slewSeconds ?? 0))}`;
  if (severity === 'fix') {
    const short = Math.ceil(-(spareSeconds ?? 0));
    return {
      what: `${slew} and the gap is ${lengthText(gapSeconds ?? 0)}`,
      shortfall: `${lengthText(short)} short`,
    };
  }
  const spare = Math.floor(spareSeconds ?? 0);
  return {
    what: `${slew} and leaves ${spare} s spare, less than ${settings.leastSpareSeconds} s`,
    shortfall: null,
  };
}

function clockWords({ ageHours }: ClockValues): string {
  if (ageHours === null) return 'Its clock was never read';
  const age = ageHours < 48 ? `${Math.floor(ageHours)} h` : `${Math.floor(ageHours / 24)} days`;
  return `The newest reading of its clock is ${age} old`;
}

/** "041 at 12:10:00" */
const dayText = (ms: number) => `${String(dayOfYear(ms)).padStart(3, '0')} at ${clockText(ms)}`;

function secondWords({ off, atMs }: SecondValues): string {
  if (off === null) {
    const since = atMs === null ? '' : ` since it was re-synchronised on day ${dayText(atMs)}`;
    return `The second of its formatter was not checked against UTC${since}`;
  }
  const count = `${off < 0 ? '\u2212' : ''}${Math.abs(off)} s`;
  const at = atMs === null ? '' : `, checked on day ${dayText(atMs)}`;
  return `The second of its formatter is off by ${count}${at}. Re-synchronise it and check again`;
}

function degrees(value: number): string {
  return `${value.toFixed(1)}°`;
}
