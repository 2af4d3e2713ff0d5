import { MS_PER_DAY } from './time';

export type Entry<T> = { ok: true; value: T } | { ok: false; message: string };

const TIME = /^(?:(\d{4})[-\s])?(?:(\d{1,3})\s+)?(?:(\d{1,2}):(\d{2})(?::(\d{2}))?|(\d{2})(\d{2})(\d{2})?)$/;

/**
 * A time of UT as people type it: "0046", "00:46", "00:46:00", "044 00:46", "2027-044 00:46".
 *
 * @param text    day of year and year may be left out
 * @param nearMs  without a day the nearest such time is meant; without a year, the nearest such day
 * @returns epoch ms on a whole second, or a sentence that says what was read and what is wanted
 */
export function readTimeEntry(text: string, nearMs: number): Entry<number> {
  const found = TIME.exec(text.trim());
  if (!found)
    return refuse(`“${text.trim()}” is no time. Write it as 00:46:00, or with the day as 044 00:46.`);
  const [, year, day] = found;
  const [hour, minute, second] = [
    found[3] ?? found[6],
    found[4] ?? found[7],
    found[5] ?? found[8] ?? '0',
  ].map(Number);
  if (hour === undefined || minute === undefined || second === undefined)
    return refuse(`“${text}” is no time.`);
  if (hour > 23 || minute > 59 || second > 59)
    return refuse(`“${text.trim()}” is no time of day: it goes to 23:59:59.`);
  const ofDayMs = ((hour * 60 + minute) * 60 + second) * 1000;
  if (day === undefined) {
    if (year !== undefined)
      return refuse(`“${text.trim()}” has a year and no day. Write it as ${year}-044 00:46.`);
    const todayMs = Math.floor(nearMs / MS_PER_DAY) * MS_PER_DAY + ofDayMs;
    return { ok: true, value: nearest([todayMs - MS_PER_DAY, todayMs, todayMs + MS_PER_DAY], nearMs) };
  }
  const nearYear = new Date(nearMs).getUTCFullYear();
  const years = year === undefined ? [nearYear - 1, nearYear, nearYear + 1] : [Number(year)];
  const fitting = years.filter((one) => Number(day) >= 1 && Number(day) <= daysIn(one));
  if (fitting.length === 0)
    return refuse(`Day ${day} is no day of the year: days go from 001 to 365 or 366.`);
  return {
    ok: true,
    value: nearest(
      fitting.map((one) => Date.UTC(one, 0, Number(day)) + ofDayMs),
      nearMs,
    ),
  };
}

/**
 * A length as people type it: "12" or "12 min", "720 s", "12:30", "1 h 30 min".
 *
 * @returns whole seconds, 1 to 86 400, or a sentence
 */
export function readLengthEntry(text: string): Entry<number> {
  const word = text.trim().toLowerCase();
  const clock = /^(\d+):([0-5]\d)$/.exec(word);
  const parts = /^(?:(\d+)\s*h)?\s*(?:(\d+)\s*(?:min|m))?\s*(?:(\d+)\s*s)?$/.exec(word);
  const seconds = clock
    ? Number(clock[1]) * 60 + Number(clock[2])
    : /^\d+$/.test(word)
      ? Number(word) * 60
      : word !== '' && parts
        ? Number(parts[1] ?? 0) * 3600 + Number(parts[2] ?? 0) * 60 + Number(parts[3] ?? 0)
        : null;
  if (seconds === null) return refuse(`“${text.trim()}” is no length. Write it as 12 min or 720 s.`);
  if (seconds < 1) return refuse('A scan lasts at least 1 s. Give a longer length.');
  if (seconds > 86_400) return refuse('A scan lasts at most 24 h. Give a shorter length.');
  return { ok: true, value: seconds };
}

const refuse = (message: string): { ok: false; message: string } => ({ ok: false, message });
const daysIn = (year: number) => (Date.UTC(year + 1, 0, 1) - Date.UTC(year, 0, 1)) / MS_PER_DAY;
const nearest = (candidates: readonly number[], nearMs: number) =>
  candidates.reduce((best, one) => (Math.abs(one - nearMs) < Math.abs(best - nearMs) ? one : best));
