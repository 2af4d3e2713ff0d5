import { describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { stations } from '@/db/schema/stations';
import { eq } from 'drizzle-orm';
import { readComments } from '@/src/data/comment/read';
import { writeComment } from '@/src/data/comment/write';
import { offerPlan } from '@/src/data/offer/write';
import { readTimeline } from '@/src/data/plan/read';
import { takeAct } from '@/src/data/plan/write';
import { landingFor } from '@/src/data/session/landing';
import { readSessionForm } from '@/src/data/session/form';
import { listSessions } from '@/src/data/session/read';
import { editSession, makeSession, setSessionState } from '@/src/data/session/write';
import type { SessionTyped } from '@/src/exchange/session-form';
import {
  makeScan,
  makeSession as storeSession,
  makeViewer,
  newId,
  openDatabase,
  sourceId,
  START_MS,
} from '@/tests/helpers/database';

openDatabase();

const HOUR = 3_600_000;
let count = 0;
const nextCode = () => `NEW-${++count}`;

async function blank(over: Partial<SessionTyped> = {}): Promise<SessionTyped> {
  const read = await readSessionForm(await makeViewer('scheduler'), null);
  if (!read.ok) throw new Error(read.message);
  const { typed, choices } = read.form;
  return {
    ...typed,
    code: nextCode(),
    what: { title: 'A new one', purpose: '' },
    when: { ...typed.when, startMs: '2027-060 12:00', lengthSeconds: '12' },
    modeId: choices.modes[0]?.id ?? '',
    stations: ['Fn', 'Af'],
    sources: [{ id: sourceId('J0738+1742'), wanted: '4' }],
    ...over,
  };
}
const make = async (over: Partial<SessionTyped> = {}) =>
  makeSession(await makeViewer('scheduler'), { id: newId(), typed: await blank(over) });

async function formOf(key: string) {
  const read = await readSessionForm(await makeViewer('scheduler'), key);
  if (!read.ok) throw new Error(read.message);
  return read.form;
}
async function withScan() {
  const session = await storeSession();
  const scheduler = await makeViewer('scheduler');
  const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] };
  const act = await takeAct(scheduler, session.id, { kind: 'do', actId: newId(), command, seen: {} });
  if (!act.ok) throw new Error(act.message);
  return { ...session, scheduler };
}

describe('a new session', () => {
  it('is made as it was typed: code in capitals, day of year, hours', async () => {
    const made = await make({ code: 'arc-77' });
    expect(made).toEqual({ ok: true, code: 'ARC-77' });
    const read = await readTimeline(await makeViewer('scheduler'), 'ARC-77');
    if (!read.ok) throw new Error(read.message);
    expect(read.timeline.session).toMatchObject({
      title: 'A new one',
      state: 'draft',
      startMs: Date.parse('2027-03-01T12:00:00Z'),
      lengthSeconds: 43_200,
      stations: ['Af', 'Fn'],
    });
    expect(read.timeline.sources.map(({ name, wantedScans }) => [name, wantedScans])).toEqual([
      ['J0738+1742', 4],
    ]);
  });

  it('sent twice is made once', async () => {
    const scheduler = await makeViewer('scheduler');
    const body = { id: newId(), typed: await blank() };
    const first = await makeSession(scheduler, body);
    expect(await makeSession(scheduler, body)).toEqual(first);
  });

  it.each([
    [{ code: '' }, 'code', 'is empty'],
    [{ code: '12' }, 'code', 'is no code'],
    [{ what: { title: ' ', purpose: '' } }, 'what.title', 'is empty'],
    [{ when: { startMs: 'soon', lengthSeconds: '24', dut1Seconds: '0' } }, 'when.startMs', 'is no time'],
    [
      { when: { startMs: '2027-060 12:00', lengthSeconds: '400', dut1Seconds: '0' } },
      'when.lengthSeconds',
      '14 days',
    ],
    [{ stations: [] }, 'stations', 'at least one'],
    [{ stations: ['Zz'] }, 'stations', 'no station Zz'],
    [{ sources: [{ id: 'x', wanted: '1' }] }, 'sources', 'not in the catalogue'],
    [{ sources: [{ id: 'x', wanted: 'many' }] }, 'sources.x', 'whole number'],
    [{ modeId: '' }, 'modeId', 'Choose the mode'],
    [{ modeId: 'x' }, 'modeId', 'not in the catalogue'],
  ])('with %j is refused beside its field', async (over, field, words) => {
    const answer = await make(over as Partial<SessionTyped>);
    expect(answer).toMatchObject({ ok: false, code: 'invalid' });
    expect(answer.ok ? '' : answer.fields?.[field]?.join()).toContain(words);
  });

  it('with limits out of order is refused', async () => {
    const typed = await blank();
    const answer = await make({ rules: { ...typed.rules, snrFair: '30', pauseMinutes: '5' } });
    expect(answer).toMatchObject({ code: 'invalid' });
    const fields = answer.ok ? {} : answer.fields;
    expect(fields).toHaveProperty(['rules.snrStrong']);
    expect(fields).toHaveProperty(['rules.pauseEveryMinutes']);
  });

  it('with a code that is taken, or a retired station, is refused', async () => {
    expect(await make({ code: 'ARC-031' })).toMatchObject({
      fields: { code: [expect.stringContaining('already') as string] },
    });
    await db().update(stations).set({ retiredAtMs: 1 }).where(eq(stations.code, 'Em'));
    expect(await make({ stations: ['Em'] })).toMatchObject({
      fields: { stations: [expect.stringContaining('retired') as string] },
    });
    await db().update(stations).set({ retiredAtMs: null }).where(eq(stations.code, 'Em'));
  });

  it.each(['operator', 'correlator', 'investigator'] as const)('is not for an %s', async (role) => {
    const where = role === 'operator' ? { stationCode: 'Af' } : {};
    const session = role === 'investigator' ? { sessionId: (await storeSession()).id } : {};
    const viewer = await makeViewer(role, { ...where, ...session });
    expect(await makeSession(viewer, { id: newId(), typed: await blank() })).toMatchObject({
      code: 'forbidden',
    });
    expect(await readSessionForm(viewer, null)).toMatchObject({ code: 'forbidden' });
  });
});

