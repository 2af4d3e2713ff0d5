'use server';

import { revalidatePath } from 'next/cache';
import type { Failure } from '@/src/data/errors';
import { makeSession } from '@/src/data/session/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../_catalogue/as-viewer';

export async function make(body: object): Promise<{ ok: true; code: string } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => makeSession(viewer, body));
  if (answer.ok) revalidatePath('/sessions');
  return answer;
}
