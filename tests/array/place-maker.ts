import fc from 'fast-check';
import { geodeticToItrf } from '@/src/sky/site';

/** Anywhere on the ground. */
export const anyPlace = fc
  .record({
    latitudeDeg: fc.double({ min: -90, max: 90, noNaN: true }),
    longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
    heightM: fc.double({ min: 0, max: 5000, noNaN: true }),
  })
  .map(geodeticToItrf);

/** Anywhere in the sky. */
export const anySource = fc.record({
  raDeg: fc.double({ min: 0, max: 360, noNaN: true }),
  decDeg: fc.double({ min: -90, max: 90, noNaN: true }),
});

export const anyInstantMs = fc.integer({ min: Date.UTC(2026, 0), max: Date.UTC(2040, 0) });
