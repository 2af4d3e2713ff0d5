import 'server-only';
import { eq } from 'drizzle-orm';
import { cookies } from 'next/headers';
import { db } from '../../db/client';
import { users } from '../../db/schema/users';
import type { Viewer } from '../access/policy';
import { env } from '../env';

export type Theme = NonNullable<Viewer['theme']>;

const THEME_COOKIE = 'antiphon_theme';
const YEAR_SECONDS = 31_536_000;

export const isTheme = (word: unknown): word is Theme => word === 'day' || word === 'night';

/** What the browser was told last; null follows the device. */
export async function currentTheme(): Promise<Theme | null> {
  const word = (await cookies()).get(THEME_COOKIE)?.value;
  return isTheme(word) ? word : null;
}

export async function setThemeCookie(theme: Theme): Promise<void> {
  const attributes = {
    path: '/',
    sameSite: 'lax',
    secure: env().isCookieSecure,
    maxAge: YEAR_SECONDS,
  } as const;
  (await cookies()).set(THEME_COOKIE, theme, attributes);
}

export async function saveTheme(viewer: Viewer, theme: Theme): Promise<void> {
  await db().update(users).set({ theme }).where(eq(users.id, viewer.userId));
}
