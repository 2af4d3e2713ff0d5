import { redirect } from 'next/navigation';
import { currentViewer } from '@/src/viewer/current-viewer';

/** Every role of today lands on the sessions. */
export default async function Home() {
  redirect((await currentViewer()) ? '/sessions' : '/sign-in');
}
