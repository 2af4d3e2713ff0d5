import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readTimeline } from '@/src/data/plan/read';
import { knownStamp } from '@/src/data/session/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { SessionFrame } from '../_head/session-frame';
import { Timeline } from './_timeline/timeline';

export const metadata: Metadata = { title: 'Timeline' };

type Props = {
  params: Promise<{ sessionId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

export default async function TimelinePage({ params, searchParams }: Props) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { sessionId } = await params;
  const { scan } = await searchParams;
  const known = await knownStamp(viewer, sessionId, 'stations');
  const answer = await readTimeline(viewer, sessionId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { timeline } = answer;
  return (
    <SessionFrame viewer={viewer} session={timeline.session} nowMs={timeline.nowMs}>
      <Timeline timeline={timeline} known={known} chosenScanId={typeof scan === 'string' ? scan : null} />
    </SessionFrame>
  );
}
