import type { ReactNode } from 'react';

/** What is wider than its column scrolls by itself, by keyboard too. */
export function Scroll({
  label,
  className = '',
  children,
}: {
  label: string;
  className?: string;
  children: ReactNode;
}) {
  return (
    <div className={`block-scroll ${className}`} role="group" aria-label={label} tabIndex={0}>
      {children}
    </div>
  );
}
