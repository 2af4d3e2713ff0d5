'use server';

import { revalidatePath } from 'next/cache';
import type { Failure } from '@/src/data/errors';
import { offerPlan, resendMail, type Offered } from '@/src/data/offer/write';
import { replySlot } from '@/src/data/slot/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../../_catalogue/as-viewer';

export async function offer(sessionId: string, body: object): Promise<Offered | Failure> {
  const answer = await asViewer<Offered>(await currentViewer(), (viewer) =>
    offerPlan(viewer, sessionId, body),
  );
  if (answer.ok) revalidatePath('/sessions', 'layout');
  return answer;
}

export async function reply(
  sessionId: string,
  station: string,
  body: object,
): Promise<{ ok: true } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) =>
    replySlot(viewer, sessionId, station, body),
  );
  if (!answer.ok) return answer;
  revalidatePath('/sessions', 'layout');
  return { ok: true };
}

export async function resend(
  sessionId: string,
): Promise<{ ok: true; sent: number; failed: { to: string; trouble: string }[] } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => resendMail(viewer, sessionId));
  if (answer.ok) revalidatePath('/sessions', 'layout');
  return answer;
}
