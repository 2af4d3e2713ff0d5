import { respond } from '@/app/api/_http/respond';
import { readNetworkStamp } from '@/src/data/network/stamp';

/** Of all that the lists of the network show. */
export function GET(request: Request) {
  return respond(request, async () => ({ ok: true, stamp: await readNetworkStamp() }));
}
