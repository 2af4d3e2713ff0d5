'use server';

import type { Route } from 'next';
import { revalidatePath } from 'next/cache';
import type { Failure } from '@/src/data/errors';
import { addMode } from '@/src/data/mode/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../_catalogue/as-viewer';

export async function add(typed: unknown): Promise<{ ok: true; href: Route } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => addMode(viewer, typed));
  if (!answer.ok) return answer;
  revalidatePath('/modes');
  return { ok: true, href: `/modes/${answer.id}` as Route };
}
