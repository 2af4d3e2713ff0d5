import { dayOfYear } from '../units/time';

/**
 * Time of day as screens and sentences write it.
 *
 * @param ms  epoch ms, UTC; a part of a second is cut off
 * @returns "01:02:50"
 * @throws RangeError if ms is not a date (programmer error)
 */
export function clockText(ms: number): string {
  return new Date(ms).toISOString().slice(11, 19);
}

/**
 * A length as prose writes it: minutes and seconds, or seconds alone below a minute.
 *
 * @param seconds  rounded to the whole second; the sign is dropped
 * @returns "4 min 00 s", "49 s", "72 min 05 s"
 */
export function lengthText(seconds: number): string {
  const whole = Math.abs(Math.round(seconds));
  const minutes = Math.floor(whole / 60);
  const rest = whole % 60;
  return minutes > 0 ? `${minutes} min ${String(rest).padStart(2, '0')} s` : `${rest} s`;
}

/**
 * A length with no idle zeros, for labels and buttons.
 *
 * @returns "1 min", "1 min 30 s", "50 s"
 */
export function shortLengthText(seconds: number): string {
  const whole = Math.abs(Math.round(seconds));
  return whole >= 60 && whole % 60 === 0 ? `${whole / 60} min` : lengthText(whole);
}

/**
 * Codes or names in a row of prose.
 *
 * @returns "Af", "Af and Bm", "Af, Bm and Cf"
 */
export function listText(words: readonly string[]): string {
  const last = words.at(-1);
  if (last === undefined) return 'none';
  return words.length === 1 ? last : `${words.slice(0, -1).join(', ')} and ${last}`;
}

/**
 * A time in full, as forms, files, mail and tooltips write it.
 *
 * @returns "2027-02-13 (044) 18:30:00 UT"
 * @throws RangeError if ms is not a date (programmer error)
 */
export function fullTimeText(ms: number): string {
  const day = String(dayOfYear(ms)).padStart(3, '0');
  return `${new Date(ms).toISOString().slice(0, 10)} (${day}) ${clockText(ms)} UT`;
}
