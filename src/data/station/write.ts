import 'server-only';
import { randomBytes } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import { transact, type Tx } from '../../../db/client';
import { stationBands } from '../../../db/schema/station-bands';
import { stationUnavailability } from '../../../db/schema/station-unavailability';
import { stations } from '../../../db/schema/stations';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import {
  OWN_BLOCKS,
  STATION_BLOCKS,
  stationCodeField,
  type Absence,
  type StationBlockName,
} from '../../exchange/catalogue/station';
import type { StationBand } from '../../exchange/catalogue/station-signal';
import { ID_BYTES, idOf } from '../../schedule/plan-ids';
import { changedValues, parseBlockAct, parseBlocks, valuesOf, type BlockAct } from '../blocks';
import { answer, forbiddenFor, invalid, type Failure } from '../errors';
import { blocksOf, fetchStation, horizonColumn, positionColumns, recordingColumns } from './rows';

type Row = typeof stations.$inferSelect;

/** A new station, from its code, position, mount and recording; the rest follows on its page. */
export const addStation = (viewer: Viewer, body: unknown): Promise<{ ok: true; code: string } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      if (!can(viewer, 'station.write')) throw forbiddenFor('station.write');
      const typed = parseBlocks(body);
      const read = stationCodeField.read(typeof typed.code === 'string' ? typed.code : '');
      if (!read.ok) throw invalid(read.message, { code: [read.message] });
      const code = read.value;
      const [twin] = await tx
        .select({ code: stations.code, name: stations.name })
        .from(stations)
        .where(eq(sql`lower(${stations.code})`, code.toLowerCase()));
      if (twin) {
        const message = `${twin.code} is the code of ${twin.name}. Codes differ by more than their case: take another.`;
        throw invalid(message, { code: [message] });
      }
      const recording = recordingColumns(valuesOf(STATION_BLOCKS.recording, typed.recording, 'recording.'));
      await tx.insert(stations).values({
        code,
        recorderFreeAtMs: recording.recorderFreeBytes === null ? null : nowMs(),
        ...positionColumns(valuesOf(STATION_BLOCKS.position, typed.position, 'position.')),
        ...valuesOf(STATION_BLOCKS.mount, typed.mount, 'mount.'),
        ...recording,
      });
      return { ok: true, code };
    }),
  );

/** One block of a station; of the own one an operator keeps horizon, sensitivity, availability and contacts. */
export const keepStationBlock = (
  viewer: Viewer,
  code: string,
  body: BlockAct,
): Promise<{ ok: true } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      const act = parseBlockAct(body);
      const row = await fetchStation(tx, code);
      const name = blockName(act.block);
      const isAllowed = OWN_BLOCKS.includes(name)
        ? can(viewer, 'station.write-own', { stationCode: row.code })
        : can(viewer, 'station.write');
      if (!isAllowed) throw forbiddenFor(OWN_BLOCKS.includes(name) ? 'station.write-own' : 'station.write');
      await saveBlock(tx, row, name, act);
      return { ok: true };
    }),
  );

/** Retired, it stays readable and in its sessions, and is not offered to new ones; or taken back into use. */
export const retireStation = (
  viewer: Viewer,
  code: string,
  isRetired: boolean,
): Promise<{ ok: true } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      const row = await fetchStation(tx, code);
      if (!can(viewer, 'station.write')) throw forbiddenFor('station.write');
      const retiredAtMs = isRetired ? (row.retiredAtMs ?? nowMs()) : null;
      await tx.update(stations).set({ retiredAtMs }).where(eq(stations.code, row.code));
      return { ok: true };
    }),
  );

function blockName(name: string): StationBlockName {
  const found = (Object.keys(STATION_BLOCKS) as StationBlockName[]).find((known) => known === name);
  if (!found) throw invalid('The form could not be read. Open the page again.');
  return found;
}

async function saveBlock(
  tx: Tx,
  row: Row,
  name: StationBlockName,
  act: ReturnType<typeof parseBlockAct>,
): Promise<void> {
  const now = await blocksOf(tx, row);
  switch (name) {
    case 'position':
      return set(tx, row, positionColumns(changedValues(STATION_BLOCKS.position, act, now.position)));
    case 'mount':
      return set(tx, row, changedValues(STATION_BLOCKS.mount, act, now.mount));
    case 'wrap': {
      const { wrapSectors } = changedValues(STATION_BLOCKS.wrap, act, now.wrap);
      return set(tx, row, { wrapSectors: JSON.stringify(wrapSectors) });
    }
    case 'bands':
      return saveBands(tx, row.code, changedValues(STATION_BLOCKS.bands, act, now.bands).bands);
    case 'wiring':
      return set(tx, row, changedValues(STATION_BLOCKS.wiring, act, now.wiring));
    case 'recording': {
      const value = recordingColumns(changedValues(STATION_BLOCKS.recording, act, now.recording));
      const isRead = value.recorderFreeBytes !== row.recorderFreeBytes;
      return set(tx, row, { ...value, ...(isRead && { recorderFreeAtMs: nowMs() }) });
    }
    case 'allowances':
      return set(tx, row, changedValues(STATION_BLOCKS.allowances, act, now.allowances));
    case 'horizon': {
      const { horizon } = changedValues(STATION_BLOCKS.horizon, act, now.horizon);
      return set(tx, row, { horizon: horizonColumn(horizon) });
    }
    case 'away':
      return saveAway(tx, row.code, changedValues(STATION_BLOCKS.away, act, now.away).away);
    case 'contacts':
      return set(tx, row, changedValues(STATION_BLOCKS.contacts, act, now.contacts));
  }
}

async function set(tx: Tx, row: Row, columns: Partial<typeof stations.$inferInsert>): Promise<void> {
  await tx.update(stations).set(columns).where(eq(stations.code, row.code));
}

async function saveBands(tx: Tx, stationCode: string, bands: readonly StationBand[]): Promise<void> {
  await tx.delete(stationBands).where(eq(stationBands.stationCode, stationCode));
  if (bands.length === 0) return;
  await tx
    .insert(stationBands)
    .values(bands.map((band) => ({ ...band, stationCode, gainCurve: JSON.stringify(band.gainCurve) })));
}

async function saveAway(tx: Tx, stationCode: string, away: readonly Absence[]): Promise<void> {
  await tx.delete(stationUnavailability).where(eq(stationUnavailability.stationCode, stationCode));
  if (away.length === 0) return;
  await tx
    .insert(stationUnavailability)
    .values(away.map((absence) => ({ ...absence, stationCode, id: idOf(randomBytes(ID_BYTES)) })));
}
