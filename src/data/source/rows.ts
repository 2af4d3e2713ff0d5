import 'server-only';
import { asc, eq } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { sourceBands } from '../../../db/schema/source-bands';
import { sources } from '../../../db/schema/sources';
import type { Component } from '../../exchange/catalogue/source';
import { notFound } from '../errors';
import type { SourceDto } from './dto';

export type SourceStored = typeof sources.$inferSelect;

export async function fetchSource(from: Database | Tx, id: string): Promise<SourceStored> {
  const [row] = await from.select().from(sources).where(eq(sources.id, id));
  if (!row) throw notFound('There is no such source.');
  return row;
}

export async function blocksOf(from: Database | Tx, row: SourceStored): Promise<SourceDto['blocks']> {
  const bands = await from
    .select()
    .from(sourceBands)
    .where(eq(sourceBands.sourceId, row.id))
    .orderBy(asc(sourceBands.band));
  return {
    place: {
      name: row.name,
      aliases: JSON.parse(row.aliases) as string[],
      role: row.role,
      raDeg: row.raDeg,
      decDeg: row.decDeg,
      properMotionEastMas: row.properMotionEastMas,
      properMotionNorthMas: row.properMotionNorthMas,
      parallaxMas: row.parallaxMas,
    },
    flux: {
      bands: bands.map(({ band, fluxJy, sizeMas }) => ({ band, fluxJy, sizeMas })),
      components: bands.flatMap(({ band, components }) =>
        (JSON.parse(components) as Omit<Component, 'band'>[]).map((component) => ({ band, ...component })),
      ),
    },
  };
}
