'use client';

import { useEffect, useRef } from 'react';
import { FringeMark } from '@/app/_ui/fringe-mark';
import { minuteText } from '@/app/_ui/format';
import { snrText, type OutlookCell, type Verdict } from '@/src/outlook/fringe-outlook';
import type { PlanContext, PlanStation } from '@/src/schedule/context';
import { MS_PER_DAY } from '@/src/units/time';
import { keyOf, notOnWord, tally, type Filter, type Outlook, type Pair, type Row } from './model';
import type { Choice } from './use-choice';

type Props = {
  outlook: Outlook | null;
  rows: readonly Row[];
  columns: readonly Pair[];
  filter: Filter;
  stations: readonly PlanStation[];
  context: PlanContext;
  choice: Choice;
};

/** Scans by baselines; the chosen cell has a frame, its row and column a wash. */
export function Matrix(props: Props) {
  const { outlook, rows, columns } = props;
  if (!outlook) return <Message word="Working out fringes" />;
  if (outlook.rows.length === 0)
    return <Message word="This session has no scans yet. Lay them out on the timeline." />;
  if (columns.length === 0) return <Message word="Tick at least two stations to see a baseline." />;
  if (rows.length === 0)
    return <Message word="No scan has such a verdict. Tick more verdicts or choose another source." />;
  return <MatrixTable {...props} />;
}

function Message({ word }: { word: string }) {
  return (
    <div className="bg-sheet p-6" role="status">
      {word}
    </div>
  );
}

function MatrixTable({ rows, columns, filter, stations, context, choice }: Props) {
  const names = new Map(stations.map(({ code, name }) => [code, name]));
  const groups = groupsOf(columns);
  return (
    <div
      role="grid"
      tabIndex={0}
      aria-label="Expected fringes: scans by baseline"
      aria-activedescendant={
        choice.scanId && choice.pairKey ? cellId(choice.scanId, choice.pairKey) : undefined
      }
      aria-rowcount={rows.length + 2}
      aria-colcount={columns.length + 4}
      onKeyDown={choice.onKeyDown}
      data-ready=""
      className="min-h-0 overflow-auto bg-sheet outline-offset-[-2px]"
    >
      <table role="presentation" className="border-separate border-spacing-0 text-table">
        <thead role="rowgroup" className="sticky top-0 z-axis bg-sheet">
          <tr role="row" className="h-[32px] align-bottom">
            <td colSpan={3} />
            {groups.map(({ first, span, start }) => (
              <th
                key={start}
                role="columnheader"
                scope="colgroup"
                colSpan={span}
                className="px-0.5 text-left font-text"
              >
                <span className="block overflow-hidden whitespace-nowrap border-b-frame border-ink pl-0.5">
                  <span className="font-serif text-lead font-head">{first}</span>{' '}
                  <span className="text-[11.5px] text-ink2" style={{ fontStretch: '82%' }}>
                    {span > 2 ? `${names.get(first) ?? ''} with` : span > 1 ? 'with' : ''}
                  </span>
                </span>
              </th>
            ))}
            <td />
          </tr>
          <tr role="row" className="h-[22px] text-[11.5px]">
            <HeadCell word="Scan" className="pl-3.5" />
            <HeadCell word="Start UT" />
            <HeadCell word="Source" />
            {columns.map((pair) => (
              <th
                key={keyOf(pair)}
                role="columnheader"
                scope="col"
                className={`w-[46px] min-w-[46px] border-b-head border-ink font-serif text-[13.5px] ${keyOf(pair) === choice.pairKey ? 'bg-wash' : ''}`}
              >
                <span className="sr-only">{pair.first}–</span>
                {pair.second}
              </th>
            ))}
            <HeadCell word="Fringes" className="pr-3.5 text-right" />
          </tr>
        </thead>
        <tbody role="rowgroup">
          {rows.map((row, index) => (
            <MatrixRow
              key={row.scan.id}
              row={row}
              columns={columns}
              filter={filter}
              sourceName={context.sources[row.scan.sourceId]?.name ?? ''}
              choice={choice}
              isNewDay={index > 0 && dayOf(rows[index - 1]) !== dayOf(row)}
            />
          ))}
        </tbody>
        <tfoot role="rowgroup" className="sticky bottom-0 bg-sheet">
          <tr role="row" className="h-[28px]">
            <th
              role="rowheader"
              scope="row"
              colSpan={3}
              className="border-t-frame border-ink pl-3.5 text-left font-head"
            >
              Fringes in scans
            </th>
            {columns.map((pair) => (
              <FootCell
                key={keyOf(pair)}
                rows={rows}
                pairKey={keyOf(pair)}
                isChosen={keyOf(pair) === choice.pairKey}
              />
            ))}
            <td className="border-t-frame border-ink" />
          </tr>
        </tfoot>
      </table>
      <p className="help px-3.5 py-2">
        Figures are SNR, cut off, not rounded. <b>clk</b>: the clock limits, the search window may be missed.
      </p>
    </div>
  );
}

function HeadCell({ word, className = '' }: { word: string; className?: string }) {
  return (
    <th
      role="columnheader"
      scope="col"
      className={`whitespace-nowrap border-b-head border-ink pr-2 text-left align-bottom font-head text-ink2 ${className}`}
    >
      {word}
    </th>
  );
}

type RowProps = {
  row: Row;
  columns: readonly Pair[];
  filter: Filter;
  sourceName: string;
  choice: Choice;
  isNewDay: boolean;
};

