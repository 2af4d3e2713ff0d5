export type StationCode = string;
export type ScanId = string;
export type GroupId = string;
/** A scan, a group, or the session's span ('span'): what a command touches. */
export type SubjectId = string;

/** Joins lateSeconds after the scan's start and leaves earlySeconds before its stop; both ≥ 0, late + early < length. */
export type ScanStation = { station: StationCode; lateSeconds: number; earlySeconds: number };

export type Scan = {
  id: ScanId;
  sourceId: string;
  modeId: string;
  /** epoch ms, UTC, on whole seconds */
  startMs: number;
  lengthSeconds: number;
  /** sorted by code, no double */
  stations: readonly ScanStation[];
  groupId: GroupId | null;
  leg: 'target' | 'calibrator' | null;
  comment: string;
};

/** The recipe of a nodding group; its legs are real scans. */
export type NoddingGroup = {
  id: GroupId;
  targetId: string;
  calibratorId: string;
  targetOnSeconds: number;
  calibratorOnSeconds: number;
  turnSeconds: number;
  first: 'target' | 'calibrator';
};

export type PlanSpan = { startMs: number; lengthSeconds: number };

export type Plan = {
  sessionId: string;
  span: PlanSpan;
  stations: readonly StationCode[];
  /** by startMs, then id */
  scans: readonly Scan[];
  groups: readonly NoddingGroup[];
};
