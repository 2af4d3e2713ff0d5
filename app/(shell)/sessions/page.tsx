import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { Suspense } from 'react';
import { staveOrder } from '@/app/_ui/stave-order';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { listSessions } from '@/src/data/session/read';
import { listStations } from '@/src/data/station/read';
import type { Viewer } from '@/src/access/policy';
import { nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../_masthead/page-frame';
import { Listing } from './_list/listing';
import { Waiting } from './_list/waiting';
import './_list/list.css';

export const metadata: Metadata = { title: 'Sessions' };

type SearchParams = Promise<Record<string, string | string[] | undefined>>;

export default async function SessionsPage({ searchParams }: { searchParams: SearchParams }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { find } = await searchParams;
  const now = nowMs();
  return (
    <PageFrame viewer={viewer} nowMs={now} place={{ kind: 'network' }}>
      <Suspense fallback={<Waiting />}>
        <Sessions viewer={viewer} now={now} find={typeof find === 'string' ? find : ''} />
      </Suspense>
    </PageFrame>
  );
}

async function Sessions({ viewer, now, find }: { viewer: Viewer; now: number; find: string }) {
  const answer = await listSessions(viewer);
  if (!answer.ok) forbidden();
  const codes = [...new Set(answer.sessions.flatMap((session) => session.stations))];
  const named = await listStations(viewer, codes);
  if (!named.ok) forbidden();
  const stations = staveOrder(named.stations).map(({ code, name }) => ({ code, name }));
  return (
    <Listing
      sessions={answer.sessions}
      stations={stations}
      nowMs={now}
      find={find}
      canMake={answer.canMake}
    />
  );
}
