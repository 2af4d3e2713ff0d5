import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { horizonElevationDeg, prepareHorizon } from '@/src/sky/horizon';
import { azEl } from '@/src/sky/position';
import type { AngleRange, AzEl, MountLimits, SkyPosition, SkyStation } from '@/src/sky/types';
import { visibilityWindows, windowsFor } from '@/src/sky/windows';
import { degToRad, normalise180, radToDeg } from '@/src/units/angle';

const HOUR = 3_600_000;
const START = Date.UTC(2028, 11, 31, 14);
const STEP_MS = 240_000;
/** So near to a limit either answer is right: what the sky moves while a window's edge is rounded, and more. */
const NEAR_DEG = 0.01;

const dot = (a: readonly number[], b: readonly number[]) =>
  a.reduce((sum, value, at) => sum + value * (b[at] ?? 0), 0);

/** East, north and up of a direction. */
function vectorOf({ azimuthDeg, elevationDeg }: AzEl): [number, number, number] {
  const [az, el] = [degToRad(azimuthDeg), degToRad(elevationDeg)];
  return [Math.cos(el) * Math.sin(az), Math.cos(el) * Math.cos(az), Math.sin(el)];
}

/** Degrees by which a direction is inside a range of angles; negative outside. */
function within(deg: number, range: AngleRange | undefined): number {
  if (!range || range.maxDeg - range.minDeg >= 360) return Infinity;
  const half = (range.maxDeg - range.minDeg) / 2;
  return half - Math.abs(normalise180(deg - range.minDeg - half));
}

/** Degrees to the nearest limit of a mount, worked out from azimuth and elevation alone. */
function mountMargin(seen: AzEl, latitudeDeg: number, mount: MountLimits | undefined): number {
  if (!mount) return Infinity;
  const direction = vectorOf(seen);
  const [east, north, up] = direction;
  const hole = mount.keyholeDeg ?? 0;
  const fromPole = (axis: readonly number[]) =>
    radToDeg(Math.asin(Math.max(-1, Math.min(1, dot(direction, axis)))));
  const inside = (deg: number, range: AngleRange | undefined) =>
    range ? Math.min(deg - range.minDeg, range.maxDeg - deg) : Infinity;
  switch (mount.kind) {
    case 'az-el':
      return Math.min(
        within(seen.azimuthDeg, mount.azimuth),
        inside(seen.elevationDeg, mount.elevation),
        90 - hole - seen.elevationDeg,
      );
    case 'ha-dec': {
      const lat = degToRad(latitudeDeg);
      const dec = fromPole([0, Math.cos(lat), Math.sin(lat)]);
      const hour = radToDeg(Math.atan2(-east, up * Math.cos(lat) - north * Math.sin(lat)));
      return Math.min(
        within(hour, mount.hourAngle),
        inside(dec, mount.declination),
        90 - hole - Math.abs(dec),
      );
    }
    case 'xy-ns': {
      const y = fromPole([0, 1, 0]);
      const x = radToDeg(Math.atan2(east, up));
      return Math.min(within(x, mount.x), inside(y, mount.y), 90 - hole - Math.abs(y));
    }
    case 'xy-ew': {
      const y = fromPole([1, 0, 0]);
      const x = radToDeg(Math.atan2(north, up));
      return Math.min(within(x, mount.x), inside(y, mount.y), 90 - hole - Math.abs(y));
    }
  }
}

/** Degrees to the nearest limit of a station; only its sign matters far from the limits. */
function margin(source: SkyPosition, station: SkyStation, at: Date): number {
  const seen = azEl(source, station.site, at);
  const horizon = prepareHorizon(station.horizon);
  const floor = Math.max(
    station.minElevationDeg,
    horizon ? horizonElevationDeg(horizon, seen.azimuthDeg) : -90,
  );
  return Math.min(
    seen.elevationDeg - floor,
    (station.maxElevationDeg ?? 90.001) - seen.elevationDeg,
    mountMargin(seen, station.site.latitudeDeg, station.mount),
  );
}

/** Every step of a span is inside a window where the margin says so. */
function expectBruteForce(source: SkyPosition, station: SkyStation, hours: number): number {
  const span = { start: new Date(START), end: new Date(START + hours * HOUR) };
  const found = visibilityWindows(source, station, span);
  let seen = 0;
  for (let ms = START; ms < span.end.getTime(); ms += STEP_MS) {
    const by = margin(source, station, new Date(ms));
    // a steep mask may be passed in a moment: beside it the time decides, not the height
    const isNearEdge = found.some(({ start, end }) =>
      [start, end].some((edge) => Math.abs(edge.getTime() - ms) < 4000),
    );
    if (Math.abs(by) < NEAR_DEG || isNearEdge) continue;
    const isIn = found.some(({ start, end }) => start.getTime() <= ms && ms < end.getTime());
    expect(isIn, `${new Date(ms).toISOString()}: ${by}°`).toBe(by > 0);
    seen += isIn ? 1 : 0;
  }
  return seen;
}

