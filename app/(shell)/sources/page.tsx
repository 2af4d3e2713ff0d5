import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { listSources } from '@/src/data/source/read';
import { nowMs } from '@/src/env';
import { readNetworkStamp } from '@/src/data/network/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../_masthead/page-frame';
import { SourceList } from './_list/source-list';

export const metadata: Metadata = { title: 'Sources' };

type SearchParams = Promise<Record<string, string | string[] | undefined>>;

export default async function SourcesPage({ searchParams }: { searchParams: SearchParams }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const known = await readNetworkStamp();
  const answer = await listSources(viewer);
  if (!answer.ok) forbidden();
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <RefreshOn address={liveKeys.network} known={known} />
      <SourceList sources={answer.sources} canAdd={answer.canAdd} query={await searchParams} />
    </PageFrame>
  );
}
