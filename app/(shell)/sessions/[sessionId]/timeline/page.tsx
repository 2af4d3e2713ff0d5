import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { longTimeText, spanText } from '@/app/_ui/format';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import type { Timeline as TimelineDto } from '@/src/data/plan/dto';
import { readTimeline } from '@/src/data/plan/read';
import { currentViewer } from '@/src/viewer/current-viewer';
import { Masthead } from '../../../_masthead/masthead';
import { Timeline } from './_timeline/timeline';

export const metadata: Metadata = { title: 'Timeline' };

export default async function TimelinePage({ params }: { params: Promise<{ sessionId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { sessionId } = await params;
  const answer = await readTimeline(viewer, sessionId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { timeline } = answer;
  const { session } = timeline;
  return (
    <div className="flex min-h-dvh flex-col desk:h-dvh">
      <Masthead
        viewer={viewer}
        nowMs={timeline.nowMs}
        place={{ kind: 'session', sessionId: session.code }}
        title={session.title}
        sub={headLine(session)}
      />
      <main id="main" className="flex min-h-0 flex-1 flex-col">
        <Timeline timeline={timeline} />
      </main>
    </div>
  );
}

const headLine = ({ code, state, startMs, lengthSeconds }: TimelineDto['session']) =>
  `${code} · ${state} · ${spanText(lengthSeconds)} from ${longTimeText(startMs)}`;
