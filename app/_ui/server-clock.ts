'use client';

import { useEffect, useSyncExternalStore } from 'react';

let offsetMs: number | null = null;
const listeners = new Set<() => void>();

/** The server's now as this browser knows it; before the first page told it, its own. */
export const serverNowMs = (): number => Date.now() + (offsetMs ?? 0);

/** The server's now, renewed each second; at first what the page was made with. */
export function useServerSecond(pageNowMs: number): number {
  const isHydrating = useSyncExternalStore(never, isFalse, isTrue);
  useEffect(() => noteServerNow(pageNowMs, isHydrating ? arrivalMs() : Date.now()), [pageNowMs, isHydrating]);
  return useSyncExternalStore(
    subscribe,
    () => wholeSecond(offsetMs === null ? pageNowMs : serverNowMs()),
    () => wholeSecond(pageNowMs),
  );
}

/** A page is late, never early: of all differences the largest is the nearest. */
function noteServerNow(nowMs: number, receivedMs: number): void {
  const candidate = nowMs - receivedMs;
  if (offsetMs !== null && candidate <= offsetMs) return;
  offsetMs = candidate;
  listeners.forEach((listener) => listener());
}

function arrivalMs(): number {
  const [load] = performance.getEntriesByType('navigation');
  const responseStart = load instanceof PerformanceNavigationTiming ? load.responseStart : 0;
  return responseStart > 0 ? performance.timeOrigin + responseStart : Date.now();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  let timer = 0;
  const next = () => {
    listener();
    timer = window.setTimeout(next, 1000 - (((serverNowMs() % 1000) + 1000) % 1000) + 5);
  };
  next();
  return () => {
    window.clearTimeout(timer);
    listeners.delete(listener);
  };
}

const wholeSecond = (ms: number) => Math.floor(ms / 1000) * 1000;
const never = () => () => undefined;
const isFalse = () => false;
const isTrue = () => true;
