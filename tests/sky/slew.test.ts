import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  axisSeconds,
  firstPointing,
  pointingAtEnd,
  slewBetween,
  slewMotion,
  startPointing,
} from '@/src/sky/slew';
import { azEl } from '@/src/sky/position';
import type { AzElMount } from '@/src/sky/types';
import { normalise180 } from '@/src/units/angle';
import slew from '../reference/slew.json';

// Truth: brute force over all turns with numpy (reference/slew.json).
const TOLERANCE = {
  /** digits of the reference */
  seconds: 1e-6,
  motorDeg: 1e-6,
  /** closed form against numerical integration of the speed, 20 000 steps */
  integratedSeconds: 0.01,
};

const mounts = new Map<string, AzElMount>(
  slew.telescopes.map((t) => [
    t.name,
    {
      kind: 'az-el',
      azimuth: { minDeg: t.az_min, maxDeg: t.az_max, rateDegPerS: t.az_rate, accelDegPerS2: t.az_acc },
      elevation: { minDeg: t.el_min, maxDeg: t.el_max, rateDegPerS: t.el_rate, accelDegPerS2: t.el_acc },
      settleSeconds: t.settle,
    },
  ]),
);

function mountNamed(name: string): AzElMount {
  const mount = mounts.get(name);
  if (!mount) throw new Error(`No mount ${name} in the reference`);
  return mount;
}

const at = (motorAzimuthDeg: number, elevationDeg: number) => ({
  azimuthDeg: ((motorAzimuthDeg % 360) + 360) % 360,
  elevationDeg,
  motorAzimuthDeg,
});

describe('slewMotion', () => {
  it('finds the quickest legal turn in all 30 reference cases', () => {
    expect(slew.cases).toHaveLength(30);
    let impossible = 0;
    for (const c of slew.cases) {
      const motion = slewMotion(mountNamed(c.telescope), at(c.from.az, c.from.el), {
        azimuthDeg: c.to.az,
        elevationDeg: c.to.el,
      });
      if ('impossible' in motion) {
        expect(c.best, c.id).toBeNull();
        impossible += 1;
        continue;
      }
      if (!c.best) throw new Error(`${c.id}: a motion where the reference has none`);
      expect(Math.abs(motion.seconds - c.best.total), c.id).toBeLessThan(TOLERANCE.seconds);
      const legal = c.tie ? c.options.map((option) => option.az) : [c.best.az];
      const off = Math.min(...legal.map((az) => Math.abs(az - motion.motorAzimuthDeg)));
      expect(off, c.id).toBeLessThan(TOLERANCE.motorDeg);
    }
    expect(impossible).toBe(slew.cases.filter((c) => !c.best).length);
  });

  it('says why there is none', () => {
    const heavy = mountNamed('heavy');
    const from = at(120, 40);
    expect(slewMotion(heavy, from, { azimuthDeg: 150, elevationDeg: 6.5 })).toMatchObject({
      impossible: 'would be below the mount’s lowest 8°',
    });
    expect(slewMotion(heavy, from, { azimuthDeg: 14, elevationDeg: 50 })).toMatchObject({
      impossible: 'cannot turn to azimuth 14°',
    });
  });

  it('takes the turn nearest to mid-range when two are equally quick', () => {
    const wide = mountNamed('offset wrap');
    const motion = slewMotion(wide, at(400, 30), { azimuthDeg: 220, elevationDeg: 31 });
    expect(motion).toMatchObject({ motorAzimuthDeg: 580 });
  });

  it('takes as long back as there, and no longer than by way of a third place', () => {
    const place = fc.record({
      az: fc.double({ min: -268, max: 267, noNaN: true }),
      el: fc.double({ min: 5, max: 88, noNaN: true }),
    });
    const light = mountNamed('light');
    const { azimuth, elevation } = light;
    type Place = { az: number; el: number };
    // on given turns: of the turns that show a direction the nearer may be another
    const seconds = (a: Place, b: Place) =>
      Math.max(axisSeconds(b.az - a.az, azimuth), axisSeconds(b.el - a.el, elevation));
    fc.assert(
      fc.property(place, place, place, (a, b, c) => {
        const motion = slewMotion(light, at(a.az, a.el), { azimuthDeg: b.az, elevationDeg: b.el });
        if ('impossible' in motion) throw new Error(motion.impossible);
        expect(motion.seconds).toBeLessThanOrEqual(seconds(a, b) + light.settleSeconds);
        const back = slewMotion(
          light,
          { ...at(motion.motorAzimuthDeg, b.el), motorAzimuthDeg: motion.motorAzimuthDeg },
          { azimuthDeg: a.az, elevationDeg: a.el },
        );
        expect(back).toMatchObject({ seconds: expect.toSatisfy((s: number) => s <= motion.seconds + 1e-9) });
        expect(seconds(a, c)).toBeLessThanOrEqual(seconds(a, b) + seconds(b, c));
      }),
    );
  });

  it('refuses what is no place and no mount, and reaches zenith and nadir where the mount does', () => {
    const light = mountNamed('light');
    const to = { azimuthDeg: 10, elevationDeg: 40 };
    expect(() => slewMotion(light, at(NaN, 40), to)).toThrow(RangeError);
    expect(() => slewMotion(light, at(0, 40), { ...to, azimuthDeg: Infinity })).toThrow(RangeError);
    expect(() => slewMotion(light, at(0, 40), { ...to, elevationDeg: NaN })).toThrow(RangeError);
    const azimuth = { ...light.azimuth, minDeg: 90, maxDeg: -90 };
    expect(() => slewMotion({ ...light, azimuth }, at(0, 40), to)).toThrow(RangeError);
    expect(() => slewMotion({ ...light, settleSeconds: -1 }, at(0, 40), to)).toThrow(RangeError);
    const elevation = { ...light.elevation, minDeg: -90, maxDeg: 90 };
    for (const elevationDeg of [-90, 90]) {
      const seconds = axisSeconds(elevationDeg - 40, elevation);
      const motion = slewMotion({ ...light, elevation }, at(10, 40), { azimuthDeg: 10, elevationDeg });
      expect(motion).toEqual({ seconds, motorAzimuthDeg: 10 });
    }
  });

  it('takes no time, not even to settle, when nothing moves', () => {
    const medium = mountNamed('medium');
    expect(slewMotion(medium, at(30, 40), { azimuthDeg: 30, elevationDeg: 40 })).toEqual({
      seconds: 0,
      motorAzimuthDeg: 30,
    });
  });
});

