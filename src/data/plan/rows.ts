import 'server-only';
import { sql, type SQL } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { journal } from '../../../db/schema/journal';
import { noddingGroups as groups } from '../../../db/schema/nodding-groups';
import { scanStations as members } from '../../../db/schema/scan-stations';
import { scans } from '../../../db/schema/scans';
import { sessions } from '../../../db/schema/sessions';
import { subjects } from '../../../db/schema/subjects';
import type { Command } from '../../schedule/commands';
import type { Plan } from '../../schedule/plan';
import { unpackPlan, type GroupRow, type PlanRows, type ScanRow } from '../../schedule/plan-rows';
import type { SessionRow } from '../session/scope';
import type { Revs } from './dto';

type StoredPlan = { startMs: number; lengthSeconds: number; scans: string; groups: string };

const scansJson = (where: SQL) => sql`(
  SELECT json_group_array(json_array(
    ${scans.id}, ${scans.sourceId}, ${scans.modeId}, (${scans.startMs} - ${sessions.startMs}) / 1000,
    ${scans.lengthSeconds},
    json((SELECT json_group_array(json_array(${members.stationCode}, ${members.lateSeconds}, ${members.earlySeconds})
            ORDER BY ${members.stationCode})
          FROM ${members} WHERE ${members.sessionId} = ${scans.sessionId} AND ${members.scanId} = ${scans.id})),
    ${scans.groupId}, ${scans.leg}, ${scans.comment}) ORDER BY ${scans.startMs}, ${scans.id})
  FROM ${scans} WHERE ${scans.sessionId} = ${sessions.id} AND ${where})`;

const groupsJson = (where: SQL) => sql`(
  SELECT json_group_array(json_array(
    ${groups.id}, ${groups.targetId}, ${groups.calibratorId}, ${groups.targetOnSeconds},
    ${groups.calibratorOnSeconds}, ${groups.turnSeconds}, ${groups.first}) ORDER BY ${groups.id})
  FROM ${groups} WHERE ${groups.sessionId} = ${sessions.id} AND ${where})`;

/** Plan, revisions and newest seq by one statement, so that they belong to one instant. */
export async function readPlanRows(
  from: Database | Tx,
  session: SessionRow,
): Promise<{ plan: PlanRows; revs: Revs; seq: number }> {
  const [row] = await from.all<StoredPlan & { revs: string; seq: number }>(sql`
    SELECT ${sessions.startMs} AS startMs, ${sessions.lengthSeconds} AS lengthSeconds,
      ${scansJson(sql`true`)} AS scans, ${groupsJson(sql`true`)} AS groups,
      (SELECT json_group_object(${subjects.id}, ${subjects.rev}) FROM ${subjects}
        WHERE ${subjects.sessionId} = ${sessions.id}) AS revs,
      (SELECT coalesce(max(${journal.seq}), 0) FROM ${journal}
        WHERE ${journal.sessionId} = ${sessions.id}) AS seq
    FROM ${sessions} WHERE ${sessions.id} = ${session.id}`);
  if (!row) throw new Error(`Session ${session.id} went away while it was read.`);
  return { plan: planRows(session, row), revs: JSON.parse(row.revs) as Revs, seq: row.seq };
}

/** The part of the plan that a command touches: its scans and groups, and the legs of a group it takes out. */
export function readTouched(tx: Tx, session: SessionRow, command: Command): Promise<Plan> {
  const ids = command.edits.flatMap((edit) => {
    if (edit.kind === 'change-span') return [];
    if ('scan' in edit)
      return edit.scan.groupId === null ? [edit.scan.id] : [edit.scan.id, edit.scan.groupId];
    if ('group' in edit) return [edit.group.id];
    return [edit.kind === 'remove-scan' ? edit.scanId : edit.groupId];
  });
  const removed = command.edits.flatMap((edit) => (edit.kind === 'remove-group' ? [edit.groupId] : []));
  return readSubjects(tx, session, ids, removed);
}

/** The scans and groups of these ids, with the groups that those scans belong to. */
export async function readSubjects(
  tx: Tx,
  session: SessionRow,
  ids: readonly string[],
  withLegsOf: readonly string[] = [],
): Promise<Plan> {
  const asked = oneOf(ids);
  const scanIsAsked = sql`(${scans.id} IN ${asked} OR ${scans.groupId} IN ${oneOf(withLegsOf)})`;
  const groupIsAsked = sql`(${groups.id} IN ${asked} OR ${groups.id} IN (
    SELECT ${scans.groupId} FROM ${scans} WHERE ${scans.sessionId} = ${sessions.id} AND ${scanIsAsked} AND ${scans.groupId} IS NOT NULL))`;
  const [row] = await tx.all<StoredPlan>(sql`
    SELECT ${sessions.startMs} AS startMs, ${sessions.lengthSeconds} AS lengthSeconds,
      ${scansJson(scanIsAsked)} AS scans, ${groupsJson(groupIsAsked)} AS groups
    FROM ${sessions} WHERE ${sessions.id} = ${session.id}`);
  if (!row) throw new Error(`Session ${session.id} went away while it was changed.`);
  return unpackPlan(planRows(session, row));
}

export const oneOf = (values: readonly (string | number)[]): SQL =>
  sql`(SELECT value FROM json_each(${JSON.stringify(values)}))`;

function planRows(session: SessionRow, row: StoredPlan): PlanRows {
  return {
    sessionId: session.id,
    startMs: row.startMs,
    lengthSeconds: row.lengthSeconds,
    stations: session.stations,
    scans: JSON.parse(row.scans) as ScanRow[],
    groups: JSON.parse(row.groups) as GroupRow[],
  };
}
