import { describe, expect, it } from 'vitest';
import { outlookCsv } from '@/app/(shell)/sessions/[sessionId]/fringes/_fringes/csv';
import {
  columnsOf,
  fails,
  keyOf,
  outlookOf,
  rowsOf,
  tally,
  VERDICTS,
  type Filter,
} from '@/app/(shell)/sessions/[sessionId]/fringes/_fringes/model';
import type { Plan } from '@/src/schedule/plan';
import { makeContext, SOURCES, withStation } from '../schedule/context-maker';

const startMs = Date.UTC(2027, 1, 13, 0, 0);
const scanAt = (id: string, sourceId: string, minutes: number) => ({
  id,
  sourceId,
  modeId: 'mode-a',
  startMs: startMs + minutes * 60_000,
  lengthSeconds: 600,
  stations: ['Af', 'Bm'].map((station) => ({ station, lateSeconds: 0, earlySeconds: 0 })),
  groupId: null,
  leg: null,
  comment: '',
});
const plan: Plan = {
  sessionId: 'session',
  span: { startMs, lengthSeconds: 7200 },
  stations: ['Af', 'Bm', 'Em'],
  scans: [scanAt('one', 'src-b', 10), scanAt('two', 'src-c', 30)],
  groups: [],
};
const filter: Filter = {
  verdicts: new Set(VERDICTS.map(([verdict]) => verdict)),
  stations: new Set(plan.stations),
  sourceId: null,
  columnsBy: 'station',
};

describe('the matrix of fringes', () => {
  const outlook = outlookOf(plan, makeContext());

  it('counts every scan and baseline once', () => {
    expect(outlook.rows.map(({ cells }) => cells.length)).toEqual([3, 3]);
    expect(Object.values(outlook.counts).reduce((sum, count) => sum + count, 0)).toBe(6);
  });

  it('shows the western station first, and shorter baselines first when sorted by length', () => {
    expect(outlook.pairs.map(keyOf)).toEqual(['Em–Af', 'Em–Bm', 'Af–Bm']);
    const byLength = columnsOf(outlook, { ...filter, columnsBy: 'length' }).map(keyOf);
    expect(byLength.at(0)).toBe('Af–Bm');
  });

  it('hides the baselines of a station that is not ticked, and scans of other sources', () => {
    const some = { ...filter, stations: new Set(['Af', 'Bm']), sourceId: 'src-c' };
    const columns = columnsOf(outlook, some);
    expect(columns.map(keyOf)).toEqual(['Af–Bm']);
    expect(rowsOf(outlook, some, columns).map(({ scan }) => scan.id)).toEqual(['two']);
  });

  it('shows only scans that have a verdict ticked', () => {
    const none = { ...filter, verdicts: new Set(['unknown' as const]) };
    expect(rowsOf(outlook, none, columnsOf(outlook, none))).toEqual([]);
  });

  it('tallies those expected of those on source', () => {
    const row = outlook.rows[0];
    expect(row && tally(row.cells)).toEqual({ expected: 1, possible: 1 });
    expect(row?.cells.filter(fails)).toEqual([]);
  });
});

describe('the table as a file', () => {
  it('has a line for each scan and baseline, figures with a point and no thousands mark', () => {
    const { rows } = outlookOf(plan, makeContext());
    const lines = outlookCsv(rows, makeContext()).trimEnd().split('\r\n');
    expect(lines).toHaveLength(7);
    const line = lines.find((one) => one.startsWith('1,') && one.includes(',Af,Bm,'));
    expect(line).toMatch(
      /^1,2027-02-13T00:10:00\.000Z,600,SYN0200\+75,Af,Bm,strong,,,\d+(\.\d+)?,600,0\.5,800,800,\d+,/,
    );
  });

  it('says what is missing, and never begins a cell as a formula', () => {
    const { 'src-b': source } = SOURCES;
    if (!source) throw new Error('no source');
    const context = withStation('Af', { sefdJy: {} });
    const named = { ...context, sources: { ...SOURCES, 'src-b': { ...source, name: '=SUM("a",1)' } } };
    const csv = outlookCsv(outlookOf(plan, named).rows, named);
    expect(csv).toContain('SEFD of Af at 8.4 GHz');
    expect(csv).toContain('"\'=SUM(""a"",1)"');
  });
});