describe('axisSeconds', () => {
  it('grows with distance and joins its two forms without a step', () => {
    const axis = { rateDegPerS: 0.8, accelDegPerS2: 0.3 };
    const corner = axis.rateDegPerS ** 2 / axis.accelDegPerS2;
    expect(axisSeconds(corner - 1e-9, axis)).toBeCloseTo(axisSeconds(corner, axis), 7);
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 500, noNaN: true }),
        fc.double({ min: 0.01, max: 5, noNaN: true }),
        (d, more) => {
          expect(axisSeconds(d + more, axis)).toBeGreaterThan(axisSeconds(d, axis));
          expect(axisSeconds(-d, axis)).toBe(axisSeconds(d, axis));
        },
      ),
    );
  });

  it('is no longer than two ways one after the other, however they lead', () => {
    const some = fc.double({ min: 0.001, max: 10, noNaN: true });
    const place = fc.double({ min: -270, max: 450, noNaN: true });
    fc.assert(
      fc.property(some, some, place, place, place, (rateDegPerS, accelDegPerS2, a, b, c) => {
        const seconds = (from: number, to: number) => axisSeconds(to - from, { rateDegPerS, accelDegPerS2 });
        expect(seconds(a, c)).toBeLessThanOrEqual((seconds(a, b) + seconds(b, c)) * (1 + 1e-12));
        expect(seconds(a, c)).toBe(seconds(c, a));
      }),
    );
  });

  it('agrees with a speed that is integrated in small steps', () => {
    const axis = { rateDegPerS: 0.8, accelDegPerS2: 0.3 };
    for (const distance of [0.4, 2, 2.2, 35]) {
      const total = axisSeconds(distance, axis);
      const step = total / 20_000;
      let gone = 0;
      for (let t = step / 2; t < total; t += step) {
        const speed = Math.min(axis.accelDegPerS2 * Math.min(t, total - t), axis.rateDegPerS);
        gone += speed * step;
      }
      expect(Math.abs(gone - distance) / axis.rateDegPerS).toBeLessThan(TOLERANCE.integratedSeconds);
    }
  });

  it('refuses a drive that does not move', () => {
    expect(() => axisSeconds(1, { rateDegPerS: 0, accelDegPerS2: 1 })).toThrow(RangeError);
    expect(() => axisSeconds(NaN, { rateDegPerS: 1, accelDegPerS2: 1 })).toThrow(RangeError);
    expect(() => axisSeconds(1, { rateDegPerS: Infinity, accelDegPerS2: 1 })).toThrow(RangeError);
    expect(() => axisSeconds(1, { rateDegPerS: 1, accelDegPerS2: NaN })).toThrow(RangeError);
  });
});

