import { createContext, useContext } from 'react';
import { useStore } from 'zustand';
import { createStore, type StoreApi } from 'zustand/vanilla';
import { fringeOutlook, type OutlookCell, type OutlookContext } from '@/src/outlook/fringe-outlook';
import { checkPlan, type Problem } from '@/src/schedule/checks';
import { stationPaths, type PathLeg } from '@/src/schedule/paths';
import type { Plan, ScanId, StationCode } from '@/src/schedule/plan';
import { scanNumbers } from '@/src/schedule/scan-numbers';
import { giveLetters } from './letters';
import type { TimelineStore } from './store';

/** Everything worked out from the plan; never stored. */
export type Derived = {
  /** false on the server and until the browser has worked it out */
  isReady: boolean;
  plan: Plan;
  numbers: ReadonlyMap<ScanId, string>;
  legs: ReadonlyMap<StationCode, readonly PathLeg[]>;
  problems: readonly Problem[];
  letters: ReadonlyMap<string, string>;
  outlook: ReadonlyMap<ScanId, readonly OutlookCell[]>;
  /** scan:station of legs whose slew or overlap must be fixed */
  lateKeys: ReadonlySet<string>;
};

function derive(plan: Plan, context: OutlookContext, known: ReadonlyMap<string, string>): Derived {
  const problems = checkPlan(plan, context);
  const outlook = new Map<ScanId, OutlookCell[]>();
  for (const cell of fringeOutlook(plan, context)) {
    const cells = outlook.get(cell.scanId);
    if (cells) cells.push(cell);
    else outlook.set(cell.scanId, [cell]);
  }
  return {
    isReady: true,
    plan,
    numbers: scanNumbers(plan),
    legs: stationPaths(plan, context),
    problems,
    letters: giveLetters(known, problems),
    outlook,
    lateKeys: new Set(
      problems
        .filter(({ severity, kind }) => severity === 'fix' && (kind === 'slew' || kind === 'overlap'))
        .map(({ scanId, station }) => `${scanId}:${station}`),
    ),
  };
}

export type DerivedStore = StoreApi<Derived> & { start: () => () => void };

/** Empty until started, so that the server's page and the browser's first one are the same. */
export function createDerivedStore(timeline: TimelineStore): DerivedStore {
  const store = createStore<Derived>(() => ({
    isReady: false,
    plan: timeline.getState().plan,
    numbers: new Map(),
    legs: new Map(),
    problems: [],
    letters: new Map(),
    outlook: new Map(),
    lateKeys: new Set(),
  }));
  let worked: OutlookContext | null = null;
  const work = () => {
    const { plan, context } = timeline.getState();
    if (store.getState().isReady && store.getState().plan === plan && worked === context) return;
    worked = context;
    store.setState(derive(plan, context, store.getState().letters));
  };
  const start = () => {
    work();
    return timeline.subscribe(work);
  };
  return { ...store, start };
}

const DerivedContext = createContext<DerivedStore | null>(null);
export const DerivedProvider = DerivedContext.Provider;

export function useDerivedStore(): DerivedStore {
  const store = useContext(DerivedContext);
  if (!store) throw new Error('outside the drawn timeline');
  return store;
}

export const useDerived = <T>(select: (derived: Derived) => T): T => useStore(useDerivedStore(), select);
