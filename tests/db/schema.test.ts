import { readdirSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { database } from '@/db/client';
import { makeScan, makeSession, makeViewer, newId, openDatabase } from '@/tests/helpers/database';
import { takeAct } from '@/src/data/plan/write';

openDatabase();

const run = (sql: string) => database().client.execute(sql);

describe('the database itself', () => {
  it('has every table of the schema, each of them strict', async () => {
    const { rows } = await run(
      "SELECT name, strict FROM pragma_table_list WHERE schema = 'main' AND name NOT LIKE 'sqlite_%' AND name NOT LIKE '\\_\\_%' ESCAPE '\\'",
    );
    const files = readdirSync(path.join(import.meta.dirname, '../../db/schema'));
    expect(rows).toHaveLength(files.length);
    expect(rows.filter((row) => row.strict !== 1)).toEqual([]);
  });

  it('writes ahead, keeps foreign keys and syncs in full', async () => {
    expect((await run('PRAGMA journal_mode')).rows[0]?.journal_mode).toBe('wal');
    expect((await run('PRAGMA foreign_keys')).rows[0]?.foreign_keys).toBe(1);
    expect((await run('PRAGMA synchronous')).rows[0]?.synchronous).toBe(2);
  });

  it('never changes a journal row and never deletes a subject', async () => {
    const { id } = await makeSession();
    const viewer = await makeViewer('scheduler');
    const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] };
    expect((await takeAct(viewer, id, { kind: 'do', actId: newId(), command, seen: {} })).ok).toBe(true);
    await expect(run("UPDATE journal SET verb = 'move-scan'")).rejects.toThrow('append-only');
    await expect(run('DELETE FROM journal')).rejects.toThrow('append-only');
    await expect(run('DELETE FROM subjects')).rejects.toThrow('never deleted');
    await expect(run('UPDATE subjects SET rev = rev - 1, top = 0')).rejects.toThrow('never falls');
  });

  it('leaves a station something of its scan, whichever of the two changes', async () => {
    const { id } = await makeSession();
    const viewer = await makeViewer('scheduler');
    const scan = makeScan();
    const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
    expect((await takeAct(viewer, id, { kind: 'do', actId: newId(), command, seen: {} })).ok).toBe(true);
    const of = `WHERE session_id = '${id}'`;
    await expect(run(`UPDATE scan_stations SET late_seconds = ${scan.lengthSeconds} ${of}`)).rejects.toThrow(
      'late + early',
    );
    await run(`UPDATE scan_stations SET late_seconds = ${scan.lengthSeconds - 1} ${of}`);
    await expect(run(`UPDATE scans SET length_seconds = ${scan.lengthSeconds - 1} ${of}`)).rejects.toThrow(
      'late + early',
    );
    await expect(run(`UPDATE scans SET length_seconds = 86401 ${of}`)).rejects.toThrow('24 h');
  });

  it('takes a scan that is shortened together with what its stations miss', async () => {
    const { id } = await makeSession();
    const viewer = await makeViewer('scheduler');
    const scan = makeScan();
    const late = scan.stations.map((member) => ({ ...member, lateSeconds: scan.lengthSeconds - 1 }));
    const first = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: { ...scan, stations: late } }] };
    const added = await takeAct(viewer, id, { kind: 'do', actId: newId(), command: first, seen: {} });
    const shorter = { ...scan, lengthSeconds: 10 };
    const second = { verb: 'edit-scan', edits: [{ kind: 'change-scan', scan: shorter }] };
    const seen = added.ok ? added.subjects : {};
    expect(await takeAct(viewer, id, { kind: 'do', actId: newId(), command: second, seen })).toMatchObject({
      ok: true,
    });
  });

  it.each([
    ['a station’s code changes', "UPDATE stations SET code = 'Zz' WHERE code = 'Af'"],
    ['a code begins with a figure', "UPDATE stations SET code = '1f' WHERE code = 'Af'"],
    ['a limit lies above the zenith', 'UPDATE stations SET max_elevation_deg = 91'],
    ['bits are neither 1 nor 2', 'UPDATE stations SET bits = 3'],
    ['a drive stands still', 'UPDATE stations SET axis1_rate_deg_per_s = 0'],
    ['a right ascension is a full turn', 'UPDATE sources SET ra_deg = 360'],
    ['a flux density is zero', 'UPDATE source_bands SET flux_jy = 0'],
    ['a scan starts on a part second', 'UPDATE scans SET start_ms = start_ms + 1'],
    ['a scan has no length', 'UPDATE scans SET length_seconds = 0'],
    ['a scan lasts a part second', 'UPDATE scans SET length_seconds = 600.5'],
    ['a leg has no group', "UPDATE scans SET leg = 'target'"],
    ['a station joins before the start', 'UPDATE scan_stations SET late_seconds = -1'],
    ['a session’s state is unknown', "UPDATE sessions SET state = 'observed'"],
    ['limits of SNR are out of order', 'UPDATE sessions SET snr_fair = 30'],
    ['a theme is unknown', "UPDATE users SET theme = 'dusk'"],
    [
      'an e-mail has capitals',
      "UPDATE users SET email = 'Admin@antiphon.example' WHERE email LIKE 'admin@%'",
    ],
    ['an operator has no station', "UPDATE grants SET station_code = NULL WHERE role = 'operator'"],
    [
      'a scheduler has a session',
      "UPDATE grants SET session_id = (SELECT id FROM sessions) WHERE role = 'scheduler'",
    ],
  ])('refuses where %s', async (_, sql) => {
    await expect(run(sql)).rejects.toThrow(/constraint|does not change|cannot store/i);
  });

  it('refuses two stations whose codes differ in case only', async () => {
    const copy = (await run('SELECT * FROM stations LIMIT 1')).columns.map((name) =>
      name === 'code' ? "'AF'" : name,
    );
    const sql = `INSERT INTO stations SELECT ${copy.join(', ')} FROM stations WHERE code = 'Af'`;
    await expect(run(sql)).rejects.toThrow(/UNIQUE/);
  });

  it('refuses a station that has nothing left of a scan', async () => {
    const sql = `INSERT INTO scan_stations SELECT session_id, id, 'Em', 400, length_seconds - 400 FROM scans
      WHERE id NOT IN (SELECT scan_id FROM scan_stations WHERE station_code = 'Em') LIMIT 1`;
    await expect(run(sql)).rejects.toThrow('less than the length');
  });
});
