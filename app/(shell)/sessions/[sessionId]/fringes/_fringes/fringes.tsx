'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useEffect, useMemo, useState } from 'react';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { staveOrder } from '@/app/_ui/stave-order';
import type { Timeline } from '@/src/data/plan/dto';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { planContextOf } from '../../../_plan/plan-context';
import { CellPanel } from './cell-panel';
import { ExportButton } from './export-button';
import { FilterPanel } from './filter-panel';
import { Matrix } from './matrix';
import { columnsOf, fails, keyOf, outlookOf, rowsOf, VERDICTS, type Filter, type Outlook } from './model';
import { useChoice } from './use-choice';

/** Which baselines will show fringes, scan by scan. */
export function Fringes({ timeline }: { timeline: Timeline }) {
  const context = useMemo(() => planContextOf(timeline), [timeline]);
  const plan = useMemo(() => unpackPlan(timeline.plan), [timeline]);
  const stations = useMemo(() => staveOrder(timeline.stations), [timeline]);
  const [all] = useState<Filter>(() => ({
    verdicts: new Set(VERDICTS.map(([verdict]) => verdict)),
    stations: new Set(stations.map(({ code }) => code)),
    sourceId: null,
    columnsBy: 'station',
  }));
  const [filter, setFilter] = useState(all);
  const [outlook, setOutlook] = useState<Outlook | null>(null);
  // worked out in the browser only, so that the server's page and the browser's first one are the same
  useEffect(() => {
    const timer = setTimeout(() => setOutlook(outlookOf(plan, context)), 0);
    return () => clearTimeout(timer);
  }, [plan, context]);

  const columns = outlook ? columnsOf(outlook, filter) : [];
  const rows = outlook ? rowsOf(outlook, filter, columns) : [];
  const choice = useChoice(rows, columns);
  const chosenRow = rows.find(({ scan }) => scan.id === choice.scanId);
  const chosenCell = chosenRow?.cells.find((cell) => keyOf(cell) === choice.pairKey);

  if (plan.scans.length === 0)
    return (
      <EmptySheet
        heading="No scans yet"
        codes={stations.map(({ code }) => code)}
        actions={
          <Link className="btn btn-primary" href={`/sessions/${timeline.session.code}/timeline` as Route}>
            Open the timeline
          </Link>
        }
      >
        <p>
          Which baselines will show fringes is worked out scan by scan. Scans are laid out on the timeline.
        </p>
      </EmptySheet>
    );
  return (
    <>
      <div className="min-h-bar flex flex-wrap items-center gap-x-3.5 border-b border-rule text-table">
        <div className="no-print flex h-bar w-tray items-center justify-between px-3.5">
          <h2 className="text-lead">Filter</h2>
          <button type="button" className="text-ink2 underline" onClick={() => setFilter(all)}>
            Clear
          </button>
        </div>
        <Summary outlook={outlook} />
        <div className="ml-auto flex h-bar items-center gap-2 px-3.5">
          <span className="no-print text-ink2">Columns by</span>
          <div className="seg" role="group" aria-label="Columns by">
            {(['station', 'length'] as const).map((by) => (
              <button
                key={by}
                type="button"
                aria-pressed={filter.columnsBy === by}
                onClick={() => setFilter({ ...filter, columnsBy: by })}
              >
                {by === 'station' ? 'Station' : 'Length'}
              </button>
            ))}
          </div>
          <ExportButton rows={rows} context={context} code={timeline.session.code} />
        </div>
      </div>
      <div className="print-wide grid min-h-0 flex-1 desk:grid-cols-[176px_minmax(0,1fr)_344px] desk:overflow-hidden print:block">
        <FilterPanel
          filter={filter}
          onFilter={setFilter}
          outlook={outlook}
          stations={stations}
          sources={timeline.sources}
        />
        <Matrix
          outlook={outlook}
          rows={rows}
          columns={columns}
          filter={filter}
          stations={stations}
          context={context}
          choice={choice}
        />
        <CellPanel
          cell={chosenCell ?? null}
          row={chosenRow ?? null}
          context={context}
          span={plan.span}
          sessionCode={timeline.session.code}
          onNext={() => choice.toNext(fails)}
        />
      </div>
    </>
  );
}

function Summary({ outlook }: { outlook: Outlook | null }) {
  if (!outlook) return null;
  const { strong, fair, doubtful, none, unknown } = outlook.counts;
  const possible = strong + fair + doubtful + none + unknown;
  return (
    <p className="px-3.5 py-1">
      <b>
        {strong + fair} of {possible}
      </b>{' '}
      baselines in scans should show fringes; {doubtful} {doubtful === 1 ? 'is' : 'are'} doubtful, {none}{' '}
      should not, of {unknown} it is not known
    </p>
  );
}
