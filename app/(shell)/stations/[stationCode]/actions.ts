'use server';

import { revalidatePath } from 'next/cache';
import type { BlockAct } from '@/src/data/blocks';
import type { Failure } from '@/src/data/errors';
import { keepStationBlock, retireStation } from '@/src/data/station/write';
import { currentViewer } from '@/src/viewer/current-viewer';
import { asViewer } from '../../_catalogue/as-viewer';

type Answer = Promise<{ ok: true } | Failure>;

export async function keepBlock(code: string, act: BlockAct): Answer {
  const answer = await asViewer(await currentViewer(), (viewer) => keepStationBlock(viewer, code, act));
  if (answer.ok) revalidatePath('/stations', 'layout');
  return answer;
}

export async function retire(code: string, isRetired: boolean): Answer {
  const answer = await asViewer(await currentViewer(), (viewer) => retireStation(viewer, code, isRetired));
  if (answer.ok) revalidatePath('/stations', 'layout');
  return answer;
}
