import 'server-only';
import { and, asc, eq, gt, isNull, ne } from 'drizzle-orm';
import { db } from '../../../db/client';
import { modeChannels } from '../../../db/schema/mode-channels';
import { modes } from '../../../db/schema/modes';
import { sessions } from '../../../db/schema/sessions';
import { stationBands } from '../../../db/schema/station-bands';
import { stations } from '../../../db/schema/stations';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { answer, forbiddenFor, type Failure } from '../errors';
import { readableBy } from '../session/scope';
import type { ModeAbility, ModeDto, ModeRow } from './dto';
import { blocksOf, channelOf, fetchMode } from './rows';

/** The whole catalogue by name, the retired ones too. */
export const listModes = (
  viewer: Viewer,
): Promise<{ ok: true; modes: ModeRow[]; canAdd: boolean } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const rows = await db().select().from(modes).orderBy(asc(modes.name));
    const channels = await db().select().from(modeChannels).orderBy(asc(modeChannels.number));
    const ahead = await sessionsAhead(viewer);
    return {
      ok: true,
      canAdd: can(viewer, 'mode.write'),
      modes: rows.map(({ id, name, band, coherenceSeconds, retiredAtMs }) => ({
        id,
        name,
        band,
        coherenceSeconds,
        retiredAtMs,
        channels: channels.filter(({ modeId }) => modeId === id).map(channelOf),
        sessionsAhead: ahead.filter(({ modeId }) => modeId === id).length,
      })),
    };
  });

export const readMode = (viewer: Viewer, id: string): Promise<{ ok: true; mode: ModeDto } | Failure> =>
  answer(async () => {
    if (!can(viewer, 'catalogue.read')) throw forbiddenFor('catalogue.read');
    const row = await fetchMode(db(), id);
    const ahead = await sessionsAhead(viewer);
    return {
      ok: true,
      mode: {
        id: row.id,
        blocks: await blocksOf(db(), row),
        retiredAtMs: row.retiredAtMs,
        canEdit: can(viewer, 'mode.write'),
        sessionsAhead: ahead
          .filter(({ modeId }) => modeId === row.id)
          .map(({ code, title, startMs }) => ({ code, title, startMs })),
        stations: await abilities(row.band),
      },
    };
  });

async function abilities(band: string): Promise<ModeAbility[]> {
  const rows = await db()
    .select({
      code: stations.code,
      name: stations.name,
      longitudeDeg: stations.longitudeDeg,
      bits: stations.bits,
      maxBitsPerS: stations.maxBitsPerS,
      maxChannels: stations.maxChannels,
      feeds: stationBands.feeds,
    })
    .from(stations)
    .leftJoin(stationBands, and(eq(stationBands.stationCode, stations.code), eq(stationBands.band, band)))
    .where(isNull(stations.retiredAtMs))
    .orderBy(asc(stations.code));
  return rows.map(({ bits, longitudeDeg, ...row }) => ({
    ...row,
    site: { longitudeDeg },
    bits: bits === 1 ? 1 : 2,
  }));
}

const sessionsAhead = (viewer: Viewer) =>
  db()
    .select({
      modeId: sessions.modeId,
      code: sessions.code,
      title: sessions.title,
      startMs: sessions.startMs,
    })
    .from(sessions)
    .where(and(gt(sessions.startMs, nowMs()), ne(sessions.state, 'cancelled'), readableBy(viewer)))
    .orderBy(asc(sessions.startMs));
