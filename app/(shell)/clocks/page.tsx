import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { listClocks } from '@/src/data/clock/read';
import { readNetworkStamp } from '@/src/data/network/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../_masthead/page-frame';
import { ClockTable } from './_clocks/clock-table';

export const metadata: Metadata = { title: 'Clocks' };

export default async function ClocksPage() {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const known = await readNetworkStamp();
  const answer = await listClocks(viewer);
  if (!answer.ok) forbidden();
  return (
    <PageFrame viewer={viewer} nowMs={answer.nowMs} place={{ kind: 'network' }}>
      <RefreshOn address={liveKeys.network} known={known} />
      <ClockTable clocks={answer.clocks} nowMs={answer.nowMs} />
    </PageFrame>
  );
}
