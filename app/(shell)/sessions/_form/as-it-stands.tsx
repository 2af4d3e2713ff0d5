'use client';

import { useDeferredValue, useMemo } from 'react';
import { dayText, minuteText, numberText, spanText } from '@/app/_ui/format';
import { FootnoteLetter } from '@/app/_ui/footnote-letter';
import { staveOrder } from '@/app/_ui/stave-order';
import type { SessionChoices } from '@/src/data/session/choices';
import type { SessionTyped } from '@/src/exchange/session-form';
import { standingOf, type Overlap, type Standing } from './standing';
import { UpStrips } from './up-strips';

type Props = { typed: SessionTyped; choices: SessionChoices };

/** What the session would find, worked out anew as the form is typed. */
export default function AsItStands({ typed, choices }: Props) {
  const settled = useDeferredValue(typed);
  const standing = useMemo(() => standingOf(settled, choices), [settled, choices]);
  const count = settled.stations.length;
  return (
    <aside className="sform-side" aria-labelledby="as-it-stands">
      <div className="flex items-baseline justify-between gap-2">
        <h2 id="as-it-stands">As it stands</h2>
        <span className="help">worked out as you type</span>
      </div>
      {standing === null || count === 0 ? (
        <p className="help">
          {standing === null
            ? 'Give a start and a length to see which sources are up.'
            : 'Choose stations and sources to see how they go together.'}
        </p>
      ) : (
        <>
          <UpStrips
            standing={standing}
            stationCount={count}
            nameOf={(id) => choices.sources.find((one) => one.id === id)?.name ?? id}
          />
          <Together standing={standing} count={count} />
          <Recorded standing={standing} choices={choices} />
          <Notes standing={standing} />
        </>
      )}
    </aside>
  );
}

function Together({ standing: { prospect }, count }: { standing: Standing; count: number }) {
  const { baselines } = prospect;
  const rows: [string, string][] = [
    [`All ${count} together, some target`, minutesText(prospect.allSeconds)],
    ...(count > 2
      ? [[`At least ${count - 1}`, minutesText(prospect.allButOneSeconds)] satisfies [string, string]]
      : []),
    [
      'Baselines',
      baselines.count === 0
        ? 'none with one station'
        : `${baselines.count}, up to ${numberText(baselines.longestM / 1000)} km`,
    ],
  ];
  return (
    <dl className="kv">
      {rows.map(([term, value]) => (
        <div key={term}>
          <dt>{term}</dt>
          <dd className="font-strong">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

function Recorded({ standing: { prospect }, choices }: { standing: Standing; choices: SessionChoices }) {
  const { recorded } = prospect;
  if (recorded.length === 0) return <p className="help">Choose a mode to see how much is recorded.</p>;
  const order = staveOrder(choices.stations).map(({ code }) => code);
  const rows = [...recorded].sort((a, b) => order.indexOf(a.code) - order.indexOf(b.code));
  return (
    <section aria-labelledby="recorded">
      <h3 id="recorded" className="mb-1">
        Recorded, if half the time is on source
      </h3>
      <table className="tt">
        <thead>
          <tr>
            <th scope="col">
              <span className="sr-only">Station</span>
            </th>
            <Figure name="Rate" unit="Mb/s" />
            <Figure name="Volume" unit="TB" />
            <Figure name="Free" unit="TB" />
            <th scope="col" className="gap">
              Enough
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ code, bitsPerS, bytes, freeBytes }) => (
            <tr key={code}>
              <th scope="row">
                <span className="code">{code}</span>
              </th>
              <td className="num">{numberText(bitsPerS / 1e6)}</td>
              <td className="num font-strong">{numberText(bytes / 1e12, 2)}</td>
              <td className="num">{freeBytes === null ? 'not said' : numberText(freeBytes / 1e12, 2)}</td>
              <td className="gap">
                <Enough bytes={bytes} freeBytes={freeBytes} />
              </td>
            </tr>
          ))}
          <tr>
            <th scope="row">All</th>
            <td />
            <td className="num font-strong">
              {numberText(rows.reduce((sum, { bytes }) => sum + bytes, 0) / 1e12, 2)}
            </td>
            <td />
            <td />
          </tr>
        </tbody>
      </table>
    </section>
  );
}

/** A window is known to the second, a plan to the minute. */
const minutesText = (seconds: number) => spanText(Math.floor(seconds / 60) * 60);

function Enough({ bytes, freeBytes }: { bytes: number; freeBytes: number | null }) {
  if (freeBytes === null) return null;
  if (freeBytes >= bytes) return 'yes';
  return <b className="text-verm">{numberText((bytes - freeBytes) / 1e12, 2)} TB short</b>;
}

const Figure = ({ name, unit }: { name: string; unit: string }) => (
  <th scope="col" className="num">
    {name}
    <br />
    {unit}
  </th>
);

function Notes({ standing }: { standing: Standing }) {
  const { overlaps, prospect } = standing;
  const short = prospect.recorded.filter(({ bytes, freeBytes }) => freeBytes !== null && freeBytes < bytes);
  const bySession = new Map<string, Overlap[]>();
  for (const one of overlaps)
    if ('session' in one.by) bySession.set(one.by.session, [...(bySession.get(one.by.session) ?? []), one]);
  const away = overlaps.filter(({ by }) => 'why' in by);
  if (overlaps.length === 0 && short.length === 0) return null;
  return (
    <>
      <ul className="flex flex-col gap-2" aria-live="polite">
        {[...bySession].map(([code, hits]) => (
          <Note key={code} isMustFix>
            <b>{code}</b> takes {hits.map(({ station }) => station).join(', ')} until{' '}
            {minuteText(hits[0]?.endMs ?? 0)}, day {dayText(hits[0]?.endMs ?? 0)}.
          </Note>
        ))}
        {away.map(({ station, startMs, endMs, by }) => (
          <Note key={`${station}${startMs}`} isMustFix={false}>
            <b>{station}</b> cannot observe from {minuteText(startMs)}, day {dayText(startMs)}, to{' '}
            {minuteText(endMs)}, day {dayText(endMs)}
            {'why' in by && by.why !== '' ? `: ${by.why}` : ''}.
          </Note>
        ))}
        {short.map(({ code, bytes, freeBytes }) => (
          <Note key={code} isMustFix={false}>
            <b>{code}</b> needs {numberText((bytes - (freeBytes ?? 0)) / 1e12, 2)} TB more, or a shorter
            session.
          </Note>
        ))}
      </ul>
      <p className="help mt-auto">
        A session may be made with things to fix. They stand in the timeline until they are solved.
      </p>
    </>
  );
}

function Note({ isMustFix, children }: { isMustFix: boolean; children: React.ReactNode }) {
  return (
    <li className="flex gap-2">
      <FootnoteLetter mustFix={isMustFix} />
      <span className="min-w-0">{children}</span>
    </li>
  );
}
