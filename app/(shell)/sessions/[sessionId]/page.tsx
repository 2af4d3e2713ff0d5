import { forbidden, redirect } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { currentViewer } from '@/src/viewer/current-viewer';
import { firstPageOf } from '../../_masthead/nav';

/** A session's address without a page: on to the one that the viewer's work begins with. */
export default async function SessionPage({ params }: { params: Promise<{ sessionId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const first = firstPageOf(viewer, { kind: 'session', sessionId: (await params).sessionId });
  if (!first) forbidden();
  redirect(first);
}
