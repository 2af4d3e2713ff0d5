import { readJson, requireSameOrigin } from '@/app/api/_http/request-guard';
import { respond } from '@/app/api/_http/respond';
import { sayOutcome } from '@/src/data/outcome/write';

type Params = { params: Promise<{ sessionId: string; stationCode: string }> };

export function POST(request: Request, { params }: Params) {
  return respond(request, async (viewer) => {
    requireSameOrigin(request);
    const { sessionId, stationCode } = await params;
    return sayOutcome(viewer, sessionId, stationCode, await readJson(request));
  });
}
