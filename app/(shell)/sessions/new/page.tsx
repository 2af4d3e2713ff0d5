import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readSessionForm } from '@/src/data/session/form';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../_masthead/page-frame';
import { SessionForm } from '../_form/session-form';
import { make } from './actions';

export const metadata: Metadata = { title: 'New session' };

export default async function NewSessionPage() {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const answer = await readSessionForm(viewer, null);
  if (!answer.ok) forbidden();
  return (
    <PageFrame viewer={viewer} nowMs={answer.form.nowMs} place={{ kind: 'network' }}>
      <div className="object-head">
        <h1>New session</h1>
      </div>
      <SessionForm
        form={answer.form}
        label="Make the session"
        leave="/sessions"
        send={make}
        next="timeline"
      />
    </PageFrame>
  );
}
