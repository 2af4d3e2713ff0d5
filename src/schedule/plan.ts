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

/**
 * Order of scans in a plan: by start, then by id.
 *
 * @returns negative when a comes first, positive when b does, 0 for the same scan
 */
export function compareScans(a: Scan, b: Scan): number {
  return a.startMs - b.startMs || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);
}

/**
 * The instant a scan ends for those who leave with it.
 *
 * @returns epoch ms, UTC; the scan holds [startMs, stop)
 */
export function scanStopMs(scan: Pick<Scan, 'startMs' | 'lengthSeconds'>): number {
  return scan.startMs + scan.lengthSeconds * 1000;
}

/**
 * When one station is on source in a scan: the scan's span less what it joins late and leaves early.
 *
 * @returns epoch ms, UTC, half-open [startMs, stopMs)
 */
export function stationOnMs(scan: Scan, member: ScanStation): { startMs: number; stopMs: number } {
  return {
    startMs: scan.startMs + member.lateSeconds * 1000,
    stopMs: scanStopMs(scan) - member.earlySeconds * 1000,
  };
}
