'use server';

import { revalidatePath } from 'next/cache';
import type { BlockAct } from '@/src/data/blocks';
import type { Failure } from '@/src/data/errors';
import { keepModeBlock, retireMode } from '@/src/data/mode/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../_catalogue/as-viewer';

type Answer = Promise<{ ok: true } | Failure>;

export async function keepBlock(id: string, act: BlockAct): Answer {
  const answer = await asViewer(await currentViewer(), (viewer) => keepModeBlock(viewer, id, act));
  if (answer.ok) revalidatePath('/modes', 'layout');
  return answer;
}

export async function retire(id: string, isRetired: boolean): Answer {
  const answer = await asViewer(await currentViewer(), (viewer) => retireMode(viewer, id, isRetired));
  if (answer.ok) revalidatePath('/modes', 'layout');
  return answer;
}
