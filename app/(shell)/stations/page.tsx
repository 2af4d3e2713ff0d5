import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { staveOrder } from '@/app/_ui/stave-order';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { canSome } from '@/src/access/policy';
import { listClocks } from '@/src/data/clock/read';
import { listStationRows } from '@/src/data/station/read';
import { nowMs } from '@/src/env';
import { readNetworkStamp } from '@/src/data/network/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../_masthead/page-frame';
import { StationList, type ClockWord } from './_list/station-list';

export const metadata: Metadata = { title: 'Stations' };

type SearchParams = Promise<Record<string, string | string[] | undefined>>;

export default async function StationsPage({ searchParams }: { searchParams: SearchParams }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const known = await readNetworkStamp();
  const answer = await listStationRows(viewer);
  if (!answer.ok) forbidden();
  const clocks: Record<string, ClockWord> = {};
  if (canSome(viewer, 'clock.read')) {
    const read = await listClocks(viewer);
    if (!read.ok) forbidden();
    for (const { code, readAtMs, now } of read.clocks) {
      clocks[code] = { readAtMs, offsetSeconds: now?.offsetSeconds ?? null };
    }
  }
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <RefreshOn address={liveKeys.network} known={known} />
      <StationList
        stations={staveOrder(answer.stations)}
        clocks={clocks}
        canAdd={answer.canAdd}
        nowMs={nowMs()}
        query={await searchParams}
      />
    </PageFrame>
  );
}
