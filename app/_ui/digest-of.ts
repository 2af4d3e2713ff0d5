/** What the framework calls an error of the server, here and in its log; null for one of the browser. */
export function digestOf(error: unknown): string | null {
  if (typeof error !== 'object' || error === null || !('digest' in error)) return null;
  return typeof error.digest === 'string' ? error.digest : null;
}
