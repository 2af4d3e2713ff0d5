import { dayText, minuteText, numberText, signedText } from '@/app/_ui/format';
import { predictClock, segmentAt } from '@/src/clock/fit';
import { offsetWords, rateWords } from '@/src/clock/reading';
import type { StationClockDto } from '@/src/data/clock/dto';
import { CHANGE_WORDS } from './change-words';

const HOUR_MS = 3_600_000;
const NOTE_HOURS = 24;

/** What the clock says now, in words and in figures, and where the figures come from. */
export function Numbers({ clock }: { clock: StationClockDto }) {
  const { station, fit, now, nowMs, readings, changes, sessions } = clock;
  const segment = fit && segmentAt(fit, new Date(nowMs));
  if (!fit || !now || !segment) {
    return (
      <section className="clk-card">
        <h2>No reading yet</h2>
        <p>
          The clock of {station.code} was not read, so nothing is known of it. The first reading gives an
          offset, the second a rate.
        </p>
      </section>
    );
  }
  const newest = readings.find(({ state }) => state === 'used');
  const ageHours = newest ? Math.floor((nowMs - newest.atMs) / HOUR_MS) : 0;
  const next = sessions.find(({ endMs }) => endMs > nowMs);
  const middle = next && predictClock(fit, new Date((next.startMs + next.endMs) / 2));
  const lines: [string, string][] = [
    ['Offset now', `${signedText(now.offsetSeconds * 1e6, 3)} ± ${numberText(now.sigmaSeconds * 1e6, 3)} µs`],
    ['Rate', `${signedText(now.rate * 1e12, 3)} ± ${numberText(segment.sigmaRate * 1e12, 3)} ps/s`],
    [
      'Drift',
      segment.driftPerDay === null
        ? 'the data do not bear one'
        : `${segment.driftPerDay.toExponential(1)} a day`,
    ],
    ['Scatter about the fit', `${numberText(segment.scatterSeconds * 1e6, 3)} µs rms`],
    ['Readings used', `${segment.used.length} of ${segment.used.length + segment.setAside.length}`],
    ['Fit from', timeWords(segment.from ?? segment.firstAt) + (segment.from ? ' (change)' : '')],
    ['Fit to', timeWords(segment.lastAt)],
    ...(middle && next
      ? ([
          [
            `Uncertainty at mid-session (95%), ${next.code}`,
            `± ${numberText(2 * middle.sigmaSeconds * 1e6, 3)} µs`,
          ],
        ] as [string, string][])
      : []),
    [
      'Instrument delay',
      station.instrumentDelaySeconds === null
        ? 'not known yet'
        : `${signedText(station.instrumentDelaySeconds * 1e6, 3)} ± ${numberText((station.instrumentDelaySigmaSeconds ?? 0) * 1e6, 3)} µs`,
    ],
  ];
  return (
    <section className="clk-card" aria-labelledby="now-title">
      <h2 id="now-title">The clock now</h2>
      <p className="help">station clock minus UTC, via GPS, positive = early</p>
      <p className="clk-sentence">
        {station.code} clock is <Offset seconds={now.offsetSeconds} /> and {rateWords(now.rate)}.
      </p>
      {ageHours >= NOTE_HOURS && (
        <p className="clk-note" role="status">
          The newest reading is {ageHours} h old.
        </p>
      )}
      {clock.isBehindChange && (
        <p className="clk-note" role="status">
          The station was changed since the newest reading: what stands here is from before. Read the clock.
        </p>
      )}
      <dl className="clk-numbers">
        {lines.map(([name, value]) => (
          <div key={name}>
            <dt>{name}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
      {changes.length > 0 && (
        <>
          <h3 className="pt-2">Changes at the station</h3>
          <ul>
            {changes.map(({ id, atMs, kind, note }) => (
              <li key={id} className="border-b border-hair py-1">
                <b>{timeWords(new Date(atMs))}</b> {CHANGE_WORDS[kind]}
                {note !== '' && <span className="help block">{note}</span>}
              </li>
            ))}
          </ul>
        </>
      )}
    </section>
  );
}

/** "EARLY by 3.214 µs" with the word that matters in bold. */
export function Offset({ seconds }: { seconds: number }) {
  const [word = '', ...rest] = offsetWords(seconds).split(' ');
  return (
    <>
      <b>{word}</b> {rest.join(' ')}
    </>
  );
}

const timeWords = (at: Date) => `day ${dayText(at.getTime())}, ${minuteText(at.getTime())}`;
