import { describe, expect, it } from 'vitest';
import { and, eq } from 'drizzle-orm';
import { db } from '@/db/client';
import { sourceBands } from '@/db/schema/source-bands';
import { seedId } from '@/db/seed-ids';
import { readHealth } from '@/src/data/health/read';
import { readJournal, readTimeline } from '@/src/data/plan/read';
import { takeAct } from '@/src/data/plan/write';
import { derivedState } from '@/src/data/session/dto';
import { listSessions, readSession } from '@/src/data/session/read';
import { listStations } from '@/src/data/station/read';
import { unpackPlan } from '@/src/schedule/plan-rows';
import {
  makeScan,
  makeSession,
  makeViewer,
  newId,
  NOW,
  openDatabase,
  sourceId,
} from '@/tests/helpers/database';

openDatabase();

const body = () => ({
  kind: 'do',
  actId: newId(),
  command: { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] },
  seen: {},
});

describe('the demo’s timeline', () => {
  it('comes whole: plan, catalogue, settings, revisions and the server’s clock', async () => {
    const answer = await readTimeline(await makeViewer('scheduler'), 'arc-031');
    if (!answer.ok) throw new Error(answer.message);
    const { timeline } = answer;
    const plan = unpackPlan(timeline.plan);
    expect(timeline.session).toMatchObject({
      code: 'ARC-031',
      title: 'North arc, 22 GHz',
      state: 'draft',
      startMs: Date.parse('2027-02-12T20:00:00Z'),
    });
    expect(plan.scans.length).toBeGreaterThan(60);
    const scan16 = plan.scans.find(({ id }) => id === seedId('scan', 'ARC-031 16'));
    expect(scan16).toMatchObject({
      startMs: Date.parse('2027-02-13T01:02:00Z'),
      lengthSeconds: 600,
    });
    expect(scan16?.stations.map((member) => member.station)).toContain('Af');
    expect(timeline.stations.map((station) => station.code)).toEqual(['Af', 'Bm', 'Cf', 'Dp', 'Em', 'Fn']);
    expect(timeline.stations[2]).toMatchObject({ code: 'Cf', bits: 1, sefdJy: { '22 GHz': 1900 } });
    expect(timeline.stations[2]?.sefdJy).not.toHaveProperty('8.4 GHz');
    expect(timeline.sources).toHaveLength(11);
    const [component] = timeline.sources[0]?.components['22 GHz'] ?? [];
    // 0.14 mas in radians
    expect(component?.majorRad).toBeCloseTo((0.14e-3 / 3600) * (Math.PI / 180), 15);
    expect(timeline.modes.map((mode) => mode.skyHz)).toEqual([22.235e9, 8.415e9]);
    expect(timeline.settings).toEqual({
      minElevationDeg: 5,
      leastSpareSeconds: 10,
      snrLimits: { doubtful: 7, fair: 10, strong: 20 },
      clockRules: { noteAfterHours: 24, unknownAfterDays: 7, instrumentSigmaSeconds: 3e-7 },
    });
    expect(Object.keys(timeline.revs)).toHaveLength(plan.scans.length + plan.groups.length + 1);
    expect(timeline).toMatchObject({ seq: 0, steps: { undo: null, redo: null } });
    expect(timeline.nowMs).toBeGreaterThanOrEqual(Date.parse(NOW));
  });
});

it('a source with components is their sum, not its one flux density', async () => {
  const stored = [
    { fluxJy: 0.3, majorMas: 0.2, minorMas: 0.1, positionAngleDeg: 90, eastMas: 1, northMas: -2 },
    { fluxJy: 0.1, majorMas: 0, minorMas: 0, positionAngleDeg: 0, eastMas: 0, northMas: 0 },
  ];
  const bandOf = and(eq(sourceBands.sourceId, sourceId('J0738+1742')), eq(sourceBands.band, '8.4 GHz'));
  await db()
    .update(sourceBands)
    .set({ components: JSON.stringify(stored) })
    .where(bandOf);
  const read = await readTimeline(await makeViewer('scheduler'), 'ARC-031');
  if (!read.ok) throw new Error(read.message);
  const found = read.timeline.sources.find(({ name }) => name === 'J0738+1742')?.components['8.4 GHz'];
  await db().update(sourceBands).set({ components: '[]' }).where(bandOf);
  expect(found?.map(({ fluxJy }) => fluxJy)).toEqual([0.3, 0.1]);
  expect(found?.[0]?.positionAngleRad).toBeCloseTo(Math.PI / 2, 12);
  // 1 mas in radians
  expect(found?.[0]?.eastRad).toBeCloseTo((1e-3 / 3600) * (Math.PI / 180), 18);
});

