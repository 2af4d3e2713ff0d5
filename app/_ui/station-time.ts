import { formatInTimeZone } from 'date-fns-tz';
import { dayText } from './format';

/** A zone's short name is known in the English of the places that use it: "MST", "CET", "CAT". */
const ENGLISH = ['en-US', 'en-GB', 'en-ZA', 'en-AU'];

/** "CET"; "GMT+9" where no English has a name for it. */
function zoneName(ms: number, timeZone: string): string {
  const names = ENGLISH.map((locale) =>
    new Intl.DateTimeFormat(locale, { timeZone, timeZoneName: 'short' })
      .formatToParts(ms)
      .find(({ type }) => type === 'timeZoneName')
      ?.value.replace('-', '−'),
  );
  return names.find((name) => name && !/^GMT./.test(name)) ?? names[0] ?? timeZone;
}

/** "21:00 CET"; "01:00 CET, day 044" where the station's day is another than UT's. */
export function stationTime(ms: number, timeZone: string): string {
  const day = formatInTimeZone(ms, timeZone, 'DDD', { useAdditionalDayOfYearTokens: true });
  const time = `${formatInTimeZone(ms, timeZone, 'HH:mm')} ${zoneName(ms, timeZone)}`;
  return day === dayText(ms) ? time : `${time}, day ${day}`;
}
