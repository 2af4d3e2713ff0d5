import { createServer, type Server } from 'node:http';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/db/client';
import { db } from '@/db/client';
import { mailOutbox } from '@/db/schema/mail-outbox';
import { readMailbox } from '@/src/data/mail/read';
import { newestSnapshot } from '@/src/data/offer/read';
import { offerPlan, resendMail } from '@/src/data/offer/write';
import { takeAct } from '@/src/data/plan/write';
import { listSlots } from '@/src/data/slot/list';
import { readSlots } from '@/src/data/slot/read';
import { replySlot } from '@/src/data/slot/write';
import { LEAD_SECONDS, TAIL_SECONDS } from '@/src/schedule/slots';
import { makeScan, makeSession, makeViewer, newId, openDatabase, START_MS } from '@/tests/helpers/database';

type Posted = { to: string | string[]; subject: string; text: string; html: string };

/** Stands for the mail service: takes all but one address, and keeps what it took. */
const taken: Posted[] = [];
const service: Server = createServer((request, response) => {
  let text = '';
  request.on('data', (part: Buffer) => (text += part.toString()));
  request.on('end', () => {
    response.setHeader('content-type', 'application/json');
    if (request.url === '/outbox') {
      const messages = taken.map((one, k) => ({
        ...one,
        id: `m${k}`,
        to: [one.to].flat(),
        from: 'Antiphon',
      }));
      response.end(JSON.stringify({ messages }));
      return;
    }
    const posted = JSON.parse(text) as Posted;
    if ([posted.to].flat().some((address) => address.includes('brightmoor'))) {
      response.statusCode = 422;
      response.end(JSON.stringify({ name: 'validation_error', message: 'The address does not take mail.' }));
      return;
    }
    taken.push(posted);
    response.end(JSON.stringify({ id: `m${taken.length}` }));
  });
});

await new Promise<void>((resolve) => service.listen(0, '127.0.0.1', resolve));
const address = service.address();
if (typeof address !== 'object' || address === null) throw new Error('no port');
process.env.MAIL_URL = `http://127.0.0.1:${address.port}`;
openDatabase();
afterAll(() => new Promise((resolve) => service.close(resolve)));

const HOUR = 3_600_000;

async function sessionWithScan() {
  const session = await makeSession();
  const scheduler = await makeViewer('scheduler');
  const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] };
  const act = await takeAct(scheduler, session.id, { kind: 'do', actId: newId(), command, seen: {} });
  if (!act.ok) throw new Error(act.message);
  return { ...session, scheduler };
}
const offer = (over: object = {}) => ({ id: newId(), kind: 'offer', note: '', answerByMs: null, ...over });