describe('who reads and writes a plan', () => {
  it.each([
    ['admin', true],
    ['scheduler', true],
    ['correlator', false],
  ] as const)('%s reads it; may change it: %s', async (role, canEdit) => {
    const session = await makeSession();
    const viewer = await makeViewer(role);
    expect(await readTimeline(viewer, session.id)).toMatchObject({ ok: true, timeline: { canEdit } });
    expect((await readJournal(viewer, session.id, 0)).ok).toBe(true);
    const answer = await takeAct(viewer, session.id, body());
    expect(answer).toMatchObject(canEdit ? { ok: true } : { ok: false, code: 'forbidden' });
  });

  it('an investigator reads the own session and finds no other', async () => {
    const [mine, other] = [await makeSession(), await makeSession()];
    const viewer = await makeViewer('investigator', { sessionId: mine.id });
    expect((await readTimeline(viewer, mine.code)).ok).toBe(true);
    expect(await takeAct(viewer, mine.id, body())).toMatchObject({ code: 'forbidden' });
    expect(await readTimeline(viewer, other.id)).toMatchObject({ code: 'not_found' });
    expect(await readJournal(viewer, other.id, 0)).toMatchObject({ code: 'not_found' });
    expect(await takeAct(viewer, other.id, body())).toMatchObject({ code: 'not_found' });
    expect(await listSessions(viewer)).toMatchObject({ ok: true, sessions: [{ code: mine.code }] });
  });

  it('an operator may not see the draft plan of a session with the own station, and finds no other', async () => {
    const session = await makeSession();
    const own = await makeViewer('operator', { stationCode: 'Af' });
    const stranger = await makeViewer('operator', { stationCode: 'Cf' });
    expect(await readSession(own, session.id)).toMatchObject({ ok: true });
    expect(await readTimeline(own, session.id)).toMatchObject({ code: 'forbidden' });
    expect(await readJournal(own, session.id, 0)).toMatchObject({ code: 'forbidden' });
    expect(await takeAct(own, session.id, body())).toMatchObject({ code: 'forbidden' });
    expect(await readSession(stranger, session.id)).toMatchObject({ code: 'not_found' });
    expect(await readTimeline(stranger, session.id)).toMatchObject({ code: 'not_found' });
    expect(await takeAct(stranger, session.id, body())).toMatchObject({ code: 'not_found' });
  });

  it('one without a grant gets nothing', async () => {
    const session = await makeSession();
    const nobody = { userId: 'x', email: 'x@antiphon.example', theme: null, grants: [] };
    expect(await listSessions(nobody)).toMatchObject({ code: 'forbidden' });
    expect(await readTimeline(nobody, session.id)).toMatchObject({ code: 'not_found' });
  });

  it('a session that does not exist is not found, by name', async () => {
    const answer = await readTimeline(await makeViewer('admin'), 'ARC-051');
    expect(answer).toMatchObject({ code: 'not_found', message: 'There is no session ARC-051.' });
  });

  it('a place in the journal that is no number is refused beside the field', async () => {
    const session = await makeSession();
    const answer = await readJournal(await makeViewer('admin'), session.id, 'yesterday');
    expect(answer).toMatchObject({
      code: 'invalid',
      fields: { after: [expect.stringContaining('yesterday')] },
    });
  });
});

describe('the stations of a list', () => {
  it('come with name and longitude, and nothing else', async () => {
    const answer = await listStations(await makeViewer('operator', { stationCode: 'Af' }), ['Af']);
    expect(answer).toEqual({
      ok: true,
      stations: [
        { code: 'Af', name: 'Arrow Fell', site: { longitudeDeg: expect.closeTo(12.1, 1) as number } },
      ],
    });
  });

  it('are not for one without a role', async () => {
    const nobody = { userId: 'x', email: 'x@antiphon.example', theme: null, grants: [] };
    expect(await listStations(nobody, ['Af'])).toMatchObject({ code: 'forbidden' });
  });

  it('that do not exist are left out', async () => {
    expect(await listStations(await makeViewer('admin'), ['Zz'])).toEqual({ ok: true, stations: [] });
  });
});

describe('the list of sessions', () => {
  it('says how many scans, and hides the draft’s count from operators', async () => {
    const find = async (role: 'scheduler' | 'operator') => {
      const viewer = await makeViewer(role, role === 'operator' ? { stationCode: 'Af' } : {});
      const answer = await listSessions(viewer);
      return answer.ok ? answer.sessions.find((session) => session.code === 'ARC-031') : undefined;
    };
    expect(await find('scheduler')).toMatchObject({
      scanCount: 73,
      stations: ['Af', 'Bm', 'Cf', 'Dp', 'Em', 'Fn'],
      canReadPlan: true,
    });
    expect(await find('operator')).toMatchObject({ scanCount: null, canReadPlan: false });
  });

  it('calls a published session observed once its end has passed', () => {
    const session = { state: 'published', startMs: 0, lengthSeconds: 60 } as const;
    expect(derivedState(session, 59_999)).toBe('published');
    expect(derivedState(session, 60_000)).toBe('observed');
    expect(derivedState({ ...session, state: 'draft' }, 60_000)).toBe('draft');
  });
});

it('health says that the database answers', async () => {
  expect(await readHealth()).toEqual({ ok: true, database: 'answers' });
});
