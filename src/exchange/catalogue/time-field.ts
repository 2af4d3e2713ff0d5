import { dayOfYear } from '../../units/time';
import { readField, refuse, type Field, type Read } from './field';

const TIME =
  /^(\d{4})-(?:(\d{1,2})-(\d{1,2})|(\d{3}))(?:\s*\(\d{3}\))?(?:[T\s]+(\d{1,2}):(\d{2})(?::(\d{2}))?)?(?:\s*(?:UT|Z))?$/i;

/** A time of UT with its date: "2027-02-18 07:00", "2027-049 07:00:30"; a date alone is its first second. */
export const timeField = (words: { label: string; help?: string }): Field<number> =>
  readField(
    words,
    (text) => (text.trim() === '' ? refuse(`“${words.label}” is empty. ${AS}`) : readTime(text)),
    timeOut,
    (ms) => `day ${String(dayOfYear(ms)).padStart(3, '0')}`,
  );

export const optionalTimeField = (words: { label: string; help?: string }): Field<number | null> =>
  readField<number | null>(
    words,
    (text) => (text.trim() === '' ? { ok: true, value: null } : readTime(text)),
    (ms) => (ms === null ? '' : timeOut(ms)),
  );

const AS = 'Type it as 2027-02-18 07:00 in UT.';

function readTime(text: string): Read<number> {
  const typed = text.trim();
  const found = TIME.exec(typed);
  if (!found) return refuse(`“${typed.slice(0, 40)}” is no time. ${AS}`);
  const [, year, month, day, dayInYear, hour = '0', minute = '0', second = '0'] = found;
  if (Number(hour) > 23 || Number(minute) > 59 || Number(second) > 59) {
    return refuse(`“${typed}” is no time of day: it goes to 23:59:59.`);
  }
  const ofDayMs = ((Number(hour) * 60 + Number(minute)) * 60 + Number(second)) * 1000;
  const dateMs =
    dayInYear === undefined
      ? Date.UTC(Number(year), Number(month) - 1, Number(day))
      : Date.UTC(Number(year), 0, Number(dayInYear));
  const back = new Date(dateMs);
  const isSame =
    dayInYear === undefined
      ? back.getUTCMonth() + 1 === Number(month) && back.getUTCDate() === Number(day)
      : dayOfYear(dateMs) === Number(dayInYear);
  if (!isSame || back.getUTCFullYear() !== Number(year)) {
    return refuse(`“${typed}” is no day of the calendar. ${AS}`);
  }
  return { ok: true, value: dateMs + ofDayMs };
}

function timeOut(ms: number): string {
  const iso = new Date(ms).toISOString();
  return `${iso.slice(0, 10)} ${iso.endsWith(':00.000Z') ? iso.slice(11, 16) : iso.slice(11, 19)}`;
}
