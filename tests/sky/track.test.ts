import { describe, expect, it } from 'vitest';
import { azEl } from '@/src/sky/position';
import { prepareSite, trackAzEl, trackElevationDeg, trackHourAngleDeg, trackOf } from '@/src/sky/track';
import { angularSeparationDeg } from '@/src/units/angle';
import sources from '../reference/sources.json';

// Truth: azEl of this project, itself checked against ERFA in position.test.ts.
const TOLERANCE = {
  /** third difference of the fortnightly nutation over a day between nodes [0.0006″] */
  insideArcsec: 0.001,
  /** the same, carried on for a day [0.0045″] */
  dayOutsideArcsec: 0.01,
  /** second order of diurnal aberration */
  elevationOnlyArcsec: 1e-5,
};

const SITES = [
  { latitudeDeg: 61.3724, longitudeDeg: 8.9213, heightM: 912 },
  { latitudeDeg: -33.1, longitudeDeg: 179.2, heightM: 20 },
  { latitudeDeg: 89.9, longitudeDeg: -120, heightM: 0 },
];
const PLACES = [
  ...sources.cases.slice(0, 12).map((s) => ({ raDeg: s.ra, decDeg: s.dec })),
  { raDeg: 37.9, decDeg: 89.3 },
  { raDeg: 211, decDeg: -88.6 },
  { raDeg: 0, decDeg: 90 },
];
const START = Date.UTC(2031, 10, 11, 3, 17, 5);
const HOUR = 3_600_000;
const spanOf = (hours: number) => ({ start: new Date(START), end: new Date(START + hours * HOUR) });

function worstArcsec(spanHours: number, fromHours: number, toHours: number): number {
  let worst = 0;
  for (const place of PLACES) {
    const track = trackOf(place, spanOf(spanHours));
    for (const site of SITES) {
      for (let hours = fromHours; hours <= toHours; hours += 1.37) {
        const atMs = Math.round(START + hours * HOUR);
        const exact = azEl(place, site, new Date(atMs));
        const quick = trackAzEl(track, site, atMs);
        const apart = angularSeparationDeg(
          { longitudeDeg: exact.azimuthDeg, latitudeDeg: exact.elevationDeg },
          { longitudeDeg: quick.azimuthDeg, latitudeDeg: quick.elevationDeg },
        );
        worst = Math.max(worst, apart * 3600);
      }
    }
  }
  return worst;
}

describe('trackOf', () => {
  it('follows azEl over two days, high declinations included', () => {
    expect(worstArcsec(48, 0, 48)).toBeLessThan(TOLERANCE.insideArcsec);
  });

  it('follows azEl over nine days, in more than one panel', () => {
    expect(worstArcsec(216, 0, 216)).toBeLessThan(TOLERANCE.insideArcsec);
  });

  it('carries on for a day outside its span', () => {
    expect(worstArcsec(24, -24, 0)).toBeLessThan(TOLERANCE.dayOutsideArcsec);
    expect(worstArcsec(24, 24, 48)).toBeLessThan(TOLERANCE.dayOutsideArcsec);
    expect(worstArcsec(1 / 3600, 0, 24)).toBeLessThan(TOLERANCE.dayOutsideArcsec);
  });

  it('gives one elevation by both ways, for a site or its prepared form', () => {
    for (const place of PLACES) {
      const track = trackOf(place, spanOf(24));
      for (const site of SITES) {
        const prepared = prepareSite(site);
        for (let hours = 0; hours < 24; hours += 0.7) {
          const atMs = START + hours * HOUR;
          const full = trackAzEl(track, site, atMs).elevationDeg;
          expect(Math.abs(trackElevationDeg(track, prepared, atMs) - full) * 3600).toBeLessThan(
            // asin loses digits toward the zenith
            TOLERANCE.elevationOnlyArcsec + 1e-9 / Math.cos((full * Math.PI) / 180),
          );
        }
      }
    }
  });

  it('has hour angle zero where the source is highest', () => {
    const place = { raDeg: 123, decDeg: 20 };
    const site = { latitudeDeg: 61.3724, longitudeDeg: 8.9213, heightM: 912 };
    const track = trackOf(place, spanOf(24));
    let best = { el: -90, hourAngle: NaN };
    for (let minutes = 0; minutes < 1440; minutes += 1) {
      const atMs = START + minutes * 60_000;
      const el = trackElevationDeg(track, site, atMs);
      if (el > best.el) best = { el, hourAngle: trackHourAngleDeg(track, site, atMs) };
    }
    expect(Math.abs(best.hourAngle)).toBeLessThan(0.25);
  });

  it('refuses a span without length', () => {
    expect(() => trackOf({ raDeg: 1, decDeg: 2 }, spanOf(0))).toThrow(RangeError);
  });
});
