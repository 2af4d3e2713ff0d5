import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readMailbox } from '@/src/data/mail/read';
import { nowMs } from '@/src/env';
import { readNetworkStamp } from '@/src/data/network/stamp';
import { currentViewer } from '@/src/viewer/current-viewer';
import { PageFrame } from '../_masthead/page-frame';
import { Mailbox } from './_mail/mailbox';
import './_mail/mail.css';

export const metadata: Metadata = { title: 'Mailbox' };

const WHY = {
  real: {
    heading: 'Mail goes to its service',
    text: 'This installation sends its messages for real, so none are kept here.',
  },
  silent: {
    heading: 'The local mail service does not answer',
    text: 'It is started together with the application. Messages are kept meanwhile: the slots page of a session names those that did not go out, and sends them again.',
  },
  none: {
    heading: 'No mail service is set up',
    text: 'Messages are kept. Set RESEND_API_KEY and start the application again; the slots page of a session then sends those that did not go out.',
  },
} as const;

export default async function MailPage() {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const known = await readNetworkStamp();
  const answer = await readMailbox(viewer);
  if (!answer.ok) {
    forbidden();
  }
  return (
    <PageFrame viewer={viewer} nowMs={nowMs()} place={{ kind: 'network' }}>
      <RefreshOn address={liveKeys.network} known={known} />
      {answer.isUp ? (
        <Mailbox messages={answer.messages} />
      ) : (
        <EmptySheet heading={WHY[answer.why].heading}>{WHY[answer.why].text}</EmptySheet>
      )}
    </PageFrame>
  );
}
