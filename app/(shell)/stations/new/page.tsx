import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { can } from '@/src/access/policy';
import { nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../_masthead/page-frame';
import { NewStation } from './_form/new-station';

export const metadata: Metadata = { title: 'New station' };

export default async function NewStationPage() {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  if (!can(viewer, 'station.write')) forbidden();
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <NewStation />
    </PageFrame>
  );
}
