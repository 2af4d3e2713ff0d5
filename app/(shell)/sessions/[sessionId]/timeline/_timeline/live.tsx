'use client';

import useSWR from 'swr';
import { liveKeys } from '@/app/_ui/live-keys';
import type { Sender } from './sender';

const EVERY_MS = 2000;

/** Others' changes: the plan catches up with the journal every two seconds, on focus and when the line is back. */
export default function Live({ sessionId, sender }: { sessionId: string; sender: Sender }) {
  useSWR(liveKeys.journal(sessionId), () => sender.catchUp(), {
    refreshInterval: EVERY_MS,
    revalidateOnMount: true,
    dedupingInterval: 500,
  });
  return null;
}
