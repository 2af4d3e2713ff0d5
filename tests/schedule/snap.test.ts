import { describe, expect, it } from 'vitest';
import type { Placement } from '@/src/schedule/feasibility';
import { judgePlacement } from '@/src/schedule/feasibility';
import { stationPaths } from '@/src/schedule/paths';
import { snapCandidates, snapStart, type SnapCandidate, type SnapKind } from '@/src/schedule/snap';
import { visibilityWindows } from '@/src/sky/windows';
import { makeContext, SOURCES, STATIONS } from './context-maker';
import { makePlan, makeScan, member, T0 } from './plan-maker';

const MINUTE = 60_000;
const context = makeContext();
const two = [member('Af'), member('Bm')];
const plan = makePlan([
  makeScan('a', { stations: two }),
  makeScan('b', { stations: two, startMs: T0 + 40 * MINUTE }),
]);
const paths = stationPaths(plan, context);

function placement(changes: Partial<Placement> = {}): Placement {
  return {
    ignoreScanId: null,
    sourceId: 'src-c',
    modeId: 'mode-a',
    startMs: T0 + 14 * MINUTE + 123,
    lengthSeconds: 300,
    stations: ['Af', 'Bm'],
    ...changes,
  };
}

function find(kind: SnapKind, changes: Partial<Placement> = {}, grid: number | null = null) {
  return snapCandidates(plan, context, placement(changes), paths, grid).filter((one) => one.kind === kind);
}

function tightest(startMs: number): number {
  return judgePlacement(plan, context, placement({ startMs }), paths).tightest?.spareSeconds ?? NaN;
}

describe('snapping', () => {
  it('offers the end of the slowest slew on the first 10 s that keep the least spare time', () => {
    const [end] = find('slew-end');
    if (!end) throw new Error('no slew');
    expect(end.startMs % 10_000).toBe(0);
    expect(tightest(end.startMs)).toBeGreaterThanOrEqual(10);
    expect(tightest(end.startMs - 10_000)).toBeLessThan(10);
  });

  it('offers the last 10 s from which the next scan is reached with the least spare time', () => {
    const [start] = find('next-start', { startMs: T0 + 33 * MINUTE });
    if (!start) throw new Error('no next');
    expect(start.startMs % 10_000).toBe(0);
    expect(tightest(start.startMs)).toBeGreaterThanOrEqual(10);
    expect(tightest(start.startMs + 10_000)).toBeLessThan(10);
  });

  it('offers rise and set so that the whole scan is seen', () => {
    const [source, station] = [SOURCES['src-a'], STATIONS.Af];
    if (!source || !station) throw new Error('not in the catalogue');
    const span = { start: new Date(plan.span.startMs), end: new Date(plan.span.startMs + 86_400_000) };
    const windows = visibilityWindows(source.position, station, span);
    const rise = find('rise', { sourceId: 'src-a' }).find((one) => one.station === 'Af');
    const set = find('set', { sourceId: 'src-a' }).find((one) => one.station === 'Af');
    expect(rise?.startMs).toBe(Math.ceil((windows[1]?.start.getTime() ?? NaN) / 10_000) * 10_000);
    expect(set?.startMs).toBe(Math.floor(((windows[0]?.end.getTime() ?? NaN) - 300_000) / 10_000) * 10_000);
  });

  it('offers no rise or set at the ends of the session', () => {
    expect(find('rise', { sourceId: 'src-b' })).toEqual([]);
    expect(find('set', { sourceId: 'src-b' })).toEqual([]);
  });

  it('offers the grid only when there is one', () => {
    expect(find('grid')).toEqual([]);
    expect(find('grid', {}, 60)).toEqual([{ kind: 'grid', startMs: T0 + 14 * MINUTE, station: null }]);
  });

  it('of a moved scan leaves its old place out of account', () => {
    const [end] = find('slew-end', { ignoreScanId: 'a', startMs: T0 + 5 * MINUTE });
    expect(end).toBeUndefined();
  });

  it('of a new scan counts the stations that are up', () => {
    const [end] = find('slew-end', { stations: 'all-up' });
    expect(['Af', 'Bm']).toContain(end?.station);
    expect(find('slew-end', { stations: 'all-up', sourceId: 'src-b' })[0]?.station).not.toBe('Cf');
  });
});

describe('the start to take', () => {
  const at = (kind: SnapKind, seconds: number): SnapCandidate => ({
    kind,
    startMs: T0 + seconds * 1000,
    station: null,
  });

  it('is the strongest in reach, and the nearest of one kind', () => {
    const all = [at('slew-end', 50), at('next-start', 5), at('rise', -8), at('set', 4), at('grid', 1)];
    expect(snapStart(T0, all, 60_000)?.kind).toBe('slew-end');
    expect(snapStart(T0, all, 20_000)?.kind).toBe('next-start');
    expect(snapStart(T0, all.slice(2), 20_000)?.kind).toBe('set');
    expect(snapStart(T0, all, 1_000)?.kind).toBe('grid');
  });

  it('is none when nothing is in reach and there is no grid', () => {
    expect(snapStart(T0, [at('slew-end', 50)], 20_000)).toBeNull();
  });
});
