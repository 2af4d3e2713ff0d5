import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  fringeOutlook,
  isExpected,
  scanOutlook,
  snrText,
  sumExpected,
  type OutlookContext,
} from '@/src/outlook/fringe-outlook';
import type { ClockPlace } from '@/src/outlook/clock-place';
import { azEl } from '@/src/sky/position';
import { visibilityWindows } from '@/src/sky/windows';
import { makeContext, SOURCES, STATIONS, withStation } from '../schedule/context-maker';
import { makePlan, makeScan, member, T0 } from '../schedule/plan-maker';
import { byHand, cellOf, planOf, withSource } from './hand';

/** SNR goes with the flux, so the flux that gives an SNR is known by hand. */
const withSnr = (snr: number) => withSource({ fluxJy: snr / byHand({ flux: 1 }).snr });

const awayBetween = (code: string, ...spans: [number, number][]): Pick<OutlookContext, 'away'> => ({
  away: {
    [code]: spans.map(([from, until]) => ({
      start: new Date(T0 + from * 1000),
      end: new Date(T0 + until * 1000),
      why: 'wind',
    })),
  },
});

describe('the cells of an outlook', () => {
  it('are all baselines of the plan, west to east, scan by scan', () => {
    const plan = makePlan([makeScan('a'), makeScan('b', { startMs: T0 + 700_000 })]);
    const cells = fringeOutlook(plan, makeContext());
    const pairs = cells.map(({ scanId, first, second }) => `${scanId} ${first}–${second}`);
    expect(pairs.slice(0, 6)).toEqual(['a Em–Af', 'a Em–Cf', 'a Em–Bm', 'a Af–Cf', 'a Af–Bm', 'a Cf–Bm']);
    expect(pairs.slice(6)).toEqual(pairs.slice(0, 6).map((pair) => pair.replace('a ', 'b ')));
  });

  it('are the same in whichever order the plan names its stations', () => {
    const plan = planOf();
    const turned = { ...plan, stations: [...plan.stations].reverse() };
    expect(fringeOutlook(turned, makeContext())).toEqual(fringeOutlook(plan, makeContext()));
  });

  it('are the same for one scan as in the whole plan', () => {
    const plan = planOf();
    const cells = plan.scans.flatMap((scan) => scanOutlook(scan, plan, makeContext()));
    expect(cells).toEqual(fringeOutlook(plan, makeContext()));
    expect(cells).toHaveLength(6);
  });

  it('are worked out again when the context changes, and not when nothing does', () => {
    const plan = planOf();
    const [scan] = plan.scans;
    if (!scan) throw new Error('no scan');
    const [before, after] = [withSnr(25), withSnr(5)];
    const cells = scanOutlook(scan, plan, before);
    expect(scanOutlook(scan, plan, before)).toBe(cells);
    expect(scanOutlook(scan, plan, after).map(({ verdict }) => verdict)).not.toEqual(
      cells.map(({ verdict }) => verdict),
    );
  });

  it('are none for a plan without baselines', () => {
    expect(fringeOutlook(makePlan([makeScan('a')], [], { stations: ['Af'] }), makeContext())).toEqual([]);
  });
});

