import 'server-only';
import { createHash } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { clockEvents } from '../../../db/schema/clock-events';
import { clockReadings } from '../../../db/schema/clock-readings';
import { journal } from '../../../db/schema/journal';
import { mailOutbox } from '../../../db/schema/mail-outbox';
import { modes } from '../../../db/schema/modes';
import { offers } from '../../../db/schema/offers';
import { sessionComments } from '../../../db/schema/session-comments';
import { sessions } from '../../../db/schema/sessions';
import { slotReplies } from '../../../db/schema/slot-replies';
import { sources } from '../../../db/schema/sources';
import { stations } from '../../../db/schema/stations';

/** Changes whenever something changed that a list of the network shows; it tells nothing of what. */
export async function readNetworkStamp(): Promise<string> {
  const [row] = await db().all<{ stamp: string }>(sql`
    SELECT (SELECT coalesce(max(seq), 0) FROM ${slotReplies})
      || '.' || (SELECT count(*) || '.' || coalesce(sum(rev), 0) FROM ${sessions})
      || '.' || (SELECT coalesce(max(rowid), 0) FROM ${journal})
      || '.' || (SELECT count(*) FROM ${offers})
      || '.' || (SELECT count(*) FROM ${sessionComments})
      || '.' || (SELECT count(*) || '.' || coalesce(max(entered_at_ms), 0) || '.' || coalesce(max(set_aside_at_ms), 0)
          || '.' || count(CASE WHEN state = 'used' THEN 1 END) FROM ${clockReadings})
      || '.' || (SELECT count(*) FROM ${clockEvents})
      || '.' || (SELECT count(*) || '.' || count(sent_at_ms) FROM ${mailOutbox})
      || '.' || (SELECT count(*) || '.' || count(retired_at_ms) FROM ${stations})
      || '.' || (SELECT count(*) || '.' || count(retired_at_ms) FROM ${sources})
      || '.' || (SELECT count(*) || '.' || count(retired_at_ms) FROM ${modes}) AS stamp`);
  if (!row) throw new Error('The network gave no stamp.');
  return createHash('sha256').update(row.stamp).digest('base64url').slice(0, 16);
}
