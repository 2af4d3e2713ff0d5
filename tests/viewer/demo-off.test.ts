import { beforeAll, expect, it, vi } from 'vitest';
import { database } from '@/db/client';
import { migrateDatabase } from '@/db/migrate';
import { seedDemo } from '@/db/seed';
import { currentViewer } from '@/src/viewer/current-viewer';
import { signIn } from '@/src/viewer/login';
import { jar } from '@/tests/helpers/cookie-jar';
import { NOW, openDatabase } from '@/tests/helpers/database';

vi.mock('next/headers', async () => (await import('@/tests/helpers/cookie-jar')).headersModule);

openDatabase({ isSeeded: false });
process.env.ANTIPHON_DEMO = '0';
process.env.ANTIPHON_NOW = '';

beforeAll(async () => {
  await migrateDatabase();
  await seedDemo(Date.parse(NOW));
});

it('an account of the demo is refused while the demo is off, with the right password too', async () => {
  expect(await signIn('admin@antiphon.example', 'antiphon-demo')).toEqual({ ok: false, reason: 'mismatch' });
});

it('a login of the demo is worth nothing while the demo is off; the same of a real account is', async () => {
  const email = 'lead@net.example';
  const sql = 'UPDATE users SET is_demo = 0, email = ? WHERE email = ?';
  await database().client.execute({ sql, args: [email, 'admin@antiphon.example'] });
  expect(await signIn(email, 'antiphon-demo')).toEqual({ ok: true });
  expect(jar.has('antiphon_login')).toBe(true);
  expect(await currentViewer()).toMatchObject({ email });
  await database().client.execute('UPDATE users SET is_demo = 1');
  expect(await currentViewer()).toBeNull();
});
