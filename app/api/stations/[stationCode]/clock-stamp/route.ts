import { respond } from '@/app/api/_http/respond';
import { readClockStamp } from '@/src/data/clock/stamp';

export function GET(request: Request, { params }: { params: Promise<{ stationCode: string }> }) {
  return respond(request, async (viewer) => readClockStamp(viewer, (await params).stationCode));
}
