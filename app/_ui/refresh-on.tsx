'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useRef } from 'react';
import useSWR from 'swr';

const EVERY_MS = 3000;

type Props = {
  address: string;
  /** the stamp that the page was made with; without it the first that is read counts as such */
  known?: string;
};

/** Reads the page anew when others changed what it shows: the address answers another stamp then. */
export default function RefreshOn({ address, known }: Props) {
  const router = useRouter();
  const seen = useRef<string | null>(known ?? null);
  const { data: stamp } = useSWR(address, readStamp, { refreshInterval: EVERY_MS, dedupingInterval: 500 });
  useEffect(() => {
    if (stamp === undefined || stamp === null) return;
    if (seen.current !== null && seen.current !== stamp) router.refresh();
    seen.current = stamp;
  }, [stamp, router]);
  return null;
}

async function readStamp(address: string): Promise<string | null> {
  const response = await fetch(address, { cache: 'no-store' });
  return response.ok ? ((await response.json()) as { stamp: string }).stamp : null;
}
