'use client';

import Link from 'next/link';
import { useParams } from 'next/navigation';
import { EmptySheet } from './empty-sheet';

const LONGEST_SHOWN = 40;

/** Says which session or page is not there; what may not be seen is said in the same words. */
export function NothingHere({ codes }: { codes?: readonly string[] }) {
  const { sessionId } = useParams<{ sessionId?: string }>();
  const name = sessionId === undefined ? null : readable(sessionId).slice(0, LONGEST_SHOWN);
  return (
    <EmptySheet
      codes={codes}
      heading={name === null ? 'There is no page at this address' : `There is no session ${name}`}
      actions={
        <>
          <Link href="/sessions" className="btn btn-primary">
            Sessions
          </Link>
          {name !== null && (
            <Link href={{ pathname: '/sessions', query: { find: name } }} className="btn">
              Find {name}
            </Link>
          )}
        </>
      }
    >
      {name === null
        ? 'The address may have a wrong letter. What you may not see is said in the same words.'
        : 'The address may have a wrong letter, or the session was never made. What you may not see is said in the same words.'}
    </EmptySheet>
  );
}

function readable(segment: string): string {
  try {
    return decodeURIComponent(segment);
  } catch (error) {
    if (error instanceof URIError) return segment;
    throw error;
  }
}
