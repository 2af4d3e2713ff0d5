'use client';

import { useTransition } from 'react';
import { setTheme } from '@/app/(auth)/theme-action';

/** Names the other theme; which one that is, is known to CSS alone while the device decides. */
export function ThemeSwitch() {
  const [isPending, startTransition] = useTransition();

  function change() {
    const root = document.documentElement;
    const other = getComputedStyle(root).colorScheme === 'dark' ? 'day' : 'night';
    root.dataset.theme = other;
    startTransition(async () => {
      await setTheme(other);
    });
  }

  return (
    <button
      type="button"
      className="link"
      onClick={change}
      aria-disabled={isPending}
      title="Change to the other theme"
    >
      <span className="in-day">Night</span>
      <span className="in-night">Day</span>
    </button>
  );
}
