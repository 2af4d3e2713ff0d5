import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { database } from '@/db/client';
import { seedDemo } from '@/db/seed';
import { SOURCES } from '@/db/seed-data/sources';
import { demoStartMs } from '@/db/seed-sessions';
import { takeAct } from '@/src/data/plan/write';
import { SIDEREAL_DAY_SECONDS } from '@/src/units/constants';
import { makeScan, makeViewer, newId, NOW, openDatabase } from '@/tests/helpers/database';

openDatabase({ isSeeded: false });

const now = Date.parse(NOW);
const day = 86_400_000;
const dump = async () => {
  const tables = ['users', 'grants', 'stations', 'sources', 'modes', 'sessions', 'scans', 'scan_stations'];
  const all = await Promise.all(
    tables.map((table) => database().client.execute(`SELECT * FROM ${table} ORDER BY 1, 2, 3`)),
  );
  return all.map(({ rows }) => rows.map((row) => Object.values(row)));
};
const starts = async () => {
  const { rows } = await database().client.execute(
    "SELECT s.start_ms AS session, min(c.start_ms) AS scan FROM sessions s JOIN scans c ON c.session_id = s.id WHERE s.code = 'ARC-031'",
  );
  return { session: Number(rows[0]?.session), scan: Number(rows[0]?.scan) };
};

describe('the demo', () => {
  it('starts at its base when seen from the day of the pictures', () => {
    expect(new Date(demoStartMs(now)).toISOString()).toBe('2027-02-12T20:00:00.000Z');
  });

  it('starts 48 h to 72 h ahead, whole sidereal days from its base to 5 s, whatever the date', () => {
    for (let k = -400; k < 400; k++) {
      const at = now + k * 0.37 * day;
      const ahead = demoStartMs(at) - at;
      expect(ahead).toBeGreaterThanOrEqual(2 * day);
      expect(ahead).toBeLessThan(3 * day);
      const days = (demoStartMs(at) - demoStartMs(now)) / (SIDEREAL_DAY_SECONDS * 1000);
      expect(Math.abs(days - Math.round(days)) * SIDEREAL_DAY_SECONDS).toBeLessThanOrEqual(5);
    }
  });

  it('has the places of the reference catalogue to the last figure', () => {
    const file = path.join(import.meta.dirname, '../reference/sources.json');
    const { cases } = JSON.parse(readFileSync(file, 'utf8')) as {
      cases: { name: string; ra: number; dec: number }[];
    };
    for (const [name, raDeg, decDeg] of SOURCES) {
      expect(cases).toContainEqual(expect.objectContaining({ name, ra: raDeg, dec: decDeg }));
    }
  });

  it('is filled once; a second run changes nothing', async () => {
    expect(await seedDemo(now)).toBe('filled');
    const before = await dump();
    expect(before.every((rows) => rows.length > 0)).toBe(true);
    expect(await seedDemo(now + 1000)).toBe('kept');
    expect(await dump()).toEqual(before);
  });

  it('stays for 24 h, then all its dates move on together', async () => {
    const before = await starts();
    expect(await seedDemo(now + day)).toBe('kept');
    expect(await seedDemo(now + 9 * day)).toBe('moved');
    const after = await starts();
    expect(after.session).toBe(demoStartMs(now + 9 * day));
    expect(after.scan - after.session).toBe(before.scan - before.session);
    expect(await seedDemo(now)).toBe('moved');
    expect(await starts()).toEqual(before);
  });

  it('stays as it is once someone changed its plan', async () => {
    const viewer = await makeViewer('scheduler');
    const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] };
    const answer = await takeAct(viewer, 'ARC-031', { kind: 'do', actId: newId(), command, seen: {} });
    expect(answer.ok).toBe(true);
    const before = await starts();
    expect(await seedDemo(now + 30 * day)).toBe('kept');
    expect(await starts()).toEqual(before);
  });
});