const anySite = fc.record({
  latitudeDeg: fc.double({ min: -90, max: 90, noNaN: true }),
  longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
  heightM: fc.constant(500),
});
const anySource = fc.record({
  raDeg: fc.double({ min: 0, max: 360, noNaN: true }),
  decDeg: fc.double({ min: -90, max: 90, noNaN: true }),
});
const anyMask = fc.array(
  fc.record({
    azimuthDeg: fc.double({ min: 0, max: 359.999, noNaN: true }),
    elevationDeg: fc.double({ min: 0, max: 60, noNaN: true }),
  }),
  { minLength: 1, maxLength: 12 },
);
const range = (from: number, to: number, least: number) =>
  fc
    .tuple(
      fc.double({ min: from, max: to, noNaN: true }),
      fc.double({ min: least, max: to - from, noNaN: true }),
    )
    .map(([minDeg, length]) => ({ minDeg, maxDeg: minDeg + length }));
const anyMount: fc.Arbitrary<MountLimits> = fc.oneof(
  fc.record(
    {
      kind: fc.constant('az-el' as const),
      azimuth: range(-270, 270, 20),
      elevation: fc.constant({ minDeg: 5, maxDeg: 85 }),
      keyholeDeg: fc.double({ min: 0, max: 10, noNaN: true }),
    },
    { requiredKeys: ['kind'] },
  ),
  fc.record(
    {
      kind: fc.constant('ha-dec' as const),
      hourAngle: range(-170, 170, 20),
      declination: fc.constant({ minDeg: -40, maxDeg: 80 }),
      keyholeDeg: fc.double({ min: 0, max: 10, noNaN: true }),
    },
    { requiredKeys: ['kind'] },
  ),
  fc.record(
    {
      kind: fc.constantFrom('xy-ns' as const, 'xy-ew' as const),
      x: range(-90, 90, 20),
      y: range(-90, 90, 20),
      keyholeDeg: fc.double({ min: 0, max: 10, noNaN: true }),
    },
    { requiredKeys: ['kind'] },
  ),
);

describe('windows against a look every four minutes', () => {
  it('agree under any mask', () => {
    let seen = 0;
    fc.assert(
      fc.property(anySite, anySource, anyMask, (site, source, horizon) => {
        seen += expectBruteForce(source, { site, minElevationDeg: 5, horizon }, 24);
      }),
      { numRuns: 120 },
    );
    expect(seen).toBeGreaterThan(1000);
  });

  it('agree for every kind of mount and its limits', () => {
    let seen = 0;
    fc.assert(
      fc.property(anySite, anySource, anyMount, (site, source, mount) => {
        seen += expectBruteForce(source, { site, minElevationDeg: -90, maxElevationDeg: 90, mount }, 24);
      }),
      { numRuns: 160 },
    );
    expect(seen).toBeGreaterThan(1000);
  });
});

describe('windows of stricter limits', () => {
  const span = { start: new Date(START), end: new Date(START + 30 * HOUR) };
  const lengthOf = (list: readonly { start: Date; end: Date }[]) =>
    list.reduce((sum, { start, end }) => sum + end.getTime() - start.getTime(), 0);

  it('lie inside those of looser ones', () => {
    fc.assert(
      fc.property(
        anySite,
        anySource,
        anyMask,
        fc.double({ min: 0, max: 40, noNaN: true }),
        fc.double({ min: 0, max: 20, noNaN: true }),
        (site, source, horizon, low, more) => {
          const loose = visibilityWindows(source, { site, minElevationDeg: low }, span);
          const strict = visibilityWindows(
            source,
            { site, minElevationDeg: low + more, horizon, maxElevationDeg: 80 },
            span,
          );
          expect(lengthOf(strict)).toBeLessThanOrEqual(lengthOf(loose) + 4);
          for (const { start, end } of strict) {
            expect(
              loose.some(
                (one) => one.start.getTime() <= start.getTime() + 2 && one.end.getTime() >= end.getTime() - 2,
              ),
            ).toBe(true);
          }
        },
      ),
      { numRuns: 150 },
    );
  });

  it('leave out the hours in which the station is away', () => {
    const site = { latitudeDeg: 50, longitudeDeg: 10, heightM: 0 };
    const source = { raDeg: 40, decDeg: 80 };
    const away = [
      { start: new Date(START + 2 * HOUR), end: new Date(START + 3 * HOUR) },
      { start: new Date(START + 2.5 * HOUR), end: new Date(START + 4 * HOUR) },
    ];
    const found = visibilityWindows(source, { site, minElevationDeg: 10, away }, span);
    expect(found.map(({ start, end }) => [start.getTime() - START, end.getTime() - START])).toEqual([
      [0, 2 * HOUR],
      [4 * HOUR, 30 * HOUR],
    ]);
  });
});

