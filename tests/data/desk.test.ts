import { beforeAll, describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { scanOutcomes } from '@/db/schema/scan-outcomes';
import { sessions } from '@/db/schema/sessions';
import { stations } from '@/db/schema/stations';
import { eq, ne } from 'drizzle-orm';
import { readDesk } from '@/src/data/desk/read';
import { offerPlan } from '@/src/data/offer/write';
import { outcomesOf } from '@/src/data/outcome/read';
import { sayOutcome } from '@/src/data/outcome/write';
import { takeAct } from '@/src/data/plan/write';
import type { Viewer } from '@/src/access/policy';
import { makeScan, makeSession, makeViewer, newId, NOW, openDatabase } from '@/tests/helpers/database';

openDatabase();

const now = Date.parse(NOW);
const MINUTE = 60_000;
const operatorOf = (stationCode: string) => makeViewer('operator', { stationCode });

/** A session that began an hour ago, with one scan that is over and one that is ahead, offered. */
async function running(state: 'offered' | 'closed' = 'offered') {
  const session = await makeSession();
  const startMs = now - 60 * MINUTE;
  await db().update(sessions).set({ startMs }).where(eq(sessions.id, session.id));
  const scheduler = await makeViewer('scheduler');
  const over = makeScan({ startMs: startMs + 10 * MINUTE, lengthSeconds: 600 });
  const ahead = makeScan({ startMs: startMs + 90 * MINUTE, lengthSeconds: 600 });
  for (const scan of [over, ahead]) {
    const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
    const act = await takeAct(scheduler, session.id, { kind: 'do', actId: newId(), command, seen: {} });
    if (!act.ok) throw new Error(act.message);
  }
  await offerPlan(scheduler, session.id, { id: newId(), kind: 'offer' });
  await db().update(sessions).set({ state }).where(eq(sessions.id, session.id));
  return { ...session, over, ahead, scheduler };
}

describe('the desk of the demo', () => {
  const deskOf = async (code: string, viewer?: Viewer) => {
    const read = await readDesk(viewer ?? (await operatorOf(code)), code);
    if (!read.ok) throw new Error(read.message);
    return read.desk;
  };

  it('shows the published run that is under way, with what comes next and how it went', async () => {
    const { run, clock, canSay } = await deskOf('Af');
    expect(run).toMatchObject({ code: 'ARC-030', kind: 'publish', number: 2, answer: 'confirmed' });
    expect(canSay).toBe(true);
    const ended = run?.scans.filter(({ stopMs }) => stopMs + 5 * MINUTE <= now) ?? [];
    expect(ended.length).toBeGreaterThan(20);
    const unsaid = ended.filter(({ scanId }) => !run?.outcomes.some((one) => one.scanId === scanId));
    expect(unsaid).toHaveLength(1);
    expect(run?.scans.some(({ startMs }) => startMs > now)).toBe(true);
    expect(clock?.offsetSeconds).toBeCloseTo(3.207e-6, 7);
  });

  it('has the way to each scan: where from, how long, on which turn', async () => {
    const { run } = await deskOf('Fn');
    const second = run?.scans[1];
    expect(second?.slewSeconds).toBeGreaterThan(0);
    expect(second?.fromStopMs).toBe(run?.scans[0]?.stopMs);
    expect(second?.startElDeg).toBeGreaterThan(5);
    for (const { motorStartDeg, turn, startAzDeg } of run?.scans ?? [])
      expect(motorStartDeg - 360 * (turn ?? NaN)).toBeCloseTo(startAzDeg, 6);
  });

  it('is for its own operators and for schedulers', async () => {
    const codeOf = async (viewer: Viewer) => {
      const read = await readDesk(viewer, 'Af');
      return read.ok ? 'ok' : read.code;
    };
    expect(await codeOf(await makeViewer('scheduler'))).toBe('ok');
    expect(await codeOf(await operatorOf('Bm'))).toBe('not_found');
    expect(await codeOf(await makeViewer('correlator'))).toBe('forbidden');
    expect(await codeOf(await makeViewer('investigator', { sessionId: (await makeSession()).id }))).toBe(
      'forbidden',
    );
  });

  it('of a station that does not exist is not found', async () => {
    expect(await readDesk(await makeViewer('admin'), 'Zz')).toMatchObject({ code: 'not_found' });
  });
});

describe('how a scan went', () => {
  let session: Awaited<ReturnType<typeof running>>;
  beforeAll(async () => {
    session = await running();
  });
  const say = (over: object = {}) => ({
    actId: newId(),
    scanId: session.over.id,
    outcome: 'good',
    ...over,
  });
  const newest = async () =>
    (await outcomesOf(db(), session.id, 'Af')).find(({ scanId }) => scanId === session.over.id);

  it('is said by its operator, once however often it is sent', async () => {
    const operator = await operatorOf('Af');
    const body = say();
    expect(await sayOutcome(operator, session.id, 'Af', body)).toMatchObject({
      ok: true,
      outcome: { outcome: 'good', lost: [], role: 'operator', isOnBehalf: false, times: 1 },
    });
    const before = await db().$count(scanOutcomes);
    expect(await sayOutcome(operator, session.id, 'Af', body)).toMatchObject({ ok: true });
    expect(await db().$count(scanOutcomes)).toBe(before);
  });

  it('can be amended, and the earlier word stays', async () => {
    const operator = await operatorOf('Af');
    const { startMs } = session.over;
    const lost = [startMs, startMs + 2 * MINUTE];
    const body = say({ outcome: 'partly', lost, reason: 'wind', text: 'Stowed.' });
    expect(await sayOutcome(operator, session.id, 'Af', body)).toMatchObject({ ok: true });
    expect(await newest()).toMatchObject({ outcome: 'partly', lost: [lost], reason: 'wind', times: 2 });
  });

  it('lost is all of the station’s time in the scan', async () => {
    await sayOutcome(await operatorOf('Af'), session.id, 'Af', say({ outcome: 'lost', reason: 'recorder' }));
    const { startMs, lengthSeconds } = session.over;
    expect((await newest())?.lost).toEqual([[startMs, startMs + lengthSeconds * 1000]]);
  });

  it('can be said by a scheduler on behalf, and is marked so', async () => {
    await sayOutcome(session.scheduler, session.id, 'Af', say());
    expect(await newest()).toMatchObject({ outcome: 'good', role: 'scheduler', isOnBehalf: true });
  });

  it.each([
    [{ outcome: 'well' }, 'outcome', 'good, partly or lost'],
    [{ outcome: 'lost', reason: 'aliens' }, 'reason', 'one reason of the eight'],
    [{ outcome: 'lost', reason: 'other' }, 'text', 'a few words'],
    [{ outcome: 'partly', reason: 'wind', lost: [5, 4] }, 'lost', 'ends before it starts'],
    [{ outcome: 'partly', reason: 'wind', lost: [0, 4] }, 'lost', 'within it'],
  ])('%j is refused beside its field', async (over, field, words) => {
    const answer = await sayOutcome(await operatorOf('Af'), session.id, 'Af', say(over));
    expect(answer).toMatchObject({ ok: false, code: 'invalid' });
    expect(answer.ok ? '' : answer.fields?.[field]?.join()).toContain(words);
  });

  it('in part that is all of it is refused', async () => {
    const { startMs, lengthSeconds } = session.over;
    const lost = [startMs, startMs + lengthSeconds * 1000];
    const body = say({ outcome: 'partly', reason: 'wind', lost });
    expect(await sayOutcome(await operatorOf('Af'), session.id, 'Af', body)).toMatchObject({
      fields: { lost: [expect.stringContaining('Say lost') as string] },
    });
  });

  it('is not said before the scan starts', async () => {
    const body = say({ scanId: session.ahead.id });
    expect(await sayOutcome(await operatorOf('Af'), session.id, 'Af', body)).toMatchObject({
      code: 'invalid',
    });
  });

  it.each([
    ['another station’s operator', 'operator', { stationCode: 'Bm' }, 'forbidden'],
    ['correlator staff', 'correlator', {}, 'forbidden'],
    ['a station without a part in it', 'operator', { stationCode: 'Cf' }, 'not_found'],
  ] as const)('is not for %s', async (_, role, where, code) => {
    expect(await sayOutcome(await makeViewer(role, where), session.id, 'Af', say())).toMatchObject({ code });
  });

  it('of a scan that the station was not given is not found', async () => {
    const body = say({ scanId: 'x' });
    expect(await sayOutcome(await operatorOf('Af'), session.id, 'Af', body)).toMatchObject({
      code: 'not_found',
    });
  });

  it('of a nodding group is said once, each leg with its part', async () => {
    const operator = await operatorOf('Af');
    const read = await readDesk(operator, 'Af');
    const group = read.ok ? read.desk.run?.scans.find(({ legIds }) => legIds.length > 1) : undefined;
    if (!read.ok || !read.desk.run || !group) throw new Error('no group');
    expect(group).toMatchObject({ number: '11', source: 'J0825+0309 with J0811+0146' });
    const lost = [group.startMs, group.startMs + 90_000];
    const body = {
      actId: newId(),
      scanId: group.scanId,
      outcome: 'partly',
      lost,
      reason: 'antenna',
      text: '',
    };
    const answer = await sayOutcome(operator, read.desk.run.sessionId, 'Af', body);
    expect(answer).toMatchObject({ ok: true, outcome: { outcome: 'partly', reason: 'antenna', times: 2 } });
    const said = await outcomesOf(db(), read.desk.run.sessionId, 'Af');
    const words = group.legIds.map((id) => said.find(({ scanId }) => scanId === id)?.outcome);
    expect(words.slice(0, 4)).toEqual(['lost', 'partly', 'good', 'good']);
    expect(words).toHaveLength(17);
    const after = await readDesk(operator, 'Af');
    const word = after.ok && after.desk.run?.outcomes.find(({ scanId }) => scanId === group.scanId);
    expect(word).toMatchObject({ outcome: 'partly' });
  });

  it('of a closed session stays as it was said', async () => {
    const closed = await running('closed');
    const body = say({ scanId: closed.over.id });
    expect(await sayOutcome(await operatorOf('Af'), closed.id, 'Af', body)).toMatchObject({
      code: 'conflict',
    });
  });
});

describe('the desk of an equatorial mount', () => {
  it('has the hour angle of each scan, in the plan as it was published, and no turn of a cable', async () => {
    await db()
      .update(stations)
      .set({ mountKind: 'ha-dec', axis1MinDeg: -180, axis1MaxDeg: 180, axis2MinDeg: -40, axis2MaxDeg: 90 })
      .where(eq(stations.code, 'Bm'));
    // a desk shows one run
    await db().update(sessions).set({ state: 'cancelled' }).where(ne(sessions.state, 'cancelled'));
    const { id } = await running();
    const read = await readDesk(await operatorOf('Bm'), 'Bm');
    if (!read.ok || read.desk.run?.sessionId !== id) throw new Error('not the run that was offered');
    const [first, second] = read.desk.run.scans;
    expect(first).toMatchObject({ motorAxis: 'hour angle', turn: null, impossible: null });
    // 80 minutes later, at 15.04° an hour
    expect((second?.motorStartDeg ?? NaN) - (first?.motorStartDeg ?? NaN)).toBeCloseTo(20.05, 1);
  });
});
