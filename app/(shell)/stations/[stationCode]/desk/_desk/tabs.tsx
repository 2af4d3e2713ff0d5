'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { usePathname } from 'next/navigation';

/** At the bottom of a phone, within a thumb's reach: the station's pages. */
export function Tabs({ code }: { code: string }) {
  const path = usePathname();
  const tabs = [
    ['Now', `/stations/${code}/desk`, 'M3 14h4M7 14V5h4M11 14V8h4'],
    ['Clock', `/stations/${code}/clock`, 'M9 2a7 7 0 1 0 .01 0M9 5v4l3 2'],
    ['Slots', '/slots', 'M3 3v12M15 3v12M6 7h6M6 11h4'],
  ] as const;
  return (
    <nav aria-label="Station" className="desk-tabs">
      {tabs.map(([label, href, drawing]) => (
        <Link key={label} href={href as Route} aria-current={path === href ? 'page' : undefined}>
          <svg
            width={20}
            height={18}
            viewBox="0 0 18 18"
            aria-hidden="true"
            fill="none"
            stroke="currentColor"
          >
            <path d={drawing} strokeWidth={1.6} />
          </svg>
          {label}
        </Link>
      ))}
    </nav>
  );
}
