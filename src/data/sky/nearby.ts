import 'server-only';
import { and, inArray, isNull, ne } from 'drizzle-orm';
import { z } from 'zod';
import { db } from '../../../db/client';
import { sourceBands } from '../../../db/schema/source-bands';
import { sources } from '../../../db/schema/sources';
import { can, type Viewer } from '../../access/policy';
import { nearby, sharedPart, type Near } from '../../schedule/nearby';
import { skyStation } from '../../schedule/sky-station';
import { spansOf } from '../../sky/interval-set';
import { windowsFor } from '../../sky/windows';
import { answer, forbiddenFor, notFound, type Failure } from '../errors';
import { parsed } from '../input';
import { componentsOf, readModes, readSources, readStations } from '../plan/context';
import { fluxOf } from '../plan/flux';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import type { Nearby, NearbySource } from './dto';
import { isEnded } from '../../schedule/ended';

/** More than this nobody reads. */
const NEARBY_MOST = 40;

const wanted = z.strictObject({
  source: z.string().max(32),
  within: z.coerce
    .number('Type degrees, for example 10.')
    .gt(0, 'Type degrees above 0.')
    .max(180, 'Nothing is farther away than 180°.'),
});

/** Calibrators of the catalogue around one of the session's sources. */
export const readNearby = (
  viewer: Viewer,
  key: string,
  query: unknown,
): Promise<{ ok: true; nearby: Nearby } | Failure> =>
  answer(async () => {
    const { source: sourceId, within } = parsed(wanted, query);
    const session = await fetchSession(db(), viewer, key);
    if (!can(viewer, 'plan.read-draft', subjectOf(session))) throw forbiddenFor('plan.read-draft');
    const own = await readSources(db(), session.id);
    const target = own.find(({ id }) => id === sourceId);
    if (!target) throw notFound(`That source is not one of ${session.code}’s.`);
    const found = nearby(target.position, await readCalibrators(sourceId), within);
    const kept = found.slice(0, NEARBY_MOST);
    const isOver = isEnded(session.state);
    return {
      ok: true,
      nearby: {
        withinDeg: within,
        sources: await weighed(session, target.position, kept, new Set(own.map(({ id }) => id))),
        more: found.length - kept.length,
        canAdd: !isOver && can(viewer, 'session.edit', subjectOf(session)),
      },
    };
  });

type Calibrator = Awaited<ReturnType<typeof readCalibrators>>[number];

async function readCalibrators(exceptId: string) {
  const rows = await db()
    .select({
      id: sources.id,
      name: sources.name,
      role: sources.role,
      raDeg: sources.raDeg,
      decDeg: sources.decDeg,
    })
    .from(sources)
    .where(and(ne(sources.role, 'target'), ne(sources.id, exceptId), isNull(sources.retiredAtMs)));
  return rows.map(({ raDeg, decDeg, ...row }) => ({ ...row, position: { raDeg, decDeg } }));
}

async function weighed(
  session: SessionRow,
  target: Calibrator['position'],
  found: readonly Near<Calibrator>[],
  own: ReadonlySet<string>,
): Promise<NearbySource[]> {
  const { startMs, lengthSeconds, minElevationDeg } = session;
  const stations = await readStations(db(), session.stations);
  const mode = (await readModes(db())).find(({ id }) => id === session.modeId);
  const [ofTarget = [], ...ofOthers] = windowsFor(
    [target, ...found.map(({ source }) => source.position)],
    stations.map((station) => skyStation(station, { minElevationDeg })),
    { start: new Date(startMs), end: new Date(startMs + lengthSeconds * 1000) },
  ).map((byStation) => byStation.map(spansOf));
  const bands = await db()
    .select()
    .from(sourceBands)
    .where(
      inArray(
        sourceBands.sourceId,
        found.map(({ source }) => source.id),
      ),
    );
  return found.map(({ source: { id, name, role }, separationDeg, positionAngleDeg }, index) => {
    const components = Object.fromEntries(
      bands.filter(({ sourceId }) => sourceId === id).map((band) => [band.band, componentsOf(band)]),
    );
    return {
      id,
      name,
      role,
      fluxJy: fluxOf({ components }, mode?.band),
      separationDeg,
      positionAngleDeg,
      upToo: sharedPart(ofTarget, ofOthers[index] ?? []),
      isInSession: own.has(id),
    };
  });
}
