'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useState } from 'react';
import { Chip } from '@/app/_ui/chip';
import { csvText } from '@/app/_ui/csv';
import { DataTable, type Column, type Sort } from '@/app/_ui/data-table';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { numberText, signedText } from '@/app/_ui/format';
import { saveFile } from '@/app/_ui/save-file';
import { StationCode } from '@/app/_ui/station-code';
import { offsetWords, rateWords } from '@/src/clock/reading';
import type { ClockSummary } from '@/src/data/clock/dto';
import { fullTimeText } from '@/src/schedule/words';
import '../../_catalogue/catalogue.css';

const HOUR_MS = 3_600_000;
const NOTE_HOURS = 24;
const UNKNOWN_DAYS = 7;

type Props = { clocks: readonly ClockSummary[]; nowMs: number };

/** The clocks of the network, west to east: where each is, how fast it goes, when it was read. */
export function ClockTable({ clocks, nowMs }: Props) {
  const [sort, setSort] = useState<Sort | null>(null);
  return (
    <div className="flex flex-1 flex-col">
      <div className="cat-head">
        <h1>Clocks</h1>
        <p className="help">station clock minus UTC, via GPS, positive = early</p>
        {clocks.length > 0 && (
          <div className="cat-acts">
            <button
              type="button"
              className="btn"
              onClick={() => saveFile('clocks.csv', 'text/csv', clocksCsv(clocks, nowMs))}
            >
              Export table
            </button>
          </div>
        )}
      </div>
      {clocks.length === 0 ? (
        <EmptySheet level={2} heading="No clock to read">
          There is no station yet. A scheduler adds stations under Stations; their operators keep the log.
        </EmptySheet>
      ) : (
        <div className="cat-sheet">
          <DataTable
            caption="Clocks"
            rows={clocks}
            columns={columnsAt(nowMs)}
            rowKey={({ code }) => code}
            sort={sort}
            onSort={setSort}
          />
          <p className="help cat-note">
            A reading older than {NOTE_HOURS} h is a note, one older than {UNKNOWN_DAYS} days says nothing of
            the clock: these are the limits that sessions start from, and each session may set its own. A
            click on a row opens the log.
          </p>
        </div>
      )}
    </div>
  );
}

const unknown = <span className="text-ink2">not known</span>;

const columnsAt = (nowMs: number): readonly Column<ClockSummary>[] => [
  {
    id: 'station',
    head: 'Station',
    value: ({ code }) => code,
    cell: ({ code, name }) => (
      <span className="inline-flex items-center gap-2.5">
        <StationCode code={code} />
        <Link href={`/stations/${code}/clock` as Route} className="row-link">
          <b>{name}</b>
        </Link>
      </span>
    ),
  },
  {
    id: 'now',
    head: 'Now',
    value: ({ now }) => now?.offsetSeconds ?? null,
    cell: ({ now }) =>
      now ? <b className="whitespace-nowrap">{offsetWords(now.offsetSeconds)}</b> : unknown,
  },
  {
    id: 'offset',
    head: 'Offset',
    unit: 'µs',
    isFigure: true,
    from: 'narrow',
    value: ({ now }) => now?.offsetSeconds ?? null,
    cell: ({ now }) => now && signedText(now.offsetSeconds * 1e6, 3),
  },
  {
    id: 'sigma',
    head: '±',
    unit: 'µs',
    isFigure: true,
    from: 'narrow',
    value: ({ now }) => now?.sigmaSeconds ?? null,
    cell: ({ now }) => now && numberText(now.sigmaSeconds * 1e6, 3),
  },
  {
    id: 'rate',
    head: 'Rate',
    unit: 'ps/s',
    isFigure: true,
    from: 'desk',
    value: ({ now }) => now?.rate ?? null,
    cell: ({ now }) => now && signedText(now.rate * 1e12, 3),
  },
  {
    id: 'day',
    head: 'In a day',
    value: ({ now }) => now?.rate ?? null,
    cell: ({ now }) => now && <span className="whitespace-nowrap">{rateWords(now.rate)}</span>,
  },
  {
    id: 'used',
    head: 'Used',
    isFigure: true,
    from: 'desk',
    value: ({ used }) => used,
    cell: ({ used }) => used,
  },
  {
    id: 'aside',
    head: 'Set aside',
    isFigure: true,
    from: 'desk',
    value: ({ setAside }) => setAside,
    cell: ({ setAside }) => setAside,
  },
  {
    id: 'read',
    head: 'Last reading',
    value: ({ readAtMs }) => readAtMs,
    cell: ({ readAtMs }) =>
      readAtMs === null ? (
        'never'
      ) : (
        <span className="whitespace-nowrap" title={fullTimeText(readAtMs)}>
          {ageText(nowMs - readAtMs)}
        </span>
      ),
  },
  {
    id: 'state',
    head: 'State',
    value: ({ readAtMs }) => readAtMs,
    cell: (clock) => <State clock={clock} nowMs={nowMs} />,
  },
];

function State({ clock, nowMs }: { clock: ClockSummary; nowMs: number }) {
  const hours = clock.readAtMs === null ? Infinity : (nowMs - clock.readAtMs) / HOUR_MS;
  if (clock.waiting > 0) return <Chip tone="warn">{clock.waiting} waiting</Chip>;
  if (hours > UNKNOWN_DAYS * 24) return <Chip tone="bad">not known</Chip>;
  if (hours > NOTE_HOURS) return <Chip tone="warn">read it</Chip>;
  return <Chip tone="ok">fresh</Chip>;
}

function ageText(ms: number): string {
  const minutes = Math.floor(ms / 60_000);
  if (minutes < 60) return `${minutes} min ago`;
  if (minutes < 48 * 60) return `${Math.floor(minutes / 60)} h ago`;
  return `${Math.floor(minutes / 1440)} days ago`;
}

/** One line for each clock; the sign is said in the head, as on screen. */
function clocksCsv(clocks: readonly ClockSummary[], nowMs: number): string {
  const head = ['station', 'at_utc', 'early_positive_us', 'sigma_us', 'rate_ps_per_s', 'used', 'set_aside'];
  return csvText([
    [...head, 'last_reading_utc'],
    ...clocks.map(({ code, now, used, setAside, readAtMs }) => [
      code,
      new Date(nowMs).toISOString(),
      now ? (now.offsetSeconds * 1e6).toFixed(4) : '',
      now ? (now.sigmaSeconds * 1e6).toFixed(4) : '',
      now ? (now.rate * 1e12).toFixed(4) : '',
      used,
      setAside,
      readAtMs === null ? '' : new Date(readAtMs).toISOString(),
    ]),
  ]);
}
