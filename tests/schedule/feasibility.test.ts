import { describe, expect, it } from 'vitest';
import { checkPlan } from '@/src/schedule/checks';
import { applyCommand } from '@/src/schedule/commands';
import type { PlanContext } from '@/src/schedule/context';
import { judgePlacement, type Judgement, type Placement } from '@/src/schedule/feasibility';
import { addScan } from '@/src/schedule/gestures/add-scan';
import { stationPaths } from '@/src/schedule/paths';
import type { Plan } from '@/src/schedule/plan';
import { makeContext } from './context-maker';
import { makePlan, makeScan, member, T0 } from './plan-maker';

const MINUTE = 60_000;
const context = makeContext();

function judge(plan: Plan, changes: Partial<Placement>, by: PlanContext = context): Judgement {
  const placement: Placement = {
    ignoreScanId: null,
    sourceId: 'src-c',
    modeId: 'mode-a',
    startMs: T0,
    lengthSeconds: 300,
    stations: 'all-up',
    ...changes,
  };
  return judgePlacement(plan, by, placement, stationPaths(plan, by));
}

const north = [member('Af'), member('Bm'), member('Em')];
const plan = makePlan([
  makeScan('a', { stations: north }),
  makeScan('b', { stations: north, startMs: T0 + 40 * MINUTE }),
]);

