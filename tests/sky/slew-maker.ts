import fc from 'fast-check';
import { anglesToward, axisFrame } from '@/src/sky/axis-frame';
import { siteFrame } from '@/src/sky/site';
import { trackDirection } from '@/src/sky/track';
import type { Track } from '@/src/sky/track';
import type { DrivenAxis, Geodetic, Mount, MountKind, SkyPosition } from '@/src/sky/types';
import { normalise180 } from '@/src/units/angle';

/** Invented mounts, sites, sources and scans, the same for the tests of slews. */
export const START_MS = Date.UTC(2029, 2, 20, 18);
export const KINDS: readonly MountKind[] = ['az-el', 'ha-dec', 'xy-ns', 'xy-ew'];

/** Ranges wide enough that most scans can be done. */
export function mountOf(kind: MountKind, change: { first?: Partial<DrivenAxis> } = {}): Mount {
  const first = { minDeg: -180, maxDeg: 180, rateDegPerS: 1.2, accelDegPerS2: 0.4, ...change.first };
  const second = { minDeg: -90, maxDeg: 90, rateDegPerS: 0.8, accelDegPerS2: 0.3 };
  const settleSeconds = 4;
  switch (kind) {
    case 'az-el': {
      const azimuth = { ...first, minDeg: -90, maxDeg: 450, ...change.first };
      return { kind, azimuth, elevation: { ...second, minDeg: 5 }, settleSeconds };
    }
    case 'ha-dec':
      return { kind, hourAngle: first, declination: second, settleSeconds };
    case 'xy-ns':
    case 'xy-ew':
      return { kind, x: first, y: second, settleSeconds };
  }
}

export const someKind = fc.constantFrom(...KINDS);
export const someSite: fc.Arbitrary<Geodetic> = fc.record({
  latitudeDeg: fc.double({ min: -80, max: 80, noNaN: true }),
  longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
  heightM: fc.constant(500),
});
export const someSource: fc.Arbitrary<SkyPosition> = fc.record({
  raDeg: fc.double({ min: 0, max: 359, noNaN: true }),
  decDeg: fc.double({ min: -88, max: 88, noNaN: true }),
});

/** The first axis's turn since the start and the second's angle, looked at again and again; steps halved where fast. */
export function lookedAt(kind: MountKind, site: Geodetic, track: Track, endMs: number, stepMs: number) {
  const axes = axisFrame(kind, siteFrame(site));
  const at = (ms: number) => anglesToward(axes, trackDirection(track, ms));
  const seen = [{ atMs: track.startMs, turnDeg: 0, ...at(track.startMs) }];
  let last = seen[0];
  let step = stepMs;
  while (last && last.atMs < endMs) {
    const atMs = Math.min(endMs, last.atMs + step);
    const angles = at(atMs);
    const moved = normalise180(angles.firstDeg - last.firstDeg);
    if (Math.abs(moved) > 20 && step > 1) {
      step /= 2;
      continue;
    }
    last = { atMs, turnDeg: last.turnDeg + moved, ...angles };
    seen.push(last);
    step = stepMs;
  }
  return seen;
}
