'use client';

import { beginsText } from '@/app/_ui/format';
import { useServerSecond } from '@/app/_ui/server-clock';

type BeginsProps = { startMs: number; lengthSeconds: number; nowMs: number };

export function Begins({ startMs, lengthSeconds, nowMs }: BeginsProps) {
  return beginsText(startMs, lengthSeconds, useServerSecond(nowMs));
}
