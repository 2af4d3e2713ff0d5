import 'server-only';
import pino, { type Logger } from 'pino';
import { env } from './env';
import { errorIdOf } from './error-id';

let instance: Logger | undefined;

export const log = (): Logger => (instance ??= pino({ level: env().logLevel }));

/** Writes an unexpected error to the log; the id it answers is the one to show. */
export function logUnexpected(error: unknown, where: Record<string, unknown> = {}): string {
  const id = errorIdOf(digestOf(error) ?? crypto.randomUUID());
  log().error({ err: error, errorId: id, ...where }, 'unexpected error');
  return id;
}

function digestOf(error: unknown): string | undefined {
  if (typeof error !== 'object' || error === null || !('digest' in error)) return undefined;
  return typeof error.digest === 'string' ? error.digest : undefined;
}
