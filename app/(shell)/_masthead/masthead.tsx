import Link from 'next/link';
import { Mark } from '@/app/_ui/mark';
import { UtClock } from '@/app/_ui/ut-clock';
import type { Viewer } from '@/src/access/policy';
import { Account } from './account';
import { navFor, type Place } from './nav';
import { NavLinks } from './nav-links';

export type MastheadProps = {
  viewer: Viewer;
  /** the server's now */
  nowMs: number;
  place: Place;
  /** inside a session: its title, and code, version, state, length and start */
  title?: string;
  sub?: string;
};

export function Masthead({ viewer, nowMs, place, title, sub }: MastheadProps) {
  const items = navFor(viewer, place);
  return (
    <header className="mast">
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <Link
        href="/"
        title="Where your work begins"
        className={place.kind === 'network' ? 'mast-logo mast-logo-margin' : 'mast-logo'}
      >
        <Mark />
        <span>Antiphon</span>
      </Link>
      <div className="mast-title">
        {title !== undefined && <b title={title}>{title}</b>}
        {sub !== undefined && <span title={sub}>{sub}</span>}
      </div>
      {items.length > 0 && <NavLinks items={items} />}
      <div className="mast-who">
        <UtClock nowMs={nowMs} />
        <Account viewer={viewer} />
      </div>
    </header>
  );
}
