import type { GaussianComponent } from '../array/structure';
import type { Geodetic, HorizonPoint, Interval, Mount, SkyPosition } from '../sky/types';
import type { StationCode } from './plan';

export type PlanStation = {
  code: StationCode;
  name: string;
  site: Geodetic;
  minElevationDeg: number;
  maxElevationDeg: number;
  horizon: HorizonPoint[];
  mount: Mount;
  bits: 1 | 2;
  /** zenith SEFD per polarisation by band; a band that is absent is not known */
  sefdJy: Readonly<Record<string, number>>;
};

export type SourceRole = 'target' | 'phase-ref' | 'finder' | 'polarisation';

export type PlanSource = {
  id: string;
  name: string;
  position: SkyPosition;
  role: SourceRole;
  /** model by band; a band that is absent is not known */
  components: Readonly<Record<string, readonly GaussianComponent[]>>;
};

export type PlanMode = {
  id: string;
  name: string;
  band: string;
  /** centre of the band on the sky */
  skyHz: number;
  channelBandwidthHz: number;
  channelsPerPolarisation: number;
  polarisations: 1 | 2;
  bits: 1 | 2;
  /** atmosphere's coherence time; null = no loss is taken, and the screen says so */
  coherenceSeconds: number | null;
  /** of the correlator */
  integrationSeconds: number;
  /** in one channel */
  spectralChannels: number;
};

export type PlanSettings = {
  /** lowest elevation for all stations, on top of masks */
  minElevationDeg: number;
  /** least spare time after a slew */
  leastSpareSeconds: number;
  /** lower limits of the verdict words; below doubtful is none */
  snrLimits: { doubtful: number; fair: number; strong: number };
  clockRules: {
    /** age of the newest reading from which it is a note */
    noteAfterHours: number;
    /** age from which nothing is said of the clock */
    unknownAfterDays: number;
    /** taken for an instrument delay that is not known */
    instrumentSigmaSeconds: number;
  };
};

export type PlanContext = {
  stations: Readonly<Record<StationCode, PlanStation>>;
  sources: Readonly<Record<string, PlanSource>>;
  modes: Readonly<Record<string, PlanMode>>;
  away: Readonly<Record<StationCode, readonly (Interval & { why: string })[]>>;
  /** newest reading of each station's clock, null where it was never read; a station that is absent is not judged */
  clockReadAtMs: Readonly<Record<StationCode, number | null>>;
  /** formatters whose whole second is off by so many seconds (found at atMs), or null: not checked since atMs */
  clockSecond?: Readonly<Record<StationCode, { off: number | null; atMs: number | null }>>;
  nowMs: number;
  settings: PlanSettings;
};
