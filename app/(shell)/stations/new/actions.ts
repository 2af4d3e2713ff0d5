'use server';

import type { Route } from 'next';
import { revalidatePath } from 'next/cache';
import type { Failure } from '@/src/data/errors';
import { addStation } from '@/src/data/station/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../_catalogue/as-viewer';

export async function add(typed: unknown): Promise<{ ok: true; href: Route } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => addStation(viewer, typed));
  if (!answer.ok) return answer;
  revalidatePath('/stations');
  return { ok: true, href: `/stations/${answer.code}` as Route };
}
