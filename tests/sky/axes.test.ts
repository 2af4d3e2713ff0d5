import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { axisAngles } from '@/src/sky/axes';
import { firstPointing, pointingAtEnd, slewBetween, startPointing } from '@/src/sky/slew';
import { trackHourAngleDeg, trackOf } from '@/src/sky/track';
import type { HaDecMount, XyMount } from '@/src/sky/types';
import { degToRad, normalise180 } from '@/src/units/angle';

const SITE = { latitudeDeg: 50, longitudeDeg: 10, heightM: 100 };
const DRIVE = { rateDegPerS: 0.2, accelDegPerS2: 0.05 };
const EQUATORIAL: HaDecMount = {
  kind: 'ha-dec',
  hourAngle: { minDeg: -95, maxDeg: 95, ...DRIVE },
  declination: { minDeg: -30, maxDeg: 88, ...DRIVE },
  settleSeconds: 5,
};
const XY: XyMount = {
  kind: 'xy-ns',
  x: { minDeg: -80, maxDeg: 80, ...DRIVE },
  y: { minDeg: -80, maxDeg: 80, ...DRIVE },
  settleSeconds: 5,
};
const START = Date.UTC(2029, 2, 20, 18);
const scanAt = (hours: number, minutes = 10) => ({
  start: new Date(START + hours * 3_600_000),
  end: new Date(START + hours * 3_600_000 + minutes * 60_000),
});

describe('axisAngles', () => {
  it('of every kind give the direction back', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 359.9, noNaN: true }),
        fc.double({ min: -89, max: 89, noNaN: true }),
        fc.double({ min: -90, max: 90, noNaN: true }),
        (azimuthDeg, elevationDeg, latitudeDeg) => {
          const [az, el, lat] = [degToRad(azimuthDeg), degToRad(elevationDeg), degToRad(latitudeDeg)];
          const seen = [Math.cos(el) * Math.sin(az), Math.cos(el) * Math.cos(az), Math.sin(el)];
          const about = (kind: 'ha-dec' | 'xy-ns' | 'xy-ew') => {
            const { firstDeg, secondDeg } = axisAngles(kind, latitudeDeg, { azimuthDeg, elevationDeg });
            expect(Math.abs(firstDeg)).toBeLessThanOrEqual(180);
            expect(Math.abs(secondDeg)).toBeLessThanOrEqual(90);
            const [a, b] = [degToRad(firstDeg), degToRad(secondDeg)];
            return [Math.cos(b) * Math.sin(a), Math.cos(b) * Math.cos(a), Math.sin(b)] as const;
          };
          const [east, up, north] = about('xy-ns');
          expect([east, north, up].every((part, at) => Math.abs(part - (seen[at] ?? NaN)) < 1e-12)).toBe(
            true,
          );
          const [toNorth, toUp, toEast] = about('xy-ew');
          expect(
            [toEast, toNorth, toUp].every((part, at) => Math.abs(part - (seen[at] ?? NaN)) < 1e-12),
          ).toBe(true);
          const [west, meridian, pole] = about('ha-dec');
          const back = [
            -west,
            pole * Math.cos(lat) - meridian * Math.sin(lat),
            pole * Math.sin(lat) + meridian * Math.cos(lat),
          ];
          expect(back.every((part, at) => Math.abs(part - (seen[at] ?? NaN)) < 1e-12)).toBe(true);
        },
      ),
    );
  });

  it('refuse what is no direction', () => {
    expect(() => axisAngles('ha-dec', 50, { azimuthDeg: NaN, elevationDeg: 0 })).toThrow(RangeError);
  });
});

