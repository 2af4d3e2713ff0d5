import { csvText } from '@/app/_ui/csv';
import type { SkySheet } from '@/src/data/sky/dto';
import { highestOf, markText, type Mark, type Row, type Span } from './model';

const HEAD = ['source', 'who', 'from_utc', 'to_utc', 'length_s', 'highest_deg', 'sun_deg', 'moon_deg'];

/** One line for each window: of each station, of all together, and of those that are marked. */
export function windowsCsv(sheet: SkySheet, rows: readonly Row[], mark: Mark): string {
  const lines = rows.flatMap(({ source, bars, all, marked }) => {
    const line = (who: string, [startMs, endMs]: Span, highest: string) => [
      source.name,
      who,
      new Date(startMs).toISOString(),
      new Date(endMs).toISOString(),
      (endMs - startMs) / 1000,
      highest,
      source.sunDeg.toFixed(1),
      source.moonDeg.toFixed(1),
    ];
    const others: [string, readonly Span[]][] = [['all', all]];
    if (mark.kind !== 'all')
      others.push([markText(mark, bars.length).replace('–', '-').toLowerCase(), marked]);
    return [
      ...bars.flatMap(({ code, spans }) => {
        const highest = highestOf(sheet.table, source.id, code)?.elevationDeg.toFixed(1) ?? '';
        return spans.map((span) => line(code, span, highest));
      }),
      ...others.flatMap(([who, spans]) => spans.map((span) => line(who, span, ''))),
    ];
  });
  return csvText([HEAD, ...lines]);
}
