import 'server-only';
import { and, asc, eq, gt, ne } from 'drizzle-orm';
import { db } from '../../../db/client';
import { sessionSources } from '../../../db/schema/session-sources';
import { sessions } from '../../../db/schema/sessions';
import { sourceBands } from '../../../db/schema/source-bands';
import { sources } from '../../../db/schema/sources';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { answer, forbiddenFor, type Failure } from '../errors';
import { readableBy } from '../session/scope';
import type { SourceDto, SourceRow } from './dto';
import { blocksOf, fetchSource } from './rows';

/** The whole catalogue by right ascension, the retired ones too. */
export const listSources = (
  viewer: Viewer,
): Promise<{ ok: true; sources: SourceRow[]; canAdd: boolean } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const rows = await db().select().from(sources).orderBy(asc(sources.raDeg), asc(sources.id));
    const bands = await db().select().from(sourceBands).orderBy(asc(sourceBands.band));
    const ahead = await sessionsAhead(viewer);
    return {
      ok: true,
      canAdd: can(viewer, 'source.write'),
      sources: rows.map(({ id, name, role, raDeg, decDeg, retiredAtMs, aliases }) => ({
        id,
        name,
        role,
        raDeg,
        decDeg,
        retiredAtMs,
        aliases: JSON.parse(aliases) as string[],
        bands: bands
          .filter(({ sourceId }) => sourceId === id)
          .map(({ band, fluxJy, sizeMas }) => ({ band, fluxJy, sizeMas })),
        sessionsAhead: ahead.filter(({ sourceId }) => sourceId === id).length,
      })),
    };
  });

export const readSource = (viewer: Viewer, id: string): Promise<{ ok: true; source: SourceDto } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const row = await fetchSource(db(), id);
    const ahead = await sessionsAhead(viewer);
    return {
      ok: true,
      source: {
        id: row.id,
        blocks: await blocksOf(db(), row),
        retiredAtMs: row.retiredAtMs,
        canEdit: can(viewer, 'source.write'),
        sessionsAhead: ahead
          .filter(({ sourceId }) => sourceId === row.id)
          .map(({ code, title, startMs }) => ({ code, title, startMs })),
      },
    };
  });

const sessionsAhead = (viewer: Viewer) =>
  db()
    .select({
      sourceId: sessionSources.sourceId,
      code: sessions.code,
      title: sessions.title,
      startMs: sessions.startMs,
    })
    .from(sessionSources)
    .innerJoin(sessions, eq(sessions.id, sessionSources.sessionId))
    .where(and(gt(sessions.startMs, nowMs()), ne(sessions.state, 'cancelled'), readableBy(viewer)))
    .orderBy(asc(sessions.startMs));
