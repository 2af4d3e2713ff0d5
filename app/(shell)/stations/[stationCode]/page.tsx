import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readStation } from '@/src/data/station/read';
import { nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../_masthead/page-frame';
import { StationPage } from './_station/station-page';

type Props = { params: Promise<{ stationCode: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Station ${(await params).stationCode}` };
}

export default async function StationRoute({ params }: Props) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const answer = await readStation(viewer, (await params).stationCode);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const now = nowMs();
  return (
    <PageFrame viewer={viewer} nowMs={now} place={{ kind: 'network' }}>
      <StationPage station={answer.station} nowMs={now} />
    </PageFrame>
  );
}
