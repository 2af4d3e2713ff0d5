'use server';

import { revalidatePath } from 'next/cache';
import { writeComment } from '@/src/data/comment/write';
import type { Failure } from '@/src/data/errors';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../../_catalogue/as-viewer';

export async function say(sessionId: string, body: object): Promise<{ ok: true } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => writeComment(viewer, sessionId, body));
  if (answer.ok) revalidatePath(`/sessions/${sessionId}/comments`);
  return answer;
}
