'use client';

import {
  createColumnHelper,
  createSortedRowModel,
  rowSortingFeature,
  tableFeatures,
  useTable,
  type SortFn,
} from '@tanstack/react-table';
import type { ReactNode } from 'react';
import './data-table.css';

export type Sort = { id: string; isDown: boolean };

export type Column<T> = {
  id: string;
  head: string;
  /** under the name, in the head */
  unit?: string;
  isFigure?: boolean;
  /** narrower than this the column is left out */
  from?: 'narrow' | 'desk';
  /** what it is sorted by; null stands last either way */
  value: (row: T) => string | number | null;
  cell: (row: T) => ReactNode;
};

type DataTableProps<T> = {
  caption: string;
  rows: readonly T[];
  /** the first names the row */
  columns: readonly Column<T>[];
  rowKey: (row: T) => string;
  sort: Sort | null;
  onSort: (sort: Sort) => void;
};

const features = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel() });
const CLASS_FROM = { narrow: 'from-narrow', desk: 'from-desk' } as const;

/** A table that sorts by its heads; the rows come as they are while nothing is chosen. */
export function DataTable<T extends object>({
  caption,
  rows,
  columns,
  rowKey,
  sort,
  onSort,
}: DataTableProps<T>) {
  const helper = createColumnHelper<typeof features, T>();
  const table = useTable({
    features,
    data: rows as T[],
    columns: helper.columns(
      columns.map(({ id, value }) =>
        helper.accessor((row) => value(row) ?? undefined, {
          id,
          sortFn: inOrder as SortFn<typeof features, T>,
          sortUndefined: 'last',
        }),
      ),
    ),
    state: { sorting: sort ? [{ id: sort.id, desc: sort.isDown }] : [] },
  });

  return (
    <table className="data">
      <caption className="sr-only">{caption}</caption>
      <thead>
        <tr>
          {columns.map((column) => {
            const isSorted = sort?.id === column.id;
            return (
              <th
                key={column.id}
                scope="col"
                className={classOf(column)}
                aria-sort={isSorted ? (sort.isDown ? 'descending' : 'ascending') : undefined}
              >
                <button
                  type="button"
                  onClick={() => onSort({ id: column.id, isDown: isSorted && !sort.isDown })}
                >
                  {column.head}
                  {isSorted && <Triangle isDown={sort.isDown} />}
                </button>
                {column.unit !== undefined && <span>{column.unit}</span>}
              </th>
            );
          })}
        </tr>
      </thead>
      <tbody>
        {table.getRowModel().rows.map(({ original }) => (
          <tr key={rowKey(original)}>
            {columns.map((column, index) =>
              index === 0 ? (
                <th key={column.id} scope="row" className={classOf(column)}>
                  {column.cell(original)}
                </th>
              ) : (
                <td key={column.id} className={classOf(column)} data-head={column.head}>
                  {column.cell(original)}
                </td>
              ),
            )}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const Triangle = ({ isDown }: { isDown: boolean }) => (
  <svg width="8" height="6" viewBox="0 0 8 6" aria-hidden="true">
    <path d={isDown ? 'M0 0h8L4 6z' : 'M0 6h8L4 0z'} fill="currentColor" />
  </svg>
);

const classOf = <T,>({ isFigure, from }: Column<T>) =>
  [isFigure && 'num', from && CLASS_FROM[from]].filter(Boolean).join(' ') || undefined;

const words = new Intl.Collator('en', { numeric: true });

function inOrder(
  a: { getValue: (id: string) => unknown },
  b: { getValue: (id: string) => unknown },
  id: string,
): number {
  const [one, other] = [a.getValue(id), b.getValue(id)];
  if (typeof one === 'number' && typeof other === 'number') return one - other;
  return words.compare(String(one), String(other));
}
