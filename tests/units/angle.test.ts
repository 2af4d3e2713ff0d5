import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { angularSeparationDeg, degToRad, normalise180, normalise360, radToDeg } from '@/src/units/angle';

const angle = fc.double({ min: -1e6, max: 1e6, noNaN: true });

describe('angles', () => {
  it('come into one turn without changing their direction', () => {
    fc.assert(
      fc.property(angle, (deg) => {
        const turned = normalise360(deg);
        expect(turned).toBeGreaterThanOrEqual(0);
        expect(turned).toBeLessThan(360);
        expect(Math.cos(degToRad(turned - deg))).toBeCloseTo(1, 9);
        const about = normalise180(deg);
        expect(about).toBeGreaterThanOrEqual(-180);
        expect(about).toBeLessThan(180);
      }),
    );
  });

  it('never give 360 or minus zero', () => {
    expect(Object.is(normalise360(-0), 0)).toBe(true);
    expect(normalise360(-1e-20)).toBe(0);
    expect(normalise360(720)).toBe(0);
    expect(normalise180(180)).toBe(-180);
  });

  it('survive degrees to radians and back', () => {
    expect(radToDeg(degToRad(123.456))).toBeCloseTo(123.456, 12);
  });

  it('separate without loss at both ends', () => {
    const at = (longitudeDeg: number, latitudeDeg: number) => ({ longitudeDeg, latitudeDeg });
    expect(angularSeparationDeg(at(10, 20), at(10, 20 + 1e-9))).toBeCloseTo(1e-9, 13);
    expect(angularSeparationDeg(at(0, 90), at(123, -90))).toBeCloseTo(180, 12);
    expect(angularSeparationDeg(at(359, 0), at(1, 0))).toBeCloseTo(2, 12);
  });
});
