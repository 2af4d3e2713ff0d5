import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readComments } from '@/src/data/comment/read';
import { knownStamp } from '@/src/data/session/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { SessionFrame } from '../_head/session-frame';
import { Comments } from './_comments/comments';

export const metadata: Metadata = { title: 'Comments' };

export default async function CommentsPage({ params }: { params: Promise<{ sessionId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { sessionId } = await params;
  const known = await knownStamp(viewer, sessionId, 'stations');
  const answer = await readComments(viewer, sessionId);
  if (!answer.ok) notFound();
  const { session, comments, canWrite, nowMs } = answer;
  return (
    <SessionFrame viewer={viewer} session={session} nowMs={nowMs}>
      <RefreshOn address={liveKeys.stationsStamp(session.id)} known={known} />
      <Comments session={session} comments={comments} canWrite={canWrite} />
    </SessionFrame>
  );
}