describe('an equatorial mount', () => {
  const source = { raDeg: 120, decDeg: 40 };
  const station = { site: SITE, mount: EQUATORIAL };

  it('keeps its declination and follows the hour angle along a scan', () => {
    const scan = scanAt(0, 30);
    const first = firstPointing(station, { source, scan });
    if ('impossible' in first) throw new Error(first.impossible);
    const track = trackOf(source, scan);
    const hourAt = (at: Date) => trackHourAngleDeg(track, SITE, at.getTime());
    expect(normalise180(first.motorAzimuthDeg - hourAt(scan.start))).toBeCloseTo(0, 2);
    const last = pointingAtEnd(station, first, { source, scan });
    expect(last.motorAzimuthDeg - first.motorAzimuthDeg).toBeCloseTo(7.52, 2);
    expect(axisAngles('ha-dec', SITE.latitudeDeg, last).secondDeg).toBeCloseTo(
      axisAngles('ha-dec', SITE.latitudeDeg, first).secondDeg,
      3,
    );
  });

  it('needs no time but settling’s to go to another declination that is near, by its slower axis', () => {
    const from = startPointing(station, { azimuthDeg: 180, elevationDeg: 60 });
    if ('impossible' in from) throw new Error(from.impossible);
    expect(from.motorAzimuthDeg).toBeCloseTo(0, 9);
    const slew = slewBetween(station, from, { source, scan: scanAt(0) });
    if ('impossible' in slew) throw new Error(slew.impossible);
    const way = Math.abs(slew.pointing.motorAzimuthDeg);
    expect(slew.seconds).toBeGreaterThanOrEqual(way / DRIVE.rateDegPerS + EQUATORIAL.settleSeconds);
  });

  it('says when the scan would run into its hour-angle limit', () => {
    const scan = scanAt(0);
    const hourDeg = trackHourAngleDeg(trackOf(source, scan), SITE, scan.start.getTime());
    const hourAngle = { ...EQUATORIAL.hourAngle, maxDeg: hourDeg + 1 };
    const found = firstPointing({ site: SITE, mount: { ...EQUATORIAL, hourAngle } }, { source, scan });
    // one degree of hour angle is 3 min 59 s
    expect(found).toEqual({
      impossible: 'would run into the hour angle limit at 18:03:59',
      kind: 'end-of-range',
      limit: 'first',
      atMs: expect.closeTo(START + 239_300, -3) as number,
    });
  });

  it('says that a declination is beyond it', () => {
    const declination = { ...EQUATORIAL.declination, minDeg: -20, maxDeg: 30 };
    const found = firstPointing(
      { site: SITE, mount: { ...EQUATORIAL, declination } },
      { source, scan: scanAt(0) },
    );
    expect(found).toMatchObject({
      impossible: 'would be above the mount’s highest 30° of declination at 18:00:00',
      limit: 'second',
    });
  });
});

describe('an X–Y mount', () => {
  it('passes the zenith without a turn', () => {
    const station = { site: SITE, mount: XY };
    // culminates in the zenith of the site
    const source = { raDeg: 200, decDeg: 50 };
    const whole = { start: new Date(START), end: new Date(START + 24 * 3_600_000) };
    const track = trackOf(source, whole);
    let noonMs = START;
    for (let ms = START; ms < whole.end.getTime(); ms += 60_000)
      if (Math.abs(trackHourAngleDeg(track, SITE, ms)) < Math.abs(trackHourAngleDeg(track, SITE, noonMs)))
        noonMs = ms;
    const scan = { start: new Date(noonMs - 1_800_000), end: new Date(noonMs + 1_800_000) };
    const first = firstPointing(station, { source, scan });
    if ('impossible' in first) throw new Error(first.impossible);
    const last = pointingAtEnd(station, first, { source, scan });
    // from 4.8° east of the zenith to as much west
    expect(first.motorAzimuthDeg).toBeGreaterThan(4);
    expect(last.motorAzimuthDeg).toBeLessThan(-4);
    expect(Math.abs(first.motorAzimuthDeg + last.motorAzimuthDeg)).toBeLessThan(0.5);
  });

  it('cannot reach the horizon beyond its lower axis', () => {
    const found = startPointing({ site: SITE, mount: XY }, { azimuthDeg: 0, elevationDeg: 5 });
    expect(found).toMatchObject({
      impossible: 'would be above the mount’s highest 80° of Y',
      limit: 'second',
    });
    const east = startPointing({ site: SITE, mount: XY }, { azimuthDeg: 90, elevationDeg: 5 });
    expect(east).toMatchObject({ impossible: 'cannot turn to X 85°', limit: 'first' });
    const west = startPointing({ site: SITE, mount: XY }, { azimuthDeg: 270, elevationDeg: 5 });
    expect(west).toMatchObject({ impossible: 'cannot turn to X −85°', limit: 'first' });
  });
});
