import type { GroupId, NoddingGroup, Plan, Scan, StationCode } from './plan';

/** id, source, mode, seconds after the span's start, length, stations with late and early, group, leg, comment. */
export type ScanRow = readonly [
  id: string,
  sourceId: string,
  modeId: string,
  afterSeconds: number,
  lengthSeconds: number,
  stations: readonly (readonly [StationCode, lateSeconds: number, earlySeconds: number])[],
  groupId: GroupId | null,
  leg: Scan['leg'],
  comment: string,
];

export type GroupRow = readonly [
  id: GroupId,
  targetId: string,
  calibratorId: string,
  targetOnSeconds: number,
  calibratorOnSeconds: number,
  turnSeconds: number,
  first: NoddingGroup['first'],
];

/** A plan as it travels: rows without names. */
export type PlanRows = {
  sessionId: string;
  startMs: number;
  lengthSeconds: number;
  stations: readonly StationCode[];
  /** by start, then id */
  scans: readonly ScanRow[];
  groups: readonly GroupRow[];
};

/**
 * The plan that compact rows stand for.
 *
 * @param rows  as the database makes them
 * @returns scans in the order of the rows
 */
export function unpackPlan(rows: PlanRows): Plan {
  return {
    sessionId: rows.sessionId,
    span: { startMs: rows.startMs, lengthSeconds: rows.lengthSeconds },
    stations: rows.stations,
    scans: rows.scans.map((row) => unpackScan(row, rows.startMs)),
    groups: rows.groups.map(unpackGroup),
  };
}

function unpackScan(row: ScanRow, spanStartMs: number): Scan {
  const [id, sourceId, modeId, afterSeconds, lengthSeconds, members, groupId, leg, comment] = row;
  return {
    id,
    sourceId,
    modeId,
    startMs: spanStartMs + afterSeconds * 1000,
    lengthSeconds,
    stations: members.map(([station, lateSeconds, earlySeconds]) => ({
      station,
      lateSeconds,
      earlySeconds,
    })),
    groupId,
    leg,
    comment,
  };
}

function unpackGroup(row: GroupRow): NoddingGroup {
  const [id, targetId, calibratorId, targetOnSeconds, calibratorOnSeconds, turnSeconds, first] = row;
  return { id, targetId, calibratorId, targetOnSeconds, calibratorOnSeconds, turnSeconds, first };
}