describe('a verdict by SNR', () => {
  it.each([
    [20.01, 'strong', null],
    [19.99, 'fair', null],
    [10.01, 'fair', null],
    [9.99, 'doubtful', null],
    [7.01, 'doubtful', null],
    [6.99, 'none', 'snr'],
    [0, 'none', 'snr'],
  ])('of %f is %s', (snr, verdict, reason) => {
    expect(cellOf(planOf(), 'Af–Bm', withSnr(snr))).toMatchObject({ verdict, reason });
  });

  it('exactly on a limit takes the better word, a hair below it the worse', () => {
    const snr = cellOf(planOf(), 'Af–Bm', withSnr(7)).snr ?? NaN;
    const above = snr * (1 + Number.EPSILON);
    expect(above).toBeGreaterThan(snr);
    const judged = (doubtful: number, fair: number, strong: number) => {
      const context = withSnr(7);
      const settings = { ...context.settings, snrLimits: { doubtful, fair, strong } };
      return cellOf(planOf(), 'Af–Bm', { ...context, settings }).verdict;
    };
    expect([judged(snr, 90, 99), judged(above, 90, 99)]).toEqual(['doubtful', 'none']);
    expect([judged(1, snr, 99), judged(1, above, 99)]).toEqual(['fair', 'doubtful']);
    expect([judged(1, 2, snr), judged(1, 2, above)]).toEqual(['strong', 'fair']);
  });

  const judgeAt =
    (place: ClockPlace, amplitude = 1) =>
    () => ({ place, amplitude, missing: 'no clock reading of Bm' });

  it.each<[ClockPlace, number, string, string | null]>([
    ['inside', 25, 'strong', null],
    ['edge', 25, 'doubtful', 'clock'],
    ['edge', 8, 'doubtful', null],
    ['edge', 5, 'none', 'snr'],
    ['outside', 25, 'none', 'clock'],
    ['unknown', 25, 'unknown', 'clock'],
    ['unknown', 5, 'none', 'snr'],
  ])('with a clock %s and SNR %d is %s', (place, snr, verdict, reason) => {
    const context = { ...withSnr(snr), judgeClock: judgeAt(place) };
    expect(cellOf(planOf(), 'Af–Bm', context)).toMatchObject({ verdict, reason });
  });

  it('loses SNR where the fringe stands beyond half the window', () => {
    const context = { ...withSnr(25), judgeClock: judgeAt('inside', 0.7) };
    const cell = cellOf(planOf(), 'Af–Bm', context);
    expect(cell.verdict).toBe('fair');
    expect(cell.snr).toBeCloseTo(17.5, 6);
  });

  it('names the clock that is not known', () => {
    const context = { ...withSnr(25), judgeClock: judgeAt('unknown') };
    expect(cellOf(planOf(), 'Af–Bm', context).missing).toBe('no clock reading of Bm');
  });

  it('is none with a clock outside even where an input is missing', () => {
    const context = { ...withSource(null), judgeClock: judgeAt('outside') };
    expect(cellOf(planOf(), 'Af–Bm', context)).toMatchObject({ verdict: 'none', reason: 'clock', snr: null });
  });
});

describe('low', () => {
  const low = { verdict: 'not-on', reason: 'low', snr: null, overlapSeconds: 0, baselineM: null };

  it('is a station that never sees the source, taking part or left out', () => {
    expect(cellOf(planOf({ sourceId: 'src-b' }), 'Cf–Bm')).toMatchObject(low);
    expect(cellOf(planOf({ sourceId: 'src-b', stations: [member('Bm')] }), 'Cf–Bm')).toMatchObject(low);
  });

  it('is a source that sets a second before the overlap ends; a second after, it is not', () => {
    const [source, station] = [SOURCES['src-a'], STATIONS['Af']];
    if (!source || !station) throw new Error('not in the catalogue');
    const span = { start: new Date(T0), end: new Date(T0 + 12 * 3_600_000) };
    const setMs = visibilityWindows(source.position, station, span)[0]?.end.getTime() ?? NaN;
    const startMs = Math.floor(setMs / 1000) * 1000 - 599_000;
    const judged = (earlySeconds: number) =>
      cellOf(planOf({ startMs, stations: [member('Af', 0, earlySeconds), member('Em')] }), 'Em–Af').reason;
    expect([judged(0), judged(2)]).toEqual(['low', null]);
  });

  it('is a source below the mask, the session’s limit or above the highest elevation', () => {
    const [source, station] = [SOURCES['src-a'], STATIONS['Bm']];
    if (!source || !station) throw new Error('not in the catalogue');
    const elevations = [T0, T0 + 600_000].map(
      (ms) => azEl(source.position, station.site, new Date(ms)).elevationDeg,
    );
    const [lowest, highest] = [Math.min(...elevations), Math.max(...elevations)];
    const masked = (elevationDeg: number) =>
      withStation('Bm', { horizon: [{ azimuthDeg: 0, elevationDeg }] });
    const session = (minElevationDeg: number) =>
      makeContext({ settings: { ...makeContext().settings, minElevationDeg } });
    const capped = (maxElevationDeg: number) => withStation('Bm', { maxElevationDeg });
    const inside = [masked(lowest - 0.01), session(lowest - 0.01), capped(highest + 0.01)];
    const outside = [masked(lowest + 0.01), session(lowest + 0.01), capped(highest - 0.01)];
    for (const context of inside) expect(cellOf(planOf(), 'Af–Bm', context).verdict).toBe('strong');
    for (const context of outside) expect(cellOf(planOf(), 'Af–Bm', context)).toMatchObject(low);
  });
});

