import 'server-only';
import { db } from '../../../db/client';
import { can, type Viewer } from '../../access/policy';
import { skyTable, type SkyTable } from '../../schedule/sky-table';
import { answer, forbiddenFor, type Failure } from '../errors';
import { readSources, readStations } from '../plan/context';
import { fetchSession, subjectOf } from '../session/scope';

/** Elevations, windows and common windows of a session's sources over its span. */
export const readSky = (viewer: Viewer, key: string): Promise<{ ok: true; table: SkyTable } | Failure> =>
  answer(async () => {
    const session = await fetchSession(db(), viewer, key);
    if (!can(viewer, 'plan.read-draft', subjectOf(session))) throw forbiddenFor('plan.read-draft');
    const { id, startMs, lengthSeconds, minElevationDeg, stations } = session;
    const span = { start: new Date(startMs), end: new Date(startMs + lengthSeconds * 1000) };
    const sources = await readSources(db(), id);
    return {
      ok: true,
      table: skyTable(await readStations(db(), stations), sources, { minElevationDeg }, span),
    };
  });
