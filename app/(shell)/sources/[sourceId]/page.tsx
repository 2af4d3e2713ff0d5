import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readSource } from '@/src/data/source/read';
import { nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../_masthead/page-frame';
import { SourcePage } from './_source/source-page';

export const metadata: Metadata = { title: 'Source' };

export default async function SourceRoute({ params }: { params: Promise<{ sourceId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const answer = await readSource(viewer, (await params).sourceId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <SourcePage source={answer.source} />
    </PageFrame>
  );
}
