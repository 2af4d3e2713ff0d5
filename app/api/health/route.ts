import { logUnexpected } from '@/src/log';
import { readHealth } from '@/src/data/health/read';

export const dynamic = 'force-dynamic';

export async function GET(): Promise<Response> {
  const headers = { 'cache-control': 'no-store' };
  try {
    return Response.json(await readHealth(), { headers });
  } catch (error) {
    const id = logUnexpected(error, { path: '/api/health' });
    const message = 'The database does not answer.';
    return Response.json({ ok: false, code: 'unexpected', message, id }, { status: 503, headers });
  }
}
