import { describe, expect, it } from 'vitest';
import { earthFrameAt } from '@/src/sky/engine';
import {
  azEl,
  gmstHours,
  moonSeparationDeg,
  parallacticAngleDeg,
  sunSeparationDeg,
} from '@/src/sky/position';
import { angularSeparationDeg, normalise180, radToDeg } from '@/src/units/angle';
import azel from '../reference/azel.json';
import parallactic from '../reference/parallactic.json';
import sidereal from '../reference/sidereal.json';
import sunmoon from '../reference/sunmoon.json';

// Truth: ERFA 2.0.0 and astropy 5.2.1 (reference/*.json, provenance inside). Measured worst cases in brackets.
const TOLERANCE = {
  /** bending of light by the Sun and the short terms of nutation [0.083″] */
  directionArcsec: 0.1,
  /** digits of the reference and the TT model [5e-9°] */
  gmstDeg: 1e-7,
  /** nutation of five terms [0.13″] */
  equinoxesArcsec: 0.15,
  /** direction error over the sine of the zenith distance [0.0009°] */
  parallacticDeg: 0.002,
  /** truncated VSOP87 [0.0004°] */
  sunDeg: 0.001,
  /** lunar series and 10 s of TT [0.0031°] */
  moonDeg: 0.005,
  /** the reference leaves the source's aberration (20.5″) out of the topocentric figure [0.0088°] */
  moonTopocentricDeg: 0.005 + 0.006,
};

const siteOf = (c: { lat: number; lon: number; height: number }) => ({
  latitudeDeg: c.lat,
  longitudeDeg: c.lon,
  heightM: c.height,
});

describe('azEl', () => {
  it('agrees with ERFA atco13 in all 200 reference cases', () => {
    expect(azel.cases).toHaveLength(200);
    for (const c of azel.cases) {
      const seen = azEl({ raDeg: c.ra, decDeg: c.dec }, siteOf(c), new Date(c.utc));
      const apart = angularSeparationDeg(
        { longitudeDeg: seen.azimuthDeg, latitudeDeg: seen.elevationDeg },
        { longitudeDeg: c.az, latitudeDeg: c.el },
      );
      expect(apart * 3600, c.id).toBeLessThan(TOLERANCE.directionArcsec);
      expect(Math.abs(seen.elevationDeg - c.el) * 3600, c.id).toBeLessThan(TOLERANCE.directionArcsec);
      expect(seen.azimuthDeg).toBeGreaterThanOrEqual(0);
      expect(seen.azimuthDeg).toBeLessThan(360);
    }
  });

  it('moves by 15″ for each second of DUT1', () => {
    const site = { latitudeDeg: 0, longitudeDeg: 20, heightM: 0 };
    const source = { raDeg: 40, decDeg: 0 };
    const at = new Date('2028-03-01T15:00:00Z');
    const before = azEl(source, site, at);
    const after = azEl(source, site, at, { dut1Seconds: 0.5 });
    expect(Math.abs(after.elevationDeg - before.elevationDeg) * 3600).toBeCloseTo(7.52, 1);
  });

  it('refuses what cannot be a direction, a place or an instant', () => {
    const site = { latitudeDeg: 10, longitudeDeg: 20, heightM: 0 };
    const at = new Date('2028-03-01T15:00:00Z');
    expect(() => azEl({ raDeg: 1, decDeg: 90.1 }, site, at)).toThrow(RangeError);
    expect(() => azEl({ raDeg: NaN, decDeg: 0 }, site, at)).toThrow(RangeError);
    expect(() => azEl({ raDeg: 1, decDeg: 0 }, { ...site, latitudeDeg: -91 }, at)).toThrow(RangeError);
    expect(() => azEl({ raDeg: 1, decDeg: 0 }, site, new Date(NaN))).toThrow(RangeError);
    expect(() => azEl({ raDeg: 1, decDeg: 0 }, site, new Date('1800-01-01T00:00:00Z'))).toThrow(RangeError);
    expect(() => azEl({ raDeg: 1, decDeg: 0 }, site, at, { dut1Seconds: 3 })).toThrow(RangeError);
  });
});

describe('gmstHours', () => {
  it('agrees with ERFA gmst06, GAST less the equation of the equinoxes, in all 20 cases', () => {
    expect(sidereal.cases).toHaveLength(20);
    for (const c of sidereal.cases) {
      const gmstDeg = gmstHours(new Date(c.utc)) * 15;
      expect(Math.abs(normalise180(gmstDeg - c.gmst)), c.utc).toBeLessThan(TOLERANCE.gmstDeg);
    }
  });

  it('leaves out an equation of the equinoxes that agrees with ERFA ee06a', () => {
    for (const c of sidereal.cases) {
      const frame = earthFrameAt(Date.parse(c.utc));
      const arcsec = radToDeg(frame.equationOfEquinoxesRad) * 3600;
      expect(Math.abs(arcsec - c.eqeq_arcsec), c.utc).toBeLessThan(TOLERANCE.equinoxesArcsec);
    }
  });
});

describe('parallacticAngleDeg', () => {
  it('agrees with ERFA hd2pa in all 40 cases', () => {
    expect(parallactic.cases).toHaveLength(40);
    for (const c of parallactic.cases) {
      const pa = parallacticAngleDeg({ raDeg: c.ra, decDeg: c.dec }, siteOf(c), new Date(c.utc));
      expect(Math.abs(normalise180(pa - c.pa)), c.id).toBeLessThan(TOLERANCE.parallacticDeg);
    }
  });
});

describe('separations', () => {
  const sources = new Map(sunmoon.sources.map((s) => [s.name, { raDeg: s.ra, decDeg: s.dec }]));
  const stations = new Map(sunmoon.stations.map((s) => [s.code, siteOf(s)]));

  it('from the Sun and the Moon agree with ERFA epv00 and moon98 in all 30 cases', () => {
    expect(sunmoon.cases).toHaveLength(30);
    for (const c of sunmoon.cases) {
      const at = new Date(c.utc);
      const site = stations.get(c.station);
      for (const s of c.sources) {
        const source = sources.get(s.name);
        if (!source || !site) throw new Error(`${c.id}: no such source or station`);
        expect(Math.abs(sunSeparationDeg(source, at) - s.sun_sep_app), c.id).toBeLessThan(TOLERANCE.sunDeg);
        expect(Math.abs(moonSeparationDeg(source, at) - s.moon_sep_app), c.id).toBeLessThan(
          TOLERANCE.moonDeg,
        );
        expect(Math.abs(moonSeparationDeg(source, at, site) - s.moon_sep_topo), c.id).toBeLessThan(
          TOLERANCE.moonTopocentricDeg,
        );
      }
    }
  });
});
