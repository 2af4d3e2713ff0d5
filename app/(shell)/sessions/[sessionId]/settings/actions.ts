'use server';

import { revalidatePath } from 'next/cache';
import type { Failure } from '@/src/data/errors';
import { editSession, setSessionState } from '@/src/data/session/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../../_catalogue/as-viewer';

export async function edit(sessionId: string, body: object): Promise<{ ok: true; code: string } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => editSession(viewer, sessionId, body));
  if (answer.ok) revalidatePath('/sessions', 'layout');
  return answer;
}

export async function setState(
  sessionId: string,
  state: 'closed' | 'cancelled' | 'open',
): Promise<{ ok: true } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) =>
    setSessionState(viewer, sessionId, { state }),
  );
  if (answer.ok) revalidatePath('/sessions', 'layout');
  return answer;
}
