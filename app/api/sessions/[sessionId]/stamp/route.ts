import { respond } from '@/app/api/_http/respond';
import { readStamp } from '@/src/data/session/stamp';

export function GET(request: Request, { params }: { params: Promise<{ sessionId: string }> }) {
  return respond(request, async (viewer) => readStamp(viewer, (await params).sessionId));
}
