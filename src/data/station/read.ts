import 'server-only';
import { asc, inArray } from 'drizzle-orm';
import { db } from '../../../db/client';
import { stations } from '../../../db/schema/stations';
import { can, whoCanGrant, type Viewer } from '../../access/policy';
import { answer, forbidden, type Failure } from '../errors';

export type StationListItem = { code: string; name: string; site: { longitudeDeg: number } };

/** The stations of these codes, as lists of sessions name them. */
export const listStations = (
  viewer: Viewer,
  codes: readonly string[],
): Promise<{ ok: true; stations: StationListItem[] } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) {
      const { heading, message } = whoCanGrant('catalogue.read');
      throw forbidden(`${heading}. ${message}`);
    }
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
