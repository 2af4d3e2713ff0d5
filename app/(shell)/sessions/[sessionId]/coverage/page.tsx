import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readCoverage } from '@/src/data/coverage/read';
import { knownStamp } from '@/src/data/session/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { SessionFrame } from '../_head/session-frame';
import { CoverageView } from './_coverage/coverage-view';

export const metadata: Metadata = { title: 'Coverage' };

type Props = {
  params: Promise<{ sessionId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

export default async function CoveragePage({ params, searchParams }: Props) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { sessionId } = await params;
  const asked = await searchParams;
  const known = await knownStamp(viewer, sessionId, 'all');
  const answer = await readCoverage(viewer, sessionId, {
    source: oneOf(asked.source),
    band: oneOf(asked.band),
    plan: oneOf(asked.plan),
  });
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { sheet } = answer;
  return (
    <SessionFrame viewer={viewer} session={sheet.session} nowMs={sheet.nowMs}>
      <RefreshOn address={liveKeys.stamp(sheet.session.id)} known={known} />
      <CoverageView sheet={sheet} />
    </SessionFrame>
  );
}

const oneOf = (value: string | string[] | undefined) => (Array.isArray(value) ? value[0] : value);
