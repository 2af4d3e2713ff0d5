import type { Instrumentation } from 'next';

export async function register() {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { env } = await import('./src/env');
  const { log } = await import('./src/log');
  const { isDemo, isLocalFile } = env();
  log().info({ isDemo, isLocalFile }, 'starting');
}

export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { logUnexpected } = await import('./src/log');
  logUnexpected(error, {
    method: request.method,
    path: request.path.split('?')[0],
    route: context.routePath,
  });
};
