import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { can } from '@/src/access/policy';
import { nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../_masthead/page-frame';
import { NewSource } from './_form/new-source';

export const metadata: Metadata = { title: 'New source' };

export default async function NewSourcePage() {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  if (!can(viewer, 'source.write')) forbidden();
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <NewSource />
    </PageFrame>
  );
}
