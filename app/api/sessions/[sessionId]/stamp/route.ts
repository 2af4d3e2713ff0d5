import { respond } from '@/app/api/_http/respond';
import { readStamp, stampText } from '@/src/data/session/stamp';

/** `?of=stations` leaves the plan out: for a page that follows the journal itself. */
export function GET(request: Request, { params }: { params: Promise<{ sessionId: string }> }) {
  return respond(request, async (viewer) => {
    const answer = await readStamp(viewer, (await params).sessionId);
    if (!answer.ok) return answer;
    const of = new URL(request.url).searchParams.get('of') === 'stations' ? 'stations' : 'all';
    return { ok: true, stamp: stampText(answer, of) };
  });
}
