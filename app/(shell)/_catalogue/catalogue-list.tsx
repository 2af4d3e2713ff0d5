'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useEffect, useRef, type ReactNode } from 'react';
import { DataTable, type Column } from '@/app/_ui/data-table';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { Segments } from '@/app/_ui/segments';
import { listStateOf } from './list-query';
import { useListState, type Query } from './use-list-state';
import './catalogue.css';

type Item = { retiredAtMs: number | null };

type Props<T extends Item> = {
  title: string;
  /** "station", "stations" */
  noun: readonly [one: string, many: string];
  /** "code, name or place" */
  findBy: string;
  rows: readonly T[];
  columns: readonly Column<T>[];
  rowKey: (row: T) => string;
  /** the words a row is found by */
  text: (row: T) => string;
  query: Query;
  /** the order while no head is chosen: "west to east" */
  usual: string;
  /** null where the viewer may not add */
  addHref: Route | null;
  addLabel: string;
  /** beside the search */
  extra?: ReactNode;
  /** under the heading */
  above?: (shown: readonly T[]) => ReactNode;
  note?: string;
};

export function CatalogueList<T extends Item>(props: Props<T>) {
  const { title, noun, findBy, rows, columns, query, usual, addHref, addLabel, above, note } = props;
  const [state, change] = useListState(
    listStateOf(
      query,
      columns.map(({ id }) => id),
    ),
  );
  const search = useSlashKey();
  const words = state.find.toLowerCase().split(/\s+/).filter(Boolean);
  const inUse = rows.filter(({ retiredAtMs }) => retiredAtMs === null);
  const of = state.show === 'use' ? inUse : rows.filter(({ retiredAtMs }) => retiredAtMs !== null);
  const shown = of.filter((row) => words.every((word) => props.text(row).toLowerCase().includes(word)));
  const add = addHref && (
    <Link href={addHref} className="btn btn-primary">
      {addLabel}
    </Link>
  );

  return (
    <div className="flex flex-1 flex-col">
      <div className="cat-head">
        <h1>{title}</h1>
        <div className="cat-find">
          <input
            ref={search}
            type="search"
            className="field"
            aria-label={`Find by ${findBy}`}
            aria-keyshortcuts="/"
            placeholder={`Find by ${findBy}`}
            value={state.find}
            onChange={(event) => change({ find: event.target.value })}
          />
          {state.find === '' && (
            <kbd className="kbd" aria-hidden="true">
              /
            </kbd>
          )}
        </div>
        <Segments
          label={`Which ${noun[1]}`}
          value={state.show}
          options={[
            { value: 'use', label: `In use ${inUse.length}` },
            { value: 'retired', label: `Retired ${rows.length - inUse.length}` },
          ]}
          onChoose={(show) => change({ show })}
        />
        {props.extra}
        <label className="until-narrow cat-sort">
          Sort by{' '}
          <select
            className="field"
            value={state.sort?.id ?? ''}
            onChange={({ target }) =>
              change({ sort: target.value === '' ? null : { id: target.value, isDown: false } })
            }
          >
            <option value="">{usual}</option>
            {columns.map(({ id, head }) => (
              <option key={id} value={id}>
                {head}
              </option>
            ))}
          </select>
        </label>
        <div className="cat-acts">{add}</div>
      </div>
      {above?.(shown)}
      {shown.length > 0 && (
        <div className="cat-sheet">
          <DataTable
            caption={title}
            rows={shown}
            columns={columns}
            rowKey={props.rowKey}
            sort={state.sort}
            onSort={(sort) => change({ sort })}
          />
          {note !== undefined && <p className="help cat-note">{note}</p>}
        </div>
      )}
      {shown.length === 0 && (
        <EmptySheet
          level={2}
          heading={words.length > 0 ? `No ${noun[1]} match` : `No ${noun[1]} ${HERE[state.show]}`}
          actions={
            words.length > 0 ? (
              <button type="button" className="btn btn-primary" onClick={() => change({ find: '' })}>
                Show all
              </button>
            ) : (
              state.show === 'use' && add
            )
          }
        >
          {words.length > 0
            ? `None ${HERE[state.show]} has “${state.find.trim()}” in its ${findBy}.`
            : EMPTY[state.show](noun[0])}
        </EmptySheet>
      )}
    </div>
  );
}

const HERE = { use: 'in use', retired: 'retired' } as const;
const EMPTY = {
  use: (noun: string) => `A ${noun} that a scheduler adds will stand here.`,
  retired: (noun: string) =>
    `A ${noun} that is retired stays readable here; it cannot be chosen for new sessions.`,
} as const;

/** "/" goes to the search, unless something is being typed. */
function useSlashKey() {
  const search = useRef<HTMLInputElement>(null);
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== '/' || event.ctrlKey || event.metaKey || event.altKey) return;
      if (event.target instanceof HTMLElement && event.target.matches('input, textarea, select')) return;
      event.preventDefault();
      search.current?.focus();
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, []);
  return search;
}
