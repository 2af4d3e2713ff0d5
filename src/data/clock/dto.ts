import type { ClockFit, ClockPrediction } from '../../clock/fit';
import type { Pulse } from '../../clock/reading';

type ReadingState = 'used' | 'set-aside' | 'waiting';

/** Station clock minus UTC, via GPS, positive = early. */
export type ReadingDto = {
  id: string;
  pulse: 'formatter' | 'maser';
  atMs: number;
  offsetSeconds: number;
  sigmaSeconds: number | null;
  secondCheck: 'yes' | 'no' | 'off';
  secondOff: number | null;
  state: ReadingState;
  /** why it is set aside or waits */
  reason: string;
  note: string;
  origin: 'form' | 'file' | 'api' | 'desk';
  enteredRole: string;
  /** the reading less the fit; null where there is no fit of its pulse */
  fromFitSeconds: number | null;
  /** too far from the fit: the fit left it out by itself */
  isFar: boolean;
};

export type ChangeDto = {
  id: string;
  atMs: number;
  kind: 'steered' | 'resync' | 'cable' | 'receiver' | 'power' | 'other';
  stepSeconds: number | null;
  note: string;
  role: string;
};

type ClockStation = {
  code: string;
  name: string;
  timeZone: string;
  counterStart: Pulse;
  counterStop: Pulse;
  stationCableSeconds: number;
  gpsCableSeconds: number;
  instrumentDelaySeconds: number | null;
  instrumentDelaySigmaSeconds: number | null;
};

export type StationClockDto = {
  station: ClockStation;
  pulse: 'formatter' | 'maser';
  /** newest first */
  readings: ReadingDto[];
  /** newest first */
  changes: ChangeDto[];
  /** null without a used reading */
  fit: ClockFit | null;
  now: ClockPrediction | null;
  /** a change with no reading after it: the fit speaks of before */
  isBehindChange: boolean;
  /** the station's sessions near the log, by start */
  sessions: { code: string; startMs: number; endMs: number }[];
  canWrite: boolean;
  canSetAside: boolean;
  nowMs: number;
};

export type ClockSummary = {
  code: string;
  name: string;
  readAtMs: number | null;
  now: ClockPrediction | null;
  used: number;
  setAside: number;
  waiting: number;
  scatterSeconds: number | null;
  /** newest first, for the small line */
  recent: { atMs: number; offsetSeconds: number }[];
};
