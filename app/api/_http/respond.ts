import type { Viewer } from '@/src/access/policy';
import { Refusal, unexpected, type Failure, type FailureCode } from '@/src/data/errors';
import { currentViewer } from '@/src/viewer/current-viewer';

const STATUS: Readonly<Record<FailureCode, number>> = {
  invalid: 422,
  unauthenticated: 401,
  forbidden: 403,
  not_found: 404,
  conflict: 409,
  unexpected: 500,
};

/** Answers a verb as JSON, for the one signed in; whatever is thrown becomes a value with an id. */
export async function respond(
  request: Request,
  run: (viewer: Viewer) => Promise<{ ok: true } | Failure>,
): Promise<Response> {
  try {
    const viewer = await currentViewer();
    const answer = viewer ? await run(viewer) : UNAUTHENTICATED;
    return json(answer);
  } catch (error) {
    if (error instanceof Refusal) return json(error.failure);
    const { pathname: path } = new URL(request.url);
    return json(unexpected(error, { method: request.method, path }));
  }
}

const UNAUTHENTICATED: Failure = {
  ok: false,
  code: 'unauthenticated',
  message: 'You are not signed in, or the login has ended. Sign in and try again.',
};

function json(answer: { ok: true } | Failure): Response {
  const status = answer.ok ? 200 : STATUS[answer.code];
  return Response.json(answer, { status, headers: { 'cache-control': 'no-store' } });
}
