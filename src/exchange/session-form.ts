import { readBlock, type Block, type Typed, type Wrong } from './catalogue/block';
import {
  areaField,
  neededField,
  numberField,
  numberIn,
  optionalNumberField,
  textField,
} from './catalogue/field';
import { timeField } from './catalogue/time-field';

export type WhatValues = { title: string; purpose: string };
export type WhenValues = { startMs: number; lengthSeconds: number; dut1Seconds: number };
export type RulesValues = {
  minElevationDeg: number;
  leastSpareSeconds: number;
  pauseMinutes: number | null;
  pauseEveryMinutes: number | null;
  finderEveryMinutes: number | null;
  snrDoubtful: number;
  snrFair: number;
  snrStrong: number;
  clockNoteHours: number;
  clockUnknownDays: number;
  instrumentSigmaSeconds: number;
  pairLimitDeg: number;
};

const LONGEST_SECONDS = 14 * 86_400;

/** Seconds of "24", "24 h", "2 d", "7 h 30 min", "7:30": a number alone is hours, figures with a colon hours and minutes. */
function lengthIn(text: string): number | null {
  const hours = numberIn(text);
  if (hours !== null) return Math.round(hours * 3600);
  const word = text.trim().toLowerCase();
  const clock = /^(\d{1,3}):([0-5]\d)$/.exec(word);
  if (clock) return Number(clock[1]) * 3600 + Number(clock[2]) * 60;
  const parts = /^(?:(\d+)\s*d)?\s*(?:(\d+)\s*h)?\s*(?:(\d+)\s*(?:min|m))?\s*(?:(\d+)\s*s)?$/.exec(word);
  if (word === '' || !parts) return null;
  const [days = 0, whole = 0, minutes = 0, seconds = 0] = parts.slice(1).map((part) => Number(part ?? 0));
  return days * 86_400 + whole * 3600 + minutes * 60 + seconds;
}

const lengthField = neededField<number>(
  { label: 'Length', help: 'For example 24 h, or 7 h 30 min.' },
  (text) => {
    const seconds = lengthIn(text);
    if (seconds === null)
      return { ok: false, message: `“${text.trim()}” is no length. Write it as 24 h, or as 7 h 30 min.` };
    if (seconds < 60)
      return { ok: false, message: 'A session lasts at least a minute. Give a longer length.' };
    if (seconds > LONGEST_SECONDS)
      return { ok: false, message: 'A session lasts at most 14 days. Make several of it.' };
    return { ok: true, value: seconds };
  },
  (seconds) => {
    const parts = [
      [Math.floor(seconds / 3600), 'h'],
      [Math.floor((seconds % 3600) / 60), 'min'],
      [seconds % 60, 's'],
    ] as const;
    return parts
      .filter(([count]) => count > 0)
      .map(([count, unit]) => `${count} ${unit}`)
      .join(' ');
  },
);

export const CODE_FIELD = neededField<string>(
  { label: 'Code', help: 'Letters, figures and dashes, for example ARC-034.' },
  (text) => {
    const code = text.trim().toUpperCase();
    return /^[A-Z][A-Z0-9-]{1,15}$/.test(code)
      ? { ok: true, value: code }
      : {
          ok: false,
          message: `“${text.trim()}” is no code. Begin with a letter, then letters, figures and dashes, 2 to 16 in all.`,
        };
  },
  (code) => code,
);

export const WHAT: Block<WhatValues> = {
  title: 'What it is',
  keep: '',
  fields: {
    title: textField({ label: 'Title', isNeeded: true, longest: 80 }),
    purpose: areaField({ label: 'What it is for', longest: 1000 }),
  },
  rows: {},
};

export const WHEN: Block<WhenValues> = {
  title: 'When',
  keep: '',
  fields: {
    startMs: timeField({ label: 'Start, UT', help: '2027-02-12 20:00, or 2027-043 20:00.' }),
    lengthSeconds: lengthField,
    dut1Seconds: numberField({ label: 'DUT1', unit: 's', above: -0.9, below: 0.9, help: 'UT1 − UTC.' }),
  },
  rows: {},
};

