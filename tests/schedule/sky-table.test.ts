import { describe, expect, it } from 'vitest';
import type { PlanSource, PlanStation } from '@/src/schedule/context';
import { skyStation } from '@/src/schedule/sky-station';
import { skyTable } from '@/src/schedule/make-sky-table';
import { stationsUp, tableElevationDeg } from '@/src/schedule/sky-table';
import { azEl } from '@/src/sky/position';
import { visibilityWindows } from '@/src/sky/windows';
import { MOUNT } from './context-maker';

// Truth: azEl and visibilityWindows of this project, themselves checked against ERFA in tests/sky.
const TOLERANCE = {
  /** nodes are rounded to 0.01°; the rest is the track's */
  nodeDeg: 0.005 + 1e-6,
  /** straight lines over ten minutes [0.028°, 0.141°, 1.05° found] */
  lineBelow60Deg: 0.03,
  lineBelow85Deg: 0.15,
  lineDeg: 1.3,
};

const START = Date.UTC(2027, 1, 12, 20);
const HOUR = 3_600_000;
const spanOf = (hours: number) => ({ start: new Date(START), end: new Date(START + hours * HOUR) });
const SETTINGS = { minElevationDeg: 5 };

function station(
  code: string,
  latitudeDeg: number,
  longitudeDeg: number,
  changes: Partial<PlanStation> = {},
) {
  const axis = { rateDegPerS: 1, accelDegPerS2: 1 };
  const made: PlanStation = {
    code,
    name: code,
    site: { latitudeDeg, longitudeDeg, heightM: 100 },
    minElevationDeg: 8,
    maxElevationDeg: 88,
    horizon: [],
    mount: {
      kind: 'az-el',
      azimuth: { ...axis, minDeg: -90, maxDeg: 450 },
      elevation: { ...axis, minDeg: 2, maxDeg: 90 },
      settleSeconds: 2,
    },
    bits: 2,
    sefdJy: {},
    ...changes,
  };
  return made;
}

function source(id: string, raDeg: number, decDeg: number): PlanSource {
  return { id, name: id, position: { raDeg, decDeg }, role: 'target', components: {} };
}

const HILL = [
  { azimuthDeg: 90, elevationDeg: 0 },
  { azimuthDeg: 120, elevationDeg: 25 },
  { azimuthDeg: 180, elevationDeg: 3 },
];
const STATIONS = [
  station('We', 45, -110),
  station('Mi', 54, 12, { horizon: HILL }),
  station('Ea', 64, 28),
  station('So', -24, 22),
];
const SOURCES = [source('north', 127, 52.3), source('equator', 164, 1.5), source('south', 30, -60)];

describe('skyTable', () => {
  it('has at each node the elevation of that instant, to 0.01°', () => {
    const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(24));
    for (const { id, position } of SOURCES) {
      for (const { code, site } of STATIONS) {
        const nodes = table.elevations[id]?.[code] ?? [];
        expect(nodes).toHaveLength(145);
        nodes.forEach((node, index) => {
          const { elevationDeg } = azEl(position, site, new Date(START + index * 600_000));
          expect(Math.abs(node / 100 - elevationDeg)).toBeLessThan(TOLERANCE.nodeDeg);
        });
      }
    }
  });

  it('reaches the end of a span that is no whole number of steps', () => {
    const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(1.05));
    expect(table.elevations['north']?.['We']).toHaveLength(8);
    expect(table.startMs).toBe(START);
  });

  it('has the windows of each pair, masks and limits kept', () => {
    const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(24));
    for (const { id, position } of SOURCES) {
      for (const { code, ...own } of STATIONS) {
        const { site, minElevationDeg, maxElevationDeg, horizon } = own;
        const limits = { site, minElevationDeg, maxElevationDeg, horizon };
        const expected = visibilityWindows(position, limits, spanOf(24));
        const found = table.windows[id]?.[code] ?? [];
        expect(found).toEqual(expected.map(({ start, end }) => [start.getTime(), end.getTime()]));
      }
    }
    expect(table.windows['south']?.['Ea']).toEqual([]);
  });

  it('holds common windows of one to all stations, each within the one before', () => {
    const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(24));
    for (const { id } of SOURCES) {
      const common = table.common[id] ?? [];
      expect(common).toHaveLength(STATIONS.length);
      for (let ms = START + 30_000; ms < START + 24 * HOUR; ms += 7 * 60_000) {
        const holds = (spans: readonly (readonly [number, number])[]) =>
          spans.some(([start, end]) => start <= ms && ms < end);
        const up = STATIONS.filter(({ code }) => holds(table.windows[id]?.[code] ?? [])).length;
        expect(common.map(holds)).toEqual(STATIONS.map((_, index) => index < up));
      }
    }
  });

  it('comes back the same from JSON', () => {
    const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(24));
    expect(JSON.parse(JSON.stringify(table))).toEqual(table);
  });

  it('has empty entries for no stations and no sources', () => {
    expect(skyTable([], SOURCES, SETTINGS, spanOf(24)).common['north']).toEqual([]);
    expect(skyTable(STATIONS, [], SETTINGS, spanOf(24)).windows).toEqual({});
  });
});