describe('an offer', () => {
  it('stores the plan as it stands, with slots and a checksum, and tells the operators', async () => {
    const { id, scheduler } = await sessionWithScan();
    taken.length = 0;
    const made = await offerPlan(scheduler, id, offer({ note: 'Third epoch.' }));
    expect(made).toMatchObject({ ok: true, number: 1, slots: 3, sent: 2 });
    expect(made.ok && made.failed).toEqual([
      { to: 'operator@brightmoor.example', trouble: 'The address does not take mail.' },
    ]);
    const snapshot = await newestSnapshot(db(), id);
    expect(snapshot).toMatchObject({ number: 1, kind: 'offer', note: 'Third epoch.' });
    expect(snapshot?.plan.scans).toHaveLength(1);
    expect(snapshot?.checksum).toMatch(/^[0-9a-f]{64}$/);
    const af = taken.find(({ to }) => [to].flat().includes('operator@arrowfell.example'));
    expect(af?.subject).toMatch(/^TST-\d+ offer 1: can Af observe\?$/);
    expect(af?.text).toContain('Third epoch.');
    expect(af?.text).toContain(
      'Station time: 2027-03-01 13:45 Europe/Berlin to 2027-03-01 14:20 Europe/Berlin',
    );
    expect(af?.html).toContain('Answer for the slot');
    const { rows } = await database().client.execute(
      `SELECT state, count(*) AS n FROM mail_outbox WHERE session_id = '${id}' GROUP BY state ORDER BY state`,
    );
    expect(rows.map(({ state, n }) => [state, n])).toEqual([
      ['failed', 1],
      ['sent', 2],
    ]);
  });

  it('that could not be told is shown to the scheduler, who sends it again', async () => {
    const { id, scheduler } = await sessionWithScan();
    await offerPlan(scheduler, id, offer());
    const unsentFor = async (viewer: typeof scheduler) => {
      const read = await readSlots(viewer, id);
      return read.ok ? read.board.unsent : read.code;
    };
    const bounced = [{ to: 'operator@brightmoor.example', trouble: 'The address does not take mail.' }];
    expect(await unsentFor(scheduler)).toEqual(bounced);
    expect(await unsentFor(await makeViewer('operator', { stationCode: 'Af' }))).toEqual([]);
    expect(await resendMail(scheduler, id)).toEqual({ ok: true, sent: 0, failed: bounced });
    expect(await resendMail(await makeViewer('correlator'), id)).toMatchObject({ code: 'forbidden' });
  });

  it('made twice with one id stands once, and no one is told twice', async () => {
    const { id, scheduler } = await sessionWithScan();
    const body = offer();
    await offerPlan(scheduler, id, body);
    const before = await db().$count(mailOutbox);
    expect(await offerPlan(scheduler, id, body)).toMatchObject({ ok: true, number: 1 });
    expect(await db().$count(mailOutbox)).toBe(before);
  });

  it('stays what it was when the draft moves on, and the board says so', async () => {
    const { id, scheduler } = await sessionWithScan();
    await offerPlan(scheduler, id, offer());
    const scan = makeScan({ startMs: START_MS + 5 * HOUR });
    const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
    await takeAct(scheduler, id, { kind: 'do', actId: newId(), command, seen: {} });
    const read = await readSlots(scheduler, id);
    if (!read.ok) throw new Error(read.message);
    expect(read.board.offer).toMatchObject({ number: 1, isBehind: true });
    expect(read.board.slots.find(({ stationCode }) => stationCode === 'Af')?.scans).toHaveLength(1);
    expect(read.board.draft).toEqual({ scans: 2 });
  });

  it('makes the session offered, a publication published', async () => {
    const { id, scheduler } = await sessionWithScan();
    const stateOf = async () => {
      const read = await readSlots(scheduler, id);
      return read.ok ? read.board.session.state : read.code;
    };
    await offerPlan(scheduler, id, offer());
    expect(await stateOf()).toBe('offered');
    await offerPlan(scheduler, id, offer({ kind: 'publish' }));
    expect(await stateOf()).toBe('published');
  });

  it.each(['operator', 'correlator'] as const)('is not for an %s', async (role) => {
    const { id } = await sessionWithScan();
    const viewer = await makeViewer(role, role === 'operator' ? { stationCode: 'Af' } : {});
    expect(await offerPlan(viewer, id, offer())).toMatchObject({ ok: false, code: 'forbidden' });
  });

  it('is not found by a stranger', async () => {
    const { id } = await sessionWithScan();
    const stranger = await makeViewer('investigator', { sessionId: (await makeSession()).id });
    expect(await offerPlan(stranger, id, offer())).toMatchObject({ ok: false, code: 'not_found' });
  });

  it('of an empty plan, with a time that has passed or without an id is refused in words', async () => {
    const empty = await makeSession();
    const { id, scheduler } = await sessionWithScan();
    expect(await offerPlan(scheduler, empty.id, offer())).toMatchObject({
      code: 'invalid',
      message: expect.stringContaining('no scan yet') as string,
    });
    expect(await offerPlan(scheduler, id, offer({ answerByMs: 0 }))).toMatchObject({
      code: 'invalid',
      fields: { answerByMs: [expect.stringContaining('has passed') as string] },
    });
    expect(await offerPlan(scheduler, id, offer({ id: 'x' }))).toMatchObject({ code: 'invalid' });
    expect(await newestSnapshot(db(), id)).toBeNull();
  });

  it('of a closed session is refused', async () => {
    const { id } = await makeSession('closed');
    expect(await offerPlan(await makeViewer('scheduler'), id, offer())).toMatchObject({ code: 'conflict' });
  });
});

