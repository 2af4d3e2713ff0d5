'use server';

import { revalidatePath } from 'next/cache';
import type { BlockAct } from '@/src/data/blocks';
import type { Failure } from '@/src/data/errors';
import { keepSourceBlock, retireSource } from '@/src/data/source/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../_catalogue/as-viewer';

type Answer = Promise<{ ok: true } | Failure>;

export async function keepBlock(id: string, act: BlockAct): Answer {
  const answer = await asViewer(await currentViewer(), (viewer) => keepSourceBlock(viewer, id, act));
  if (answer.ok) revalidatePath('/sources', 'layout');
  return answer;
}

export async function retire(id: string, isRetired: boolean): Answer {
  const answer = await asViewer(await currentViewer(), (viewer) => retireSource(viewer, id, isRetired));
  if (answer.ok) revalidatePath('/sources', 'layout');
  return answer;
}