describe('skyStation', () => {
  it('takes the stricter of station, session and mount', () => {
    const limitsOf = (own: Partial<PlanStation>, minElevationDeg: number) => {
      const found = skyStation(station('We', 45, -110, own), { minElevationDeg });
      return [found.minElevationDeg, found.maxElevationDeg];
    };
    expect(limitsOf({}, 5)).toEqual([8, 88]);
    expect(limitsOf({}, 15)).toEqual([15, 88]);
    const elevation = { ...MOUNT.elevation, minDeg: 12, maxDeg: 80 };
    expect(limitsOf({ mount: { ...MOUNT, elevation } }, 5)).toEqual([12, 80]);
    expect(limitsOf({ mount: { ...MOUNT, elevation } }, 15)).toEqual([15, 80]);
  });

  it('keeps the mask', () => {
    expect(skyStation(station('Mi', 54, 12, { horizon: HILL }), SETTINGS).horizon).toEqual(HILL);
  });
});

describe('tableElevationDeg', () => {
  it('follows the sky between nodes within the errors it states', () => {
    const worst = { below60: 0, below85: 0, all: 0 };
    for (const latitudeDeg of [-80, -35, 0, 10, 54, 70]) {
      for (const decDeg of [-70, -20, 0, 3, 25, 40, 54, 75]) {
        for (const raDeg of [0, 0.8, 1.25, 1.7]) {
          const one = station('On', latitudeDeg, 12);
          const place = source('it', raDeg, decDeg);
          const table = skyTable([one], [place], SETTINGS, spanOf(24));
          for (let ms = START; ms < START + 24 * HOUR; ms += 140_000) {
            const { elevationDeg } = azEl(place.position, one.site, new Date(ms));
            const off = Math.abs((tableElevationDeg(table, 'it', 'On', ms) ?? NaN) - elevationDeg);
            worst.all = Math.max(worst.all, off);
            if (elevationDeg < 0) continue;
            if (elevationDeg < 85) worst.below85 = Math.max(worst.below85, off);
            if (elevationDeg < 60) worst.below60 = Math.max(worst.below60, off);
          }
        }
      }
    }
    expect(worst.below60).toBeLessThan(TOLERANCE.lineBelow60Deg);
    expect(worst.below85).toBeLessThan(TOLERANCE.lineBelow85Deg);
    expect(worst.all).toBeLessThan(TOLERANCE.lineDeg);
  });

  it('holds the end nodes outside the table', () => {
    const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(2));
    const nodes = table.elevations['north']?.['We'] ?? [];
    expect(tableElevationDeg(table, 'north', 'We', START - HOUR)).toBe((nodes[0] ?? NaN) / 100);
    expect(tableElevationDeg(table, 'north', 'We', START + 9 * HOUR)).toBe((nodes.at(-1) ?? NaN) / 100);
  });

  it('knows nothing of a pair that is not in the table', () => {
    const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(2));
    expect(tableElevationDeg(table, 'north', 'Xx', START)).toBeNull();
    expect(tableElevationDeg(table, 'west', 'We', START)).toBeNull();
  });
});

describe('stationsUp', () => {
  const table = skyTable(STATIONS, SOURCES, SETTINGS, spanOf(24));

  it('covers the time asked for without gaps, and neighbours differ', () => {
    for (const { id } of SOURCES) {
      const steps = stationsUp(table, id, START + HOUR, START + 20 * HOUR);
      expect(steps[0]?.startMs).toBe(START + HOUR);
      expect(steps.at(-1)?.endMs).toBe(START + 20 * HOUR);
      steps.slice(1).forEach((step, index) => {
        expect(step.startMs).toBe(steps[index]?.endMs);
        expect(step.up).not.toBe(steps[index]?.up);
      });
    }
  });

  it('counts as the common windows do', () => {
    for (const { id } of SOURCES) {
      for (const { startMs, endMs, up } of stationsUp(table, id, START, START + 24 * HOUR)) {
        const middle = (startMs + endMs) / 2;
        const counts = (table.common[id] ?? []).filter((spans) =>
          spans.some(([start, end]) => start <= middle && middle < end),
        );
        expect(counts).toHaveLength(up);
      }
    }
  });

  it('is one step of none for a source that is not in the table', () => {
    expect(stationsUp(table, 'west', START, START + HOUR)).toEqual([
      { startMs: START, endMs: START + HOUR, up: 0 },
    ]);
  });

  it('is empty when no time is asked for', () => {
    expect(stationsUp(table, 'north', START, START)).toEqual([]);
  });
});
