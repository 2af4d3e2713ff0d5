'use client';

export type Toast = {
  message: string;
  /** one thing to do about it, such as Undo */
  action?: { label: string; run: () => void };
};

type Show = (toast: Toast) => void;

let show: Show | null = null;
let waiting: Toast | null = null;
const wanted = new Set<() => void>();

/** What happened, in one sentence; the newest takes the place of the one before. Errors stand where the work is, not here. */
export function showToast(toast: Toast): void {
  if (show) return show(toast);
  waiting = toast;
  wanted.forEach((listener) => listener());
}

/** For the Toaster: told once a first toast waits. */
export function onFirstToast(listener: () => void): () => void {
  wanted.add(listener);
  return () => wanted.delete(listener);
}

export const isToastWaiting = (): boolean => waiting !== null || show !== null;

/** For the Toaster: from now on it shows. */
export function setToastDoor(door: Show | null): void {
  show = door;
  if (door && waiting) door(waiting);
  if (door) waiting = null;
}

let hide: (() => void) | null = null;

/** Takes the toast away: what it said is no longer so. */
export function hideToast(): void {
  waiting = null;
  hide?.();
}

/** For the Toaster: how a toast is taken away. */
export function setToastEnd(end: (() => void) | null): void {
  hide = end;
}
