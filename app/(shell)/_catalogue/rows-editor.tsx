'use client';

import { useId, useRef, type ClipboardEvent } from 'react';
import type { RowsField, TypedRow, Wrong } from '@/src/exchange/catalogue/block';
import type { Field } from '@/src/exchange/catalogue/field';

type Props = {
  name: string;
  table: RowsField<unknown>;
  rows: readonly TypedRow[];
  wrong: readonly Wrong[];
  onRows: (rows: readonly TypedRow[]) => void;
};

/** Rows of a table as fields; what is wrong with a row stands under it. */
export function RowsEditor({ name, table, rows, wrong, onRows }: Props) {
  const id = useId();
  const body = useRef<HTMLTableSectionElement>(null);
  const columns = Object.entries<Field<unknown>>(table.columns);
  const whole = wrong.find(({ field }) => field === name);
  const ofRow = (index: number) => wrong.filter(({ field }) => field.startsWith(`${name}.${index}.`));

  const setCell = (index: number, column: string, text: string) =>
    onRows(rows.map((row, at) => (at === index ? { ...row, [column]: text } : row)));

  const add = () => {
    onRows([...rows, emptyRow(columns, rows.at(-1), table.again)]);
    requestAnimationFrame(() => {
      body.current?.querySelector<HTMLElement>('tr[data-row]:last-of-type :is(input, select)')?.focus();
    });
  };

  const paste = (event: ClipboardEvent, index: number, column: number) => {
    const cells = cellsOf(event.clipboardData.getData('text'));
    if (cells.length === 0) return;
    event.preventDefault();
    const next = [...rows];
    cells.forEach((line, down) => {
      const base = next[index + down] ?? emptyRow(columns, undefined);
      const typed = line.flatMap((text, right) => {
        const target = columns[column + right];
        return target ? [[target[0], text] as const] : [];
      });
      next[index + down] = { ...base, ...Object.fromEntries(typed) };
    });
    onRows(next.slice(0, table.most));
  };

  return (
    <div className="block-rows">
      <div className="block-rows-head">
        <h3 id={id}>{table.label}</h3>
        <button type="button" className="btn btn-sm" onClick={add}>
          {table.add}
        </button>
      </div>
      {rows.length > 0 && (
        <div className="block-scroll">
          <table className="tt" aria-labelledby={id}>
            <thead>
              <tr>
                {columns.map(([column, { label, unit }]) => (
                  <th key={column} scope="col">
                    {label}
                    {unit !== undefined && <span className="block font-text">{unit}</span>}
                  </th>
                ))}
                <th scope="col">
                  <span className="sr-only">Take away</span>
                </th>
              </tr>
            </thead>
            <tbody ref={body}>
              {rows.map((row, index) => (
                <Row
                  key={index}
                  number={index + 1}
                  columns={columns}
                  row={row}
                  path={`${name}.${index}`}
                  wrong={ofRow(index)}
                  onCell={(column, text) => setCell(index, column, text)}
                  onPaste={(event, column) => paste(event, index, column)}
                  onRemove={() => onRows(rows.filter((_, at) => at !== index))}
                />
              ))}
            </tbody>
          </table>
        </div>
      )}
      {whole && <p className="mt-1 text-small font-strong text-verm">{whole.message}</p>}
      {table.help !== undefined && <p className="help mt-1">{table.help}</p>}
    </div>
  );
}

type RowProps = {
  number: number;
  columns: readonly [string, Field<unknown>][];
  row: TypedRow;
  path: string;
  wrong: readonly Wrong[];
  onCell: (column: string, text: string) => void;
  onPaste: (event: ClipboardEvent, column: number) => void;
  onRemove: () => void;
};

function Row({ number, columns, row, path, wrong, onCell, onPaste, onRemove }: RowProps) {
  const id = useId();
  return (
    <>
      <tr data-row>
        {columns.map(([column, field], at) => {
          const isWrong = wrong.some((one) => one.field === `${path}.${column}`);
          const shared = {
            name: `${path}.${column}`,
            value: row[column] ?? '',
            'aria-label': `${field.label}, row ${number}`,
            'aria-invalid': isWrong || undefined,
            'aria-describedby': isWrong ? id : undefined,
          };
          return (
            <td key={column}>
              {field.kind === 'choice' ? (
                <select {...shared} className="field" onChange={({ target }) => onCell(column, target.value)}>
                  {field.choices?.map(({ value, label }) => (
                    <option key={value} value={value}>
                      {label}
                    </option>
                  ))}
                </select>
              ) : (
                <input
                  {...shared}
                  className="field"
                  autoComplete="off"
                  spellCheck={false}
                  onChange={({ target }) => onCell(column, target.value)}
                  onPaste={(event) => onPaste(event, at)}
                />
              )}
            </td>
          );
        })}
        <td>
          <button
            type="button"
            className="btn btn-sm"
            aria-label={`Take row ${number} away`}
            title="Take away"
            onClick={onRemove}
          >
            −
          </button>
        </td>
      </tr>
      {wrong.length > 0 && (
        <tr>
          <td colSpan={columns.length + 1} id={id} className="text-small text-verm">
            {wrong.map((one) => (
              <p key={one.field} className="font-strong">
                {one.message}{' '}
                {one.mend !== undefined && (
                  <button
                    type="button"
                    className="link"
                    onClick={() => onCell(one.field.slice(path.length + 1), one.mend ?? '')}
                  >
                    Make it {one.mend.replace('-', '\u2212')}
                  </button>
                )}
              </p>
            ))}
          </td>
        </tr>
      )}
    </>
  );
}

/** Choices are taken from the row before: the next channel mostly has the same. */
function emptyRow(
  columns: readonly [string, Field<unknown>][],
  last: TypedRow | undefined,
  again: readonly string[] = [],
): TypedRow {
  const start = (name: string, { choices }: Field<unknown>) =>
    choices || again.includes(name) ? (last?.[name] ?? choices?.[0]?.value ?? '') : '';
  return Object.fromEntries(columns.map(([name, field]) => [name, start(name, field)]));
}

/** Lines and columns of a pasted piece of a sheet; one cell alone is plain text. */
function cellsOf(text: string): string[][] {
  const lines = text
    .replaceAll('\r', '')
    .split('\n')
    .filter((line) => line.trim() !== '');
  const cells = lines.map((line) => line.split(/\t|;/).map((cell) => cell.trim()));
  return cells.flat().length > 1 ? cells : [];
}
