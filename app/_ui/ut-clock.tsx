'use client';

import { clockText } from '@/src/schedule/words';
import { dayText } from './format';
import { useServerSecond } from './server-clock';

/** UT with day of year, ticking; not read out by itself. */
export function UtClock({ nowMs }: { nowMs: number }) {
  const ms = useServerSecond(nowMs);
  return (
    <div className="mast-clock" role="timer" aria-label="UT">
      <b>{clockText(ms)}</b>
      <span>UT · day {dayText(ms)}</span>
    </div>
  );
}
