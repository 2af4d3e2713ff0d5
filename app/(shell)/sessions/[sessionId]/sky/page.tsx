import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readSkySheet } from '@/src/data/sky/read';
import { knownStamp } from '@/src/data/session/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { SessionFrame } from '../_head/session-frame';
import { Sky } from './_sky/sky';

export const metadata: Metadata = { title: 'Sky' };

export default async function SkyPage({ params }: { params: Promise<{ sessionId: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { sessionId } = await params;
  const known = await knownStamp(viewer, sessionId, 'stations');
  const answer = await readSkySheet(viewer, sessionId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { sheet } = answer;
  return (
    <SessionFrame viewer={viewer} session={sheet.session} nowMs={sheet.nowMs}>
      <RefreshOn address={liveKeys.stationsStamp(sheet.session.id)} known={known} />
      <Sky sheet={sheet} />
    </SessionFrame>
  );
}
