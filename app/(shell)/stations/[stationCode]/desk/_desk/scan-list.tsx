'use client';

import { useEffect, useRef } from 'react';
import { angleText, dayText } from '@/app/_ui/format';
import type { DeskDto, DeskScan } from '@/src/data/desk/dto';
import { clockText } from '@/src/schedule/words';
import { OutcomeMark } from './outcome-words';
import type { Saying } from './use-saying';

type Run = NonNullable<DeskDto['run']>;
type Props = { run: Run; now: number; saying: Saying; canSay: boolean; onChoose: (scanId: string) => void };

/** All scans of the run at this station, with how they went; a word can be amended from here. */
export function ScanList({ run, now, saying, canSay, onChoose }: Props) {
  const done = run.scans.filter(({ stopMs }) => stopMs <= now).length;
  const nextId = run.scans.find(({ stopMs }) => stopMs > now)?.scanId;
  const box = useRef<HTMLDivElement>(null);
  // where the list scrolls by itself, what comes next is in sight
  useEffect(() => {
    const row = box.current?.querySelector<HTMLElement>('[aria-current]');
    if (box.current && row) box.current.scrollTop = row.offsetTop - box.current.clientHeight / 2;
  }, [nextId]);
  return (
    <section aria-labelledby="scans-title" className="desk-list">
      <header className="flex items-baseline justify-between gap-2 pb-1.5">
        <h2 id="scans-title">Scans</h2>
        <span className="help">
          {run.scans.length} {run.scans.length === 1 ? 'scan' : 'scans'}, {done} over ·{' '}
          {run.kind === 'publish' ? 'version' : 'offer'} {run.number}
        </span>
      </header>
      <div ref={box} className="desk-scroll" tabIndex={0} role="group" aria-label="Scans of the run">
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">Scan</th>
              <th scope="col">Start</th>
              <th scope="col">Stop</th>
              <th scope="col">Source</th>
              <th scope="col" className="num">
                Az
              </th>
              <th scope="col" className="num">
                El
              </th>
              <th scope="col" className="gap">
                Went
              </th>
            </tr>
          </thead>
          <tbody>
            {run.scans.map((scan, index) => (
              <tr
                key={scan.scanId}
                aria-current={scan.scanId === nextId || undefined}
                className={scan.scanId === nextId ? 'desk-current' : ''}
              >
                <th scope="row" className="font-strong">
                  {scan.number}
                </th>
                <td title={`day ${dayText(scan.startMs)}`}>
                  {isNewDay(run.scans, index) && <b>{dayText(scan.startMs)} </b>}
                  {clockText(scan.startMs)}
                </td>
                <td>{clockText(scan.stopMs)}</td>
                <td>{scan.source}</td>
                <td className="num">{angleText(scan.startAzDeg)}</td>
                <td className="num">{angleText(scan.startElDeg)}</td>
                <td className="gap whitespace-nowrap">
                  <Went scan={scan} now={now} saying={saying} canSay={canSay} onChoose={onChoose} />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}

const isNewDay = (scans: readonly DeskScan[], index: number): boolean => {
  const [before, scan] = [scans[index - 1], scans[index]];
  return before !== undefined && scan !== undefined && dayText(before.startMs) !== dayText(scan.startMs);
};

function Went({ scan, now, saying, canSay, onChoose }: Omit<Props, 'run'> & { scan: DeskScan }) {
  const said = saying.outcomeOf(scan.scanId);
  if (scan.stopMs > now) return scan.startMs <= now ? <b>now</b> : null;
  const word = said ? (
    <>
      <OutcomeMark outcome={said.outcome} /> {said.outcome}
      {said.times > 1 && <span className="text-ink3">, amended</span>}
    </>
  ) : (
    'not said'
  );
  if (!canSay) return <span className="inline-flex items-center gap-1.5">{word}</span>;
  return (
    <button
      type="button"
      className={`desk-said ${said ? '' : 'font-strong text-verm'}`}
      aria-label={`Scan ${scan.number}: ${said ? `${said.outcome}, amend` : 'not said, say how it went'}`}
      onClick={() => onChoose(scan.scanId)}
    >
      {said ? word : 'say now'}
    </button>
  );
}
