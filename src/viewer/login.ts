import 'server-only';
import { createHash, randomBytes } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { cookies } from 'next/headers';
import { db } from '../../db/client';
import { users } from '../../db/schema/users';
import { env } from '../env';
import { countAttempt, forgiveAttempts } from './attempts';
import { lucia } from './lucia';
import { passwordMatches } from './password';
import { setThemeCookie } from './theme';

export type SignInAnswer =
  { ok: true } | { ok: false; reason: 'mismatch' } | { ok: false; reason: 'wait'; waitSeconds: number };

/** Checks the password and starts a login; an account of the demo counts only while the demo is on. */
export async function signIn(emailAsTyped: string, password: string): Promise<SignInAnswer> {
  const email = emailAsTyped.trim().toLowerCase();
  const waitSeconds = await countAttempt(email);
  if (waitSeconds > 0) return { ok: false, reason: 'wait', waitSeconds };
  const user = await findAccount(email);
  const matches = await passwordMatches(user?.passwordHash ?? null, password);
  if (!user || !matches) return { ok: false, reason: 'mismatch' };
  await forgiveAttempts(email);
  await endLogin();
  await startLogin(user.id);
  if (user.theme) await setThemeCookie(user.theme);
  return { ok: true };
}

export async function signOut(): Promise<void> {
  await endLogin();
  const blank = lucia().createBlankSessionCookie();
  (await cookies()).set(blank.name, blank.value, blank.attributes);
}

/** The table holds a hash; only the browser holds the token. */
export const digestOf = (token: string): string => createHash('sha256').update(token).digest('hex');

async function findAccount(email: string) {
  const [user] = await db()
    .select({
      id: users.id,
      passwordHash: users.passwordHash,
      theme: users.theme,
      isDemo: users.isDemo,
    })
    .from(users)
    .where(eq(users.email, email));
  return user && (!user.isDemo || env().isDemo) ? user : null;
}

async function startLogin(userId: string): Promise<void> {
  const token = randomBytes(24).toString('base64url');
  await lucia().deleteExpiredSessions();
  await lucia().createSession(userId, {}, { sessionId: digestOf(token) });
  const cookie = lucia().createSessionCookie(token);
  (await cookies()).set(cookie.name, cookie.value, cookie.attributes);
}

async function endLogin(): Promise<void> {
  const token = (await cookies()).get(lucia().sessionCookieName)?.value;
  if (token) await lucia().invalidateSession(digestOf(token));
}
