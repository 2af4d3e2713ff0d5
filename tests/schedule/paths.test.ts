import { describe, expect, it } from 'vitest';
import { stationPaths, type PathLeg } from '@/src/schedule/paths';
import type { Plan, Scan } from '@/src/schedule/plan';
import { azEl } from '@/src/sky/position';
import { makeContext, MOUNT, SOURCES, STATIONS, withStation } from './context-maker';
import { makePlan, makeScan, member, T0 } from './plan-maker';

/** Time of one axis by the formula of uniform acceleration, written again for the test. */
function axis(distanceDeg: number, rate: number, acceleration: number): number {
  const d = Math.abs(distanceDeg);
  return d < rate ** 2 / acceleration ? 2 * Math.sqrt(d / acceleration) : d / rate + rate / acceleration;
}

function at(source: string, station: string, ms: number) {
  const [from, to] = [SOURCES[source], STATIONS[station]];
  if (!from || !to) throw new Error('not in the catalogue');
  return azEl(from.position, to.site, new Date(ms));
}

function legsOf(plan: Plan, station: string, context = makeContext()): readonly PathLeg[] {
  return stationPaths(plan, context).get(station) ?? [];
}

const inAf: Partial<Scan> = { stations: [member('Af')] };
const second = { ...inAf, sourceId: 'src-c', startMs: T0 + 900_000 };

