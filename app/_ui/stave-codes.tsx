'use client';

import { createContext, useContext, type ReactNode } from 'react';

const Codes = createContext<readonly string[]>([]);

type Props = { codes: readonly string[]; children: ReactNode };

/** Lets an empty sheet or an error, which has no data of its own, name the network's staves. */
export function StaveCodes({ codes, children }: Props) {
  return <Codes value={codes}>{children}</Codes>;
}

export const useStaveCodes = (): readonly string[] => useContext(Codes);
