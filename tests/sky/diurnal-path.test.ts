import { describe, expect, it } from 'vitest';
import { diurnalPath } from '@/src/sky/diurnal-path';

describe('diurnalPath', () => {
  it('culminates at 90° − |latitude − declination|, south or north, and sets where cos A = sin δ / cos φ', () => {
    const path = diurnalPath(20, 50);
    expect(path).toHaveLength(181);
    const top = path[90];
    expect(top?.elevationDeg).toBeCloseTo(60, 9);
    expect(top?.azimuthDeg).toBeCloseTo(180, 9);
    expect(diurnalPath(70, 50)[90]?.azimuthDeg).toBeCloseTo(0, 9);
    const setting =
      Math.acos(Math.sin((20 * Math.PI) / 180) / Math.cos((50 * Math.PI) / 180)) * (180 / Math.PI);
    const after = path.slice(91).find(({ elevationDeg }) => elevationDeg < 0);
    expect(Math.abs((after?.azimuthDeg ?? NaN) - (360 - setting))).toBeLessThan(2.5);
  });

  it('rises in the east before it culminates', () => {
    const path = diurnalPath(0, 45);
    expect(path[45]?.azimuthDeg).toBeCloseTo(90, 6);
    expect(path[135]?.azimuthDeg).toBeCloseTo(270, 6);
  });

  it.each([
    [90, 90],
    [-90, 30],
    [10, -90],
  ])('is finite for declination %d at latitude %d', (decDeg, latitudeDeg) => {
    for (const { azimuthDeg, elevationDeg } of diurnalPath(decDeg, latitudeDeg)) {
      expect(azimuthDeg).toBeGreaterThanOrEqual(0);
      expect(azimuthDeg).toBeLessThan(360);
      expect(Math.abs(elevationDeg)).toBeLessThanOrEqual(90);
    }
  });

  it('refuses what is no declination', () => {
    expect(() => diurnalPath(91, 0)).toThrow(RangeError);
    expect(() => diurnalPath(NaN, 0)).toThrow(RangeError);
  });
});