function MatrixRow({ row, columns, filter, sourceName, choice, isNewDay }: RowProps) {
  const { scan, number, cells } = row;
  const isChosen = scan.id === choice.scanId;
  const shown = columns.flatMap((pair) => cells.find((cell) => keyOf(cell) === keyOf(pair)) ?? []);
  const { expected, possible } = tally(shown);
  const line = isNewDay ? 'border-t-mark border-ink' : 'border-t border-hair';
  return (
    <tr role="row" className={`h-[27px] ${isChosen ? 'bg-wash' : ''}`}>
      <th role="rowheader" scope="row" className={`pl-3.5 pr-2 text-left font-strong ${line}`}>
        {number}
      </th>
      <td role="gridcell" className={`pr-2 ${line}`}>
        {minuteText(scan.startMs)}
      </td>
      <td role="gridcell" className={`whitespace-nowrap pr-2 ${line}`} style={{ fontStretch: '82%' }}>
        {sourceName}
      </td>
      {shown.map((cell) => (
        <MatrixCell
          key={keyOf(cell)}
          cell={cell}
          line={line}
          isFaint={!filter.verdicts.has(cell.verdict)}
          isChosen={isChosen && keyOf(cell) === choice.pairKey}
          isInColumn={keyOf(cell) === choice.pairKey}
          isInRow={isChosen}
          onChoose={() => choice.choose(scan.id, keyOf(cell))}
        />
      ))}
      <td role="gridcell" className={`whitespace-nowrap pl-2 pr-3.5 text-right ${line}`}>
        <b>{expected}</b> <span className="text-ink2">of {possible}</span>
      </td>
    </tr>
  );
}

const TINT: Readonly<Record<Verdict, string>> = {
  strong: 'bg-teal-wash',
  fair: 'bg-[color-mix(in_srgb,var(--teal-wash)_50%,var(--sheet))]',
  doubtful: 'bg-ochre-wash',
  none: 'bg-verm-wash',
  unknown: '',
  'not-on': '',
};

type CellProps = {
  cell: OutlookCell;
  line: string;
  isFaint: boolean;
  isChosen: boolean;
  isInColumn: boolean;
  isInRow: boolean;
  onChoose: () => void;
};

function MatrixCell({ cell, line, isFaint, isChosen, isInColumn, isInRow, onChoose }: CellProps) {
  const ref = useRef<HTMLTableCellElement>(null);
  useEffect(() => {
    if (isChosen) ref.current?.scrollIntoView({ block: 'nearest', inline: 'nearest' });
  }, [isChosen]);
  return (
    <td
      ref={ref}
      id={cellId(cell.scanId, keyOf(cell))}
      role="gridcell"
      aria-selected={isChosen}
      aria-label={`${keyOf(cell)}: ${spoken(cell)}`}
      onClick={onChoose}
      className={`cursor-pointer scroll-my-14 p-px ${line} ${isInColumn ? 'bg-wash' : ''}`}
    >
      <span
        className={`flex items-center justify-between px-1 ${TINT[cell.verdict]} ${isFaint ? 'opacity-25' : ''} ${
          isChosen ? 'outline outline-[2.5px] outline-ink' : ''
        }`}
        style={{ fontStretch: '82%', height: 24 }}
      >
        <CellContent cell={cell} isOnWash={isInColumn || isInRow} />
      </span>
    </td>
  );
}

function CellContent({ cell, isOnWash }: { cell: OutlookCell; isOnWash: boolean }) {
  if (cell.verdict === 'not-on')
    return (
      <span className={`w-full text-center ${isOnWash ? 'text-ink2' : 'text-ink3'}`}>{notOnWord(cell)}</span>
    );
  return (
    <>
      <FringeMark verdict={cell.verdict} />
      {cell.verdict === 'unknown' ? (
        <span className="text-[10px] text-ink2" style={{ fontStretch: '70%' }}>
          no data
        </span>
      ) : cell.reason === 'clock' ? (
        <b style={{ fontStretch: '82%' }}>clk</b>
      ) : (
        <span style={{ fontStretch: (cell.snr ?? 0) >= 1000 ? '66%' : '82%' }}>
          {cell.snr === null ? '' : snrText(cell.snr)}
        </span>
      )}
    </>
  );
}

function FootCell({ rows, pairKey, isChosen }: { rows: readonly Row[]; pairKey: string; isChosen: boolean }) {
  const { expected, possible } = tally(
    rows.flatMap(({ cells }) => cells.filter((cell) => keyOf(cell) === pairKey)),
  );
  return (
    <td
      className={`whitespace-nowrap border-t-frame border-ink text-center text-small ${isChosen ? 'bg-wash' : ''}`}
      style={{ fontStretch: '76%' }}
    >
      <b>{expected}</b> <span className="text-ink2">of {possible}</span>
    </td>
  );
}

function spoken(cell: OutlookCell): string {
  if (cell.verdict === 'not-on') return `not on source, ${notOnWord(cell)}`;
  if (cell.verdict === 'unknown') return `no data, ${cell.missing ?? ''}`;
  const snr = cell.snr === null ? '' : `, SNR ${snrText(cell.snr)}`;
  return `${cell.verdict}${cell.reason === 'clock' ? ', the clock limits' : ''}${snr}`;
}

const cellId = (scanId: string, pairKey: string) => `cell-${scanId}-${pairKey}`;
const dayOf = (row: Row | undefined) => (row ? Math.floor(row.scan.startMs / MS_PER_DAY) : null);

function groupsOf(columns: readonly Pair[]): { first: string; span: number; start: number }[] {
  const groups: { first: string; span: number; start: number }[] = [];
  columns.forEach(({ first }, start) => {
    const last = groups.at(-1);
    if (last?.first === first) last.span += 1;
    else groups.push({ first, span: 1, start });
  });
  return groups;
}
