import { respond } from '@/app/api/_http/respond';
import { readJournal } from '@/src/data/plan/read';

export function GET(request: Request, { params }: { params: Promise<{ sessionId: string }> }) {
  return respond(request, async (viewer) => {
    const { sessionId } = await params;
    return readJournal(viewer, sessionId, new URL(request.url).searchParams.get('after'));
  });
}
