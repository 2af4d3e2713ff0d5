'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import type { NavItem } from './nav';

export function NavLinks({ items }: { items: readonly NavItem[] }) {
  const pathname = usePathname();
  return (
    <nav className="mast-nav" aria-label="Pages">
      {items.map(({ href, label }) => {
        const isCurrent = pathname === href || pathname.startsWith(`${href}/`);
        return (
          <Link key={href} href={href} aria-current={isCurrent ? 'page' : undefined}>
            {label}
          </Link>
        );
      })}
    </nav>
  );
}
