import 'server-only';
import { createHash } from 'node:crypto';
import { desc, eq } from 'drizzle-orm';
import type { Tx } from '../../../db/client';
import { offers } from '../../../db/schema/offers';
import { slots } from '../../../db/schema/slots';
import { unpackPlan } from '../../schedule/plan-rows';
import { slotsOf, type Slot } from '../../schedule/slots';
import { readModes, readSources, readStations } from '../plan/context';
import { readPlanRows } from '../plan/rows';
import { settingsOf } from '../plan/settings';
import type { SessionRow } from '../session/scope';
import type { StoredSnapshot } from './read';

export type OfferRow = typeof offers.$inferSelect;

/** Stores the plan as it stands, with its checksum, and the slot that it asks of each station. */
export async function saveOffer(
  tx: Tx,
  session: SessionRow,
  made: Pick<OfferRow, 'id' | 'kind' | 'madeAtMs' | 'madeBy' | 'answerByMs' | 'note'>,
): Promise<{ offer: OfferRow; slots: Slot[]; scanCount: number }> {
  const { plan: rows, seq } = await readPlanRows(tx, session);
  const stored: StoredSnapshot = {
    plan: rows,
    stations: await readStations(tx, session.stations),
    sources: await readSources(tx, session.id),
    modes: await readModes(tx),
    settings: settingsOf(session),
  };
  const snapshot = JSON.stringify(stored);
  const [last] = await tx
    .select({ number: offers.number })
    .from(offers)
    .where(eq(offers.sessionId, session.id))
    .orderBy(desc(offers.number))
    .limit(1);
  const [offer] = await tx
    .insert(offers)
    .values({
      ...made,
      sessionId: session.id,
      number: (last?.number ?? 0) + 1,
      snapshot,
      checksum: createHash('sha256').update(snapshot).digest('hex'),
      seq,
    })
    .returning();
  if (!offer) throw new Error('The offer gave no row back.');
  const plan = unpackPlan(rows);
  const asked = slotsOf(plan);
  if (asked.length > 0) {
    await tx.insert(slots).values(
      asked.map(({ station, startMs, endMs, modeIds }) => ({
        offerId: offer.id,
        stationCode: station,
        startMs,
        endMs,
        modes: JSON.stringify(modeIds),
      })),
    );
  }
  return { offer, slots: asked, scanCount: plan.scans.length };
}
