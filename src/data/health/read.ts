import 'server-only';
import { database } from '../../../db/client';

/** Throws where the database does not answer. */
export async function readHealth(): Promise<{ ok: true; database: 'answers' }> {
  await database().client.execute('SELECT 1');
  return { ok: true, database: 'answers' };
}
