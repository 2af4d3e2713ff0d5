import 'server-only';
import { randomBytes } from 'node:crypto';
import { and, eq, inArray, ne, sql } from 'drizzle-orm';
import { transact, type Tx } from '../../../db/client';
import { modeChannels } from '../../../db/schema/mode-channels';
import { modeStations } from '../../../db/schema/mode-stations';
import { modes } from '../../../db/schema/modes';
import { stations } from '../../../db/schema/stations';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { MODE_BLOCKS, plainChannel, type Channel, type ModeStation } from '../../exchange/catalogue/mode';
import { ID_BYTES, idOf } from '../../schedule/plan-ids';
import { changedValues, parseBlockAct, parseBlocks, valuesOf, type BlockAct } from '../blocks';
import { answer, forbiddenFor, invalid, type Failure } from '../errors';
import { blocksOf, fetchMode } from './rows';

export const addMode = (viewer: Viewer, body: unknown): Promise<{ ok: true; id: string } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      if (!can(viewer, 'mode.write')) throw forbiddenFor('mode.write');
      const typed = parseBlocks(body);
      const head = valuesOf(MODE_BLOCKS.head, typed.head, 'head.');
      const { channels } = valuesOf(MODE_BLOCKS.channels, typed.channels, 'channels.');
      const correlator = valuesOf(MODE_BLOCKS.correlator, typed.correlator, 'correlator.');
      const id = idOf(randomBytes(ID_BYTES));
      await refuseTwin(tx, id, head.name, 'head.name');
      await tx.insert(modes).values({ id, ...head, ...correlator });
      await saveChannels(tx, id, channels);
      return { ok: true, id };
    }),
  );

/** One block of a mode; offers and published versions keep the mode as it was. */
export const keepModeBlock = (viewer: Viewer, id: string, body: BlockAct): Promise<{ ok: true } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      const act = parseBlockAct(body);
      const row = await fetchMode(tx, id);
      if (!can(viewer, 'mode.write')) throw forbiddenFor('mode.write');
      const now = await blocksOf(tx, row);
      switch (act.block) {
        case 'head': {
          const head = changedValues(MODE_BLOCKS.head, act, now.head);
          await refuseTwin(tx, row.id, head.name, 'name');
          await tx.update(modes).set(head).where(eq(modes.id, row.id));
          break;
        }
        case 'channels':
          await saveChannels(tx, row.id, changedValues(MODE_BLOCKS.channels, act, now.channels).channels);
          break;
        case 'correlator': {
          const correlator = changedValues(MODE_BLOCKS.correlator, act, now.correlator);
          await tx.update(modes).set(correlator).where(eq(modes.id, row.id));
          break;
        }
        case 'stations':
          await saveStations(tx, row.id, changedValues(MODE_BLOCKS.stations, act, now.stations).stations);
          break;
        default:
          throw invalid('The form could not be read. Open the page again.');
      }
      return { ok: true };
    }),
  );

/** Retired, it stays readable and in its sessions, and is not offered to new ones; or taken back into use. */
export const retireMode = (viewer: Viewer, id: string, isRetired: boolean): Promise<{ ok: true } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      const row = await fetchMode(tx, id);
      if (!can(viewer, 'mode.write')) throw forbiddenFor('mode.write');
      const retiredAtMs = isRetired ? (row.retiredAtMs ?? nowMs()) : null;
      await tx.update(modes).set({ retiredAtMs }).where(eq(modes.id, row.id));
      return { ok: true };
    }),
  );

async function refuseTwin(tx: Tx, id: string, name: string, field: string): Promise<void> {
  const [twin] = await tx
    .select({ name: modes.name })
    .from(modes)
    .where(and(ne(modes.id, id), eq(sql`lower(${modes.name})`, name.toLowerCase())));
  if (!twin) return;
  const message = `There is already a mode “${twin.name}”. Give this one another name.`;
  throw invalid(message, { [field]: [message] });
}

async function saveChannels(tx: Tx, modeId: string, channels: readonly Channel[]): Promise<void> {
  await tx.delete(modeChannels).where(eq(modeChannels.modeId, modeId));
  await tx
    .insert(modeChannels)
    .values(channels.map((channel, index) => ({ ...plainChannel(channel), modeId, number: index + 1 })));
}

async function saveStations(tx: Tx, modeId: string, rows: readonly ModeStation[]): Promise<void> {
  const codes = rows.map(({ stationCode }) => stationCode);
  const found = await tx.select({ code: stations.code }).from(stations).where(inArray(stations.code, codes));
  const known = new Set(found.map(({ code }) => code));
  const fields = Object.fromEntries(
    codes.flatMap((code, index) =>
      known.has(code)
        ? []
        : [
            [
              `stations.${index}.stationCode`,
              [`There is no station ${code}. Take one from the list of stations.`],
            ],
          ],
    ),
  );
  const [first] = Object.values(fields);
  if (first) throw invalid(first[0] ?? 'Look at the form again.', fields);
  await tx.delete(modeStations).where(eq(modeStations.modeId, modeId));
  if (rows.length === 0) return;
  await tx.insert(modeStations).values(
    rows.map(({ stationCode, isAble, bits, note }) => ({
      modeId,
      stationCode,
      isAble: isAble === 'yes',
      bits: bits === '' ? null : Number(bits),
      note,
    })),
  );
}
