import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readMode } from '@/src/data/mode/read';
import { nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../_masthead/page-frame';
import { ModePage } from './_mode/mode-page';

export const metadata: Metadata = { title: 'Mode' };

export default async function ModeRoute({ params }: { params: Promise<{ modeId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const answer = await readMode(viewer, (await params).modeId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <ModePage mode={answer.mode} />
    </PageFrame>
  );
}
