import { describe, expect, it } from 'vitest';
import { windowsCsv } from '@/app/(shell)/sessions/[sessionId]/sky/_sky/csv';
import { highestOf, pointsIn, rowsOf, togetherIn } from '@/app/(shell)/sessions/[sessionId]/sky/_sky/model';
import { gmstAt, gmstTicks, hourTicks } from '@/app/(shell)/sessions/[sessionId]/sky/_sky/scale';
import { hoursText, spanTexts, togetherSentence } from '@/app/(shell)/sessions/[sessionId]/sky/_sky/words';
import type { SkySheet } from '@/src/data/sky/dto';
import { skyTable } from '@/src/schedule/make-sky-table';
import { gmstHours } from '@/src/sky/position';
import { overlap } from '@/src/sky/windows';
import { makeContext, SOURCES, STATIONS } from '../schedule/context-maker';

const startMs = Date.UTC(2027, 1, 12, 20, 0);
const DAY = 86_400_000;
const codes = ['Em', 'Af', 'Bm'];
const stations = codes.flatMap((code) => STATIONS[code] ?? []);
const span = { start: new Date(startMs), end: new Date(startMs + DAY) };
const sources = Object.values(SOURCES);
const sheet: SkySheet = {
  session: {
    id: 'session',
    code: 'TST-1',
    title: 'A test',
    state: 'draft',
    startMs,
    lengthSeconds: 86_400,
    stations: codes,
  },
  band: '8.4 GHz',
  minElevationDeg: 5,
  gmstStartHours: gmstHours(span.start),
  stations,
  sources: sources.map((source) => ({ ...source, fluxJy: 1, sunDeg: 100, moonDeg: 50 })),
  table: skyTable(stations, sources, makeContext().settings, span),
  starts: { windows: [], areTargets: true, longestSeconds: 86_400, move: null },
  nowMs: startMs,
};
const scale = { startMs, endMs: startMs + DAY, gmstStartHours: sheet.gmstStartHours, width: 808 };

describe('the rows of the sky', () => {
  it('count stations so that all together is the overlap of all windows', () => {
    for (const { source, bars, all, steps } of rowsOf(sheet, codes, { kind: 'all' })) {
      const sets = bars.map(({ spans }) =>
        spans.map(([from, to]) => ({ start: new Date(from), end: new Date(to) })),
      );
      const expected = overlap(sets, 3).map(({ start, end }) => [start.getTime(), end.getTime()]);
      expect(all).toEqual(expected);
      expect(sheet.table.common[source.id]?.[2]).toEqual(expected);
      expect(steps.at(0)?.startMs).toBe(startMs);
      expect(steps.at(-1)?.endMs).toBe(startMs + DAY);
    }
  });

  it('mark a baseline’s times whoever else is chosen', () => {
    const pair = { kind: 'pair', first: 'Em', second: 'Bm' } as const;
    for (const { id } of sheet.sources) {
      const ofTwo = togetherIn(sheet, id, ['Em', 'Bm'], { kind: 'all' });
      expect(togetherIn(sheet, id, ['Af'], pair)).toEqual(ofTwo);
      expect(togetherIn(sheet, id, codes, { kind: 'least', least: 3 })).toEqual(
        togetherIn(sheet, id, codes, { kind: 'all' }),
      );
    }
  });

  it('mark nothing where no station is chosen', () => {
    expect(
      rowsOf(sheet, [], { kind: 'all' }).every(({ all, marked }) => all.length + marked.length === 0),
    ).toBe(true);
  });

  it('draw a curve from edge to edge of its window, the highest point among them', () => {
    const row = rowsOf(sheet, codes, { kind: 'all' }).find(({ bars }) =>
      bars.some(({ spans }) => spans.length > 0),
    );
    const bar = row?.bars.find(({ spans }) => spans.length > 0);
    const window = bar?.spans[0];
    if (!row || !bar || !window) throw new Error('nothing is up');
    const points = pointsIn(sheet.table, row.source.id, bar.code, window);
    expect([points.at(0)?.ms, points.at(-1)?.ms]).toEqual([...window]);
    const highest = highestOf(sheet.table, row.source.id, bar.code);
    expect(highest?.elevationDeg).toBeGreaterThanOrEqual(Math.max(...points.map((one) => one.elevationDeg)));
  });
});

describe('the axis', () => {
  it('labels hours of UT that stand apart, and midnight as such', () => {
    const ticks = hourTicks(scale);
    expect(ticks).toHaveLength(25);
    expect(ticks.filter(({ isMidnight }) => isMidnight).map(({ ms }) => ms)).toEqual([Date.UTC(2027, 1, 13)]);
    const labelled = ticks.filter(({ isLabelled }) => isLabelled);
    expect(labelled.map(({ hour }) => hour).slice(0, 3)).toEqual([20, 22, 0]);
    const phone = hourTicks({ ...scale, width: 366 }).filter(({ isLabelled }) => isLabelled);
    expect((phone[1]?.x ?? 0) - (phone[0]?.x ?? 0)).toBeGreaterThan(50);
  });

  it('puts GMST where it belongs, to a second over a day', () => {
    const atMs = startMs + 0.7 * DAY;
    expect(gmstAt(scale, atMs)).toBeCloseTo(gmstHours(new Date(atMs)), 3);
    const [tick] = gmstTicks(scale);
    const tickMs = startMs + ((tick?.x ?? 0) / scale.width) * DAY;
    expect(gmstHours(new Date(tickMs))).toBeCloseTo(tick?.hour ?? -1, 3);
  });
});

describe('times in words', () => {
  const at = (hour: number, minute: number, second = 0) => Date.UTC(2027, 1, 13, hour, minute, second);

  it('are the whole minutes inside the window', () => {
    const spans = [[at(2, 40, 12), at(5, 9, 50)] as const];
    expect(spanTexts(spans, sheet)).toEqual(['02:41–05:09']);
    expect(hoursText(spans)).toBe('2:29');
    expect(hoursText([])).toBe('none');
    expect(spanTexts([[at(2, 40, 12), at(2, 40, 50)]], sheet)).toEqual(['02:40:12–02:40:50']);
  });

  it('carry the day where the session is longer than one', () => {
    const long = { session: { ...sheet.session, lengthSeconds: 172_800 } };
    expect(spanTexts([[at(2, 0), at(5, 0)]], long)).toEqual(['044 02:00–05:00']);
  });

  it('say who sees the source together, or that nobody does', () => {
    const [source] = sheet.sources;
    if (!source) throw new Error('no source');
    expect(togetherSentence('All 3 stations', source, [[at(2, 40), at(5, 9)]])).toBe(
      `All 3 stations see ${source.name} together from 02:40 to 05:09, 2 h 29 min in all.`,
    );
    expect(togetherSentence('Em and Bm', source, [])).toBe(
      `Em and Bm never see ${source.name} together in this session.`,
    );
  });
});

describe('the table as a file', () => {
  it('has a line for each window, whole times and ASCII only', () => {
    const mark = { kind: 'pair', first: 'Em', second: 'Bm' } as const;
    const rows = rowsOf(sheet, codes, mark);
    const lines = windowsCsv(sheet, rows, mark).trimEnd().split('\r\n');
    const windows = rows.flatMap(({ bars, all, marked }) => [
      ...bars.flatMap(({ spans }) => spans),
      ...all,
      ...marked,
    ]);
    expect(lines).toHaveLength(windows.length + 1);
    expect(lines.some((line) => line.includes(',em-bm,'))).toBe(true);
    expect(lines.every((line) => /^[\x20-\x7e]+$/.test(line))).toBe(true);
  });
});
