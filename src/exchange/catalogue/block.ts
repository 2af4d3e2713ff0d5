import type { Field, Read } from './field';

export type TypedRow = Readonly<Record<string, string>>;
/** A block as it was typed: text by field, rows of text by table. */
export type Typed = Readonly<Record<string, string | readonly TypedRow[]>>;

export type FieldsOf<V> = { readonly [K in keyof V & string]: Field<V[K]> };

/** A table inside a block: rows that can be added and taken away. */
export type RowsField<R> = {
  kind: 'rows';
  label: string;
  help?: string;
  /** "Add a band" */
  add: string;
  /** columns that a new row takes from the row before; choices always are */
  again?: readonly string[];
  columns: FieldsOf<R>;
  most: number;
};

export type Wrong = { field: string; message: string; mend?: string };

/** Part of an object that is edited in one go: scalar fields, then tables, then what only together can be judged. */
export type Block<V, T = Record<never, never>> = {
  title: string;
  /** the button: "Keep position" */
  keep: string;
  fields: FieldsOf<V>;
  rows: { readonly [K in keyof T & string]: RowsField<T[K]> };
  /** labels that depend on what is typed, by field; the others are the fields' own */
  labels?(typed: Typed): Readonly<Record<string, string>>;
  /** fields that another one makes meaningless; they are read as empty */
  hides?(typed: Typed): readonly string[];
  check?(value: Values<V, T>): readonly Wrong[];
  /** what follows from what is typed, worked out */
  note?(value: Values<V, T>): string | null;
};

export type Values<V, T = Record<never, never>> = V & { readonly [K in keyof T]: readonly T[K][] };

export type BlockRead<V> = { ok: true; value: V } | { ok: false; wrong: Wrong[] };

/**
 * What a block's text means.
 *
 * @param typed  anything: what is not text or rows is read as empty
 * @returns the values, or each wrong field; a cell of a table is "horizon.3.elevationDeg"
 */
export function readBlock<V, T>(block: Block<V, T>, typed: unknown): BlockRead<Values<V, T>> {
  const text = textIn(typed);
  const hidden = block.hides?.(text) ?? [];
  const labels = block.labels?.(text) ?? {};
  const wrong: Wrong[] = [];
  const value: Record<string, unknown> = {};
  for (const [name, field] of scalarsOf(block)) {
    const entry = text[name];
    const read = field.read(hidden.includes(name) || typeof entry !== 'string' ? '' : entry);
    if (read.ok) value[name] = read.value;
    else wrong.push(relabelled(wrongAt(name, read), field.label, labels[name]));
  }
  for (const [name, table] of tablesOf(block)) {
    const entry = text[name];
    const rows = typeof entry === 'string' || entry === undefined ? [] : entry;
    if (rows.length > table.most) {
      const message = `“${table.label}” has ${rows.length} rows. It takes at most ${table.most}.`;
      wrong.push({ field: name, message });
      continue;
    }
    value[name] = rows.map((row, index) => readRow(table, row, `${name}.${index}`, wrong));
  }
  if (wrong.length > 0) return { ok: false, wrong };
  // each name of V and of T was read by its own field above
  const whole = value as Values<V, T>;
  const found = block.check?.(whole) ?? [];
  return found.length > 0 ? { ok: false, wrong: [...found] } : { ok: true, value: whole };
}

/** Values as the form shows them at first; reading it gives the values back. */
export function writeBlock<V, T>(block: Block<V, T>, value: Values<V, T>): Typed {
  const scalars = scalarsOf(block).map(([name, field]) => [
    name,
    field.write(value[name as keyof typeof value]),
  ]);
  const tables = tablesOf(block).map(([name, table]) => [
    name,
    (value[name as keyof typeof value] as readonly Record<string, unknown>[]).map((row) =>
      Object.fromEntries(
        Object.entries<Field<unknown>>(table.columns).map(([column, field]) => [
          column,
          field.write(row[column]),
        ]),
      ),
    ),
  ]);
  return Object.fromEntries([...scalars, ...tables]) as Typed;
}

/** A block whose values are not looked at: for the one form that shows them all. */
export type AnyBlock = Block<Record<string, unknown>, Record<string, unknown>>;

/** Its scalar fields by name, in order. */
export const scalarsOf = (block: Pick<AnyBlock, 'fields'>): [string, Field<unknown>][] =>
  Object.entries(block.fields);

/** Its tables by name, in order. */
export const tablesOf = (block: Pick<AnyBlock, 'rows'>): [string, RowsField<unknown>][] =>
  Object.entries(block.rows);

/** Sentences by field, as a verb answers them. */
export function fieldsOf(wrong: readonly Wrong[], prefix = ''): Record<string, string[]> {
  const fields: Record<string, string[]> = {};
  for (const { field, message } of wrong) (fields[prefix + field] ??= []).push(message);
  return fields;
}

function readRow(table: RowsField<unknown>, row: TypedRow, at: string, wrong: Wrong[]) {
  const value: Record<string, unknown> = {};
  for (const [name, field] of Object.entries<Field<unknown>>(table.columns)) {
    const read = field.read(row[name] ?? '');
    if (read.ok) value[name] = read.value;
    else wrong.push(wrongAt(`${at}.${name}`, read));
  }
  return value;
}

const wrongAt = (field: string, read: Extract<Read<unknown>, { ok: false }>): Wrong => ({
  field,
  message: read.message,
  ...(read.mend !== undefined && { mend: read.mend }),
});

function textIn(typed: unknown): Typed {
  if (!isRecord(typed)) return {};
  return Object.fromEntries(
    Object.entries(typed).flatMap(([name, entry]): [string, string | TypedRow[]][] => {
      if (typeof entry === 'string') return [[name, entry]];
      if (!Array.isArray(entry)) return [];
      return [[name, entry.slice(0, 5001).map(rowIn)]];
    }),
  );
}

function rowIn(row: unknown): TypedRow {
  if (!isRecord(row)) return {};
  return Object.fromEntries(
    Object.entries(row).filter((cell): cell is [string, string] => typeof cell[1] === 'string'),
  );
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/** A message names its field as the form does. */
function relabelled(wrong: Wrong, was: string, label: string | undefined): Wrong {
  return label === undefined ? wrong : { ...wrong, message: wrong.message.replace(`“${was}”`, `“${label}”`) };
}
