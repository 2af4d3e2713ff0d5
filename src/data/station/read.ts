import 'server-only';
import { asc, inArray } from 'drizzle-orm';
import { db } from '../../../db/client';
import { stations } from '../../../db/schema/stations';
import { can, type Viewer } from '../../access/policy';
import { answer, forbiddenFor, type Failure } from '../errors';

export type StationListItem = { code: string; name: string; site: { longitudeDeg: number } };

/** The stations of these codes, as lists of sessions name them. */
export const listStations = (
  viewer: Viewer,
  codes: readonly string[],
): Promise<{ ok: true; stations: StationListItem[] } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const rows = await db()
      .select({ code: stations.code, name: stations.name, longitudeDeg: stations.longitudeDeg })
      .from(stations)
      .where(inArray(stations.code, [...codes]))
      .orderBy(asc(stations.code));
    return {
      ok: true,
      stations: rows.map(({ code, name, longitudeDeg }) => ({ code, name, site: { longitudeDeg } })),
    };
  });
