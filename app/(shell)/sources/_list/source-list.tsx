'use client';

import type { Route } from 'next';
import Link from 'next/link';
import type { Column } from '@/app/_ui/data-table';
import { numberText } from '@/app/_ui/format';
import type { SourceRow } from '@/src/data/source/dto';
import { ROLE_CHOICES } from '@/src/exchange/catalogue/source';
import { declinationText, rightAscensionText } from '@/src/units/sexagesimal';
import { CatalogueList } from '../../_catalogue/catalogue-list';
import type { Query } from '../../_catalogue/use-list-state';

type Props = { sources: readonly SourceRow[]; canAdd: boolean; query: Query };

export function SourceList({ sources, canAdd, query }: Props) {
  const bands = [...new Set(sources.flatMap((source) => source.bands.map(({ band }) => band)))].sort(
    (a, b) => parseFloat(a) - parseFloat(b),
  );
  return (
    <CatalogueList
      title="Sources"
      noun={['source', 'sources']}
      findBy="name or role"
      usual="Right ascension"
      rows={sources}
      columns={[...COLUMNS, ...bands.map(bandColumn), SESSIONS]}
      rowKey={({ id }) => id}
      text={({ name, aliases, role }) => `${name} ${aliases.join(' ')} ${roleWord(role)}`}
      query={query}
      addHref={canAdd ? ('/sources/new' as Route) : null}
      addLabel="Add a source"
      note="By right ascension. A click on a head sorts by it; a click on a row opens the source. Flux in Jy, size in mas."
    />
  );
}

const roleWord = (role: SourceRow['role']) => ROLE_CHOICES.find(({ value }) => value === role)?.label ?? role;

const COLUMNS: readonly Column<SourceRow>[] = [
  {
    id: 'name',
    head: 'Source',
    value: ({ name }) => name,
    cell: ({ id, name, aliases }) => (
      <>
        <Link href={`/sources/${id}` as Route} className="row-link">
          <b>{name}</b>
        </Link>
        {aliases.length > 0 && <span className="cat-sub block">{aliases.join(', ')}</span>}
      </>
    ),
  },
  { id: 'role', head: 'Role', value: ({ role }) => roleWord(role), cell: ({ role }) => roleWord(role) },
  {
    id: 'ra',
    head: 'Right ascension',
    unit: 'h min s',
    isFigure: true,
    value: ({ raDeg }) => raDeg,
    cell: ({ raDeg }) => <span className="whitespace-nowrap">{rightAscensionText(raDeg)}</span>,
  },
  {
    id: 'dec',
    head: 'Declination',
    unit: '° min s of arc',
    isFigure: true,
    value: ({ decDeg }) => decDeg,
    cell: ({ decDeg }) => <span className="whitespace-nowrap">{declinationText(decDeg)}</span>,
  },
];

const bandColumn = (band: string): Column<SourceRow> => ({
  id: `flux-${band.replaceAll(/[^0-9a-z.]/gi, '').toLowerCase()}`,
  head: `Flux ${band}`,
  unit: 'Jy',
  isFigure: true,
  value: ({ bands }) => bands.find((one) => one.band === band)?.fluxJy ?? null,
  cell: ({ bands }) => {
    const found = bands.find((one) => one.band === band);
    if (!found) return <span className="text-ink2">no data</span>;
    return (
      <>
        {numberText(found.fluxJy, 2)}
        <span className="cat-sub block">
          {found.sizeMas === null ? 'point' : `${numberText(found.sizeMas, 2)} mas`}
        </span>
      </>
    );
  },
});

const SESSIONS: Column<SourceRow> = {
  id: 'sessions',
  head: 'Sessions',
  from: 'narrow',
  value: ({ sessionsAhead }) => sessionsAhead,
  cell: ({ sessionsAhead }) => (sessionsAhead === 0 ? 'none ahead' : `${sessionsAhead} ahead`),
};
