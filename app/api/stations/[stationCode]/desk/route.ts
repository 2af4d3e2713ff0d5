import { respond } from '@/app/api/_http/respond';
import { readDesk } from '@/src/data/desk/read';

export function GET(request: Request, { params }: { params: Promise<{ stationCode: string }> }) {
  return respond(request, async (viewer) => readDesk(viewer, (await params).stationCode));
}
