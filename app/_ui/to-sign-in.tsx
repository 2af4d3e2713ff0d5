'use client';

import type { Route } from 'next';
import { redirect, usePathname, useSearchParams } from 'next/navigation';

/** Sends to the sign-in page, which leads back to here. */
export function ToSignIn(): never {
  const pathname = usePathname();
  const query = useSearchParams().toString();
  const here = query === '' ? pathname : `${pathname}?${query}`;
  redirect(`/sign-in?next=${encodeURIComponent(here)}` as Route);
}
