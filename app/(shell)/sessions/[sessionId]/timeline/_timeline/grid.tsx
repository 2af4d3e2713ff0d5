'use client';

import { useId } from 'react';
import { clockText } from '@/src/schedule/words';
import type { PathLeg } from '@/src/schedule/paths';
import { scanStopMs, type Scan } from '@/src/schedule/plan';
import { columnLengthText } from '@/app/_ui/format';
import { useDerived } from './derived';
import { isExpected } from '@/src/outlook/fringe-outlook';
import { useGridKeys } from './grid-keys';
import { GRID_ID } from './places';
import { useTimeline } from './store';

/** Columns drawn on both sides of the cursor. */
const REACH = 6;

/**
 * The grid that has the focus: it mirrors the drawing for keys and screen readers. Rows are the heading and
 * the stations, columns the scans; only those near the cursor are there.
 */
export function TimelineGrid() {
  const id = useId();
  const plan = useDerived((derived) => derived.plan);
  const stations = useTimeline((state) => state.stations);
  const chosen = useTimeline((state) => state.chosen);
  const moving = useTimeline((state) => state.placing?.by === 'keys');
  const onKeyDown = useGridKeys();
  const at = plan.scans.findIndex((scan) => scan.id === chosen?.scanId);
  const first = Math.max(0, (at < 0 ? 0 : at) - REACH);
  const columns = plan.scans.slice(first, first + 2 * REACH + 1);
  const row = chosen?.station ? 1 + stations.findIndex(({ code }) => code === chosen.station) : 0;
  const cellId = (scan: Scan, rowIndex: number) => `${id}-${scan.id}-${rowIndex}`;
  const active = plan.scans[at];
  return (
    <div
      id={GRID_ID}
      role="grid"
      tabIndex={0}
      aria-label="Timeline: scans by station"
      aria-describedby={`${id}-help`}
      aria-rowcount={stations.length + 1}
      aria-colcount={plan.scans.length + 1}
      aria-activedescendant={active ? cellId(active, row) : undefined}
      onKeyDown={onKeyDown}
      className={`pointer-events-none absolute inset-0 outline-offset-[-2px] ${moving ? 'outline outline-[2px] outline-teal' : ''}`}
    >
      <p id={`${id}-help`} className="sr-only">
        Arrow keys choose a scan and a station. N adds a scan, M moves it, L changes its length, Space takes a
        station out or puts it in, Delete removes the scan, brackets go to the next problem.
      </p>
      <div role="row" aria-rowindex={1} className="sr-only">
        <span role="rowheader">Scans</span>
        {columns.map((scan, index) => (
          <ScanCell
            key={scan.id}
            id={cellId(scan, 0)}
            scan={scan}
            column={first + index + 2}
            selected={scan.id === chosen?.scanId && row === 0}
          />
        ))}
        {columns.length === 0 && <span role="gridcell">No scans yet</span>}
      </div>
      {stations.map(({ code, name }, index) => (
        <div role="row" aria-rowindex={index + 2} key={code} className="sr-only">
          <span role="rowheader">{name}</span>
          {columns.map((scan, column) => (
            <StationCell
              key={scan.id}
              id={cellId(scan, index + 1)}
              scan={scan}
              code={code}
              column={first + column + 2}
              selected={scan.id === chosen?.scanId && row === index + 1}
            />
          ))}
          {columns.length === 0 && <span role="gridcell">–</span>}
        </div>
      ))}
    </div>
  );
}

type CellProps = { id: string; scan: Scan; column: number; selected: boolean };

function ScanCell({ id, scan, column, selected }: CellProps) {
  const number = useDerived((derived) => derived.numbers.get(scan.id));
  const cells = useDerived((derived) => derived.outlook.get(scan.id)) ?? [];
  const name = useTimeline((state) => state.context.sources[scan.sourceId]?.name);
  const problems = useDerived(
    (derived) => derived.problems.filter(({ scanId }) => scanId === scan.id).length,
  );
  return (
    <span role="gridcell" id={id} aria-colindex={column} aria-selected={selected}>
      Scan {number}, {name}, {clockText(scan.startMs)} to {clockText(scanStopMs(scan))},{' '}
      {scan.stations.length} {scan.stations.length === 1 ? 'station' : 'stations'}, fringes on{' '}
      {cells.filter(isExpected).length} of {cells.length} baselines
      {problems > 0 && `, ${problems} ${problems === 1 ? 'problem' : 'problems'}`}
    </span>
  );
}

function StationCell({ id, scan, column, selected, code }: CellProps & { code: string }) {
  const leg = useDerived((derived) => derived.legs.get(code)?.find(({ scanId }) => scanId === scan.id));
  return (
    <span role="gridcell" id={id} aria-colindex={column} aria-selected={selected}>
      {code}: {leg ? legWords(leg) : 'left out'}
    </span>
  );
}

function legWords({ startAzEl, stopAzEl, spareSeconds }: PathLeg): string {
  const spare = spareSeconds === null ? 'first scan' : `spare ${columnLengthText(spareSeconds)} minutes`;
  return `elevation ${startAzEl.elevationDeg.toFixed(0)}° to ${stopAzEl.elevationDeg.toFixed(0)}°, ${spare}`;
}
