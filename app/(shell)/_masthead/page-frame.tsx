import type { ReactNode } from 'react';
import { Masthead, type MastheadProps } from './masthead';

/** Masthead and one main part under it, at least as high as the screen. */
export function PageFrame({ children, ...masthead }: MastheadProps & { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <Masthead {...masthead} />
      <main id="main" className="flex min-h-0 flex-1 flex-col">
        {children}
      </main>
    </div>
  );
}
