import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { Suspense } from 'react';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { staveOrder } from '@/app/_ui/stave-order';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import type { SessionState } from '@/src/data/session/dto';
import { readTimeline } from '@/src/data/plan/read';
import { listSessions } from '@/src/data/session/read';
import { listStations } from '@/src/data/station/read';
import type { Viewer } from '@/src/access/policy';
import { nowMs } from '@/src/env';
import { readNetworkStamp } from '@/src/data/network/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../_masthead/page-frame';
import { Listing } from './_list/listing';
import { Problems } from './_list/problems';
import { Waiting } from './_list/waiting';
import './_list/list.css';

export const metadata: Metadata = { title: 'Sessions' };

/** States in which a plan can still be mended. */
const OPEN: readonly SessionState[] = ['draft', 'offered', 'published'];
/** Of the sessions ahead, the soonest: each is checked whole. */
const MOST_CHECKED = 12;

type SearchParams = Promise<Record<string, string | string[] | undefined>>;

export default async function SessionsPage({ searchParams }: { searchParams: SearchParams }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { find } = await searchParams;
  const known = await readNetworkStamp();
  const now = nowMs();
  return (
    <PageFrame viewer={viewer} nowMs={now} place={{ kind: 'network' }}>
      <RefreshOn address={liveKeys.network} known={known} />
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
  const open = answer.sessions.filter(
    ({ canReadPlan, state, startMs, lengthSeconds }) =>
      canReadPlan && OPEN.includes(state) && startMs + lengthSeconds * 1000 > now,
  );
  return (
    <Listing
      sessions={answer.sessions}
      stations={stations}
      nowMs={now}
      find={find}
      canMake={answer.canMake}
      problems={Object.fromEntries(
        open.slice(-MOST_CHECKED).map(({ id, code }) => [
          id,
          <Suspense key={id} fallback={null}>
            <Problems reading={timelineOf(viewer, code)} />
          </Suspense>,
        ]),
      )}
    />
  );
}

async function timelineOf(viewer: Viewer, code: string) {
  const answer = await readTimeline(viewer, code);
  return answer.ok ? answer.timeline : null;
}
