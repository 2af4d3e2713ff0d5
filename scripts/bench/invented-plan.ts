import type { PlanContext, PlanSource, PlanStation } from '../../src/schedule/context';
import type { Plan, Scan } from '../../src/schedule/plan';
import { visibilityWindows } from '../../src/sky/windows';
import { chance, inventedSources, inventedStations, SPAN } from './invented-sky';

const HOURS = 48;
const MODE_ID = 'mode';

/**
 * A plan over two days, the same in every run: each scan is watched by the stations that see its source throughout;
 * starts come somewhat too early for some slews.
 */
export function inventedPlan(scanCount: number, stationCount: number): { plan: Plan; context: PlanContext } {
  const next = chance(23);
  const stations = inventedStations(stationCount, true).map(planStation);
  const sources = inventedSources(40).map((position, index): PlanSource => {
    return { id: `source${index}`, name: `S${index}`, position, role: 'target', components: {} };
  });
  const startMs = SPAN.start.getTime();
  const span = { start: new Date(startMs), end: new Date(startMs + HOURS * 3_600_000) };
  const seen = sources.map(({ position }) =>
    stations.map((station) => visibilityWindows(position, station, span)),
  );
  const eachMs = (HOURS * 3_600_000) / scanCount;
  const scans = Array.from({ length: scanCount }, (_, index): Scan => {
    const from = startMs + Math.round((index * eachMs) / 1000) * 1000;
    const lengthSeconds = 60 + Math.floor(next() * 20);
    const until = from + lengthSeconds * 1000;
    const best = sources
      .map((source, at) => ({ source, at, rank: next() }))
      .map((one) => ({
        ...one,
        up: stations.filter((_one, which) =>
          (seen[one.at]?.[which] ?? []).some(
            ({ start, end }) => start.getTime() <= from && end.getTime() >= until,
          ),
        ),
      }))
      .sort((a, b) => Number(b.up.length > 4) - Number(a.up.length > 4) || a.rank - b.rank)[0];
    return {
      id: `scan${String(index).padStart(4, '0')}`,
      sourceId: best?.source.id ?? 'source0',
      modeId: MODE_ID,
      startMs: from,
      lengthSeconds,
      stations: (best?.up ?? [])
        .map(({ code }) => ({ station: code, lateSeconds: 0, earlySeconds: 0 }))
        .sort((a, b) => (a.station < b.station ? -1 : 1)),
      groupId: null,
      leg: null,
      comment: '',
    };
  });
  const codes = stations.map(({ code }) => code);
  const plan: Plan = {
    sessionId: 'session',
    span: { startMs, lengthSeconds: HOURS * 3600 },
    stations: codes,
    scans,
    groups: [],
  };
  return { plan, context: contextOf(stations, sources, startMs) };
}

function planStation(sky: ReturnType<typeof inventedStations>[number], index: number): PlanStation {
  const code = `S${String.fromCharCode(97 + index)}`;
  return {
    code,
    name: code,
    site: sky.site,
    minElevationDeg: sky.minElevationDeg,
    maxElevationDeg: 88,
    horizon: [...(sky.horizon ?? [])],
    mount: {
      kind: 'az-el',
      azimuth: { minDeg: -90, maxDeg: 450, rateDegPerS: 3, accelDegPerS2: 0.5 },
      elevation: { minDeg: 3, maxDeg: 89, rateDegPerS: 1.5, accelDegPerS2: 0.5 },
      settleSeconds: 3,
    },
    bits: 2,
    sefdJy: { '8.4 GHz': 800 },
  };
}

function contextOf(
  stations: readonly PlanStation[],
  sources: readonly PlanSource[],
  nowMs: number,
): PlanContext {
  return {
    stations: Object.fromEntries(stations.map((one) => [one.code, one])),
    sources: Object.fromEntries(sources.map((one) => [one.id, one])),
    modes: {
      [MODE_ID]: {
        id: MODE_ID,
        name: '8.4 GHz',
        band: '8.4 GHz',
        skyHz: 8.415e9,
        channelBandwidthHz: 32e6,
        channelsPerPolarisation: 2,
        polarisations: 2,
        bits: 2,
        coherenceSeconds: null,
        integrationSeconds: 2,
        spectralChannels: 64,
      },
    },
    away: {},
    clockReadAtMs: Object.fromEntries(stations.map(({ code }) => [code, nowMs])),
    nowMs,
    settings: {
      minElevationDeg: 5,
      leastSpareSeconds: 10,
      snrLimits: { doubtful: 7, fair: 10, strong: 20 },
      clockRules: { noteAfterHours: 24, unknownAfterDays: 7, instrumentSigmaSeconds: 5e-7 },
    },
  };
}