describe('startPointing', () => {
  it('stands on the turn nearest to the middle of the range', () => {
    const wide = mountNamed('offset wrap'); // 95…715, middle 405
    expect(
      startPointing(
        { site: { latitudeDeg: 50, longitudeDeg: 10, heightM: 0 }, mount: wide },
        { azimuthDeg: 100, elevationDeg: 45 },
      ),
    ).toMatchObject({
      motorAzimuthDeg: 460,
    });
    expect(
      startPointing(
        { site: { latitudeDeg: 50, longitudeDeg: 10, heightM: 0 }, mount: wide },
        { azimuthDeg: 300, elevationDeg: 45 },
      ),
    ).toMatchObject({
      motorAzimuthDeg: 300,
    });
  });
});

describe('slews along scans', () => {
  // invented: a site in the north, a source that passes north of its zenith, through azimuth 0 from east to west
  const site = { latitudeDeg: 50, longitudeDeg: 10, heightM: 100 };
  const mount: AzElMount = {
    kind: 'az-el',
    azimuth: { minDeg: -90, maxDeg: 450, rateDegPerS: 1, accelDegPerS2: 0.5 },
    elevation: { minDeg: 5, maxDeg: 89, rateDegPerS: 0.5, accelDegPerS2: 0.5 },
    settleSeconds: 5,
  };
  const station = { site, mount };
  const south = { raDeg: 100, decDeg: 10 };
  const transitMs = highestMinute(south);
  const scanAt = (minutes: number, lengthMinutes: number) => ({
    start: new Date(transitMs + minutes * 60_000),
    end: new Date(transitMs + (minutes + lengthMinutes) * 60_000),
  });

  function highestMinute(source: { raDeg: number; decDeg: number }): number {
    const startMs = Date.UTC(2028, 2, 1);
    let best = { ms: startMs, el: -90 };
    for (let ms = startMs; ms < startMs + 86_400_000; ms += 60_000) {
      const el = azEl(source, site, new Date(ms)).elevationDeg;
      if (el > best.el) best = { ms, el };
    }
    return best.ms;
  }

  it('give the pointing at the start of the scan', () => {
    const to = { source: south, scan: scanAt(-30, 10) };
    const slewed = slewBetween(station, at(170, 40), to);
    if ('impossible' in slewed) throw new Error(slewed.impossible);
    const seen = azEl(south, site, to.scan.start);
    expect(slewed.pointing.azimuthDeg).toBeCloseTo(seen.azimuthDeg, 5);
    expect(slewed.pointing.elevationDeg).toBeCloseTo(seen.elevationDeg, 5);
    expect(slewed.pointing.motorAzimuthDeg).toBeCloseTo(seen.azimuthDeg, 5);
  });

  it('leave the quickest turn when the scan would run into the limit on it', () => {
    const narrow = { site, mount: { ...mount, azimuth: { ...mount.azimuth, minDeg: -190, maxDeg: 190 } } };
    const to = { source: south, scan: scanAt(-10, 120) };
    const from = at(175, 50);
    const short = slewBetween(narrow, from, { source: south, scan: scanAt(-10, 12) });
    const long = slewBetween(narrow, from, to);
    if ('impossible' in short || 'impossible' in long) throw new Error('both scans can be tracked');
    expect(short.pointing.motorAzimuthDeg).toBeGreaterThan(170);
    expect(long.pointing.motorAzimuthDeg).toBeCloseTo(short.pointing.motorAzimuthDeg - 360, 6);
    expect(long.seconds).toBeGreaterThan(short.seconds + 300);
  });

  it('say when the limit would be met if no turn lasts', () => {
    const stopped = { site, mount: { ...mount, azimuth: { ...mount.azimuth, minDeg: 0, maxDeg: 185 } } };
    const answer = slewBetween(stopped, at(175, 50), { source: south, scan: scanAt(-10, 120) });
    if (!('impossible' in answer) || answer.atMs === null) throw new Error('no limit met');
    const clock = new Date(answer.atMs).toISOString().slice(11, 19);
    expect(answer.impossible).toBe(`would run into the azimuth limit at ${clock}`);
    expect(azEl(south, site, new Date(answer.atMs)).azimuthDeg).toBeCloseTo(185, 4);
  });

  it('say when the source would leave the mount’s elevations', () => {
    const answer = slewBetween(station, at(175, 50), { source: south, scan: scanAt(300, 180) });
    if (!('impossible' in answer) || answer.atMs === null) throw new Error('it does not set');
    expect(answer.limit).toBe('second');
    expect(azEl(south, site, new Date(answer.atMs)).elevationDeg).toBeCloseTo(5, 4);
  });

  it('carry the turn on to the end of the scan through north', () => {
    const polar = { raDeg: 100, decDeg: 70 };
    const upperMs = highestMinute(polar); // above the pole it goes from east over north to west
    const to = {
      source: polar,
      scan: { start: new Date(upperMs - 3_600_000), end: new Date(upperMs + 3_600_000) },
    };
    const start = firstPointing(station, to);
    if ('impossible' in start) throw new Error(start.impossible);
    const end = pointingAtEnd(station, start, to);
    expect(end.motorAzimuthDeg).toBeLessThan(start.motorAzimuthDeg);
    expect(start.motorAzimuthDeg - end.motorAzimuthDeg).toBeLessThan(180);
    expect(normalise180(end.motorAzimuthDeg - end.azimuthDeg)).toBeCloseTo(0, 6);
    expect(end.azimuthDeg).toBeCloseTo(azEl(polar, site, to.scan.end).azimuthDeg, 5);
  });

  it('start a station on the turn nearest to mid-range that lasts', () => {
    const wide = firstPointing(station, { source: south, scan: scanAt(-30, 60) });
    expect(wide).toMatchObject({ motorAzimuthDeg: expect.closeTo(wrapped(scanAt(-30, 60).start), 5) });
    function wrapped(start: Date): number {
      return azEl(south, site, start).azimuthDeg; // about 160, the middle of −90…450 is 180
    }
  });

  it('say when azimuth would have to turn too fast near the zenith', () => {
    const zenithal = { raDeg: 100, decDeg: 50.1 };
    const slow = {
      site,
      mount: {
        ...mount,
        azimuth: { ...mount.azimuth, rateDegPerS: 0.3 },
        elevation: { ...mount.elevation, maxDeg: 90 },
      },
    };
    const upperMs = highestMinute(zenithal);
    const scan = { start: new Date(upperMs - 1_800_000), end: new Date(upperMs + 1_800_000) };
    const answer = firstPointing(slow, { source: zenithal, scan });
    if (!('impossible' in answer) || answer.atMs === null) throw new Error('not too fast');
    expect(answer).toMatchObject({ kind: 'too-fast', limit: 'first' });
    expect(answer.impossible).toMatch(/^would be too slow in azimuth to follow at \d\d:\d\d:\d\d$/);
    const azimuthAt = (ms: number) => azEl(zenithal, site, new Date(ms)).azimuthDeg;
    const rateAt = (ms: number) => Math.abs(normalise180(azimuthAt(ms + 1000) - azimuthAt(ms - 1000))) / 2;
    expect(rateAt(answer.atMs)).toBeCloseTo(0.3, 2);
    expect(rateAt(answer.atMs - 30_000)).toBeLessThan(0.3);
    const quick = { ...slow, mount: { ...slow.mount, azimuth: { ...mount.azimuth, rateDegPerS: 6 } } };
    expect(firstPointing(quick, { source: zenithal, scan })).not.toHaveProperty('impossible');
  });

  it('refuse a scan without length', () => {
    const now = new Date(transitMs);
    expect(() => slewBetween(station, at(0, 45), { source: south, scan: { start: now, end: now } })).toThrow(
      RangeError,
    );
  });
});
