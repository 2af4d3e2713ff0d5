import type { Route } from 'next';
import Link from 'next/link';
import type { ReactNode } from 'react';
import { Chip } from '@/app/_ui/chip';
import { dayText, minuteText, spanText } from '@/app/_ui/format';
import { fullTimeText } from '@/src/schedule/words';
import { AnswerBox } from '@/app/_ui/answer-box';
import { StationCode } from '@/app/_ui/station-code';
import type { SessionListItem } from '@/src/data/session/dto';
import { utcParts } from '@/src/units/time';
import { Begins } from './begins';
import type { ListedStation } from './listing';

type SessionTableProps = {
  sessions: readonly SessionListItem[];
  stations: readonly ListedStation[];
  nowMs: number;
  problems: Readonly<Record<string, ReactNode>>;
};

export function SessionTable({ sessions, stations, nowMs, problems }: SessionTableProps) {
  const hasProblems = sessions.some(({ id }) => id in problems);
  const hasScans = sessions.some(({ scanCount }) => scanCount !== null);
  return (
    <table className="list">
      <caption className="sr-only">Sessions with their times, stations and states</caption>
      <thead>
        <tr>
          <th scope="col">Session</th>
          <th scope="col">Start UT, day</th>
          <th scope="col" className="from-desk">
            Stop UT, day
          </th>
          <th scope="col" className="num from-narrow">
            Length
          </th>
          <th scope="col">Stations, west to east</th>
          <th scope="col">State</th>
          {hasScans && (
            <th scope="col" className="num from-narrow">
              Scans
            </th>
          )}
          {hasProblems && (
            <th scope="col" className="from-desk">
              Problems
            </th>
          )}
          <th scope="col" className="from-desk list-begins">
            Begins
          </th>
        </tr>
      </thead>
      <tbody>
        {sessions.map((session) => (
          <tr key={session.id}>
            <th scope="row" className="list-title">
              <Title session={session} />
              <div className="text-small text-ink2">{session.code}</div>
            </th>
            <td>
              <Instant ms={session.startMs} nowMs={nowMs} />
            </td>
            <td className="from-desk">
              <Instant ms={session.startMs + session.lengthSeconds * 1000} nowMs={nowMs} />
            </td>
            <td className="num from-narrow">{spanText(session.lengthSeconds)}</td>
            <td>
              <span className="list-stations">
                {stations
                  .filter(({ code }) => session.stations.includes(code))
                  .map(({ code, name }) => {
                    const answer = session.answers[code];
                    return answer ? (
                      <AnswerBox key={code} code={code} name={name} answer={answer} />
                    ) : (
                      <StationCode key={code} code={code} name={name} />
                    );
                  })}
              </span>
            </td>
            <td>
              <Chip>{session.state}</Chip>
              {session.offer && (
                <div className="pt-1 text-small text-ink2">
                  {session.offer.kind === 'publish' ? 'version' : 'offer'} {session.offer.number}
                </div>
              )}
            </td>
            {hasScans && <td className="num from-narrow">{scansText(session.scanCount)}</td>}
            {hasProblems && <td className="from-desk">{problems[session.id]}</td>}
            <td className="from-desk list-begins">
              <Begins startMs={session.startMs} lengthSeconds={session.lengthSeconds} nowMs={nowMs} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Title({ session }: { session: SessionListItem }) {
  const page = session.canReadPlan ? 'timeline' : 'slots';
  return (
    <Link href={`/sessions/${encodeURIComponent(session.code)}/${page}` as Route}>
      <b>{session.title}</b>
    </Link>
  );
}

function Instant({ ms, nowMs }: { ms: number; nowMs: number }) {
  const { year } = utcParts(ms);
  return (
    <time dateTime={new Date(ms).toISOString()} title={fullTimeText(ms)} className="whitespace-nowrap">
      {year !== utcParts(nowMs).year && `${year} `}
      <b>{dayText(ms)}</b> {minuteText(ms)}
    </time>
  );
}

function scansText(count: number | null): string {
  if (count === null) return '';
  return count === 0 ? 'none yet' : String(count);
}
