import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { axisAngles } from '@/src/sky/axes';
import { anglesToward, axisFrame, firstRate } from '@/src/sky/axis-frame';
import { horizontal } from '@/src/sky/direction';
import { siteFrame } from '@/src/sky/site';
import { SIDEREAL_RAD_PER_MS, trackDirection, trackOf } from '@/src/sky/track';
import { normalise180 } from '@/src/units/angle';
import { someKind, someSite, someSource, START_MS } from './slew-maker';

const DAY = { start: new Date(START_MS), end: new Date(START_MS + 86_400_000) };
const someMs = fc.double({ min: START_MS, max: START_MS + 86_400_000, noNaN: true });

describe('anglesToward', () => {
  it('are those of azimuth and elevation, for each kind of mount', () => {
    fc.assert(
      fc.property(someKind, someSite, someSource, someMs, (kind, site, source, ms) => {
        const frame = siteFrame(site);
        const direction = trackDirection(trackOf(source, DAY), ms);
        const found = anglesToward(axisFrame(kind, frame), direction);
        const wanted = axisAngles(kind, site.latitudeDeg, horizontal(direction, frame));
        expect(found.secondDeg).toBeCloseTo(wanted.secondDeg, 9);
        // an angle about the axis has no more digits than its distance from the axis's end leaves it
        const across = Math.cos((wanted.secondDeg * Math.PI) / 180);
        expect(Math.abs(normalise180(found.firstDeg - wanted.firstDeg)) * across).toBeLessThan(1e-9);
      }),
    );
  });

  it('keep azimuth below 360°', () => {
    const axes = axisFrame('az-el', siteFrame({ latitudeDeg: 0, longitudeDeg: 0, heightM: 0 }));
    const still = { ...axes, shift: [0, 0, 0] as const };
    expect(anglesToward(still, [0.5, -1e-300, 0.5]).firstDeg).toBe(0);
  });
});

describe('firstRate', () => {
  it('is the slope of the first angle', () => {
    fc.assert(
      fc.property(someKind, someSite, someSource, someMs, (kind, site, source, ms) => {
        const track = trackOf(source, DAY);
        const axes = axisFrame(kind, siteFrame(site));
        const at = (atMs: number) => anglesToward(axes, trackDirection(track, atMs));
        fc.pre(Math.abs(at(ms).secondDeg) < 85);
        const halfMs = 500;
        const slope = normalise180(at(ms + halfMs).firstDeg - at(ms - halfMs).firstDeg) / (2 * halfMs);
        const rate = firstRate(axes, trackDirection(track, ms)) * SIDEREAL_RAD_PER_MS;
        expect(Math.abs(rate - slope)).toBeLessThan(1e-10 + 1e-5 * Math.abs(slope));
      }),
    );
  });
});
