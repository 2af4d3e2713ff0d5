'use client';

import { lazy, Suspense, useSyncExternalStore } from 'react';
import { isToastWaiting, onFirstToast } from './toast';

const ToastRegion = lazy(() => import('./toast-region'));

/** Nothing is loaded until the first toast. */
export function Toaster() {
  const isWanted = useSyncExternalStore(onFirstToast, isToastWaiting, () => false);
  if (!isWanted) return null;
  return (
    <Suspense>
      <ToastRegion />
    </Suspense>
  );
}
