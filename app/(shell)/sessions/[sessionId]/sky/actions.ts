'use server';

import { revalidatePath } from 'next/cache';
import type { Failure } from '@/src/data/errors';
import { takeAct } from '@/src/data/plan/write';
import { addSessionSource } from '@/src/data/session/add-source';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../../_catalogue/as-viewer';

/** Moves the session's hours, or takes that back: an act on its plan like those of the timeline. */
export async function moveHours(sessionId: string, body: object): Promise<{ ok: true } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => takeAct(viewer, sessionId, body));
  if (!answer.ok) return answer;
  revalidatePath('/sessions', 'layout');
  return { ok: true };
}

/** Puts a source of the catalogue on the session's list. */
export async function addSource(
  sessionId: string,
  body: object,
): Promise<{ ok: true; name: string } | Failure> {
  const answer = await asViewer<{ ok: true; name: string }>(await currentViewer(), (viewer) =>
    addSessionSource(viewer, sessionId, body),
  );
  if (answer.ok) revalidatePath('/sessions', 'layout');
  return answer;
}
