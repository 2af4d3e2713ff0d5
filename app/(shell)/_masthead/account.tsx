import { signOut } from '@/app/(auth)/sign-in/actions';
import { ROLES, roleLabel, type Viewer } from '@/src/access/policy';
import { ThemeSwitch } from './theme-switch';

/** The role, the other theme's name, and under the role the way out. */
export function Account({ viewer }: { viewer: Viewer }) {
  const grants = ROLES.flatMap((role) => viewer.grants.filter((grant) => grant.role === role));
  const labels = [...new Set(grants.map(roleLabel))];
  return (
    <div className="mast-role">
      <button type="button" className="mast-role-name" popoverTarget="account" aria-haspopup="dialog">
        {labels[0] ?? 'No role yet'}
        <svg width="7" height="5" viewBox="0 0 7 5" aria-hidden="true">
          <path d="M0 0h7L3.5 5z" fill="currentColor" />
        </svg>
      </button>
      <div className="from-narrow">
        <ThemeSwitch />
      </div>
      <div id="account" popover="auto" role="dialog" aria-label="Account" className="float account">
        <p className="text-small text-ink2">Signed in as</p>
        <p className="break-words font-strong">{viewer.email}</p>
        {labels.length > 1 && <p className="mt-1 text-small text-ink2">{labels.join(', ')}</p>}
        <div className="until-narrow">
          Theme: <ThemeSwitch />
        </div>
        <form action={signOut} className="mt-2.5">
          <button type="submit" className="btn w-full">
            Sign out
          </button>
        </form>
      </div>
    </div>
  );
}