describe('out', () => {
  const out = { verdict: 'not-on', reason: 'out', snr: null, overlapSeconds: 0 };

  it('is a station left out though it sees the source', () => {
    expect(cellOf(planOf({ stations: [member('Af')] }), 'Af–Bm')).toMatchObject(out);
    expect(cellOf(planOf({ stations: [] }), 'Af–Bm')).toMatchObject(out);
  });

  it('is a station that joins when the other has left', () => {
    const touching = [member('Af', 0, 300), member('Bm', 300, 0)];
    const apart = [member('Af', 0, 400), member('Bm', 300, 0)];
    expect(cellOf(planOf({ stations: touching }), 'Af–Bm')).toMatchObject(out);
    expect(cellOf(planOf({ stations: apart }), 'Af–Bm')).toMatchObject(out);
    const meeting = [member('Af', 0, 299), member('Bm', 300, 0)];
    expect(cellOf(planOf({ stations: meeting }), 'Af–Bm').overlapSeconds).toBe(1);
  });
});

describe('declined', () => {
  const judged = (...spans: [number, number][]) =>
    cellOf(planOf(), 'Af–Bm', { ...makeContext(), ...awayBetween('Bm', ...spans) });

  it('is a station away for all of the overlap, in one piece or several', () => {
    const declined = { verdict: 'not-on', reason: 'declined', snr: null, overlapSeconds: 0 };
    expect(judged([0, 600])).toMatchObject(declined);
    expect(judged([300, 900], [-60, 300])).toMatchObject(declined);
  });

  it('for a part takes time off: the longest piece that is left counts', () => {
    expect(judged([-60, 200]).overlapSeconds).toBe(400);
    expect(judged([200, 260]).overlapSeconds).toBe(340);
    expect(judged([100, 500], [150, 200]).overlapSeconds).toBe(100);
    const { snr, overlapSeconds } = judged([400, 700]);
    expect(overlapSeconds).toBe(400);
    expect(snr).toBeCloseTo(byHand({ seconds: 400 }).snr, 9);
  });

  it('before or after the scan changes nothing', () => {
    expect(judged([-60, 0], [600, 900])).toMatchObject({ overlapSeconds: 600, reason: null });
  });
});

it('a mode that is not in the context is not on, by mode', () => {
  const gone = cellOf(planOf({ modeId: 'gone' }), 'Af–Bm');
  expect(gone).toMatchObject({ verdict: 'not-on', reason: 'mode', missing: null, overlapSeconds: 0 });
});

describe('of several reasons', () => {
  const away = awayBetween('Cf', [0, 600]);

  it('low is told before out, out before declined, declined before mode', () => {
    const gone = { modeId: 'gone' };
    const everything = { ...gone, sourceId: 'src-b', stations: [member('Bm')] };
    const context = { ...makeContext(), ...away };
    expect(cellOf(planOf(everything), 'Cf–Bm', context).reason).toBe('low');
    expect(cellOf(planOf({ ...gone, stations: [member('Bm')] }), 'Cf–Bm', context).reason).toBe('out');
    expect(cellOf(planOf(gone), 'Cf–Bm', context).reason).toBe('declined');
    expect(cellOf(planOf(gone), 'Cf–Bm').reason).toBe('mode');
  });

  it('not on is told before a low SNR and before what is missing', () => {
    expect(cellOf(planOf(), 'Cf–Bm', { ...withSnr(1), ...away }).verdict).toBe('not-on');
    expect(cellOf(planOf(), 'Cf–Bm', { ...withSource(null), ...away }).verdict).toBe('not-on');
  });
});

describe('an SNR in words', () => {
  it.each([
    [0, '0.0'],
    [0.04, '0.0'],
    [6.99, '6.9'],
    [7 - 1e-15, '6.9'],
    [7, '7.0'],
    [9.96, '9.9'],
    [10 - 2e-15, '9.9'],
    [10, '10'],
    [19.97, '19'],
    [20, '20'],
    [1399.999, '1399'],
  ])('of %f is %s', (snr, text) => {
    expect(snrText(snr)).toBe(text);
  });

  it('gives each tenth back as it is', () => {
    for (let tenths = 0; tenths < 100; tenths += 1) {
      expect(snrText(tenths / 10)).toBe((tenths / 10).toFixed(1));
    }
  });

  it('is never above the figure and less than its last digit below', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1e6, noNaN: true }), (snr) => {
        const shown = Number(snrText(snr));
        expect(shown).toBeLessThanOrEqual(snr);
        expect(snr - shown).toBeLessThan((snr < 10 ? 0.1 : 1) + 1e-12);
      }),
    );
  });
});

it('strong and fair are expected, nothing else', () => {
  const verdicts = ['strong', 'fair', 'doubtful', 'none', 'unknown', 'not-on'] as const;
  expect(verdicts.filter((verdict) => isExpected({ verdict }))).toEqual(['strong', 'fair']);
  expect(sumExpected(verdicts.map((verdict) => ({ verdict })))).toBe(2);
});
