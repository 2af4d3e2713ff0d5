import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import type { Tx } from '../../../db/client';
import { noddingGroups } from '../../../db/schema/nodding-groups';
import { scanStations } from '../../../db/schema/scan-stations';
import { scans } from '../../../db/schema/scans';
import { sessions } from '../../../db/schema/sessions';
import type { NoddingGroup, Plan, Scan } from '../../schedule/plan';
import { oneOf } from './rows';

/** Writes what differs; groups come before their legs and go after them. */
export async function saveDifference(tx: Tx, before: Plan, after: Plan): Promise<void> {
  const { sessionId } = after;
  const put = <T extends { id: string }>(old: readonly T[], now: readonly T[]) => {
    const known = new Map(old.map((item) => [item.id, item]));
    return now.filter((item) => known.get(item.id) !== item);
  };
  const gone = <T extends { id: string }>(old: readonly T[], now: readonly T[]) => {
    const kept = new Set(now.map((item) => item.id));
    return old.filter((item) => !kept.has(item.id)).map((item) => item.id);
  };
  if (after.span !== before.span) {
    const { startMs, lengthSeconds } = after.span;
    await tx.update(sessions).set({ startMs, lengthSeconds }).where(eq(sessions.id, sessionId));
  }
  await putGroups(tx, sessionId, put(before.groups, after.groups));
  await removeScans(tx, sessionId, gone(before.scans, after.scans));
  await putScans(tx, sessionId, put(before.scans, after.scans));
  await removeGroups(tx, sessionId, gone(before.groups, after.groups));
}

async function putScans(tx: Tx, sessionId: string, changed: readonly Scan[]): Promise<void> {
  if (changed.length === 0) return;
  const rows = changed.map((scan) => [
    scan.id,
    scan.sourceId,
    scan.modeId,
    scan.startMs,
    scan.lengthSeconds,
    scan.groupId,
    scan.leg,
    scan.comment,
  ]);
  // members go before their scan is shortened, and come back with what is left of it
  await tx
    .delete(scanStations)
    .where(
      and(
        eq(scanStations.sessionId, sessionId),
        sql`${scanStations.scanId} IN ${oneOf(changed.map((scan) => scan.id))}`,
      ),
    );
  await tx.run(sql`
    INSERT INTO ${scans} (session_id, id, source_id, mode_id, start_ms, length_seconds, group_id, leg, comment)
    SELECT ${sessionId}, value ->> 0, value ->> 1, value ->> 2, value ->> 3, value ->> 4, value ->> 5, value ->> 6, value ->> 7
    FROM json_each(${JSON.stringify(rows)}) WHERE true
    ON CONFLICT (session_id, id) DO UPDATE SET
      source_id = excluded.source_id, mode_id = excluded.mode_id, start_ms = excluded.start_ms,
      length_seconds = excluded.length_seconds, group_id = excluded.group_id, leg = excluded.leg,
      comment = excluded.comment`);
  const members = changed.flatMap((scan) =>
    scan.stations.map((member) => [scan.id, member.station, member.lateSeconds, member.earlySeconds]),
  );
  await tx.run(sql`
    INSERT INTO ${scanStations} (session_id, scan_id, station_code, late_seconds, early_seconds)
    SELECT ${sessionId}, value ->> 0, value ->> 1, value ->> 2, value ->> 3
    FROM json_each(${JSON.stringify(members)})`);
}

async function removeScans(tx: Tx, sessionId: string, ids: readonly string[]): Promise<void> {
  if (ids.length === 0) return;
  await tx.delete(scans).where(and(eq(scans.sessionId, sessionId), sql`${scans.id} IN ${oneOf(ids)}`));
}

async function putGroups(tx: Tx, sessionId: string, changed: readonly NoddingGroup[]): Promise<void> {
  for (const group of changed) {
    await tx
      .insert(noddingGroups)
      .values({ sessionId, ...group })
      .onConflictDoUpdate({ target: [noddingGroups.sessionId, noddingGroups.id], set: group });
  }
}

async function removeGroups(tx: Tx, sessionId: string, ids: readonly string[]): Promise<void> {
  if (ids.length === 0) return;
  await tx
    .delete(noddingGroups)
    .where(and(eq(noddingGroups.sessionId, sessionId), sql`${noddingGroups.id} IN ${oneOf(ids)}`));
}