describe('a session that is edited', () => {
  it('keeps what is typed, and its new hours stand in the journal, where they are undone', async () => {
    const { id, scheduler } = await withScan();
    const form = await formOf(id);
    const typed = { ...form.typed, when: { ...form.typed.when, lengthSeconds: '6 h' } };
    const edited = {
      actId: newId(),
      rev: form.rev,
      typed: { ...typed, what: { title: 'Other', purpose: 'Why' } },
    };
    expect(await editSession(scheduler, id, edited)).toMatchObject({ ok: true });
    const after = await formOf(id);
    expect(after.typed.what).toEqual({ title: 'Other', purpose: 'Why' });
    expect(after.session?.lengthSeconds).toBe(21_600);
    expect(await takeAct(scheduler, id, { kind: 'undo', actId: newId() })).toMatchObject({ ok: true });
    expect((await formOf(id)).session?.lengthSeconds).toBe(86_400);
  });

  it('changed by someone else meanwhile is not overwritten', async () => {
    const { id, scheduler } = await withScan();
    const form = await formOf(id);
    const body = () => ({ actId: newId(), rev: form.rev, typed: form.typed });
    expect(await editSession(scheduler, id, body())).toMatchObject({ ok: true });
    expect(await editSession(scheduler, id, body())).toMatchObject({ ok: false, code: 'conflict' });
  });

  it('keeps a station and a source that scans use, and says so', async () => {
    const { id, scheduler } = await withScan();
    const form = await formOf(id);
    const edit = (over: Partial<SessionTyped>) =>
      editSession(scheduler, id, { actId: newId(), rev: form.rev, typed: { ...form.typed, ...over } });
    expect(await edit({ stations: ['Af', 'Bm'] })).toMatchObject({
      fields: { stations: ['Fn takes part in 1 scan: leave it out of them on the timeline first.'] },
    });
    expect(await edit({ sources: [] })).toMatchObject({
      fields: { sources: ['J0738+1742 has 1 scan: take them off the timeline first.'] },
    });
    const kept = form.typed.sources.filter((source) => source.id === sourceId('J0738+1742'));
    expect(await edit({ sources: kept, stations: ['Af', 'Bm', 'Fn', 'Em'] })).toMatchObject({ ok: true });
    expect((await formOf(id)).typed.stations).toEqual(['Af', 'Bm', 'Em', 'Fn']);
  });

  it('is not found by strangers and not for those who only read it', async () => {
    const { id } = await withScan();
    const form = await formOf(id);
    const body = { actId: newId(), rev: form.rev, typed: form.typed };
    const stranger = await makeViewer('operator', { stationCode: 'Cf' });
    expect(await editSession(stranger, id, body)).toMatchObject({ code: 'not_found' });
    expect(await editSession(await makeViewer('correlator'), id, body)).toMatchObject({ code: 'forbidden' });
    expect(await readSessionForm(await makeViewer('correlator'), id)).toMatchObject({ code: 'forbidden' });
  });
});

