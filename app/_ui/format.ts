import { clockText } from '@/src/schedule/words';
import { dayOfYear, utcParts } from '@/src/units/time';

export const MINUS = '\u2212';
const THIN_SPACE = '\u2009';

const padded = (value: number, width: number) => String(value).padStart(width, '0');

/** "01:02": hours and minutes of UT. */
export const minuteText = (ms: number): string => clockText(ms).slice(0, 5);

/** "043": day of year. */
export const dayText = (ms: number): string => padded(dayOfYear(ms), 3);

/** "2027 day 043, 20:00 UT"; with seconds where they are set. */
export function longTimeText(ms: number): string {
  const time = clockText(ms);
  return `${utcParts(ms).year} day ${dayText(ms)}, ${time.endsWith(':00') ? time.slice(0, 5) : time} UT`;
}

/** "4:49": minutes and seconds in a column whose head says min:s. */
export function columnLengthText(seconds: number): string {
  const whole = Math.round(Math.abs(seconds));
  const sign = seconds < 0 && whole > 0 ? MINUS : '';
  return `${sign}${Math.floor(whole / 60)}:${padded(whole % 60, 2)}`;
}

/** "24 h", "7 h 41 min", "12 min", "50 s": the length of a session or a window. */
export function spanText(seconds: number): string {
  const whole = Math.round(seconds);
  const parts = [
    [Math.floor(whole / 3600), 'h'],
    [Math.floor((whole % 3600) / 60), 'min'],
    [whole % 60, 's'],
  ] as const;
  const said = parts.filter(([count]) => count > 0).map(([count, unit]) => `${count} ${unit}`);
  return said.length > 0 ? said.join(' ') : '0 s';
}

/** "In 2 d 5 h", "In 41 min", "Now", "Ended": when a session begins, seen from now. */
export function beginsText(startMs: number, lengthSeconds: number, nowMs: number): string {
  if (nowMs >= startMs + lengthSeconds * 1000) return 'Ended';
  if (nowMs >= startMs) return 'Now';
  const minutes = Math.floor((startMs - nowMs) / 60_000);
  const [days, hours] = [Math.floor(minutes / 1440), Math.floor((minutes % 1440) / 60)];
  if (days >= 10) return `In ${days} d`;
  if (days > 0) return hours > 0 ? `In ${days} d ${hours} h` : `In ${days} d`;
  return hours > 0 ? `In ${hours} h ${minutes % 60} min` : `In ${minutes} min`;
}

/** Fixed decimals with a true minus and thin spaces: "−6.93", "11 838". */
export function numberText(value: number, decimals = 0): string {
  const [whole = '', fraction] = Math.abs(value).toFixed(decimals).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole;
  const digits = fraction === undefined ? grouped : `${grouped}.${fraction}`;
  return value < 0 && /[1-9]/.test(digits) ? `${MINUS}${digits}` : digits;
}

/** "+3.214", "−6.930": where the head of the column says what the sign means. */
export function signedText(value: number, decimals = 0): string {
  const text = numberText(value, decimals);
  return text.startsWith(MINUS) || !/[1-9]/.test(text) ? text : `+${text}`;
}

/** "39°"; "39.2°" in detail. */
export const angleText = (deg: number, decimals = 0): string => `${numberText(deg, decimals)}°`;
