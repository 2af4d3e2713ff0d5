'use server';

import { revalidatePath } from 'next/cache';
import {
  reportChange,
  reportReading,
  setReadingAside,
  type ReadingFailure,
  type Reported,
} from '@/src/data/clock/write';
import type { Failure } from '@/src/data/errors';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../../_catalogue/as-viewer';

/** One line for each verb: the body is what the form holds, read by the verb itself. */
export async function report(code: string, body: object): Promise<Reported | ReadingFailure> {
  const answer = await asViewer<Reported>(await currentViewer(), (viewer) =>
    reportReading(viewer, code, body),
  );
  if (answer.ok) revalidatePath(`/stations/${code}/clock`);
  return answer;
}

export async function change(code: string, body: object): Promise<{ ok: true } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) => reportChange(viewer, code, body));
  if (answer.ok) revalidatePath(`/stations/${code}/clock`);
  return answer;
}

export async function setAside(
  code: string,
  readingId: string,
  body: object,
): Promise<{ ok: true } | Failure> {
  const answer = await asViewer(await currentViewer(), (viewer) =>
    setReadingAside(viewer, code, readingId, body),
  );
  if (answer.ok) revalidatePath(`/stations/${code}/clock`);
  return answer;
}
