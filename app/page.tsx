import { redirect } from 'next/navigation';
import { ToSignIn } from './_ui/to-sign-in';
import { currentViewer } from '@/src/viewer/current-viewer';

/** Every role of today lands on the sessions. */
export default async function Home() {
  if (await currentViewer()) redirect('/sessions');
  return <ToSignIn />;
}
