import { describe, expect, it } from 'vitest';
import { azEl, sunSeparationDeg } from '@/src/sky/position';
import type { SkyPosition, SkyStation } from '@/src/sky/types';
import { visibilityWindows, windowsFor } from '@/src/sky/windows';
import windows from '../reference/windows.json';

// Truth: ERFA atco13, edges by bisection, printed to 0.1 s (reference/windows.json).
const TOLERANCE = {
  /** digits of the reference and 0.1″ of direction at a usual rate */
  edgeSeconds: 0.2,
  /** grazing edges: direction error (0.1″ = 0.00003°) along the limit; once the reference’s 0.001° */
  edgeShifts: 1,
  /** edges on whole milliseconds */
  ownMs: 1,
};

const HOUR = 3_600_000;
const stationSites = new Map(
  windows.stations.map((s) => [s.code, { latitudeDeg: s.lat, longitudeDeg: s.lon, heightM: s.height }]),
);
const places = new Map(windows.sources.map((s) => [s.name, { raDeg: s.ra, decDeg: s.dec }]));

type Case = (typeof windows.cases)[number];

function setUp(c: Case): { source: SkyPosition; station: SkyStation; span: { start: Date; end: Date } } {
  const source = places.get(c.source);
  const site = stationSites.get(c.station);
  if (!source || !site) throw new Error(`${c.id}: no such source or station`);
  const horizon =
    c.mask?.map(([azimuthDeg = NaN, elevationDeg = NaN]) => ({ azimuthDeg, elevationDeg })) ?? [];
  const start = new Date(c.start);
  const span = { start, end: new Date(start.getTime() + c.hours * HOUR) };
  return { source, station: { site, minElevationDeg: c.el_min, horizon }, span };
}