describe('an answer to a slot', () => {
  let session: Awaited<ReturnType<typeof sessionWithScan>>;
  let offerId = '';
  const start = START_MS + HOUR - LEAD_SECONDS * 1000;
  const end = START_MS + HOUR + 600_000 + TAIL_SECONDS * 1000;
  beforeAll(async () => {
    session = await sessionWithScan();
    offerId = newId();
    await offerPlan(session.scheduler, session.id, offer({ id: offerId }));
  });
  const reply = (over: object) => ({ actId: newId(), offerId, ...over });
  const answerOf = async (station: string) => {
    const read = await readSlots(session.scheduler, session.id);
    if (!read.ok) throw new Error(read.message);
    return read.board.slots.find(({ stationCode }) => stationCode === station);
  };

  it('is open at first, then what the operator says, at once for all', async () => {
    const operator = await makeViewer('operator', { stationCode: 'Af' });
    expect(await answerOf('Af')).toMatchObject({ answer: 'open', startMs: start, endMs: end });
    expect(await replySlot(operator, session.id, 'Af', reply({ reply: 'confirmed' }))).toMatchObject({
      ok: true,
    });
    expect(await answerOf('Af')).toMatchObject({
      answer: 'confirmed',
      hours: [[start, end]],
      without: [],
      role: 'operator',
      isOnBehalf: false,
    });
  });

  it('in part keeps the hours that are left, with the reason', async () => {
    const operator = await makeViewer('operator', { stationCode: 'Bm' });
    const without = [start, start + 15 * 60_000];
    const said = reply({ reply: 'partly', without, reason: 'generator service' });
    expect(await replySlot(operator, session.id, 'Bm', said)).toMatchObject({ ok: true });
    expect(await answerOf('Bm')).toMatchObject({
      answer: 'partly',
      hours: [[start + 15 * 60_000, end]],
      without: [without],
      reason: 'generator service',
    });
  });

  it('can be given by a scheduler, and is marked so', async () => {
    const said = reply({ reply: 'declined', reason: 'told by phone: wind' });
    expect(await replySlot(session.scheduler, session.id, 'Fn', said)).toMatchObject({ ok: true });
    expect(await answerOf('Fn')).toMatchObject({
      answer: 'declined',
      isOnBehalf: true,
      role: 'scheduler',
      without: [[start, end]],
    });
  });

  it('sent twice stands once', async () => {
    const operator = await makeViewer('operator', { stationCode: 'Af' });
    const said = reply({ reply: 'confirmed' });
    await replySlot(operator, session.id, 'Af', said);
    const count = () => database().client.execute(`SELECT count(*) AS n FROM slot_replies`);
    const before = (await count()).rows[0]?.n;
    expect(await replySlot(operator, session.id, 'Af', said)).toMatchObject({ ok: true });
    expect((await count()).rows[0]?.n).toBe(before);
  });

  it.each([
    [{ reply: 'declined', reason: ' ' }, 'reason', 'Say why'],
    [{ reply: 'partly', reason: 'x', without: [end, start] }, 'without', 'end before they start'],
    [{ reply: 'partly', reason: 'x', without: [end, end + HOUR] }, 'without', 'outside the slot'],
    [{ reply: 'partly', reason: 'x', without: [start, end] }, 'without', 'Decline it instead'],
  ])('%j is refused beside its field', async (over, field, words) => {
    const operator = await makeViewer('operator', { stationCode: 'Af' });
    const answer = await replySlot(operator, session.id, 'Af', reply(over));
    expect(answer).toMatchObject({ ok: false, code: 'invalid' });
    expect(answer.ok ? '' : answer.fields?.[field]?.join()).toContain(words);
  });

  it('to an offer that is not the newest is refused', async () => {
    const operator = await makeViewer('operator', { stationCode: 'Af' });
    const old = { ...reply({ reply: 'confirmed' }), offerId: 'old' };
    expect(await replySlot(operator, session.id, 'Af', old)).toMatchObject({ ok: false, code: 'conflict' });
  });

  it.each([
    ['another station’s operator', 'operator', { stationCode: 'Bm' }, 'forbidden'],
    ['correlator staff', 'correlator', {}, 'forbidden'],
    ['an operator without a part in the session', 'operator', { stationCode: 'Cf' }, 'not_found'],
  ] as const)('is not for %s', async (_, role, where, code) => {
    const viewer = await makeViewer(role, where);
    expect(await replySlot(viewer, session.id, 'Af', reply({ reply: 'confirmed' }))).toMatchObject({ code });
  });

  it('of a station without a slot is not found', async () => {
    expect(await replySlot(session.scheduler, session.id, 'Zz', reply({ reply: 'confirmed' }))).toMatchObject(
      {
        code: 'not_found',
      },
    );
  });

  it('is asked again when the slot leaves the hours it gave', async () => {
    const scan = makeScan({ startMs: START_MS + 9 * HOUR });
    const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
    await takeAct(session.scheduler, session.id, { kind: 'do', actId: newId(), command, seen: {} });
    await offerPlan(session.scheduler, session.id, offer());
    expect(await answerOf('Af')).toMatchObject({ answer: 'stale', without: [] });
    expect(await answerOf('Fn')).toMatchObject({ answer: 'declined' });
  });
});

