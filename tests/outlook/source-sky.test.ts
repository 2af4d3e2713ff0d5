import { describe, expect, it } from 'vitest';
import { sourceSky } from '@/src/outlook/source-sky';
import { azEl } from '@/src/sky/position';
import { makeContext, SOURCES, STATIONS, withStation } from '../schedule/context-maker';
import { makePlan, makeScan, member, T0 } from '../schedule/plan-maker';

const wanted = { sourceId: 'src-a', band: '8.4 GHz', stepSeconds: 600 };
const stations = ['Af', 'Bm'].map((code) => member(code));
const plan = makePlan([makeScan('a', { stations }), makeScan('b', { stations: [member('Bm', 60)] })]);

describe('a source over the stations of a plan', () => {
  it('has the scans each station takes part in, in its own hours', () => {
    const skies = sourceSky(plan, makeContext(), wanted);
    const scansOf = (code: string) => skies.find((one) => one.code === code)?.scans ?? [];
    expect(scansOf('Af').map(({ scanId }) => scanId)).toEqual(['a']);
    expect(scansOf('Bm').map(({ scanId, startMs }) => [scanId, startMs])).toEqual([
      ['a', T0],
      ['b', T0 + 60_000],
    ]);
  });

  it('points where azEl points, to 0.001°', () => {
    const [af] = sourceSky(plan, makeContext(), wanted).filter(({ code }) => code === 'Af');
    const [azimuthDeg = NaN, elevationDeg = NaN] = af?.scans[0]?.points[0] ?? [];
    const source = SOURCES['src-a'];
    const site = STATIONS['Af']?.site;
    if (!source || !site) throw new Error('no such pair');
    const there = azEl(source.position, site, new Date(T0));
    expect(Math.abs(azimuthDeg - there.azimuthDeg)).toBeLessThan(0.001);
    expect(Math.abs(elevationDeg - there.elevationDeg)).toBeLessThan(0.001);
  });

  it('draws lines only above the lowest limit, from edge to edge', () => {
    const context = makeContext();
    for (const { lines } of sourceSky(plan, context, wanted)) {
      for (const line of lines) {
        expect(line.length).toBeGreaterThan(1);
        for (const [, elevationDeg] of line) expect(elevationDeg).toBeGreaterThan(7.99);
      }
    }
  });

  it('has the mask as its ground where it is above the limit', () => {
    const hill = [
      { azimuthDeg: 0, elevationDeg: 0 },
      { azimuthDeg: 90, elevationDeg: 20 },
      { azimuthDeg: 180, elevationDeg: 0 },
    ];
    const context = withStation('Af', { horizon: hill });
    const [af] = sourceSky(plan, context, wanted).filter(({ code }) => code === 'Af');
    expect(af?.ground).toHaveLength(72);
    expect(af?.ground.find(([azimuthDeg]) => azimuthDeg === 90)).toEqual([90, 20]);
    expect(af?.ground.find(([azimuthDeg]) => azimuthDeg === 270)).toEqual([270, 8]);
  });

  it('is empty for a source that is not there', () => {
    expect(sourceSky(plan, makeContext(), { ...wanted, sourceId: 'nobody' })).toEqual([]);
  });
});