describe('the state of a session', () => {
  it('is closed and opened again, back to what it was', async () => {
    const { id, scheduler } = await withScan();
    await offerPlan(scheduler, id, { id: newId(), kind: 'offer' });
    expect(await setSessionState(scheduler, id, { state: 'closed' })).toEqual({ ok: true });
    const form = await formOf(id);
    expect(form.session?.state).toBe('closed');
    const body = { actId: newId(), rev: form.rev, typed: form.typed };
    expect(await editSession(scheduler, id, body)).toMatchObject({ code: 'conflict' });
    expect(await setSessionState(scheduler, id, { state: 'cancelled' })).toMatchObject({ code: 'conflict' });
    expect(await setSessionState(scheduler, id, { state: 'open' })).toEqual({ ok: true });
    expect((await formOf(id)).session?.state).toBe('offered');
  });

  it('of a draft that is cancelled is a draft again', async () => {
    const { id, scheduler } = await withScan();
    await setSessionState(scheduler, id, { state: 'cancelled' });
    await setSessionState(scheduler, id, { state: 'open' });
    expect((await formOf(id)).session?.state).toBe('draft');
  });

  it('is a scheduler’s to change, and one that is known', async () => {
    const { id, scheduler } = await withScan();
    expect(await setSessionState(await makeViewer('correlator'), id, { state: 'closed' })).toMatchObject({
      code: 'forbidden',
    });
    expect(await setSessionState(scheduler, id, { state: 'observed' })).toMatchObject({ code: 'invalid' });
    expect(await setSessionState(scheduler, 'NO-1', { state: 'closed' })).toMatchObject({
      code: 'not_found',
    });
  });
});

describe('comments', () => {
  it('are read by all who have a part in the session, oldest first, each by its role', async () => {
    const { id } = await storeSession();
    const operator = await makeViewer('operator', { stationCode: 'Bm' });
    await writeComment(await makeViewer('scheduler'), id, { id: newId(), text: 'First.' });
    const body = { id: newId(), text: ' Windy. ' };
    await writeComment(operator, id, body);
    await writeComment(operator, id, body);
    const read = await readComments(await makeViewer('investigator', { sessionId: id }), id);
    if (!read.ok) throw new Error(read.message);
    expect(read.comments.map(({ by, text }) => [by, text])).toEqual([
      ['Scheduler', 'First.'],
      ['Operator Bm', 'Windy.'],
    ]);
    expect(read.canWrite).toBe(true);
  });

  it('that are empty are refused, and strangers do not find the session', async () => {
    const { id } = await storeSession();
    const scheduler = await makeViewer('scheduler');
    expect(await writeComment(scheduler, id, { id: newId(), text: '  ' })).toMatchObject({
      fields: { text: ['The comment is empty. Write it first.'] },
    });
    const stranger = await makeViewer('operator', { stationCode: 'Cf' });
    expect(await writeComment(stranger, id, { id: newId(), text: 'x' })).toMatchObject({ code: 'not_found' });
    expect(await readComments(stranger, id)).toMatchObject({ code: 'not_found' });
  });
});

describe('where work begins', () => {
  it.each([
    ['admin', {}, '/sessions'],
    ['scheduler', {}, '/sessions'],
    ['operator', { stationCode: 'Bm' }, '/stations/Bm/desk'],
    ['correlator', {}, '/sessions/ARC-030/fringes'],
  ] as const)('is for %s with %j at %s', async (role, where, path) => {
    expect(await landingFor(await makeViewer(role, where))).toBe(path);
  });

  it('is for an investigator the coverage of their own session, and the list without one', async () => {
    const { id, code } = await storeSession();
    expect(await landingFor(await makeViewer('investigator', { sessionId: id }))).toBe(
      `/sessions/${code}/coverage`,
    );
    expect(await landingFor({ userId: 'u', email: 'u@x', theme: null, grants: [] })).toBe('/sessions');
  });
});

describe('the list', () => {
  it('carries the answers of the stations and what they answered', async () => {
    const listed = await listSessions(await makeViewer('scheduler'));
    if (!listed.ok) throw new Error(listed.message);
    expect(listed.canMake).toBe(true);
    expect(listed.sessions.find(({ code }) => code === 'ARC-030')).toMatchObject({
      offer: { number: 2, kind: 'publish' },
      answers: { Af: 'confirmed', Cf: 'partly', Bm: 'open' },
    });
    expect(listed.sessions.find(({ code }) => code === 'ARC-031')).toMatchObject({
      offer: null,
      answers: {},
    });
    expect(listed.sessions.find(({ startMs }) => startMs === START_MS - HOUR)).toBeUndefined();
  });
});