describe('hard places and times', () => {
  const span = { start: new Date('2028-12-31T20:00:00Z'), end: new Date('2029-01-01T08:00:00Z') };

  it.each([90, -90])(
    'at the pole of latitude %d a source keeps its height, over year’s end',
    (latitudeDeg) => {
      const site = { latitudeDeg, longitudeDeg: 0, heightM: 2800 };
      const dec = Math.sign(latitudeDeg) * 30;
      expect(visibilityWindows({ raDeg: 10, decDeg: dec }, { site, minElevationDeg: 20 }, span)).toEqual([
        span,
      ]);
      expect(visibilityWindows({ raDeg: 10, decDeg: -dec }, { site, minElevationDeg: 20 }, span)).toEqual([]);
      const horizon = [
        { azimuthDeg: 0, elevationDeg: 0 },
        { azimuthDeg: 180, elevationDeg: 60 },
      ];
      const masked = visibilityWindows(
        { raDeg: 10, decDeg: dec },
        { site, minElevationDeg: 0, horizon },
        span,
      );
      expect(masked.length).toBeGreaterThan(0);
      for (const { start, end } of masked) expect(end.getTime()).toBeGreaterThan(start.getTime());
    },
  );

  it.each([90, -90])('a source at declination %d stands still', (decDeg) => {
    const site = { latitudeDeg: Math.sign(decDeg) * 40, longitudeDeg: 25, heightM: 0 };
    expect(visibilityWindows({ raDeg: 0, decDeg }, { site, minElevationDeg: 30 }, span)).toEqual([span]);
    expect(visibilityWindows({ raDeg: 0, decDeg }, { site, minElevationDeg: 50 }, span)).toEqual([]);
  });

  it('a leap day has its windows like any other', () => {
    const site = { latitudeDeg: 20, longitudeDeg: 0, heightM: 0 };
    const leap = { start: new Date('2028-02-28T12:00:00Z'), end: new Date('2028-03-01T12:00:00Z') };
    const found = visibilityWindows({ raDeg: 100, decDeg: 0 }, { site, minElevationDeg: 30 }, leap);
    expect(found).toHaveLength(2);
    const [first, second] = found;
    const apart = (second?.start.getTime() ?? NaN) - (first?.start.getTime() ?? NaN);
    expect(apart / 1000).toBeCloseTo(86_164.1, 0);
  });

  it('a mask of one corner is level all round', () => {
    const site = { latitudeDeg: 50, longitudeDeg: 10, heightM: 0 };
    const source = { raDeg: 100, decDeg: 10 };
    const horizon = [{ azimuthDeg: 200, elevationDeg: 25 }];
    expect(visibilityWindows(source, { site, minElevationDeg: 5, horizon }, span)).toEqual(
      visibilityWindows(source, { site, minElevationDeg: 25 }, span),
    );
  });

  const site = { latitudeDeg: 50, longitudeDeg: 10, heightM: 0 };
  const source = { raDeg: 100, decDeg: 10 };
  it.each<[string, SkyPosition, SkyStation]>([
    ['declination beyond the pole', { raDeg: 0, decDeg: 91 }, { site, minElevationDeg: 5 }],
    ['right ascension that is no number', { raDeg: NaN, decDeg: 0 }, { site, minElevationDeg: 5 }],
    ['latitude beyond the pole', source, { site: { ...site, latitudeDeg: 90.5 }, minElevationDeg: 5 }],
    ['limit above the zenith', source, { site, minElevationDeg: 91 }],
    ['limit that is no number', source, { site, minElevationDeg: NaN }],
    [
      'corner that is no number',
      source,
      { site, minElevationDeg: 5, horizon: [{ azimuthDeg: NaN, elevationDeg: 5 }] },
    ],
    ['Sun limit beyond 180°', source, { site, minElevationDeg: 5, sunLimitDeg: 181 }],
    [
      'keyhole of a whole sky',
      source,
      { site, minElevationDeg: 5, mount: { kind: 'az-el', keyholeDeg: 91 } },
    ],
    [
      'range that ends before it starts',
      source,
      { site, minElevationDeg: 5, mount: { kind: 'ha-dec', hourAngle: { minDeg: 90, maxDeg: -90 } } },
    ],
  ])('refuses a %s', (_, place, station) => {
    expect(() => visibilityWindows(place, station, span)).toThrow(RangeError);
    expect(() => windowsFor([place], [station], span)).toThrow(RangeError);
  });
});
