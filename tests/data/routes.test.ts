import { beforeEach, describe, expect, it, vi } from 'vitest';
import { GET as health } from '@/app/api/health/route';
import { POST } from '@/app/api/sessions/[sessionId]/commands/route';
import { GET } from '@/app/api/sessions/[sessionId]/journal/route';
import { database } from '@/db/client';
import { signIn } from '@/src/viewer/login';
import { jar } from '@/tests/helpers/cookie-jar';
import { makeScan, makeSession, newId, openDatabase } from '@/tests/helpers/database';

vi.mock('next/headers', async () => (await import('@/tests/helpers/cookie-jar')).headersModule);

openDatabase();

const HOST = 'antiphon.example';
const body = (over = {}) => ({
  kind: 'do',
  actId: newId(),
  command: { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan(over) }] },
  seen: {},
});
const post = async (
  sessionId: string,
  content: unknown,
  headers: Record<string, string> = { origin: `http://${HOST}` },
) => {
  const text = typeof content === 'string' ? content : JSON.stringify(content);
  const request = new Request(`http://${HOST}/api`, {
    method: 'POST',
    body: text,
    headers: { host: HOST, ...headers },
  });
  const response = await POST(request, { params: Promise.resolve({ sessionId }) });
  return { status: response.status, answer: (await response.json()) as Record<string, unknown> };
};
const signInAs = async (email: string) => {
  expect(await signIn(email, 'antiphon-demo')).toEqual({ ok: true });
};

let session: { id: string; code: string };

beforeEach(async () => {
  jar.clear();
  session = await makeSession();
});

describe('the commands’ route', () => {
  it('takes an act of the scheduler, by the session’s id or code', async () => {
    await signInAs('scheduler@antiphon.example');
    expect(await post(session.id, body())).toMatchObject({ status: 200, answer: { ok: true, kind: 'do' } });
    expect(await post(session.code.toLowerCase(), body())).toMatchObject({ status: 200 });
  });

  it('answers 401 to one who is not signed in', async () => {
    expect(await post(session.id, body())).toMatchObject({
      status: 401,
      answer: { code: 'unauthenticated' },
    });
  });

  it('answers 403 to one without the right, and says who can give it', async () => {
    await signInAs('correlator@antiphon.example');
    const { status, answer } = await post(session.id, body());
    expect(status).toBe(403);
    expect(answer.message).toBe('Schedulers change plans. An administrator can give the right.');
  });

  it('answers 404 to one whose session it is not, as to a session that does not exist', async () => {
    await signInAs('investigator@antiphon.example');
    const other = await post(session.code, body());
    expect(other).toMatchObject({ status: 404, answer: { message: `There is no session ${session.code}.` } });
    expect(await post('NIL-001', body())).toMatchObject({ status: 404 });
  });

  it('answers 409 to an act on something changed since, and to an undo of nothing', async () => {
    await signInAs('scheduler@antiphon.example');
    expect(await post(session.id, { kind: 'undo', actId: newId() })).toMatchObject({ status: 409 });
    const act = body();
    await post(session.id, act);
    const again = { ...act, actId: newId() };
    expect(await post(session.id, again)).toMatchObject({ status: 409, answer: { reason: 'changed' } });
  });

  it('answers 422 to a scan of zero length and to a body that is no act', async () => {
    await signInAs('scheduler@antiphon.example');
    expect(await post(session.id, body({ lengthSeconds: 0 }))).toMatchObject({ status: 422 });
    expect(await post(session.id, '{"kind":')).toMatchObject({
      status: 422,
      answer: { message: 'The request is not JSON.' },
    });
    expect(await post(session.id, 'x'.repeat(2_000_001))).toMatchObject({ status: 422 });
    const cut = await post(session.id, body(), { origin: `http://${HOST}`, 'content-length': '9999' });
    expect(cut).toMatchObject({ status: 422, answer: { message: expect.stringContaining('cut off') } });
  });

  it.each([
    ['another site', { origin: 'https://elsewhere.example' }],
    ['another site of the same domain', { origin: `http://${HOST}`, 'sec-fetch-site': 'same-site' }],
    ['an opaque origin', { origin: 'null' }],
    ['no page at all', {}],
  ])('refuses a request from %s', async (_, headers) => {
    await signInAs('scheduler@antiphon.example');
    expect(await post(session.id, body(), headers)).toMatchObject({ status: 403 });
  });

  it('answers 500 with an id and nothing of the cause where the database fails', async () => {
    await signInAs('scheduler@antiphon.example');
    await database().client.execute(
      "CREATE TRIGGER broken BEFORE INSERT ON scans BEGIN SELECT RAISE(ABORT, 'secret cause'); END",
    );
    const { status, answer } = await post(session.id, body());
    await database().client.execute('DROP TRIGGER broken');
    expect(status).toBe(500);
    expect(answer.id).toMatch(/^\w{4}-\w{4}$/);
    expect(JSON.stringify(answer)).not.toContain('secret cause');
  });
});

describe('the journal’s route', () => {
  const get = async (sessionId: string, query = '') => {
    const request = new Request(`http://${HOST}/api${query}`);
    const response = await GET(request, { params: Promise.resolve({ sessionId }) });
    return { status: response.status, answer: (await response.json()) as Record<string, unknown> };
  };

  it('gives the rows after a row, to those who may read the draft', async () => {
    await signInAs('scheduler@antiphon.example');
    await post(session.id, body());
    expect(await get(session.id, '?after=0')).toMatchObject({
      status: 200,
      answer: { entries: [{ kind: 'do' }] },
    });
    expect(await get(session.id, '?after=-1')).toMatchObject({ status: 422 });
    jar.clear();
    expect(await get(session.id)).toMatchObject({ status: 401 });
    await signInAs('operator@arrowfell.example');
    expect(await get(session.id)).toMatchObject({ status: 403 });
  });
});

it('health needs no sign-in and is never stored', async () => {
  const response = await health();
  expect(response.status).toBe(200);
  expect(response.headers.get('cache-control')).toBe('no-store');
  expect(await response.json()).toEqual({ ok: true, database: 'answers' });
});
