import type { Route } from 'next';
import { redirect } from 'next/navigation';
import { ToSignIn } from './_ui/to-sign-in';
import { landingFor } from '@/src/data/session/landing';
import { currentViewer } from '@/src/viewer/current-viewer';

/** Sends each role to where its work begins. */
export default async function Home() {
  const viewer = await currentViewer();
  if (viewer) redirect((await landingFor(viewer)) as Route);
  return <ToSignIn />;
}
