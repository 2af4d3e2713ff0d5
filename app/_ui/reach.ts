import { unstable_rethrow } from 'next/navigation';
import { errorIdOf } from '@/src/error-id';
import { digestOf } from './digest-of';

/** Nothing that the server said: the line failed, or the server did. */
export type Unreached = { ok: false; message: string; fields?: undefined };

/** An act's answer; where none came back, what to say of it. What was typed stays where it is. */
export async function reach<Answer>(act: () => Promise<Answer>): Promise<Answer | Unreached> {
  try {
    return await act();
  } catch (error) {
    unstable_rethrow(error);
    return { ok: false, message: unreachedText(error) };
  }
}

function unreachedText(error: unknown): string {
  if (error instanceof TypeError)
    return 'There is no line. What you typed is kept: send it again when the line is back.';
  const digest = digestOf(error);
  const id = digest === null ? '' : ` If it happens again, give ${errorIdOf(digest)} to the administrator.`;
  return `The server could not finish this. What you typed is kept: send it again.${id}`;
}
