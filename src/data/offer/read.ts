import 'server-only';
import { desc, eq } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { offers } from '../../../db/schema/offers';
import type { PlanMode, PlanSettings } from '../../schedule/context';
import type { PlanRows } from '../../schedule/plan-rows';
import type { TimelineSource, TimelineStation } from '../plan/dto';
import type { OfferFacts } from '../slot/dto';

/** The plan and all that it was judged by, as they were when it was offered. */
export type StoredSnapshot = {
  plan: PlanRows;
  stations: TimelineStation[];
  sources: TimelineSource[];
  modes: PlanMode[];
  settings: PlanSettings;
};

export type Snapshot = StoredSnapshot &
  OfferFacts & {
    offerId: string;
    /** newest journal row that it holds */
    seq: number;
  };

/** What the stations were asked or told last; null before the first offer. */
export async function newestSnapshot(from: Database | Tx, sessionId: string): Promise<Snapshot | null> {
  const [row] = await from
    .select()
    .from(offers)
    .where(eq(offers.sessionId, sessionId))
    .orderBy(desc(offers.number))
    .limit(1);
  if (!row) return null;
  const { id: offerId, number, kind, madeAtMs, answerByMs, note, checksum, seq, snapshot } = row;
  return {
    ...(JSON.parse(snapshot) as StoredSnapshot),
    offerId,
    number,
    kind,
    madeAtMs,
    answerByMs,
    note,
    checksum,
    seq,
  };
}
