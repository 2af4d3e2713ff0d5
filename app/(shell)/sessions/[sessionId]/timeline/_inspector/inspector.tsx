'use client';

import { lazy, Suspense, useEffect } from 'react';
import { useDerived } from '../_timeline/derived';
import { INSPECTOR_ID } from '../_timeline/places';
import { useTimeline } from '../_timeline/store';

const loadPanel = () => import('./scan-panel');
const ScanPanel = lazy(loadPanel);
const PANEL_AFTER_MS = 300;

/** Everything about the chosen scan; its code is fetched once the sheet is drawn, before anything is chosen. */
export function Inspector() {
  const plan = useDerived((derived) => derived.plan);
  const isReady = useDerived((derived) => derived.isReady);
  const chosenId = useTimeline((state) => state.chosen?.scanId ?? null);
  const scan = plan.scans.find(({ id }) => id === chosenId);
  useEffect(() => {
    if (!isReady) return;
    const timer = setTimeout(() => void loadPanel(), PANEL_AFTER_MS);
    return () => clearTimeout(timer);
  }, [isReady]);
  return (
    <aside
      id={INSPECTOR_ID}
      tabIndex={-1}
      aria-label="Chosen scan"
      className="relative flex min-h-0 flex-col gap-2.5 overflow-y-auto border-l border-rule px-[16px] py-[12px]"
    >
      {scan ? (
        <Suspense>
          <ScanPanel scan={scan} />
        </Suspense>
      ) : (
        <NothingChosen count={plan.scans.length} />
      )}
    </aside>
  );
}

function NothingChosen({ count }: { count: number }) {
  const canEdit = useTimeline((state) => state.canEdit);
  return (
    <div className="help">
      <h1 className="mb-2 text-[22px] leading-[26px] text-ink">
        {count === 0 ? 'No scans yet' : 'No scan chosen'}
      </h1>
      {count === 0 ? (
        <p>
          {canEdit
            ? 'Drag a source from the left onto the staves to make the first scan.'
            : 'The scheduler has not laid out this session yet.'}
        </p>
      ) : (
        <p>
          Click a scan on the sheet, or move to one with the arrow keys, to see its stations and expected
          fringes.
        </p>
      )}
    </div>
  );
}
