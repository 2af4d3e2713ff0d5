import { columnLengthText, dayText, minuteText, spanText } from '@/app/_ui/format';
import type { SkySheet, SkySource } from '@/src/data/sky/dto';
import { clockText } from '@/src/schedule/words';
import { MS_PER_DAY } from '@/src/units/time';
import { secondsOf, type Span } from './model';

const MINUTE = 60_000;

/** "2:29" under a head that says h:min; a part of a minute is cut off. */
export const hoursText = (spans: readonly Span[]): string =>
  spans.length === 0 ? 'none' : columnLengthText(Math.floor(secondsOf(spans) / 60));

/** "02:40–05:09", to the whole minutes inside; with the day where a session is longer than one. */
export function spanTexts(spans: readonly Span[], { session }: Pick<SkySheet, 'session'>): string[] {
  const isLong = session.lengthSeconds * 1000 > MS_PER_DAY;
  return spans.map((span) => {
    const said = endsText(span).join('–');
    return isLong ? `${dayText(span[0])} ${said}` : said;
  });
}

/** "All 6 stations see J1159+2914 together from 02:40 to 05:09, 2 h 29 min in all." */
export function togetherSentence(who: string, source: SkySource, spans: readonly Span[]): string {
  if (spans.length === 0) return `${who} never see ${source.name} together in this session.`;
  const said = spans.map((span) => endsText(span).join(' to ')).join(' and from ');
  const whole = spanText(Math.floor(secondsOf(spans) / 60) * 60);
  return `${who} see ${source.name} together from ${said}, ${whole} in all.`;
}

function endsText([startMs, endMs]: Span): [string, string] {
  const [from, to] = [Math.ceil(startMs / MINUTE) * MINUTE, Math.floor(endMs / MINUTE) * MINUTE];
  return from < to ? [minuteText(from), minuteText(to)] : [clockText(startMs), clockText(endMs)];
}
