import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { can } from '@/src/access/policy';
import { readMode } from '@/src/data/mode/read';
import { nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../_masthead/page-frame';
import { NewMode } from './_form/new-mode';

export const metadata: Metadata = { title: 'New mode' };

type SearchParams = Promise<Record<string, string | string[] | undefined>>;

export default async function NewModePage({ searchParams }: { searchParams: SearchParams }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  if (!can(viewer, 'mode.write')) forbidden();
  const { copy } = await searchParams;
  const copied = typeof copy === 'string' ? await readMode(viewer, copy) : null;
  if (copied && !copied.ok) notFound();
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <NewMode copied={copied?.mode ?? null} />
    </PageFrame>
  );
}
