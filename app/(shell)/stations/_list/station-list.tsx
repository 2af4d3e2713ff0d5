'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useState } from 'react';
import { Chip } from '@/app/_ui/chip';
import type { Column } from '@/app/_ui/data-table';
import { dayText, minuteText, numberText, spanText } from '@/app/_ui/format';
import { StationCode } from '@/app/_ui/station-code';
import { offsetWords } from '@/src/clock/reading';
import type { StationRow } from '@/src/data/station/dto';
import { MOUNT_WORDS } from '@/src/exchange/catalogue/station-site';
import { CatalogueList } from '../../_catalogue/catalogue-list';
import type { Query } from '../../_catalogue/use-list-state';
import { latitudeText, longitudeText } from '../_place/place-text';
import { StationMap } from './station-map';

export type ClockWord = { readAtMs: number | null; offsetSeconds: number | null };

type Props = {
  /** in stave order */
  stations: readonly StationRow[];
  /** of those whose clock the viewer may read */
  clocks: Readonly<Record<string, ClockWord>>;
  canAdd: boolean;
  nowMs: number;
  query: Query;
};

/** A reading younger than this is fresh (the session settings' default). */
const FRESH_HOURS = 24;
const MS_PER_HOUR = 3_600_000;

export function StationList({ stations, clocks, canAdd, nowMs, query }: Props) {
  const bands = [...new Set(stations.flatMap(({ sefdJy }) => Object.keys(sefdJy)))].sort(
    (a, b) => parseFloat(a) - parseFloat(b),
  );
  const [band, setBand] = useState(bands.at(-1) ?? '');
  return (
    <CatalogueList
      title="Stations"
      noun={['station', 'stations']}
      findBy="code, name or place"
      usual="West to east"
      rows={stations}
      columns={columnsOf(band, clocks, nowMs)}
      rowKey={({ code }) => code}
      text={({ code, name, timeZone }) => `${code} ${name} ${timeZone}`}
      query={query}
      addHref={canAdd ? ('/stations/new' as Route) : null}
      addLabel="Add a station"
      extra={
        bands.length > 0 && (
          <label className="cat-extra">
            Band
            <select className="field" value={band} onChange={({ target }) => setBand(target.value)}>
              {bands.map((name) => (
                <option key={name}>{name}</option>
              ))}
            </select>
          </label>
        )
      }
      above={(shown) => <StationMap stations={shown} />}
      note="From the widest gap in longitude eastward: the order of the staves. A click on a head sorts by it; a click on a row opens the station. Fresh: read within 24 h."
    />
  );
}

function columnsOf(band: string, clocks: Props['clocks'], nowMs: number): readonly Column<StationRow>[] {
  return [
    {
      id: 'name',
      head: 'Station',
      value: ({ name }) => name,
      cell: ({ code, name, timeZone }) => (
        <span className="station-name">
          <StationCode code={code} />
          <span>
            <Link href={`/stations/${code}` as Route} className="row-link">
              <b>{name}</b>
            </Link>
            <span className="cat-sub block">{timeZone}</span>
          </span>
        </span>
      ),
    },
    {
      id: 'longitude',
      head: 'Longitude',
      value: ({ site }) => site.longitudeDeg,
      cell: ({ site }) => longitudeText(site.longitudeDeg),
    },
    {
      id: 'latitude',
      head: 'Latitude',
      isFigure: true,
      value: ({ site }) => site.latitudeDeg,
      cell: ({ site }) => latitudeText(site.latitudeDeg),
    },
    {
      id: 'dish',
      head: 'Dish, mount',
      value: ({ dishM }) => dishM,
      cell: ({ dishM, mountKind }) => (
        <>
          {numberText(dishM)} m<span className="cat-sub block">{MOUNT_WORDS[mountKind].short}</span>
        </>
      ),
    },
    {
      id: 'sefd',
      head: `SEFD ${band}`,
      unit: 'Jy',
      isFigure: true,
      value: ({ sefdJy }) => sefdJy[band] ?? null,
      cell: ({ sefdJy }) => {
        const value = sefdJy[band];
        return value === undefined ? <span className="text-ink2">no data</span> : numberText(value);
      },
    },
    {
      id: 'free',
      head: 'Recorder',
      unit: 'free',
      isFigure: true,
      from: 'desk',
      value: ({ recorderFreeBytes }) => recorderFreeBytes,
      cell: ({ recorderFreeBytes }) =>
        recorderFreeBytes === null ? (
          <span className="text-ink2">not said</span>
        ) : (
          `${numberText(recorderFreeBytes / 1e12, 2)} TB`
        ),
    },
    ...(Object.keys(clocks).length > 0 ? [clockColumn(clocks, nowMs)] : []),
    {
      id: 'away',
      head: 'Next not available',
      from: 'desk',
      value: ({ nextAway }) => nextAway?.startMs ?? null,
      cell: ({ nextAway }) =>
        nextAway === null ? (
          <span className="text-ink2">none</span>
        ) : (
          <span title={nextAway.why}>
            {dayText(nextAway.startMs)} {minuteText(nextAway.startMs)},{' '}
            {spanText((nextAway.endMs - nextAway.startMs) / 1000)}
          </span>
        ),
    },
    {
      id: 'sessions',
      head: 'Sessions',
      from: 'narrow',
      value: ({ sessionsAhead }) => sessionsAhead,
      cell: ({ sessionsAhead }) => (sessionsAhead === 0 ? 'none ahead' : `${sessionsAhead} ahead`),
    },
  ];
}

/** The offset's sign is said by EARLY and LATE alone. */
const clockColumn = (clocks: Props['clocks'], nowMs: number): Column<StationRow> => ({
  id: 'clock',
  head: 'Clock, from the fit',
  value: ({ code }) => clocks[code]?.readAtMs ?? null,
  cell: ({ code }) => {
    const clock = clocks[code];
    if (!clock) return <span className="text-ink2">not yours to read</span>;
    if (clock.readAtMs === null) return <span className="text-ink2">never read</span>;
    const hours = Math.max(0, (nowMs - clock.readAtMs) / MS_PER_HOUR);
    const age = hours < 48 ? `${Math.floor(hours)} h` : `${Math.floor(hours / 24)} d`;
    return (
      <span className="station-clock">
        <span>
          {clock.offsetSeconds === null ? 'no fit' : <Early offsetSeconds={clock.offsetSeconds} />}
          <span className="cat-sub block">read {age} ago</span>
        </span>
        {hours < FRESH_HOURS ? <Chip tone="ok">fresh</Chip> : <Chip tone="warn">{age} old</Chip>}
      </span>
    );
  },
});

function Early({ offsetSeconds }: { offsetSeconds: number }) {
  const [word, ...rest] = offsetWords(offsetSeconds).split(' ');
  return (
    <>
      <b>{word}</b> {rest.join(' ')}
    </>
  );
}
