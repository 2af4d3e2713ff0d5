import { respond } from '@/app/api/_http/respond';
import { readNearby } from '@/src/data/sky/nearby';

/** `?source=ID&within=DEGREES` */
export function GET(request: Request, { params }: { params: Promise<{ sessionId: string }> }) {
  return respond(request, async (viewer) => {
    const query = Object.fromEntries(new URL(request.url).searchParams);
    return readNearby(viewer, (await params).sessionId, query);
  });
}
