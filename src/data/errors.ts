import 'server-only';
import { whoCanGrant, type Verb } from '../access/policy';
import { logUnexpected } from '../log';

export type FailureCode =
  'invalid' | 'unauthenticated' | 'forbidden' | 'not_found' | 'conflict' | 'unexpected';

/** An expected failure is a value: the message says what to do. */
export type Failure = {
  ok: false;
  code: FailureCode;
  message: string;
  fields?: Record<string, string[]>;
  /** of an unexpected error, as it stands in the log */
  id?: string;
};

/** Thrown inside a verb, so that its transaction rolls back; `answer` turns it into the value. */
export class Refusal<F extends Failure = Failure> extends Error {
  override name = 'Refusal';

  constructor(readonly failure: F) {
    super(failure.message);
  }
}

export const notFound = (message: string) => new Refusal({ ok: false, code: 'not_found', message });
export const forbidden = (message: string) => new Refusal({ ok: false, code: 'forbidden', message });
/** Refused by the policy: which right it takes, and who can give it. */
export function forbiddenFor(verb: Verb): Refusal {
  const { heading, message } = whoCanGrant(verb);
  return forbidden(`${heading}. ${message}`);
}

export const invalid = (message: string, fields?: Record<string, string[]>) =>
  new Refusal({ ok: false, code: 'invalid', message, ...(fields && { fields }) });

/** Runs a verb; a refusal comes back as its value, anything else is thrown on. */
export async function answer<T extends { ok: true }>(run: () => Promise<T>): Promise<T | Failure> {
  try {
    return await run();
  } catch (error) {
    if (error instanceof Refusal) return error.failure;
    throw error;
  }
}

/** For routes: what the client gets of an error that nobody expected. */
export function unexpected(error: unknown, where: Record<string, unknown>): Failure & { id: string } {
  const id = logUnexpected(error, where);
  const message = `The server could not finish this. Nothing was changed. Try again; if it happens again, give ${id} to the administrator.`;
  return { ok: false, code: 'unexpected', message, id };
}
