import { readJson, requireSameOrigin } from '@/app/api/_http/request-guard';
import { respond } from '@/app/api/_http/respond';
import { takeAct } from '@/src/data/plan/write';

export function POST(request: Request, { params }: { params: Promise<{ sessionId: string }> }) {
  return respond(request, async (viewer) => {
    requireSameOrigin(request);
    const { sessionId } = await params;
    return takeAct(viewer, sessionId, await readJson(request));
  });
}