describe('a placement', () => {
  it('fits where the stations are up and have the time before and after', () => {
    const judged = judge(plan, { startMs: T0 + 20 * MINUTE });
    expect(judged).toMatchObject({ verdict: 'fits', reason: '', problems: [], stations: ['Af', 'Bm', 'Em'] });
    expect(judged.cannot).toEqual([{ station: 'Cf', why: 'below the horizon' }]);
    expect(judged.slews).toHaveLength(3);
  });

  it('says the same of slews and problems as the whole plan after the drop', () => {
    for (let minute = 11; minute <= 40; minute += 1) {
      const startMs = T0 + minute * MINUTE;
      const judged = judge(plan, { startMs });
      if (judged.stations.length === 0) continue;
      const args = { id: 'new', sourceId: 'src-c', modeId: 'mode-a', startMs, lengthSeconds: 300 };
      const dropped = applyCommand(plan, addScan(plan, context, args)).plan;
      const problems = checkPlan(dropped, context);
      expect(judged.problems.map(({ key }) => key)).toEqual(problems.map(({ key }) => key));
      for (const { station, slewSeconds, spareSeconds, nextSpareSeconds } of judged.slews) {
        const legs = stationPaths(dropped, context).get(station) ?? [];
        const index = legs.findIndex(({ scanId }) => scanId === 'new');
        expect(legs[index]).toMatchObject({ slewSeconds, spareSeconds });
        expect(legs[index + 1]?.spareSeconds).toBe(nextSpareSeconds);
      }
    }
  });

  it('does not fit where a dish arrives late, and says which and by how much', () => {
    const judged = judge(plan, { startMs: T0 + 11 * MINUTE });
    expect(judged.verdict).toBe('no');
    expect(judged.reason).toMatch(/^Af arrives (\d min )?\d+ s late$/);
    // Em turns from 80° to 88° in azimuth but climbs 43°: it too is late, Bm and Af by the most
    const least = Math.min(...judged.slews.map(({ spareSeconds }) => spareSeconds ?? Infinity));
    expect(judged.tightest?.spareSeconds).toBe(least);
  });

  it('does not fit where the next scan would be reached late, and names that scan', () => {
    const judged = judge(plan, { startMs: T0 + 34 * MINUTE });
    expect(judged.verdict).toBe('no');
    expect(judged.reason).toMatch(/late at scan 2$/);
  });

  it('fits with a note where less than the least spare time is left', () => {
    const spare = judge(plan, { startMs: T0 + 20 * MINUTE }).tightest?.spareSeconds ?? NaN;
    const settings = { ...context.settings, leastSpareSeconds: spare + 1 };
    const judged = judge(plan, { startMs: T0 + 20 * MINUTE }, makeContext({ settings }));
    expect(judged.verdict).toBe('note');
    expect(judged.reason).toMatch(/has only \d+ s spare/);
  });

  it('takes the free stations only, and says what keeps the others', () => {
    const alone = makePlan([makeScan('a', { stations: [member('Af')] })]);
    const judged = judge(alone, { startMs: T0 + MINUTE });
    expect(judged.stations).toEqual(['Bm', 'Em']);
    expect(judged.cannot[0]).toEqual({ station: 'Af', why: 'busy with scan 1' });
    expect(judged.verdict).toBe('fits');
  });

  it('of a moved scan does not count its own old place', () => {
    const judged = judge(plan, { ignoreScanId: 'b', sourceId: 'src-a', startMs: T0 + 38 * MINUTE });
    expect(judged).toMatchObject({ verdict: 'fits', stations: ['Af', 'Bm', 'Cf', 'Em'] });
  });

  it('with given stations does not fit if one of them cannot', () => {
    const judged = judge(plan, { startMs: T0 + 20 * MINUTE, stations: ['Af', 'Cf'] });
    expect(judged).toMatchObject({ verdict: 'no', stations: ['Af'] });
    expect(judged.reason).toBe('Cf is below its limit');
    const busy = judge(plan, { startMs: T0, stations: ['Af', 'Bm'] });
    expect(busy).toMatchObject({ verdict: 'no', reason: 'Af is busy with scan 1' });
  });

  it('keeps what a station misses', () => {
    const startMs = T0 + 10 * MINUTE;
    const late = judge(plan, { startMs, stations: [member('Bm', 200)] });
    const whole = judge(plan, { startMs, stations: ['Bm'] });
    // joining 200 s later leaves 200 s more, and the source moves on by less than a second of slew
    expect((late.tightest?.spareSeconds ?? NaN) - (whole.tightest?.spareSeconds ?? NaN)).toBeGreaterThan(195);
  });

  it('with one station fits with a note: there is no baseline', () => {
    const judged = judge(makePlan(), { stations: ['Af'] });
    expect(judged).toMatchObject({ verdict: 'note', reason: 'Only Af can watch, so there is no baseline' });
  });

  it('that nobody sees does not fit', () => {
    const cfOnly = makePlan([], [], { stations: ['Cf'] });
    expect(judge(cfOnly, {})).toMatchObject({ verdict: 'no', reason: 'No station can watch', stations: [] });
  });

  it('outside the session does not fit', () => {
    const span = { startMs: T0, lengthSeconds: 3600 };
    const judged = judge(makePlan([], [], { span }), { startMs: T0 - 5 * MINUTE });
    expect(judged).toMatchObject({ verdict: 'no', reason: 'It starts 5 min 00 s before the session' });
  });

  it('in declined hours says so', () => {
    const away = { Af: [{ start: new Date(T0), end: new Date(T0 + MINUTE), why: 'receiver change' }] };
    const judged = judge(makePlan(), {}, makeContext({ away }));
    expect(judged.cannot).toContainEqual({ station: 'Af', why: 'away: receiver change' });
  });

  it('is not refused for a fault that the next scan has already and that does not grow', () => {
    const late = makePlan([
      makeScan('a', { stations: north }),
      makeScan('b', { stations: north, sourceId: 'src-b', startMs: T0 + 11 * MINUTE }),
    ]);
    const judged = judge(late, {
      ignoreScanId: 'a',
      sourceId: 'src-a',
      startMs: T0 - MINUTE,
      lengthSeconds: 600,
      stations: ['Af', 'Bm'],
    });
    expect(judged.verdict).toBe('fits');
    const worse = judge(late, {
      ignoreScanId: 'a',
      sourceId: 'src-a',
      startMs: T0 + 30_000,
      lengthSeconds: 600,
      stations: ['Af', 'Bm'],
    });
    expect(worse.verdict).toBe('no');
  });
});