describe('visibilityWindows', () => {
  it('has the number and the edges of all 80 reference cases', () => {
    expect(windows.cases).toHaveLength(80);
    let edges = 0;
    for (const c of windows.cases) {
      const { source, station, span } = setUp(c);
      const found = visibilityWindows(source, station, span);
      expect(found, `${c.id} ${c.kind}`).toHaveLength(c.windows.length);
      c.windows.forEach((expected, index) => {
        const shift = TOLERANCE.edgeShifts * (expected.edge_shift_s_per_0p001deg ?? NaN);
        const allowed = Math.max(TOLERANCE.edgeSeconds, shift);
        const window = found[index];
        if (!window) throw new Error(`${c.id}: window ${index} is missing`);
        const off = (at: Date, seconds: number) =>
          at.getTime() / 1000 - span.start.getTime() / 1000 - seconds;
        expect(Math.abs(off(window.start, expected.start_s)), c.id).toBeLessThanOrEqual(allowed);
        expect(Math.abs(off(window.end, expected.end_s)), c.id).toBeLessThanOrEqual(allowed);
        if ('open_start' in expected) expect(window.start).toEqual(span.start);
        if ('open_end' in expected) expect(window.end).toEqual(span.end);
        edges += 2;
      });
    }
    expect(edges).toBe(2 * windows.cases.reduce((sum, c) => sum + c.windows.length, 0));
  });

  it('covers every kind of the reference, masks and grazing ones included', () => {
    const kinds = new Set(windows.cases.map((c) => c.kind));
    expect([...kinds].sort()).toEqual([
      'always-up',
      'grazing-above',
      'grazing-below',
      'mask',
      'never-up',
      'rise-set',
      'two-full-windows',
      'two-windows',
      'up-at-start',
    ]);
  });

  const site = { latitudeDeg: 38.3207, longitudeDeg: -7.4149, heightM: 231.5 };
  const source = { raDeg: 194.2, decDeg: 32.5 };
  const span = { start: new Date('2030-12-16T00:00:00Z'), end: new Date('2030-12-17T00:00:00Z') };

  it('gives the whole span to a circumpolar source and nothing to one that never rises', () => {
    const polar = { raDeg: 10, decDeg: 85 };
    expect(visibilityWindows(polar, { site, minElevationDeg: 10 }, span)).toEqual([span]);
    expect(visibilityWindows({ raDeg: 10, decDeg: -85 }, { site, minElevationDeg: 0 }, span)).toEqual([]);
  });

  it('gives nothing for a span without length', () => {
    const nothing = { start: span.start, end: span.start };
    expect(visibilityWindows(source, { site, minElevationDeg: 10 }, nothing)).toEqual([]);
  });

  it('cuts the zenith out of a window by the upper limit', () => {
    const station = { site, minElevationDeg: 20, maxElevationDeg: 80 };
    const found = visibilityWindows(source, station, span);
    expect(found).toHaveLength(2);
    const inner = [found[0]?.end, found[1]?.start];
    for (const edge of inner) {
      if (!edge) throw new Error('two windows have four edges');
      expect(azEl(source, site, edge).elevationDeg).toBeCloseTo(80, 3);
    }
  });

  it('takes the stricter of limit and mask', () => {
    const open = visibilityWindows(source, { site, minElevationDeg: 20 }, span);
    const low = [{ azimuthDeg: 0, elevationDeg: 15 }];
    const high = [{ azimuthDeg: 0, elevationDeg: 35 }];
    expect(visibilityWindows(source, { site, minElevationDeg: 20, horizon: low }, span)).toEqual(open);
    const raised = visibilityWindows(source, { site, minElevationDeg: 35 }, span);
    const masked = visibilityWindows(source, { site, minElevationDeg: 20, horizon: high }, span);
    expect(masked).toHaveLength(1);
    const startOff = (masked[0]?.start.getTime() ?? NaN) - (raised[0]?.start.getTime() ?? NaN);
    const endOff = (masked[0]?.end.getTime() ?? NaN) - (raised[0]?.end.getTime() ?? NaN);
    expect(Math.max(Math.abs(startOff), Math.abs(endOff))).toBeLessThanOrEqual(TOLERANCE.ownMs);
  });

  it('sees a mast a tenth of a degree wide, thinner than the steps of the search', () => {
    const eastAz = azEl(source, site, new Date('2030-12-16T03:00:00Z')).azimuthDeg;
    const mast = [
      { azimuthDeg: eastAz - 0.05, elevationDeg: 5 },
      { azimuthDeg: eastAz - 0.05, elevationDeg: 60 },
      { azimuthDeg: eastAz + 0.05, elevationDeg: 60 },
      { azimuthDeg: eastAz + 0.05, elevationDeg: 5 },
    ];
    const found = visibilityWindows(source, { site, minElevationDeg: 20, horizon: mast }, span);
    expect(found).toHaveLength(2);
    const hidden = (found[1]?.start.getTime() ?? NaN) - (found[0]?.end.getTime() ?? NaN);
    const before = azEl(source, site, found[0]?.end ?? span.start).azimuthDeg;
    expect(before).toBeCloseTo(eastAz - 0.05, 3);
    expect(hidden).toBeGreaterThan(10_000);
    expect(hidden).toBeLessThan(60_000);
  });

  it('does not care in which order the corners of a mask come', () => {
    const masked = windows.cases.filter((c) => c.kind === 'mask');
    expect(masked).toHaveLength(20);
    for (const c of masked) {
      const { source: place, station, span: when } = setUp(c);
      const turned = { ...station, horizon: [...(station.horizon ?? [])].reverse() };
      expect(visibilityWindows(place, turned, when)).toEqual(visibilityWindows(place, station, when));
    }
  });

  it('keeps away from the Sun and joins the day again when it has passed', () => {
    const nearEcliptic = { raDeg: 264, decDeg: -23.3 };
    const month = { start: new Date('2030-12-01T00:00:00Z'), end: new Date('2030-12-31T00:00:00Z') };
    const polar = { latitudeDeg: -89, longitudeDeg: 0, heightM: 2800 };
    const station = { site: polar, minElevationDeg: 10, sunLimitDeg: 5 };
    const found = visibilityWindows(nearEcliptic, station, month);
    expect(found).toHaveLength(2);
    for (const edge of [found[0]?.end, found[1]?.start]) {
      if (!edge) throw new Error('two windows have four edges');
      expect(sunSeparationDeg(nearEcliptic, edge)).toBeCloseTo(5, 5);
    }
    expect(visibilityWindows(nearEcliptic, { ...station, sunLimitDeg: 179 }, month)).toEqual([]);
  });
});

describe('windowsFor', () => {
  it('gives what visibilityWindows gives, by source and station', () => {
    const chosen = windows.cases.filter((c) => c.kind === 'mask' || c.kind === 'rise-set').slice(0, 12);
    const set = chosen.map(setUp);
    const span = set[0]?.span ?? { start: new Date(0), end: new Date(0) };
    const sources = set.map((c) => c.source);
    const stations = set.map((c) => c.station);
    const batch = windowsFor(sources, stations, span);
    expect(batch).toEqual(
      sources.map((source) => stations.map((station) => visibilityWindows(source, station, span))),
    );
  });

  it('keeps its shape for a span without length', () => {
    const at = new Date('2030-01-01T00:00:00Z');
    const site = { latitudeDeg: 0, longitudeDeg: 0, heightM: 0 };
    const station = { site, minElevationDeg: 0 };
    const source = { raDeg: 0, decDeg: 0 };
    expect(windowsFor([source, source], [station], { start: at, end: at })).toEqual([[[]], [[]]]);
  });
});
