'use client';

import { createContext, useContext } from 'react';
import type { Sender } from './sender';

export type Acts = {
  dispatch: Sender['dispatch'];
  undo: () => void;
  redo: () => void;
};

const ActsContext = createContext<Acts | null>(null);
export const ActsProvider = ActsContext.Provider;

export function useActs(): Acts {
  const acts = useContext(ActsContext);
  if (!acts) throw new Error('outside the timeline');
  return acts;
}
