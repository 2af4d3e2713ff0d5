import { expect, it } from 'vitest';
import { takeAct } from '@/src/data/plan/write';
import { readTimeline } from '@/src/data/plan/read';
import { offerPlan } from '@/src/data/offer/write';
import { replySlot } from '@/src/data/slot/write';
import { readNetworkStamp } from '@/src/data/network/stamp';
import { readStamp } from '@/src/data/session/stamp';
import { makeScan, makeSession, makeViewer, newId, openDatabase } from '@/tests/helpers/database';

openDatabase();

const stampOf = async (viewer: Awaited<ReturnType<typeof makeViewer>>, id: string) => {
  const stamp = await readStamp(viewer, id);
  if (!stamp.ok) throw new Error(stamp.message);
  return stamp;
};

it('the stamp of a session changes with its plan and with its stations’ word, each apart', async () => {
  const { id } = await makeSession();
  const scheduler = await makeViewer('scheduler');
  const first = await stampOf(scheduler, id);
  const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] };
  await takeAct(scheduler, id, { kind: 'do', actId: newId(), command, seen: {} });
  const planned = await stampOf(scheduler, id);
  expect(planned.plan).not.toBe(first.plan);
  expect(planned.stations).toBe(first.stations);
  const offerId = newId();
  await offerPlan(scheduler, id, { id: offerId, kind: 'offer' });
  const offered = await stampOf(scheduler, id);
  expect(offered.stations).not.toBe(planned.stations);
  const body = { actId: newId(), offerId, reply: 'declined', reason: 'wind' };
  await replySlot(await makeViewer('operator', { stationCode: 'Af' }), id, 'Af', body);
  expect((await stampOf(scheduler, id)).stations).not.toBe(offered.stations);
});

it('what a station declined stands in the plan’s hours at once', async () => {
  const { id } = await makeSession();
  const scheduler = await makeViewer('scheduler');
  const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] };
  await takeAct(scheduler, id, { kind: 'do', actId: newId(), command, seen: {} });
  const offerId = newId();
  await offerPlan(scheduler, id, { id: offerId, kind: 'offer' });
  const body = { actId: newId(), offerId, reply: 'declined', reason: 'wind' };
  await replySlot(await makeViewer('operator', { stationCode: 'Af' }), id, 'Af', body);
  const read = await readTimeline(scheduler, id);
  if (!read.ok) throw new Error(read.message);
  expect(read.timeline.away['Af']).toMatchObject([{ why: 'wind', isDeclined: true }]);
  expect(read.timeline.answers).toMatchObject({ Af: 'declined', Bm: 'open' });
});

it('is not for strangers, and shows an operator nothing of the draft', async () => {
  const { id } = await makeSession();
  const stranger = await makeViewer('investigator', { sessionId: (await makeSession()).id });
  expect(await readStamp(stranger, id)).toMatchObject({ ok: false, code: 'not_found' });
  expect((await stampOf(await makeViewer('operator', { stationCode: 'Af' }), id)).plan).toBe('');
});

it('the stamp of the network changes with whatever its lists show', async () => {
  const scheduler = await makeViewer('scheduler');
  const seen = new Set([await readNetworkStamp()]);
  const { id } = await makeSession();
  seen.add(await readNetworkStamp());
  const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan() }] };
  await takeAct(scheduler, id, { kind: 'do', actId: newId(), command, seen: {} });
  seen.add(await readNetworkStamp());
  const offerId = newId();
  await offerPlan(scheduler, id, { id: offerId, kind: 'offer' });
  seen.add(await readNetworkStamp());
  const body = { actId: newId(), offerId, reply: 'declined', reason: 'wind' };
  await replySlot(await makeViewer('operator', { stationCode: 'Af' }), id, 'Af', body);
  seen.add(await readNetworkStamp());
  expect(seen.size).toBe(5);
  expect(await readNetworkStamp()).toBe([...seen].at(-1));
});
