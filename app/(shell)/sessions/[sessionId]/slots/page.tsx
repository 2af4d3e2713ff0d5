import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { staveOrder } from '@/app/_ui/stave-order';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readTimeline } from '@/src/data/plan/read';
import { knownStamp } from '@/src/data/session/stamp';
import { networkOf } from '@/src/data/station/read';
import { readSlots } from '@/src/data/slot/read';
import { checkPlan } from '@/src/schedule/checks';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { currentViewer } from '@/src/viewer/current-viewer';
import { SessionFrame } from '../_head/session-frame';
import { planContextOf } from '../../_plan/plan-context';
import { Slots } from './_slots/slots';
import './_slots/slots.css';

export const metadata: Metadata = { title: 'Slots' };

type Props = {
  params: Promise<{ sessionId: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

export default async function SlotsPage({ params, searchParams }: Props) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const { sessionId } = await params;
  // first, so that what changes while the page is made is not missed
  const stamp = await knownStamp(viewer, sessionId, 'all');
  const answer = await readSlots(viewer, sessionId);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { board } = answer;
  const { station } = await searchParams;
  const draft = board.canOffer ? await readTimeline(viewer, sessionId) : null;
  const toFix = draft?.ok
    ? checkPlan(unpackPlan(draft.timeline.plan), planContextOf(draft.timeline)).filter(
        ({ severity }) => severity === 'fix',
      ).length
    : 0;
  const codes = staveOrder(await networkOf(viewer))
    .map(({ code }) => code)
    .filter((code) => board.session.stations.includes(code));
  return (
    <SessionFrame viewer={viewer} session={board.session} nowMs={board.nowMs}>
      <Slots
        board={board}
        codes={codes}
        stamp={stamp}
        toFix={toFix}
        station={typeof station === 'string' ? station : null}
      />
    </SessionFrame>
  );
}
