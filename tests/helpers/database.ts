import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll } from 'vitest';
import { database, db } from '@/db/client';
import { migrateDatabase } from '@/db/migrate';
import { grants } from '@/db/schema/grants';
import { sessionSources } from '@/db/schema/session-sources';
import { sessionStations } from '@/db/schema/session-stations';
import { sessions } from '@/db/schema/sessions';
import { users } from '@/db/schema/users';
import { seedDemo } from '@/db/seed';
import { seedId } from '@/db/seed-ids';
import type { Grant, Role, Viewer } from '@/src/access/policy';
import type { Scan } from '@/src/schedule/plan';

export const NOW = '2027-02-10T14:32:00Z';
export const START_MS = Date.parse('2027-03-01T12:00:00Z');
export const MODE_ID = seedId('mode', '22 GHz');
export const sourceId = (name: string) => seedId('source', name);

/** A real file of its own for the test file that calls it, migrated, with the demo in it. */
export function openDatabase({ isMigrated = true, isSeeded = true } = {}): void {
  const folder = mkdtempSync(path.join(tmpdir(), 'antiphon-test-'));
  process.env.DATABASE_URL = `file:${path.join(folder, 'test.db')}`;
  process.env.ANTIPHON_NOW = NOW;
  process.env.LOG_LEVEL = 'silent';
  beforeAll(async () => {
    if (isMigrated) await migrateDatabase();
    if (isMigrated && isSeeded) await seedDemo(Date.parse(NOW));
  });
  afterAll(() => {
    database().client.close();
    rmSync(folder, { recursive: true });
  });
}

let count = 0;
export const newId = (): string => `t${String(++count).padStart(15, '0')}`;

/** A draft session of Af, Bm and Fn, with two sources and no scan. */
export async function makeSession(
  state: 'draft' | 'closed' = 'draft',
): Promise<{ id: string; code: string }> {
  const id = newId();
  const code = `TST-${count}`;
  await db().insert(sessions).values({
    id,
    code,
    title: 'A test',
    state,
    startMs: START_MS,
    lengthSeconds: 86_400,
    modeId: MODE_ID,
    minElevationDeg: 5,
    leastSpareSeconds: 10,
    snrDoubtful: 7,
    snrFair: 10,
    snrStrong: 20,
  });
  await db()
    .insert(sessionStations)
    .values(['Af', 'Bm', 'Fn'].map((stationCode) => ({ sessionId: id, stationCode })));
  await db()
    .insert(sessionSources)
    .values(
      ['J0738+1742', 'J0927+3902'].map((name) => ({
        sessionId: id,
        sourceId: sourceId(name),
        wantedScans: 3,
      })),
    );
  return { id, code };
}

export async function makeViewer(
  role: Role,
  where: { stationCode?: string; sessionId?: string } = {},
): Promise<Viewer> {
  const userId = newId();
  const email = `${userId}@antiphon.example`;
  const grant: Grant = {
    role,
    stationCode: where.stationCode ?? null,
    sessionId: where.sessionId ?? null,
  };
  await db().insert(users).values({ id: userId, email, passwordHash: 'none' });
  await db()
    .insert(grants)
    .values({ id: newId(), userId, ...grant });
  return { userId, email, theme: null, grants: [grant] };
}

export const makeScan = (over: Partial<Scan> = {}): Scan => ({
  id: newId(),
  sourceId: sourceId('J0738+1742'),
  modeId: MODE_ID,
  startMs: START_MS + 3_600_000,
  lengthSeconds: 600,
  stations: ['Af', 'Bm', 'Fn'].map((station) => ({ station, lateSeconds: 0, earlySeconds: 0 })),
  groupId: null,
  leg: null,
  comment: '',
  ...over,
});
