'use client';

import type { Route } from 'next';
import Link from 'next/link';
import type { Column } from '@/app/_ui/data-table';
import { numberText } from '@/app/_ui/format';
import type { ModeRow } from '@/src/data/mode/dto';
import { plainChannel } from '@/src/exchange/catalogue/mode';
import { dataRateOf } from '@/src/schedule/mode-channels';
import { CatalogueList } from '../../_catalogue/catalogue-list';
import type { Query } from '../../_catalogue/use-list-state';

type Props = { modes: readonly ModeRow[]; canAdd: boolean; query: Query };

export function ModeList({ modes, canAdd, query }: Props) {
  return (
    <CatalogueList
      title="Modes"
      noun={['mode', 'modes']}
      findBy="name or band"
      usual="Name"
      rows={modes}
      columns={COLUMNS}
      rowKey={({ id }) => id}
      text={({ name, band }) => `${name} ${band}`}
      query={query}
      addHref={canAdd ? ('/modes/new' as Route) : null}
      addLabel="Add a mode"
      note="The rate is two samples a hertz, times the bits, over all channels."
    />
  );
}

const rateOf = ({ channels }: ModeRow) => dataRateOf(channels.map(plainChannel)) / 1e6;

const COLUMNS: readonly Column<ModeRow>[] = [
  {
    id: 'name',
    head: 'Mode',
    value: ({ name }) => name,
    cell: ({ id, name }) => (
      <Link href={`/modes/${id}` as Route} className="row-link">
        <b>{name}</b>
      </Link>
    ),
  },
  { id: 'band', head: 'Band', value: ({ band }) => parseFloat(band), cell: ({ band }) => band },
  {
    id: 'channels',
    head: 'Channels',
    isFigure: true,
    value: ({ channels }) => channels.length,
    cell: ({ channels }) => channels.length,
  },
  {
    id: 'bandwidth',
    head: 'Bandwidth',
    unit: 'MHz',
    isFigure: true,
    value: ({ channels }) => channels[0]?.bandwidthHz ?? null,
    cell: ({ channels: [first] }) => (first ? numberText(first.bandwidthHz / 1e6) : ''),
  },
  {
    id: 'bits',
    head: 'Bits',
    isFigure: true,
    value: ({ channels }) => Number(channels[0]?.bits ?? 0),
    cell: ({ channels: [first] }) => first?.bits,
  },
  {
    id: 'polarisations',
    head: 'Polarisations',
    value: ({ channels }) => polarisations(channels),
    cell: ({ channels }) => polarisations(channels),
  },
  {
    id: 'rate',
    head: 'Rate',
    unit: 'Mb/s',
    isFigure: true,
    value: rateOf,
    cell: (row) => <b>{numberText(rateOf(row))}</b>,
  },
  {
    id: 'sessions',
    head: 'Sessions',
    value: ({ sessionsAhead }) => sessionsAhead,
    cell: ({ sessionsAhead }) => (sessionsAhead === 0 ? 'none ahead' : `${sessionsAhead} ahead`),
  },
];

const polarisations = (channels: ModeRow['channels']) =>
  [...new Set(channels.map(({ polarisation }) => polarisation))].join(', ');
