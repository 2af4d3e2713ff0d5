import { formatInTimeZone } from 'date-fns-tz';

const SIDEREAL_PER_SOLAR = 1.00273790935;

/** "01:58:38": the station's own time of day. */
export const localTime = (ms: number, timeZone: string): string => formatInTimeZone(ms, timeZone, 'HH:mm:ss');

/** "10:31:11": GMST, run on from a moment at which it was known. */
export function siderealTime(ms: number, known: { gmstHours: number; nowMs: number }): string {
  const hours = known.gmstHours + ((ms - known.nowMs) / 3_600_000) * SIDEREAL_PER_SOLAR;
  const seconds = Math.floor((((hours % 24) + 24) % 24) * 3600);
  return [seconds / 3600, (seconds / 60) % 60, seconds % 60]
    .map((part) => String(Math.floor(part)).padStart(2, '0'))
    .join(':');
}

/** "4:22" below an hour, "3:04:22" below a day, "2 d 05:04" beyond. */
export function countText(ms: number): string {
  const seconds = Math.max(0, Math.ceil(ms / 1000));
  const two = (value: number) => String(Math.floor(value)).padStart(2, '0');
  if (seconds < 3600) return `${Math.floor(seconds / 60)}:${two(seconds % 60)}`;
  if (seconds < 86_400)
    return `${Math.floor(seconds / 3600)}:${two((seconds / 60) % 60)}:${two(seconds % 60)}`;
  return `${Math.floor(seconds / 86_400)} d ${two((seconds / 3600) % 24)}:${two((seconds / 60) % 60)}`;
}

/** What the figures of `countText` are. */
export const countUnit = (ms: number): string =>
  ms < 3_600_000 ? 'min:s' : ms < 86_400_000 ? 'h:min:s' : 'days, h:min';
