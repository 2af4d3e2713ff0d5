import { beforeAll, describe, expect, it } from 'vitest';
import { startMailFake } from '@/scripts/mail-fake.mjs';

type Outbox = { messages: { id: string; to: string[]; subject: string }[] };

let address = '';
beforeAll(async () => {
  address = await startMailFake();
});

const post = (body: string, headers: Record<string, string> = {}) =>
  fetch(`${address}/emails`, { method: 'POST', body, headers });
const message = (to: string, subject: string) =>
  JSON.stringify({ to, from: 'Antiphon <notices@antiphon.example>', subject, text: 'Text', html: '<p>' });
const outbox = async () => (await (await fetch(`${address}/outbox`)).json()) as Outbox;

describe('the fake of the mail service', () => {
  it('keeps what it is given, newest first, and sends nothing', async () => {
    await post(message('one@station.example', 'First'));
    await post(message('two@station.example', 'Second'));
    const { messages } = await outbox();
    expect(messages.map(({ subject }) => subject)).toEqual(['Second', 'First']);
    expect(messages[0]?.to).toEqual(['two@station.example']);
  });

  it('takes a message with a known key once and answers the first id', async () => {
    const headers = { 'idempotency-key': 'offer-1:Af' };
    const first = (await (await post(message('af@station.example', 'Offer'), headers)).json()) as object;
    const again = (await (await post(message('af@station.example', 'Offer'), headers)).json()) as object;
    expect(again).toEqual(first);
    const { messages } = await outbox();
    expect(messages.filter(({ subject }) => subject === 'Offer')).toHaveLength(1);
  });

  it('refuses an address that bounces and what it cannot read', async () => {
    expect((await post(message('bounce@station.example', 'No'))).status).toBe(422);
    expect((await post('{')).status).toBe(400);
    expect((await fetch(`${address}/elsewhere`)).status).toBe(404);
  });
});
