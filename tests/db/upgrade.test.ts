import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { migrate } from 'drizzle-orm/libsql/migrator';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/client';
import { migrateDatabase } from '@/db/migrate';
import { openDatabase } from '@/tests/helpers/database';

const MIGRATIONS = path.join(import.meta.dirname, '../../migrations');

/** The migrations as they stood before the whole job was in them, in a folder of their own. */
function firstMigrations(count: number): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'antiphon-migrations-'));
  cpSync(MIGRATIONS, folder, { recursive: true });
  const file = path.join(folder, 'meta', '_journal.json');
  const journal = JSON.parse(readFileSync(file, 'utf8')) as { entries: unknown[] };
  writeFileSync(file, JSON.stringify({ ...journal, entries: journal.entries.slice(0, count) }));
  return folder;
}

const run = (sql: string) => database().client.execute(sql);

describe('a database of the first version that is brought up to date', () => {
  const folder = firstMigrations(3);
  openDatabase({ isMigrated: false });

  beforeAll(async () => {
    await migrate(database().db, { migrationsFolder: folder });
    for (const sql of [
      `INSERT INTO modes VALUES ('m', 'A mode', '22 GHz', 22.235e9, 32e6, 2, 2, 2, 120)`,
      `INSERT INTO stations (code, name, latitude_deg, longitude_deg, height_m, min_elevation_deg, max_elevation_deg,
         mount_kind, axis1_min_deg, axis1_max_deg, axis1_rate_deg_per_s, axis1_accel_deg_per_s2, axis2_min_deg,
         axis2_max_deg, axis2_rate_deg_per_s, axis2_accel_deg_per_s2, settle_seconds, bits, dish_m, time_zone)
       VALUES ('Xx', 'Ex', 50, 10, 100, 5, 88, 'az-el', -90, 450, 1, 1, 3, 89, 1, 1, 2, 2, 30, 'Europe/Berlin')`,
      `INSERT INTO station_bands (station_code, band, sefd_jy) VALUES ('Xx', '22 GHz', 500)`,
      `INSERT INTO sources (id, name, ra_deg, dec_deg, role) VALUES ('s', 'J0000+0000', 0, 0, 'target')`,
      `INSERT INTO source_bands (source_id, band, flux_jy, size_mas) VALUES ('s', '22 GHz', 1, NULL)`,
      `INSERT INTO sessions VALUES ('o', 'OLD-1', 'Old', 'draft', 0, 3600, 'm', 5, 10, 7, 10, 20)`,
      `INSERT INTO session_stations VALUES ('o', 'Xx')`,
      `INSERT INTO session_sources VALUES ('o', 's', 1)`,
      `INSERT INTO scans (session_id, id, source_id, mode_id, start_ms, length_seconds)
       VALUES ('o', 'c', 's', 'm', 0, 600)`,
      `INSERT INTO scan_stations VALUES ('o', 'c', 'Xx', 0, 0)`,
    ])
      await run(sql);
    await migrateDatabase();
  });
  afterAll(() => rmSync(folder, { recursive: true }));

  it('keeps every row and every tie between rows', async () => {
    const counts = await run(
      `SELECT (SELECT count(*) FROM stations) AS stations, (SELECT count(*) FROM station_bands) AS bands,
        (SELECT count(*) FROM sources) AS sources, (SELECT count(*) FROM source_bands) AS fluxes,
        (SELECT count(*) FROM sessions) AS sessions, (SELECT count(*) FROM session_stations) AS taking,
        (SELECT count(*) FROM scans) AS scans, (SELECT count(*) FROM scan_stations) AS members`,
    );
    expect({ ...counts.rows[0] }).toMatchObject({
      stations: 1,
      bands: 1,
      sources: 1,
      fluxes: 1,
      sessions: 1,
      taking: 1,
      scans: 1,
      members: 1,
    });
    expect((await run('PRAGMA foreign_key_check')).rows).toEqual([]);
    await expect(run("DELETE FROM stations WHERE code = 'Xx'")).rejects.toThrow(/FOREIGN KEY/);
  });

  it('lists the channels of a mode that had only their number', async () => {
    const { rows } = await run(
      'SELECT edge_hz, sideband, polarisation, bandwidth_hz, bits FROM mode_channels',
    );
    expect(
      rows.map((row) => [row.edge_hz, row.sideband, row.polarisation, row.bandwidth_hz, row.bits]),
    ).toEqual([
      [22.203e9, 'upper', 'R', 32e6, 2],
      [22.235e9, 'upper', 'R', 32e6, 2],
      [22.203e9, 'upper', 'L', 32e6, 2],
      [22.235e9, 'upper', 'L', 32e6, 2],
    ]);
  });

  it('still keeps a station’s code', async () => {
    await expect(run("UPDATE stations SET code = 'Yy'")).rejects.toThrow('does not change');
  });
});
