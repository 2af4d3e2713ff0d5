import 'server-only';
import { sql } from 'drizzle-orm';
import { db } from '../../../db/client';
import { clockEvents } from '../../../db/schema/clock-events';
import { clockReadings } from '../../../db/schema/clock-readings';
import type { Viewer } from '../../access/policy';
import { answer, type Failure } from '../errors';
import { fetchStation } from './read';

/** Changes whenever a station's clock log did. */
export const readClockStamp = (
  viewer: Viewer,
  code: string,
): Promise<{ ok: true; stamp: string } | Failure> =>
  answer(async () => {
    const station = await fetchStation(db(), viewer, code);
    const [row] = await db().all<{ stamp: string }>(sql`
      SELECT (SELECT count(*) || '.' || coalesce(max(entered_at_ms), 0) || '.' || coalesce(max(set_aside_at_ms), 0)
          || '.' || count(CASE WHEN state = 'used' THEN 1 END)
        FROM ${clockReadings} WHERE station_code = ${station.code})
        || '.' || (SELECT count(*) FROM ${clockEvents} WHERE station_code = ${station.code}) AS stamp`);
    return { ok: true, stamp: row?.stamp ?? '' };
  });
