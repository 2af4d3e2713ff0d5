import 'server-only';
import { randomBytes } from 'node:crypto';
import { and, eq, ne, sql } from 'drizzle-orm';
import { transact, type Tx } from '../../../db/client';
import { sourceBands } from '../../../db/schema/source-bands';
import { sources } from '../../../db/schema/sources';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { SOURCE_BLOCKS, type SourceValues } from '../../exchange/catalogue/source';
import { ID_BYTES, idOf } from '../../schedule/plan-ids';
import { changedValues, parseBlockAct, parseBlocks, valuesOf, type BlockAct } from '../blocks';
import { answer, forbiddenFor, invalid, type Failure } from '../errors';
import type { SourceDto } from './dto';
import { blocksOf, fetchSource } from './rows';

export const addSource = (viewer: Viewer, body: unknown): Promise<{ ok: true; id: string } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      if (!can(viewer, 'source.write')) throw forbiddenFor('source.write');
      const typed = parseBlocks(body);
      const place = valuesOf(SOURCE_BLOCKS.place, typed.place, 'place.');
      const flux = valuesOf(SOURCE_BLOCKS.flux, typed.flux, 'flux.');
      const id = idOf(randomBytes(ID_BYTES));
      await refuseTwin(tx, id, place.name, 'place.name');
      await tx.insert(sources).values({ id, ...placeColumns(place) });
      await saveFlux(tx, id, flux);
      return { ok: true, id };
    }),
  );

export const keepSourceBlock = (
  viewer: Viewer,
  id: string,
  body: BlockAct,
): Promise<{ ok: true } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      const act = parseBlockAct(body);
      const row = await fetchSource(tx, id);
      if (!can(viewer, 'source.write')) throw forbiddenFor('source.write');
      const now = await blocksOf(tx, row);
      if (act.block === 'place') {
        const place = changedValues(SOURCE_BLOCKS.place, act, now.place);
        await refuseTwin(tx, row.id, place.name, 'name');
        await tx.update(sources).set(placeColumns(place)).where(eq(sources.id, row.id));
      } else if (act.block === 'flux') {
        await saveFlux(tx, row.id, changedValues(SOURCE_BLOCKS.flux, act, now.flux));
      } else throw invalid('The form could not be read. Open the page again.');
      return { ok: true };
    }),
  );

/** Retired, it stays readable and in its sessions, and is not offered to new ones; or taken back into use. */
export const retireSource = (
  viewer: Viewer,
  id: string,
  isRetired: boolean,
): Promise<{ ok: true } | Failure> =>
  answer(() =>
    transact(async (tx) => {
      const row = await fetchSource(tx, id);
      if (!can(viewer, 'source.write')) throw forbiddenFor('source.write');
      const retiredAtMs = isRetired ? (row.retiredAtMs ?? nowMs()) : null;
      await tx.update(sources).set({ retiredAtMs }).where(eq(sources.id, row.id));
      return { ok: true };
    }),
  );

const placeColumns = ({ aliases, ...place }: SourceValues) => ({
  ...place,
  aliases: JSON.stringify(aliases),
});

async function refuseTwin(tx: Tx, id: string, name: string, field: string): Promise<void> {
  const [twin] = await tx
    .select({ name: sources.name })
    .from(sources)
    .where(and(ne(sources.id, id), eq(sql`lower(${sources.name})`, name.toLowerCase())));
  if (!twin) return;
  const message = `There is already a source ${twin.name}. Give this one another name.`;
  throw invalid(message, { [field]: [message] });
}

async function saveFlux(tx: Tx, sourceId: string, flux: SourceDto['blocks']['flux']): Promise<void> {
  await tx.delete(sourceBands).where(eq(sourceBands.sourceId, sourceId));
  if (flux.bands.length === 0) return;
  await tx.insert(sourceBands).values(
    flux.bands.map((band) => ({
      ...band,
      sourceId,
      components: JSON.stringify(
        flux.components
          .filter((component) => component.band === band.band)
          .map(({ band: _, ...component }) => component),
      ),
    })),
  );
}
