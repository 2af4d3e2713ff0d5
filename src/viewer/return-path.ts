/** Where to go after sign-in: a path of this site (one leading slash), else the fallback. */
export function safeReturnPath(asked: unknown, fallback = '/'): string {
  if (typeof asked !== 'string') return fallback;
  return /^\/(?![/\\])[^\\\u0000-\u0020\u007f]*$/.test(asked) ? asked : fallback;
}