describe('the path of a dish', () => {
  it('stands where the source is at the start and the end of each leg, late and early taken off', () => {
    const plan = makePlan([makeScan('a', { stations: [member('Af', 60, 120)] })]);
    const [leg] = legsOf(plan, 'Af');
    expect(leg?.startMs).toBe(T0 + 60_000);
    expect(leg?.stopMs).toBe(T0 + 480_000);
    // 1″ is the agreement that science asks of positions
    expect(leg?.startAzEl.azimuthDeg).toBeCloseTo(at('src-a', 'Af', T0 + 60_000).azimuthDeg, 3);
    expect(leg?.startAzEl.elevationDeg).toBeCloseTo(at('src-a', 'Af', T0 + 60_000).elevationDeg, 3);
    expect(leg?.stopAzEl.elevationDeg).toBeCloseTo(at('src-a', 'Af', T0 + 480_000).elevationDeg, 3);
    expect(leg?.minElevationDeg).toBe(leg?.stopAzEl.elevationDeg);
    expect(leg?.slewSeconds).toBeNull();
    expect(leg?.spareSeconds).toBeNull();
  });

  it('takes the slower axis and the settling, and what is left of the gap is spare', () => {
    const [, leg] = legsOf(makePlan([makeScan('a', inAf), makeScan('b', second)]), 'Af');
    const from = at('src-a', 'Af', T0 + 600_000);
    const to = at('src-c', 'Af', T0 + 900_000);
    const azimuth = axis(to.azimuthDeg - from.azimuthDeg, 0.5, 0.1);
    const elevation = axis(to.elevationDeg - from.elevationDeg, 0.4, 0.1);
    const expected = Math.max(azimuth, elevation) + 6;
    expect(leg?.slewSeconds).toBeCloseTo(expected, 2);
    expect(leg?.gapSeconds).toBe(300);
    expect(leg?.spareSeconds).toBeCloseTo(300 - expected, 2);
    expect(leg?.azimuthMoveDeg).toBeCloseTo(to.azimuthDeg - from.azimuthDeg, 3);
    const arrived = at('src-c', 'Af', T0 + 600_000 + expected * 1000);
    expect(leg?.arriveElevationDeg).toBeCloseTo(arrived.elevationDeg, 3);
    expect(leg?.fromScanId).toBe('a');
  });

  it('begins the session on the turn nearest to mid-range', () => {
    const scan = makeScan('a', { sourceId: 'src-a', stations: [member('Em')] });
    const turned = (minDeg: number, maxDeg: number) => {
      const azimuth = { ...MOUNT.azimuth, minDeg, maxDeg };
      const context = withStation('Em', { mount: { ...MOUNT, azimuth } });
      return legsOf(makePlan([scan]), 'Em', context)[0]?.motorStartDeg;
    };
    const azimuth = at('src-a', 'Em', T0).azimuthDeg;
    expect(turned(-90, 450)).toBeCloseTo(azimuth, 3);
    expect(turned(-540, 180)).toBeCloseTo(azimuth - 360, 3);
  });

  it('carries the turn of the cable from scan to scan', () => {
    const plan = makePlan([
      makeScan('a', { stations: [member('Em')] }),
      makeScan('b', { sourceId: 'src-b', startMs: T0 + 1_200_000, stations: [member('Em')] }),
    ]);
    const [first, next] = legsOf(plan, 'Em');
    // from azimuth 80° to 350°: 90° backward is shorter than 270° forward, and within −90°…450°
    expect(next?.azimuthMoveDeg).toBeLessThan(-85);
    expect(next?.motorStartDeg).toBeCloseTo((first?.motorStopDeg ?? NaN) + (next?.azimuthMoveDeg ?? NaN), 9);
  });

  it('needs no slew to stay on its source', () => {
    const plan = makePlan([makeScan('a', inAf), makeScan('b', { ...inAf, startMs: T0 + 630_000 })]);
    const [, leg] = legsOf(plan, 'Af');
    expect(leg?.slewSeconds).toBe(0);
    expect(leg?.spareSeconds).toBe(30);
  });

  it('says why where no turn of the cable lets the whole scan be tracked', () => {
    const azimuth = { minDeg: 100, maxDeg: 234, rateDegPerS: 0.5, accelDegPerS2: 0.1 };
    const context = withStation('Af', { mount: { ...MOUNT, azimuth } });
    const [leg] = legsOf(makePlan([makeScan('a', inAf)]), 'Af', context);
    expect(leg?.impossible).toMatch(/azimuth limit at 01:0\d:\d\d/);
    expect(leg?.slewSeconds).toBeNull();
  });

  it('passes over a scan that the dish cannot do', () => {
    const plan = makePlan([
      makeScan('a', { stations: [member('Cf')] }),
      makeScan('b', { sourceId: 'src-b', startMs: T0 + 900_000, stations: [member('Cf')] }),
      makeScan('c', { startMs: T0 + 1_800_000, stations: [member('Cf')] }),
    ]);
    const legs = legsOf(plan, 'Cf');
    expect(legs.map(({ impossible }) => impossible !== null)).toEqual([false, true, false]);
    expect(legs[2]?.fromScanId).toBe('a');
    expect(legs[2]?.slewSeconds).toBe(0);
  });

  it('comes from the scan that ends last where scans overlap', () => {
    const plan = makePlan([
      makeScan('a', { ...inAf, lengthSeconds: 1800 }),
      makeScan('b', { ...inAf, sourceId: 'src-b', startMs: T0 + 60_000, lengthSeconds: 60 }),
      makeScan('c', { ...inAf, sourceId: 'src-c', startMs: T0 + 600_000 }),
    ]);
    const legs = legsOf(plan, 'Af');
    expect(legs.map(({ fromScanId }) => fromScanId)).toEqual([null, 'a', 'a']);
    expect(legs.map(({ gapSeconds }) => gapSeconds)).toEqual([null, -1740, -1200]);
  });

  it('is the same after a change and back, and the same from scratch', () => {
    const scans = [
      makeScan('a', inAf),
      makeScan('b', second),
      makeScan('c', { ...inAf, startMs: T0 + 2_000_000 }),
    ];
    const plan = makePlan(scans);
    const before = structuredClone(legsOf(plan, 'Af'));
    const moved = {
      ...plan,
      scans: plan.scans.map((s) => (s.id === 'b' ? { ...s, startMs: s.startMs + 60_000 } : s)),
    };
    const fresh = structuredClone(moved);
    expect(legsOf(moved, 'Af')).toEqual(legsOf(fresh, 'Af'));
    expect(legsOf({ ...plan }, 'Af')).toEqual(before);
  });

  it('leaves out what is in no catalogue', () => {
    const plan = makePlan([makeScan('a', { ...inAf, sourceId: 'gone' }), makeScan('b', second)]);
    expect(legsOf(plan, 'Af').map(({ scanId }) => scanId)).toEqual(['b']);
    expect(legsOf(plan, 'Em')).toEqual([]);
  });
});
