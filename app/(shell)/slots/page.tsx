import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { listSlots } from '@/src/data/slot/list';
import { readNetworkStamp } from '@/src/data/network/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../_masthead/page-frame';
import { SlotList } from './_list/slot-list';
import './_list/slot-list.css';

export const metadata: Metadata = { title: 'Slots' };

export default async function SlotsPage() {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const known = await readNetworkStamp();
  const answer = await listSlots(viewer);
  if (!answer.ok) forbidden();
  const { slots, nowMs } = answer;
  return (
    <PageFrame viewer={viewer} nowMs={nowMs} place={{ kind: 'network' }}>
      <RefreshOn address={liveKeys.network} known={known} />
      <SlotList slots={slots} nowMs={nowMs} />
    </PageFrame>
  );
}
