import type { ReactNode } from 'react';
import { Mark } from './mark';

/** For pages that know nothing of the viewer: the mark, and what kind of answer this is. */
export function BareFrame({ status, children }: { status: string; children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="mast">
        <div className="mast-logo bare-logo">
          <Mark />
          <span>Antiphon</span>
        </div>
        <p className="ml-auto self-center px-6 text-small text-ink2">{status}</p>
      </header>
      <main id="main" className="flex min-h-0 flex-1 flex-col">
        {children}
      </main>
    </div>
  );
}
