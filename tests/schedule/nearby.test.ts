import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nearby, sharedPart } from '@/src/schedule/nearby';

const at = (raDeg: number, decDeg: number) => ({ position: { raDeg, decDeg } });

describe('nearby', () => {
  it('measures from north through east, across 0 h and beside a pole', () => {
    const found = nearby(
      { raDeg: 359.5, decDeg: 0 },
      [at(0.5, 0), at(359.5, -2), at(359.5, 3), at(10, 40)],
      5,
    );
    expect(found.map(({ separationDeg }) => Number(separationDeg.toFixed(9)))).toEqual([1, 2, 3]);
    expect(found.map(({ positionAngleDeg }) => Number(positionAngleDeg.toFixed(9)))).toEqual([90, 180, 0]);
    const [polar] = nearby({ raDeg: 0, decDeg: 90 }, [at(123, 89)], 2);
    expect(polar?.separationDeg).toBeCloseTo(1, 9);
    expect(polar?.positionAngleDeg).toBeCloseTo(180 - 123, 9);
  });

  it('leads back where it came from: the step of that length in that direction ends at the source', () => {
    const place = fc.record({
      raDeg: fc.double({ min: 0, max: 360, noNaN: true }),
      decDeg: fc.double({ min: -89, max: 89, noNaN: true }),
    });
    fc.assert(
      fc.property(place, place, (from, to) => {
        const [near] = nearby(from, [{ position: to }], 180);
        if (!near) throw new Error('nothing within 180°');
        const rad = Math.PI / 180;
        const [angle, way] = [near.positionAngleDeg * rad, near.separationDeg * rad];
        const dec = from.decDeg * rad;
        const sinDec = Math.sin(dec) * Math.cos(way) + Math.cos(dec) * Math.sin(way) * Math.cos(angle);
        expect(Math.asin(Math.max(-1, Math.min(1, sinDec))) / rad).toBeCloseTo(to.decDeg, 5);
      }),
    );
  });
});

describe('sharedPart', () => {
  it('is the part of the target’s station-hours that both have', () => {
    const target = [[[0, 10]], [[5, 15]]] as const;
    expect(sharedPart(target, [[[5, 20]], [[0, 10]]])).toBe(0.5);
    expect(sharedPart(target, target)).toBe(1);
    expect(sharedPart(target, [[], []])).toBe(0);
    expect(sharedPart([[], []], target)).toBeNull();
  });
});
