import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readTimeline } from '@/src/data/plan/read';
import { knownStamp } from '@/src/data/session/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { SessionFrame } from '../_head/session-frame';
import { Fringes } from './_fringes/fringes';

export const metadata: Metadata = { title: 'Fringes' };

export default async function FringesPage({ params }: { params: Promise<{ sessionId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { sessionId } = await params;
  const known = await knownStamp(viewer, sessionId, 'all');
  const answer = await readTimeline(viewer, sessionId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { timeline } = answer;
  return (
    <SessionFrame viewer={viewer} session={timeline.session} nowMs={timeline.nowMs}>
      <RefreshOn address={liveKeys.stamp(timeline.session.id)} known={known} />
      <Fringes timeline={timeline} />
    </SessionFrame>
  );
}
