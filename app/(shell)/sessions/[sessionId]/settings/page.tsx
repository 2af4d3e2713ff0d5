import type { Metadata, Route } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readSessionForm } from '@/src/data/session/form';
import { currentViewer } from '@/src/viewer/current-viewer';
import { SessionForm } from '../../_form/session-form';
import { SessionFrame } from '../_head/session-frame';
import { StateBox } from './_settings/state-box';
import { edit } from './actions';
import { isEnded } from '@/src/schedule/ended';

export const metadata: Metadata = { title: 'Session' };

export default async function SettingsPage({ params }: { params: Promise<{ sessionId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const answer = await readSessionForm(viewer, (await params).sessionId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { form } = answer;
  if (!form.session) notFound();
  const { session } = form;
  const isOver = isEnded(session.state);
  return (
    <SessionFrame viewer={viewer} session={session} nowMs={form.nowMs}>
      <div className="flex min-h-0 flex-1 flex-col desk:overflow-y-auto">
        <StateBox session={session} />
        {isOver ? (
          <p className="px-6 py-4.5">
            {session.code} is {session.state}: its plan, the answers and what was said of its scans stay as
            they are. Open it again to change it.
          </p>
        ) : (
          <SessionForm
            key={form.rev}
            form={form}
            label="Keep the changes"
            leave={`/sessions/${encodeURIComponent(session.code)}/timeline` as Route}
            send={edit.bind(null, session.id)}
            next="settings"
          />
        )}
      </div>
    </SessionFrame>
  );
}
