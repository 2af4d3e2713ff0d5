import type { PlanContext, PlanMode, PlanSource, PlanStation } from '@/src/schedule/context';
import type { AzElMount } from '@/src/sky/types';

const point = (fluxJy: number) => ({
  fluxJy,
  majorRad: 0,
  minorRad: 0,
  positionAngleRad: 0,
  eastRad: 0,
  northRad: 0,
});

export const MOUNT: AzElMount = {
  kind: 'az-el',
  azimuth: { minDeg: -90, maxDeg: 450, rateDegPerS: 0.5, accelDegPerS2: 0.1 },
  elevation: { minDeg: 3, maxDeg: 89, rateDegPerS: 0.4, accelDegPerS2: 0.1 },
  settleSeconds: 6,
};

/** Invented stations: places of the demo's network, drives of our own. */
function makeStation(code: string, latitudeDeg: number, longitudeDeg: number): PlanStation {
  return {
    code,
    name: code,
    site: { latitudeDeg, longitudeDeg, heightM: 100 },
    minElevationDeg: 8,
    maxElevationDeg: 88,
    horizon: [],
    mount: MOUNT,
    bits: 2,
    sefdJy: { '8.4 GHz': 800, '22 GHz': 1200 },
  };
}

export const STATIONS: Record<string, PlanStation> = {
  Em: makeStation('Em', 45.6, -109.9),
  Af: makeStation('Af', 54.2, 12.1),
  Bm: makeStation('Bm', 64.1, 27.6),
  Cf: makeStation('Cf', -24.1, 21.6),
};

function makeSource(id: string, name: string, raDeg: number, decDeg: number): PlanSource {
  return {
    id,
    name,
    position: { raDeg, decDeg },
    role: 'target',
    components: { '8.4 GHz': [point(0.5)], '22 GHz': [point(0.2)] },
  };
}

/** src-a and src-c are ICRF2 places (tests/reference/sources.json); src-b is made up and never sets in the north. */
export const SOURCES: Record<string, PlanSource> = {
  'src-a': makeSource('src-a', 'J0854+2006', 133.7036455292, 20.1085113572),
  'src-b': makeSource('src-b', 'SYN0200+75', 30, 75),
  'src-c': makeSource('src-c', 'J0555+3948', 88.8783567146, 39.8136569351),
};

export const MODE: PlanMode = {
  id: 'mode-a',
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
};

export function makeContext(changes: Partial<PlanContext> = {}): PlanContext {
  return {
    stations: STATIONS,
    sources: SOURCES,
    modes: { 'mode-a': MODE },
    away: {},
    clockReadAtMs: {},
    nowMs: 0,
    settings: {
      minElevationDeg: 0,
      leastSpareSeconds: 10,
      snrLimits: { doubtful: 7, fair: 10, strong: 20 },
      clockRules: { noteAfterHours: 24, unknownAfterDays: 7, instrumentSigmaSeconds: 5e-7 },
    },
    ...changes,
  };
}

export function withStation(code: string, changes: Partial<PlanStation>): PlanContext {
  const station = STATIONS[code];
  if (!station) throw new Error(`no station ${code}`);
  return makeContext({ stations: { ...STATIONS, [code]: { ...station, ...changes } } });
}
