import { describe, expect, it } from 'vitest';
import { prospectOf, type ProspectInput, type ProspectStation } from '@/src/outlook/prospect';

const station = (code: string, latitudeDeg: number, longitudeDeg: number): ProspectStation => ({
  code,
  site: { latitudeDeg, longitudeDeg, heightM: 0 },
  minElevationDeg: 10,
  maxElevationDeg: 89,
  bits: 2,
  recorderFreeBytes: 1e12,
});

const input: ProspectInput = {
  stations: [station('Aa', 50, 0), station('Bb', 52, 12), station('Cc', 46, -110)],
  sources: [
    { id: 'never-sets', position: { raDeg: 10, decDeg: 80 }, isTarget: true },
    { id: 'never-rises', position: { raDeg: 10, decDeg: -80 }, isTarget: true },
    { id: 'rises', position: { raDeg: 120, decDeg: 10 }, isTarget: false },
  ],
  span: { start: new Date('2027-02-12T20:00:00Z'), end: new Date('2027-02-13T20:00:00Z') },
  minElevationDeg: 5,
  recording: { bandwidthHz: 128e6, bits: 2 },
};

describe('what a session would find', () => {
  it('counts every station where a source never sets, and none where it never rises', () => {
    const { counts } = prospectOf(input);
    expect(counts[0]?.steps).toEqual([
      { startMs: input.span.start.getTime(), endMs: input.span.end.getTime(), up: 3 },
    ]);
    expect(counts[1]?.steps.map(({ up }) => up)).toEqual([0]);
  });

  it('covers the whole span without gap or overlap', () => {
    const steps = prospectOf(input).counts[2]?.steps ?? [];
    expect(steps.length).toBeGreaterThan(2);
    expect(steps.at(0)?.startMs).toBe(input.span.start.getTime());
    expect(steps.at(-1)?.endMs).toBe(input.span.end.getTime());
    for (const [index, step] of steps.slice(1).entries()) expect(step.startMs).toBe(steps[index]?.endMs);
  });

  it('takes only targets for the time together', () => {
    expect(prospectOf(input).allSeconds).toBe(86_400);
    const finders = input.sources.map((source) => ({ ...source, isTarget: false }));
    expect(prospectOf({ ...input, sources: finders }).allSeconds).toBe(0);
  });

  it('gives the lesser bits of mode and station, and half the time', () => {
    const stations = [station('Aa', 50, 0), { ...station('Bb', 52, 12), bits: 1 as const }];
    const { recorded } = prospectOf({ ...input, stations });
    // 2 · 128 MHz · 2 bit = 512 Mb/s; half of 24 h at 512 Mb/s is 2.7648 TB
    expect(recorded.map(({ bitsPerS }) => bitsPerS)).toEqual([512e6, 256e6]);
    expect(recorded[0]?.bytes).toBeCloseTo(2.7648e12, -3);
  });

  it('has a value for no station, one station and no mode', () => {
    const none = prospectOf({ ...input, stations: [], recording: null });
    expect(none).toMatchObject({ allSeconds: 0, baselines: { count: 0, longestM: 0 }, recorded: [] });
    const one = prospectOf({ ...input, stations: [station('Aa', 50, 0)] });
    expect(one).toMatchObject({ allSeconds: 86_400, allButOneSeconds: 0, baselines: { count: 0 } });
  });

  it('takes a lowest elevation above a station’s highest as never up', () => {
    const high = prospectOf({ ...input, minElevationDeg: 90 });
    expect(high.counts.every(({ steps }) => steps.every(({ up }) => up === 0))).toBe(true);
  });
});
