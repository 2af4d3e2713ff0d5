import type { Wrong } from './block';

/** The second of two values that must rise. */
export const before = (field: string, low: number, high: number, what: string): Wrong[] =>
  low < high ? [] : [{ field, message: `${what} Set a larger value.` }];

/** Each row but the first that has a name again. */
export const doubles = (table: string, column: string, names: readonly string[]): Wrong[] =>
  names.flatMap((name, index) =>
    names.indexOf(name) < index
      ? [{ field: `${table}.${index}.${column}`, message: `${name} stands twice. Take one of them away.` }]
      : [],
  );