export const RULES: Block<RulesValues> = {
  title: 'Settings',
  keep: '',
  fields: {
    minElevationDeg: numberField({
      label: 'Lowest elevation',
      unit: '°',
      min: 0,
      max: 90,
      help: 'On top of masks.',
    }),
    leastSpareSeconds: numberField({
      label: 'Least spare time',
      unit: 's',
      min: 0,
      max: 3600,
      isWhole: true,
    }),
    pauseMinutes: optionalNumberField({ label: 'Pause', unit: 'min', min: 1, max: 600, isWhole: true }),
    pauseEveryMinutes: optionalNumberField({
      label: 'Pause every',
      unit: 'min',
      min: 2,
      max: 6000,
      isWhole: true,
    }),
    finderEveryMinutes: optionalNumberField({
      label: 'Finder at least every',
      unit: 'min',
      min: 1,
      max: 6000,
      isWhole: true,
    }),
    snrDoubtful: numberField({ label: 'Doubtful from SNR', above: 0, max: 1000 }),
    snrFair: numberField({ label: 'Fair from SNR', above: 0, max: 1000 }),
    snrStrong: numberField({ label: 'Strong from SNR', above: 0, max: 1000 }),
    clockNoteHours: numberField({ label: 'Clock note after', unit: 'h', above: 0, max: 1000 }),
    clockUnknownDays: numberField({ label: 'Clock unknown after', unit: 'days', above: 0, max: 400 }),
    instrumentSigmaSeconds: numberField({
      label: 'Unknown instrument delay ±',
      unit: 'µs',
      min: 0,
      max: 100,
      scale: 1e-6,
    }),
    pairLimitDeg: numberField({ label: 'Pairs apart at most', unit: '°', above: 0, max: 90 }),
  },
  rows: {},
  check({ snrDoubtful, snrFair, snrStrong, pauseMinutes, pauseEveryMinutes }) {
    const wrong: Wrong[] = [];
    if (!(snrDoubtful < snrFair))
      wrong.push({ field: 'snrFair', message: `Fair begins above doubtful: type more than ${snrDoubtful}.` });
    if (!(snrFair < snrStrong))
      wrong.push({ field: 'snrStrong', message: `Strong begins above fair: type more than ${snrFair}.` });
    if ((pauseMinutes === null) !== (pauseEveryMinutes === null))
      wrong.push({
        field: pauseMinutes === null ? 'pauseMinutes' : 'pauseEveryMinutes',
        message: 'A pause has a length and comes every so many minutes: fill both, or neither.',
      });
    else if (pauseMinutes !== null && pauseEveryMinutes !== null && pauseMinutes >= pauseEveryMinutes)
      wrong.push({
        field: 'pauseEveryMinutes',
        message: 'The pause is longer than the time between pauses.',
      });
    return wrong;
  },
};

/** A session's form as it is typed; sources with the number of scans that are wanted of each. */
export type SessionTyped = {
  code: string;
  what: Typed;
  when: Typed;
  rules: Typed;
  modeId: string;
  stations: readonly string[];
  sources: readonly { id: string; wanted: string }[];
};

export type SessionValues = {
  code: string;
  what: WhatValues;
  when: WhenValues;
  rules: RulesValues;
  modeId: string;
  stations: string[];
  sources: { id: string; wantedScans: number }[];
};

/**
 * What a session's form means.
 *
 * @returns the values, or each wrong field: "code", "what.title", "when.startMs", "stations", "sources.<id>", …
 */
export function readSession(
  typed: SessionTyped,
): { ok: true; value: SessionValues } | { ok: false; wrong: Wrong[] } {
  const wrong: Wrong[] = [];
  const code = CODE_FIELD.read(typed.code);
  if (!code.ok) wrong.push({ field: 'code', message: code.message });
  const what = part('what', WHAT, typed.what, wrong);
  const when = part('when', WHEN, typed.when, wrong);
  const rules = part('rules', RULES, typed.rules, wrong);
  if (typed.modeId === '')
    wrong.push({ field: 'modeId', message: 'Choose the mode that scans are laid out in.' });
  if (typed.stations.length === 0) wrong.push({ field: 'stations', message: 'Choose at least one station.' });
  const sources = typed.sources.map(({ id, wanted }) => {
    const count = wanted.trim() === '' ? 0 : numberIn(wanted);
    if (count === null || count < 0 || count > 999 || !Number.isInteger(count))
      wrong.push({ field: `sources.${id}`, message: 'A whole number of scans, 0 to 999.' });
    return { id, wantedScans: count ?? 0 };
  });
  if (wrong.length > 0 || !code.ok || !what || !when || !rules) return { ok: false, wrong };
  const { modeId } = typed;
  return {
    ok: true,
    value: {
      code: code.value,
      what,
      when,
      rules,
      modeId,
      stations: [...new Set(typed.stations)].sort(),
      sources,
    },
  };
}

function part<V>(name: string, block: Block<V>, typed: Typed, wrong: Wrong[]): V | null {
  const read = readBlock(block, typed);
  if (read.ok) return read.value;
  wrong.push(...read.wrong.map((one) => ({ ...one, field: `${name}.${one.field}` })));
  return null;
}
