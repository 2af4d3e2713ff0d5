'use server';

import { currentViewer } from '@/src/viewer/current-viewer';
import { isTheme, saveTheme, setThemeCookie } from '@/src/viewer/theme';
import { can } from '@/src/access/policy';

export async function setTheme(
  theme: string,
): Promise<{ ok: true } | { ok: false; code: 'invalid'; message: string }> {
  if (!isTheme(theme)) return { ok: false, code: 'invalid', message: 'The theme is day or night.' };
  await setThemeCookie(theme);
  const viewer = await currentViewer();
  if (viewer && can(viewer, 'settings.own')) await saveTheme(viewer, theme);
  return { ok: true };
}
