import 'server-only';
import { eq } from 'drizzle-orm';
import { cookies } from 'next/headers';
import { cache } from 'react';
import { db } from '../../db/client';
import { grants } from '../../db/schema/grants';
import type { Viewer } from '../access/policy';
import { env } from '../env';
import { digestOf } from './login';
import { lucia } from './lucia';

/** Who is signed in, with their grants; null is nobody. */
export const currentViewer = cache(async (): Promise<Viewer | null> => {
  const token = (await cookies()).get(lucia().sessionCookieName)?.value;
  if (!token) return null;
  const { user } = await lucia().validateSession(digestOf(token));
  if (!user || (user.isDemo && !env().isDemo)) return null;
  const held = await db()
    .select({ role: grants.role, stationCode: grants.stationCode, sessionId: grants.sessionId })
    .from(grants)
    .where(eq(grants.userId, user.id))
    .orderBy(grants.id);
  return { userId: user.id, email: user.email, theme: user.theme, grants: held };
});
