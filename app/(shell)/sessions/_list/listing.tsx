'use client';

import Link from 'next/link';
import { useState, type ReactNode } from 'react';
import { AnswerLegend } from '@/app/_ui/answer-legend';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { Segments } from '@/app/_ui/segments';
import type { SessionListItem } from '@/src/data/session/dto';
import { Days } from './days';
import { shownSessions, type Show } from './filter';
import { SessionTable } from './session-table';

export type ListedStation = { code: string; name: string };

type ListingProps = {
  sessions: readonly SessionListItem[];
  /** in stave order */
  stations: readonly ListedStation[];
  nowMs: number;
  find: string;
  canMake: boolean;
  /** by session, for those that can still be mended */
  problems: Readonly<Record<string, ReactNode>>;
};

const SHOWS = [
  { value: 'ahead', label: 'Ahead' },
  { value: 'past', label: 'Past' },
  { value: 'all', label: 'All' },
] as const;

export function Listing({ sessions, stations, nowMs, find: asked, canMake, problems }: ListingProps) {
  const [show, setShow] = useState<Show>(asked === '' ? 'ahead' : 'all');
  const [find, setFind] = useState(asked);
  const shown = shownSessions(sessions, { show, find, nowMs });

  function showAll() {
    setShow('all');
    setFind('');
  }

  return (
    <div className="flex flex-1 flex-col">
      <div className="list-head">
        <h1>Sessions</h1>
        {sessions.length > 0 && (
          <>
            <Segments label="Which sessions" value={show} options={SHOWS} onChoose={setShow} />
            <input
              type="search"
              className="field list-find"
              aria-label="Find by code, title or station"
              placeholder="Find by code, title or station"
              value={find}
              onChange={(event) => setFind(event.target.value)}
            />
          </>
        )}
        {canMake && (
          <Link href="/sessions/new" className="btn btn-primary ml-auto">
            New session
          </Link>
        )}
      </div>
      <Days sessions={sessions} stations={stations} nowMs={nowMs} />
      {shown.length > 0 && (
        <div className="list-sheet flex-1">
          <SessionTable sessions={shown} stations={stations} nowMs={nowMs} problems={problems} />
          {shown.some(({ offer }) => offer !== null) && <AnswerLegend code={stations[0]?.code ?? ''} />}
        </div>
      )}
      {sessions.length === 0 && (
        <EmptySheet level={2} heading="No sessions yet">
          {canMake
            ? 'Make the first one: its code, its hours, the stations and the sources.'
            : 'None is planned that you have a part in. It will stand here as soon as a scheduler has made it.'}
        </EmptySheet>
      )}
      {sessions.length > 0 && shown.length === 0 && (
        <EmptySheet
          level={2}
          heading="No sessions match"
          codes={stations.map(({ code }) => code)}
          actions={
            <button type="button" className="btn btn-primary" onClick={showAll}>
              Show all sessions
            </button>
          }
        >
          {find.trim() === ''
            ? `None of your sessions is ${show}.`
            : `None ${show === 'all' ? '' : `${show} `}has “${find.trim()}” in its code, title or stations.`}
        </EmptySheet>
      )}
    </div>
  );
}
