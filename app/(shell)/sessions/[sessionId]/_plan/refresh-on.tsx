'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useRef } from 'react';
import useSWR from 'swr';
import { liveKeys } from '@/app/_ui/live-keys';
import type { SessionStamp } from '@/src/data/session/stamp';

const EVERY_MS = 3000;

/** Reads the page anew when others changed what it shows: the stations' word, and the plan too where it says so. */
export default function RefreshOn({ sessionId, withPlan }: { sessionId: string; withPlan: boolean }) {
  const router = useRouter();
  const seen = useRef<string | null>(null);
  const { data } = useSWR(liveKeys.stamp(sessionId), readStamp, {
    refreshInterval: EVERY_MS,
    dedupingInterval: 500,
  });
  useEffect(() => {
    if (!data) return;
    const stamp = withPlan ? `${data.plan} ${data.stations}` : data.stations;
    if (seen.current !== null && seen.current !== stamp) router.refresh();
    seen.current = stamp;
  }, [data, withPlan, router]);
  return null;
}

async function readStamp(address: string): Promise<SessionStamp | null> {
  const response = await fetch(address, { cache: 'no-store' });
  return response.ok ? ((await response.json()) as SessionStamp) : null;
}
