'use client';

import { errorIdOf } from '@/src/error-id';
import { CopyText } from './copy-text';
import { digestOf } from './digest-of';
import { EmptySheet } from './empty-sheet';

/** An error nobody expected: with its id where the server has logged it. */
export function Broken({ error, retry }: { error: unknown; retry: () => void }) {
  const digest = digestOf(error);
  return (
    <EmptySheet
      isBroken
      heading={digest === null ? 'This page could not go on' : 'The server could not finish this'}
      actions={
        <>
          <button type="button" className="btn btn-primary" onClick={retry}>
            Try again
          </button>
          <form action="/">
            <button type="submit" className="btn">
              Sessions
            </button>
          </form>
        </>
      }
    >
      {digest === null ? (
        <p>Something in the browser stopped it. What was saved is safe. Try again, or load the page anew.</p>
      ) : (
        <>
          <p>
            This page was not made. If it happens again, give this id to the administrator; it stands in the
            log.
          </p>
          <p className="error-id">
            <CopyText text={errorIdOf(digest)} />
          </p>
        </>
      )}
    </EmptySheet>
  );
}
