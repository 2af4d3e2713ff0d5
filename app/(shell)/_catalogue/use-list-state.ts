import { useEffect, useState } from 'react';
import type { Sort } from '@/app/_ui/data-table';

type Show = 'use' | 'retired';
export type ListState = { find: string; show: Show; sort: Sort | null };
export type Query = Readonly<Record<string, string | string[] | undefined>>;

/** Search, sort and what is shown, kept in the address so that it can be sent and comes back. */
export function useListState(initial: ListState): [ListState, (change: Partial<ListState>) => void] {
  const [state, setState] = useState(initial);

  useEffect(() => {
    const query = queryOf(state);
    if (query !== window.location.search) {
      window.history.replaceState(null, '', `${window.location.pathname}${query}`);
    }
  }, [state]);

  return [state, (change) => setState({ ...state, ...change })];
}

function queryOf({ find, show, sort }: ListState): string {
  const query = new URLSearchParams();
  if (find !== '') query.set('find', find);
  if (show !== 'use') query.set('show', show);
  if (sort) query.set('sort', sort.isDown ? `-${sort.id}` : sort.id);
  const text = query.toString();
  return text === '' ? '' : `?${text}`;
}