describe('what was said', () => {
  it('is kept word by word, newest first, with the offer it answers', async () => {
    const { id, scheduler } = await sessionWithScan();
    const made = offer();
    await offerPlan(scheduler, id, made);
    const operator = await makeViewer('operator', { stationCode: 'Af' });
    const body = { offerId: made.id, actId: newId() };
    await replySlot(operator, id, 'Af', { ...body, reply: 'declined', reason: 'Staff' });
    await replySlot(scheduler, id, 'Af', { ...body, actId: newId(), reply: 'confirmed' });
    const read = await readSlots(operator, id);
    const af = read.ok && read.board.slots.find(({ stationCode }) => stationCode === 'Af');
    expect(af && af.words).toMatchObject([
      { reply: 'confirmed', role: 'scheduler', isOnBehalf: true, number: 1, kind: 'offer', reason: '' },
      { reply: 'declined', role: 'operator', isOnBehalf: false, hours: [], reason: 'Staff' },
    ]);
    expect(af && af.modes).toHaveLength(1);
    const bm = read.ok && read.board.slots.find(({ stationCode }) => stationCode === 'Bm');
    expect(bm && bm.words).toEqual([]);
  });
});

describe('the list of slots', () => {
  it('has an operator’s own, of every session that is offered', async () => {
    const [one, two] = [await sessionWithScan(), await sessionWithScan()];
    const draft = await sessionWithScan();
    const answerByMs = START_MS - 24 * HOUR;
    await offerPlan(one.scheduler, one.id, offer({ answerByMs }));
    await offerPlan(two.scheduler, two.id, offer());
    const listed = await listSlots(await makeViewer('operator', { stationCode: 'Af' }));
    if (!listed.ok) throw new Error(listed.message);
    const codes = listed.slots.map(({ sessionCode }) => sessionCode);
    expect(codes).toEqual(expect.arrayContaining([one.code, two.code]));
    expect(codes).not.toContain(draft.code);
    expect(new Set(listed.slots.map(({ stationCode }) => stationCode))).toEqual(new Set(['Af']));
    expect(listed.slots.find(({ sessionCode }) => sessionCode === one.code)).toMatchObject({
      answer: 'open',
      stationName: 'Arrow Fell',
      timeZone: 'Europe/Berlin',
      answerByMs,
    });
  });

  it('is for those who answer', async () => {
    const scheduler = await listSlots(await makeViewer('scheduler'));
    const codes = scheduler.ok ? scheduler.slots.map(({ stationCode }) => stationCode) : [];
    expect(codes).toEqual(expect.arrayContaining(['Af', 'Bm', 'Fn']));
    for (const role of ['correlator', 'admin'] as const)
      expect(await listSlots(await makeViewer(role))).toMatchObject({ ok: false, code: 'forbidden' });
  });
});

describe('the local mailbox', () => {
  it('shows the demo’s administrator what the fake took', async () => {
    const read = await readMailbox(await makeViewer('admin'));
    if (!read.ok || !read.isUp) throw new Error('the fake is down');
    expect(read.messages.length).toBe(taken.length);
    expect(read.messages[0]).toMatchObject({ subject: taken[0]?.subject });
  });

  it('is for no one else', async () => {
    expect(await readMailbox(await makeViewer('scheduler'))).toMatchObject({ ok: false, code: 'forbidden' });
  });
});
