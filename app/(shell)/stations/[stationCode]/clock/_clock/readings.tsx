'use client';

import { useState } from 'react';
import { Dialog } from '@/app/_ui/dialog';
import { Field } from '@/app/_ui/field';
import { dayText, numberText, signedText } from '@/app/_ui/format';
import { offsetWords } from '@/src/clock/reading';
import type { ReadingDto, StationClockDto } from '@/src/data/clock/dto';
import { clockText, fullTimeText } from '@/src/schedule/words';
import { setAside } from '../actions';
import { isUsed } from './chart-scale';

const FIRST = 30;

const ORIGINS: Readonly<Record<ReadingDto['origin'], string>> = {
  form: 'typed in',
  file: 'counter',
  api: 'counter',
  desk: 'desk',
};

const SECONDS: Readonly<Record<ReadingDto['secondCheck'], string>> = {
  yes: 'yes',
  no: 'not checked',
  off: 'off',
};

/** The readings as a table, newest first; those set aside stay, with why. */
export function Readings({
  clock,
  shown,
  isAll,
}: {
  clock: StationClockDto;
  shown: readonly ReadingDto[];
  isAll: boolean;
}) {
  const [count, setCount] = useState(FIRST);
  const [asked, setAsked] = useState<ReadingDto | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const { code } = clock.station;
  const aside = shown.filter((one) => !isUsed(one)).length;
  const use = async (one: ReadingDto) => {
    const answer = await setAside(code, one.id, { state: 'used' });
    setTrouble(answer.ok ? null : answer.message);
  };
  if (clock.readings.length === 0) return <p className="help">No readings yet.</p>;
  return (
    <>
      <header className="flex flex-wrap items-baseline justify-between gap-2 pb-1.5">
        <h2 className="text-lead">Readings</h2>
        <span className="help">
          station clock minus UTC, via GPS, positive = early · {shown.length}
          {isAll ? '' : ` of ${clock.readings.length}`}, {aside} set aside
        </span>
      </header>
      {trouble !== null && (
        <p role="alert" className="error-box mb-2">
          {trouble}
        </p>
      )}
      <div className="clk-scroll" tabIndex={0} role="group" aria-label="Readings">
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">Day, UT</th>
              <th scope="col" className="num">
                Offset
                <br />
                µs
              </th>
              <th scope="col" className="gap from-narrow">
                In words
              </th>
              <th scope="col" className="num">
                From fit
                <br />
                µs
              </th>
              <th scope="col" className="gap from-narrow">
                Second
              </th>
              <th scope="col" className="from-narrow">
                Way
              </th>
              <th scope="col" className="gap">
                State
              </th>
              {clock.canSetAside && <th scope="col">Do</th>}
            </tr>
          </thead>
          <tbody>
            {shown.slice(0, count).map((one) => (
              <tr key={one.id} className={isUsed(one) ? '' : 'text-verm'}>
                <th scope="row" title={fullTimeText(one.atMs)} className="whitespace-nowrap">
                  {dayText(one.atMs)} {clockText(one.atMs)}
                </th>
                <td className="num">{signedText(one.offsetSeconds * 1e6, 3)}</td>
                <td className="gap from-narrow">
                  {offsetWords(one.offsetSeconds).split(' ')[0]?.toLowerCase()}
                </td>
                <td className="num">
                  {one.fromFitSeconds === null ? '' : signedText(one.fromFitSeconds * 1e6, 3)}
                </td>
                <td className="gap from-narrow">
                  {SECONDS[one.secondCheck]}
                  {one.secondOff === null ? '' : ` by ${numberText(one.secondOff)} s`}
                </td>
                <td className="from-narrow">{ORIGINS[one.origin]}</td>
                <td className="gap">
                  {one.state === 'used'
                    ? one.isFar
                      ? 'set aside by the fit'
                      : 'used'
                    : one.state.replace('-', ' ')}
                  {one.reason !== '' && <span className="block text-small">{one.reason}</span>}
                  {one.note !== '' && <span className="help block">{one.note}</span>}
                </td>
                {clock.canSetAside && (
                  <td>
                    {one.state === 'used' ? (
                      <button type="button" className="link min-h-[24px]" onClick={() => setAsked(one)}>
                        Set aside<span className="sr-only"> the reading of {fullTimeText(one.atMs)}</span>
                      </button>
                    ) : (
                      <button type="button" className="link min-h-[24px]" onClick={() => void use(one)}>
                        Use again<span className="sr-only">, the reading of {fullTimeText(one.atMs)}</span>
                      </button>
                    )}
                  </td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
        {shown.length === 0 && <p className="help py-2">No reading in these days. Choose more days above.</p>}
        {shown.length > count && (
          <button type="button" className="btn mt-2" onClick={() => setCount(count + 200)}>
            Show {Math.min(200, shown.length - count)} more
          </button>
        )}
      </div>
      <Aside key={asked?.id} code={code} reading={asked} onClose={() => setAsked(null)} />
    </>
  );
}

function Aside({
  code,
  reading,
  onClose,
}: {
  code: string;
  reading: ReadingDto | null;
  onClose: () => void;
}) {
  const [reason, setReason] = useState('');
  const [error, setError] = useState<string | undefined>(undefined);
  const send = async () => {
    if (!reading) return;
    const answer = await setAside(code, reading.id, { state: 'set-aside', reason });
    if (answer.ok) return onClose();
    setError(answer.fields?.reason?.join(' ') ?? answer.message);
  };
  return (
    <Dialog
      isOpen={reading !== null}
      title="Set this reading aside?"
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Leave it in
          </button>
          <button type="button" className="btn btn-danger" onClick={() => void send()}>
            Set it aside
          </button>
        </>
      }
    >
      {reading && (
        <div className="flex flex-col gap-2.5">
          <p>
            {fullTimeText(reading.atMs)}: {offsetWords(reading.offsetSeconds)}. It stays in the log and is
            left out of the fit.
          </p>
          <Field
            label="Why"
            value={reason}
            maxLength={500}
            error={error}
            onChange={(event) => setReason(event.target.value)}
          />
        </div>
      )}
    </Dialog>
  );
}
