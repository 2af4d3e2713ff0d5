'use client';

import { useEffect, useState } from 'react';
import { viewEndMs, xOf, type Frame } from './scale';
import { useTimeline } from './store';

const TICK_MS = 10_000;

/** Where the present is, in vermilion; the server's now moved on by this browser's clock. */
export function NowLine({ frame }: { frame: Frame }) {
  const serverNowMs = useTimeline((state) => state.context.nowMs);
  const [elapsedMs, setElapsedMs] = useState(0);
  useEffect(() => {
    const started = performance.now();
    const timer = setInterval(() => setElapsedMs(performance.now() - started), TICK_MS);
    return () => clearInterval(timer);
  }, []);
  const nowMs = serverNowMs + elapsedMs;
  if (nowMs < frame.view.startMs || nowMs > viewEndMs(frame.view)) return null;
  const x = xOf(frame, nowMs);
  return <line x1={x} x2={x} y1={22} y2={frame.fringeBase} stroke="var(--verm)" strokeWidth={1.5} />;
}
