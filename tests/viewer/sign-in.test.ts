import { beforeEach, describe, expect, it, vi } from 'vitest';
import { signIn, signOut } from '@/app/(auth)/sign-in/actions';
import { setTheme } from '@/app/(auth)/theme-action';
import { database } from '@/db/client';
import { countAttempt, TRIES_IN_TOTAL, TRIES_PER_ACCOUNT } from '@/src/viewer/attempts';
import { currentViewer } from '@/src/viewer/current-viewer';
import { passwordMatches } from '@/src/viewer/password';
import { safeReturnPath } from '@/src/viewer/return-path';
import { jar } from '@/tests/helpers/cookie-jar';
import { openDatabase } from '@/tests/helpers/database';

vi.mock('next/headers', async () => (await import('@/tests/helpers/cookie-jar')).headersModule);
vi.mock('next/navigation', () => ({
  redirect: (path: string) => {
    throw new Error(`to ${path}`);
  },
}));

openDatabase();

const form = (email: string, password: string, next?: string) => {
  const data = new FormData();
  data.set('email', email);
  data.set('password', password);
  if (next !== undefined) data.set('next', next);
  return data;
};

beforeEach(() => {
  jar.clear();
});

describe('sign-in', () => {
  it('lets the right password in, in any case of the e-mail, and goes back to where one was going', async () => {
    const asked = form(' Scheduler@Antiphon.example ', 'antiphon-demo', '/sessions/ARC-031');
    await expect(signIn(null, asked)).rejects.toThrow('to /sessions/ARC-031');
    expect(await currentViewer()).toMatchObject({
      email: 'scheduler@antiphon.example',
      grants: [{ role: 'scheduler', stationCode: null, sessionId: null }],
    });
  });

  it('keeps only a hash of what the browser holds', async () => {
    await expect(signIn(null, form('admin@antiphon.example', 'antiphon-demo'))).rejects.toThrow('to /');
    const token = jar.get('antiphon_login');
    expect(token).toMatch(/^[\w-]{32}$/);
    const { rows } = await database().client.execute('SELECT id FROM login_sessions');
    expect(rows.length).toBeGreaterThan(0);
    expect(rows.map((row) => row.id)).not.toContain(token);
  });

  it('ends with sign-out: the cookie is gone and an old one is worth nothing', async () => {
    await expect(signIn(null, form('admin@antiphon.example', 'antiphon-demo'))).rejects.toThrow('to');
    const token = jar.get('antiphon_login') ?? '';
    await expect(signOut()).rejects.toThrow('to /sign-in');
    expect(jar.has('antiphon_login')).toBe(false);
    jar.set('antiphon_login', token);
    expect(await currentViewer()).toBeNull();
  });

  it('ends after 26 h by itself', async () => {
    await expect(signIn(null, form('admin@antiphon.example', 'antiphon-demo'))).rejects.toThrow('to');
    const { rows } = await database().client.execute('SELECT max(expires_at) AS at FROM login_sessions');
    const hours = (Number(rows[0]?.at) - Date.now() / 1000) / 3600;
    expect(hours).toBeCloseTo(26, 1);
    await database().client.execute('UPDATE login_sessions SET expires_at = 1');
    expect(await currentViewer()).toBeNull();
  });

  it.each([
    ['a wrong password', 'correlator@antiphon.example'],
    ['an unknown address', 'nobody@antiphon.example'],
  ])('says the same of %s, keeps the e-mail and sets no cookie', async (_, email) => {
    expect(await signIn(null, form(email, 'wrong'))).toEqual({
      ok: false,
      code: 'invalid',
      message: 'That e-mail and password do not match.',
      advice: 'Check both, or ask an administrator for a new password.',
      email,
    });
    expect(jar.size).toBe(0);
  });

  it('says beside the field what is missing', async () => {
    expect(await signIn(null, form('', ''))).toMatchObject({
      fields: { email: ['Enter your e-mail.'], password: ['Enter your password.'] },
    });
    expect(await signIn(null, form('somebody', 'x'))).toMatchObject({
      fields: { email: ['An e-mail has the form name@place.'] },
      email: 'somebody',
    });
  });

  it('stops after too many tries on one account, says when to try again, and not before the right password either', async () => {
    const email = 'operator@brightmoor.example';
    for (let n = 0; n < TRIES_PER_ACCOUNT; n++) {
      expect(await signIn(null, form(email, 'wrong'))).toMatchObject({
        message: 'That e-mail and password do not match.',
      });
    }
    const answer = await signIn(null, form(email, 'antiphon-demo'));
    expect(answer?.message).toMatch(/^Too many tries\. Try again in 1\d min \d\d s\.$/);
    await expect(signIn(null, form('operator@arrowfell.example', 'antiphon-demo'))).rejects.toThrow('to');
  });

  it('lets one blocked account lock out nobody else, however often it is tried', async () => {
    const waits = [];
    for (let n = 0; n < TRIES_IN_TOTAL + 20; n++) waits.push(await countAttempt('blocked@antiphon.example'));
    expect(waits.filter((wait) => wait > 0).length).toBeGreaterThanOrEqual(TRIES_IN_TOTAL);
    expect(await countAttempt('other@antiphon.example')).toBe(0);
  });

  it('takes a password of no account for wrong', async () => {
    expect(await passwordMatches(null, 'antiphon-demo')).toBe(false);
  });
});

describe('the way back after sign-in', () => {
  it.each([
    ['/sessions/ARC-031?at=1', '/sessions/ARC-031?at=1'],
    ['//elsewhere.example', '/'],
    ['/\\elsewhere.example', '/'],
    ['/\t/elsewhere.example', '/'],
    ['https://elsewhere.example', '/'],
    ['sessions', '/'],
    ['', '/'],
    [null, '/'],
  ])('%j goes to %s', (asked, path) => {
    expect(safeReturnPath(asked)).toBe(path);
  });
});

describe('the theme', () => {
  it('is kept in the cookie and with the account', async () => {
    await expect(signIn(null, form('scheduler@antiphon.example', 'antiphon-demo'))).rejects.toThrow('to');
    expect(await setTheme('night')).toEqual({ ok: true });
    expect(jar.get('antiphon_theme')).toBe('night');
    expect(await currentViewer()).toMatchObject({ theme: 'night' });
    jar.clear();
    await expect(signIn(null, form('scheduler@antiphon.example', 'antiphon-demo'))).rejects.toThrow('to');
    expect(jar.get('antiphon_theme')).toBe('night');
  });

  it('is day or night', async () => {
    expect(await setTheme('dusk')).toMatchObject({ ok: false, code: 'invalid' });
    expect(jar.has('antiphon_theme')).toBe(false);
  });
});
