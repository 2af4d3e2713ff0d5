import type { Viewer } from '@/src/access/policy';
import type { Failure } from '@/src/data/errors';

/** For actions: runs a verb for who is signed in, or says that nobody is. */
export async function asViewer<T extends { ok: true }>(
  viewer: Viewer | null,
  run: (viewer: Viewer) => Promise<T | Failure>,
): Promise<T | Failure> {
  if (viewer) return run(viewer);
  return {
    ok: false,
    code: 'unauthenticated',
    message: 'The login has ended. Sign in in another window, then keep this again.',
  };
}
