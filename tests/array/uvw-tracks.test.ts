import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { baselineLengthM } from '@/src/array/baseline';
import { geometricDelay } from '@/src/array/delay';
import { delayTracks, uvTracks, uvwTracks } from '@/src/array/uvw-tracks';
import { baselineUvw } from '@/src/array/uvw';
import { geodeticToItrf } from '@/src/sky/site';
import { EARTH_ROTATION_RAD_PER_S, SPEED_OF_LIGHT } from '@/src/units/constants';
import { anyInstantMs, anyPlace, anySource } from './place-maker';

// Truth: the exact functions, themselves against ERFA (uvw.test.ts, delay.test.ts).
const TOLERANCE = {
  /** quadratic between nodes half a day apart: fortnightly terms of nutation; relative to the length of the baseline */
  relative: 1e-9,
  /** rounding of places given from the centre of the Earth, metres */
  roundingM: 1e-8,
};

const days = fc.double({ min: 0, max: 9, noNaN: true });
const dut1Seconds = fc.double({ min: -0.9, max: 0.9, noNaN: true });

describe('tracks', () => {
  it('are baselineUvw and geometricDelay at every instant, baseline-major, in any order of time', () => {
    const places = fc.array(anyPlace, { minLength: 2, maxLength: 4 });
    const offsets = fc.array(days, { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(
        places,
        anySource,
        anyInstantMs,
        offsets,
        dut1Seconds,
        (at, s, fromMs, offsetDays, dut1) => {
          const opts = { dut1Seconds: dut1 };
          const timesMs = offsetDays.map((day) => Math.round(fromMs + day * 86_400_000));
          const tracks = uvwTracks(at, s, timesMs, opts);
          const delays = delayTracks(at, s, timesMs, opts);
          let index = 0;
          at.forEach((first, one) =>
            at.slice(one + 1).forEach((second) =>
              timesMs.forEach((ms) => {
                const exact = baselineUvw(first, second, s, new Date(ms), opts);
                const delay = geometricDelay(first, second, s, new Date(ms), opts);
                const allowedM = TOLERANCE.relative * baselineLengthM(first, second) + TOLERANCE.roundingM;
                for (const axis of ['u', 'v', 'w'] as const) {
                  expect(Math.abs((tracks[axis][index] ?? NaN) - exact[axis])).toBeLessThan(allowedM);
                }
                const [seconds, rate] = [delays.seconds[index] ?? NaN, delays.rate[index] ?? NaN];
                const allowed = allowedM / SPEED_OF_LIGHT;
                expect(Math.abs(seconds - delay.seconds)).toBeLessThan(allowed);
                expect(Math.abs(rate - delay.rate)).toBeLessThan(allowed * EARTH_ROTATION_RAD_PER_S);
                index += 1;
              }),
            ),
          );
          expect(tracks.u).toHaveLength(index);
        },
      ),
    );
  });

  it('come in wavelengths where they are asked for in them', () => {
    const at = [0, 40].map((longitudeDeg) => geodeticToItrf({ latitudeDeg: 30, longitudeDeg, heightM: 0 }));
    const [timesMs, s] = [[Date.UTC(2029, 2, 20)], { raDeg: 187, decDeg: 12 }];
    const [metres, waves] = [uvTracks(at, s, timesMs), uvTracks(at, s, timesMs, { unitM: 0.013 })];
    expect((metres.u[0] ?? NaN) / (waves.u[0] ?? NaN)).toBeCloseTo(0.013, 12);
    expect((metres.v[0] ?? NaN) / (waves.v[0] ?? NaN)).toBeCloseTo(0.013, 12);
  });

  it('are nil for two stations at one place', () => {
    const one = geodeticToItrf({ latitudeDeg: 30, longitudeDeg: 7, heightM: 0 });
    const tracks = uvwTracks([one, one], { raDeg: 187, decDeg: 12 }, [Date.UTC(2029, 2, 20)]);
    expect([...tracks.u, ...tracks.v, ...tracks.w]).toEqual([0, 0, 0]);
  });

  it('refuse what is no array, no time and no unit', () => {
    const at = [
      { x: 6e6, y: 0, z: 0 },
      { x: 0, y: 6e6, z: 0 },
    ] as const;
    const s = { raDeg: 187, decDeg: 12 };
    const timesMs = [Date.UTC(2029, 2, 20)];
    expect(() => uvTracks(at.slice(1), s, timesMs)).toThrow(RangeError);
    expect(() => uvTracks(at, s, [])).toThrow(RangeError);
    expect(() => uvTracks(at, s, [NaN])).toThrow(RangeError);
    expect(() => uvTracks(at, { raDeg: NaN, decDeg: 0 }, timesMs)).toThrow(RangeError);
    expect(() => uvTracks([at[0], { x: NaN, y: 0, z: 0 }], s, timesMs)).toThrow(RangeError);
    expect(() => uvTracks(at, s, timesMs, { unitM: 0 })).toThrow(RangeError);
  });
});
