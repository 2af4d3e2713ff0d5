import type { ListState, Query } from './use-list-state';

/** What an address says of a list; what it cannot mean is left at its start. */
export function listStateOf(query: Query, columns: readonly string[]): ListState {
  const one = (name: string) => (typeof query[name] === 'string' ? query[name] : '');
  const sort = one('sort');
  const id = sort.replace(/^-/, '');
  return {
    find: one('find').slice(0, 100),
    show: one('show') === 'retired' ? 'retired' : 'use',
    sort: columns.includes(id) ? { id, isDown: sort.startsWith('-') } : null,
  };
}
