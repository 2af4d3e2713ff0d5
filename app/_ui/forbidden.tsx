import Link from 'next/link';
import { ROLES, roleLabel, whoCanGrant, type Verb, type Viewer } from '@/src/access/policy';
import { BareFrame } from './bare-frame';
import { EmptySheet } from './empty-sheet';
import { staveOrder } from './stave-order';

type ForbiddenProps = {
  verb: Verb;
  viewer: Viewer | null;
  /** of the network, so that its staves can be named */
  stations: readonly { code: string; site: { longitudeDeg: number } }[];
};

/** A page that the viewer's roles have no part in: which right it takes, and who can give it. */
export function Forbidden({ verb, viewer, stations }: ForbiddenProps) {
  const { heading, message } = whoCanGrant(verb);
  const grants = ROLES.flatMap((role) => viewer?.grants.filter((grant) => grant.role === role) ?? []);
  const labels = [...new Set(grants.map(roleLabel))];
  return (
    <BareFrame status="403">
      <EmptySheet
        heading={heading}
        codes={staveOrder(stations).map(({ code }) => code)}
        actions={
          <Link href="/sessions" className="btn btn-primary">
            Sessions
          </Link>
        }
      >
        {labels.length > 0 ? (
          <>
            You are signed in as <b>{labels.join(', ')}</b>.{' '}
          </>
        ) : (
          'You have no role yet. '
        )}
        {message}
      </EmptySheet>
    </BareFrame>
  );
}
