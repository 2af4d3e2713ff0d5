import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { listClocks, readStationClock } from '@/src/data/clock/read';
import { readClockStamp } from '@/src/data/clock/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../../../_masthead/page-frame';
import { ClockLog } from './_clock/clock-log';
import './_clock/clock.css';

export const metadata: Metadata = { title: 'Clock log' };

export default async function ClockPage({ params }: { params: Promise<{ stationCode: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { stationCode } = await params;
  const stamp = await readClockStamp(viewer, stationCode);
  const answer = await readStationClock(viewer, stationCode);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { clock } = answer;
  const listed = await listClocks(viewer);
  const codes = listed.ok ? listed.clocks.map(({ code }) => code) : [];
  const { code, name } = clock.station;
  return (
    <PageFrame
      viewer={viewer}
      nowMs={clock.nowMs}
      place={clock.canWrite ? { kind: 'station', stationCode: code } : { kind: 'network' }}
      title={`Clock log of ${name}`}
      sub="station clock minus UTC, via GPS, positive = early"
    >
      <RefreshOn address={liveKeys.clockStamp(code)} known={stamp.ok ? stamp.stamp : undefined} />
      <ClockLog key={code} clock={clock} codes={codes} />
    </PageFrame>
  );
}
