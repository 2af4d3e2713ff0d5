import type { HorizonPoint, Interval, SkyPosition, SkyStation } from '../../src/sky/types';

/** Invented stations and sources, the same in every run. */
export const SPAN: Interval = {
  start: new Date('2029-03-20T18:00:00Z'),
  end: new Date('2029-03-21T18:00:00Z'),
};

/** Evenly spread over the sphere by chance. */
export function inventedSources(count: number): SkyPosition[] {
  const next = chance(7);
  return Array.from({ length: count }, () => ({
    raDeg: 360 * next(),
    decDeg: (Math.asin(2 * next() - 1) * 180) / Math.PI,
  }));
}

/** Over the continents of both hemispheres; with masks, one corner each 10° between 4° and 20°. */
export function inventedStations(count: number, hasMasks: boolean): SkyStation[] {
  const next = chance(11);
  return Array.from({ length: count }, () => {
    const site = {
      latitudeDeg: -45 + 115 * next(),
      longitudeDeg: 360 * next() - 180,
      heightM: 2500 * next(),
    };
    const horizon: HorizonPoint[] = Array.from({ length: 36 }, (_, index) => ({
      azimuthDeg: 10 * index,
      elevationDeg: 4 + 16 * next(),
    }));
    return { site, minElevationDeg: 8, ...(hasMasks && { horizon }) };
  });
}

/** Numbers in [0, 1) by a linear congruence (Numerical Recipes 2nd ed., ch. 7.1). */
export function chance(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}
