import 'server-only';
import { asc, eq } from 'drizzle-orm';
import type { Database, Tx } from '../../../db/client';
import { modeChannels } from '../../../db/schema/mode-channels';
import { modeStations } from '../../../db/schema/mode-stations';
import { modes } from '../../../db/schema/modes';
import type { Channel } from '../../exchange/catalogue/mode';
import { notFound } from '../errors';
import type { ModeDto } from './dto';

export type ModeStored = typeof modes.$inferSelect;

export async function fetchMode(from: Database | Tx, id: string): Promise<ModeStored> {
  const [row] = await from.select().from(modes).where(eq(modes.id, id));
  if (!row) throw notFound('There is no such mode.');
  return row;
}

export async function blocksOf(from: Database | Tx, row: ModeStored): Promise<ModeDto['blocks']> {
  const channels = await from
    .select()
    .from(modeChannels)
    .where(eq(modeChannels.modeId, row.id))
    .orderBy(asc(modeChannels.number));
  const able = await from
    .select()
    .from(modeStations)
    .where(eq(modeStations.modeId, row.id))
    .orderBy(asc(modeStations.stationCode));
  const { name, band, coherenceSeconds, toneSpacingHz, integrationSeconds, spectralChannels } = row;
  return {
    head: { name, band, coherenceSeconds, toneSpacingHz },
    channels: { channels: channels.map(channelOf) },
    correlator: { integrationSeconds, spectralChannels },
    stations: {
      stations: able.map(({ stationCode, isAble, bits, note }) => ({
        stationCode,
        isAble: isAble ? ('yes' as const) : ('no' as const),
        bits: bits === null ? ('' as const) : bitsOf(bits),
        note,
      })),
    },
  };
}

export const channelOf = (row: typeof modeChannels.$inferSelect): Channel => ({
  edgeHz: row.edgeHz,
  sideband: row.sideband,
  polarisation: row.polarisation,
  bandwidthHz: row.bandwidthHz,
  bits: bitsOf(row.bits),
});

const bitsOf = (bits: number) => (bits === 1 ? ('1' as const) : ('2' as const));
