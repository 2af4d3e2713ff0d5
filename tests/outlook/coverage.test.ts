import { describe, expect, it } from 'vitest';
import { baselineLengthM } from '@/src/array/baseline';
import { coverageOf, observedIn } from '@/src/outlook/coverage';
import { geodeticToItrf } from '@/src/sky/site';
import { SPEED_OF_LIGHT } from '@/src/units/constants';
import { makeContext, MODE, STATIONS, withStation } from '../schedule/context-maker';
import { makePlan, makeScan, member, T0 } from '../schedule/plan-maker';
import { byHand } from './hand';

const wanted = { sourceId: 'src-a', band: '8.4 GHz', stepSeconds: 120 };
const pair = makePlan([makeScan('a')]);
const lengthM = (first: string, second: string) => {
  const [a, b] = [STATIONS[first], STATIONS[second]];
  if (!a || !b) throw new Error('no station');
  return baselineLengthM(geodeticToItrf(a.site), geodeticToItrf(b.site));
};

describe('the coverage of a source', () => {
  it('has one track for each baseline and scan, both ends included', () => {
    const stations = ['Af', 'Bm', 'Em'].map((code) => member(code));
    const plan = makePlan([makeScan('a', { stations }), makeScan('b', { startMs: T0 + 900_000 })]);
    const { tracks, scans } = coverageOf(plan, makeContext(), wanted);
    expect(tracks.map(({ scanId, first, second }) => `${scanId} ${first}–${second}`)).toEqual([
      'a Em–Af',
      'a Em–Bm',
      'a Af–Bm',
      'b Af–Bm',
    ]);
    expect(tracks.every(({ points }) => points.length === 6)).toBe(true);
    expect(scans).toEqual(['a', 'b']);
  });

  it('never reaches farther than the stations lie apart', () => {
    const { longest, shortest, resolutionRad, largestScaleRad } = coverageOf(pair, makeContext(), wanted);
    const most = (lengthM('Af', 'Bm') * MODE.skyHz) / SPEED_OF_LIGHT;
    expect(longest?.wavelengths).toBeLessThanOrEqual(most);
    expect(longest?.wavelengths).toBeGreaterThan(shortest?.wavelengths ?? Infinity);
    expect(longest?.metres).toBeLessThanOrEqual(lengthM('Af', 'Bm'));
    expect((longest?.wavelengths ?? 0) * (resolutionRad ?? 0)).toBeCloseTo(1, 12);
    expect((shortest?.wavelengths ?? 0) * (largestScaleRad ?? 0)).toBeCloseTo(1, 12);
  });

  it('has the noise of one baseline, two products, from the formula', () => {
    const { imageNoiseJy } = coverageOf(pair, makeContext(), wanted);
    expect(imageNoiseJy).toBeCloseTo(byHand().sigma / Math.SQRT2, 12);
  });

  it('has half the noise of four times as many scans', () => {
    const four = makePlan([0, 1, 2, 3].map((k) => makeScan(`s${k}`, { startMs: T0 + k * 700_000 })));
    const one = coverageOf(pair, makeContext(), wanted).imageNoiseJy ?? 0;
    expect(coverageOf(four, makeContext(), wanted).imageNoiseJy).toBeCloseTo(one / 2, 12);
  });

  it('counts the time on source once, and each baseline’s own', () => {
    const stations = [member('Af'), member('Bm', 60), member('Em', 0, 120)];
    const { onSourceSeconds, stationSeconds, baselineSeconds } = coverageOf(
      makePlan([makeScan('a', { stations })]),
      makeContext(),
      wanted,
    );
    expect(onSourceSeconds).toBe(600);
    expect(stationSeconds).toMatchObject({ Af: 600, Bm: 540, Em: 480 });
    const secondsOf = (first: string, second: string) =>
      baselineSeconds.find((one) => one.first === first && one.second === second)?.seconds;
    expect([secondsOf('Af', 'Bm'), secondsOf('Em', 'Af'), secondsOf('Em', 'Bm')]).toEqual([540, 480, 420]);
  });

  it('leaves out what another source, another band or a declined hour takes', () => {
    const away = { Bm: [{ start: new Date(T0), end: new Date(T0 + 600_000), why: 'wind' }] };
    const nothing = {
      tracks: [],
      longest: null,
      resolutionRad: null,
      imageNoiseJy: null,
      onSourceSeconds: 0,
    };
    expect(coverageOf(pair, makeContext(), { ...wanted, sourceId: 'src-b' })).toMatchObject(nothing);
    expect(coverageOf(pair, makeContext(), { ...wanted, band: '22 GHz' })).toMatchObject(nothing);
    expect(coverageOf(pair, makeContext({ away }), wanted)).toMatchObject(nothing);
  });

  it('says whose SEFD is not known, and gives no noise without a baseline', () => {
    const context = withStation('Bm', { sefdJy: {} });
    expect(coverageOf(pair, context, wanted)).toMatchObject({ imageNoiseJy: null, withoutSefd: ['Bm'] });
    expect(coverageOf(pair, context, wanted).tracks).toHaveLength(1);
  });

  it('lists what is observed, and in which band', () => {
    const plan = makePlan([makeScan('a'), makeScan('b', { sourceId: 'src-c' }), makeScan('c')]);
    expect(observedIn(plan, makeContext())).toEqual([
      { sourceId: 'src-a', band: '8.4 GHz' },
      { sourceId: 'src-c', band: '8.4 GHz' },
    ]);
  });
});
