import { describe, expect, it } from 'vitest';
import { applyCommand, CommandRefused, type Command } from '@/src/schedule/commands';
import { addScan } from '@/src/schedule/gestures/add-scan';
import { changeLength } from '@/src/schedule/gestures/change-length';
import { editScan } from '@/src/schedule/gestures/edit-scan';
import { moveScan } from '@/src/schedule/gestures/move-scan';
import { removeScan } from '@/src/schedule/gestures/remove-scan';
import { toggleStation } from '@/src/schedule/gestures/toggle-station';
import type { Plan } from '@/src/schedule/plan';
import { makeContext } from './context-maker';
import { makeGroup, makePlan, makeScan, member, T0 } from './plan-maker';

const plan = makePlan([makeScan('a')]);

function after(command: Command, from: Plan = plan): Plan {
  return applyCommand(from, command).plan;
}

function codes(of: Plan, id: string): string[] | undefined {
  return of.scans.find((scan) => scan.id === id)?.stations.map(({ station }) => station);
}

const fresh = { id: 'new', sourceId: 'src-b', modeId: 'mode-a', startMs: T0 + 1_800_000, lengthSeconds: 300 };

describe('a new scan', () => {
  it('takes the stations that see the source all the time, by code', () => {
    const command = addScan(plan, makeContext(), fresh);
    expect(command.verb).toBe('add-scan');
    // src-b never rises at Cf
    expect(codes(after(command), 'new')).toEqual(['Af', 'Bm', 'Em']);
  });

  it('leaves out those that are busy, so that it may lie beside another scan', () => {
    const command = addScan(plan, makeContext(), { ...fresh, startMs: T0 });
    expect(codes(after(command), 'new')).toEqual(['Em']);
  });

  it('takes the stations it is given, sorted', () => {
    const command = addScan(plan, makeContext(), { ...fresh, stations: ['Em', 'Cf'] });
    expect(codes(after(command), 'new')).toEqual(['Cf', 'Em']);
  });
});

describe('a moved scan', () => {
  it('keeps its length, its stations and what they miss', () => {
    const from = makePlan([makeScan('a', { stations: [member('Af', 60), member('Bm')] })]);
    const moved = after(moveScan(from, 'a', T0 + 60_000), from).scans[0];
    expect(moved).toEqual({ ...from.scans[0], startMs: T0 + 60_000 });
  });

  it('takes its nodding group along', () => {
    const leg = (id: string, startMs: number) => makeScan(id, { startMs, groupId: 'g1', leg: 'target' });
    const from = makePlan([leg('l1', T0), leg('l2', T0 + 700_000)], [makeGroup('g1')]);
    const moved = after(moveScan(from, 'l2', T0 + 760_000), from);
    expect(moved.scans.map(({ startMs }) => startMs)).toEqual([T0 + 60_000, T0 + 760_000]);
  });

  it('may change who takes part; who stays keeps being late', () => {
    const from = makePlan([makeScan('a', { stations: [member('Af', 60), member('Bm')] })]);
    const moved = after(moveScan(from, 'a', T0, ['Em', 'Af']), from);
    expect(moved.scans[0]?.stations).toEqual([member('Af', 60), member('Em')]);
  });

  it('that is gone is refused with a sentence', () => {
    expect(() => moveScan(plan, 'gone', T0)).toThrow(CommandRefused);
    expect(() => moveScan(plan, 'gone', T0)).toThrow('This scan is no longer in the plan. It was removed.');
  });
});

describe('a scan’s length', () => {
  it('changes at its end, and a station with nothing left is left out', () => {
    const from = makePlan([makeScan('a', { stations: [member('Af', 300), member('Bm')] })]);
    const shorter = after(changeLength(from, 'a', 300), from);
    expect(shorter.scans[0]).toMatchObject({ startMs: T0, lengthSeconds: 300, stations: [member('Bm')] });
    expect(codes(after(changeLength(from, 'a', 301), from), 'a')).toEqual(['Af', 'Bm']);
  });

  it('of zero is refused', () => {
    expect(() => after(changeLength(plan, 'a', 0))).toThrow(/cannot last 0 s/);
  });
});

describe('a station', () => {
  it('is taken out and put in again by the same gesture', () => {
    const out = toggleStation(plan, 'a', 'Af');
    expect(out.verb).toBe('take-station-out');
    const without = after(out);
    expect(codes(without, 'a')).toEqual(['Bm']);
    const back = toggleStation(without, 'a', 'Af');
    expect(back.verb).toBe('put-station-in');
    expect(after(back, without)).toEqual(plan);
  });
});

describe('a removed scan', () => {
  it('is gone, and its group with the last leg', () => {
    expect(after(removeScan(plan, 'a')).scans).toEqual([]);
    const leg = (id: string) => makeScan(id, { groupId: 'g1', leg: 'target' });
    const from = makePlan([leg('l1'), leg('l2')], [makeGroup('g1')]);
    const one = after(removeScan(from, 'l1'), from);
    expect(one.groups).toHaveLength(1);
    expect(after(removeScan(one, 'l2'), one)).toMatchObject({ scans: [], groups: [] });
  });
});

describe('an edited scan', () => {
  it('has the new fields and keeps the rest', () => {
    const edited = after(editScan(plan, 'a', { comment: 'windy', sourceId: 'src-c' }));
    expect(edited.scans[0]).toEqual({ ...plan.scans[0], comment: 'windy', sourceId: 'src-c' });
  });
});
