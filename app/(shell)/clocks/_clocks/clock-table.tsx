import type { Route } from 'next';
import Link from 'next/link';
import { Chip } from '@/app/_ui/chip';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { numberText, signedText } from '@/app/_ui/format';
import { offsetWords, rateWords } from '@/src/clock/reading';
import type { ClockSummary } from '@/src/data/clock/dto';
import { fullTimeText } from '@/src/schedule/words';

const HOUR_MS = 3_600_000;
const NOTE_HOURS = 24;
const UNKNOWN_DAYS = 7;

/** The clocks of the network, west to east: where each is, how fast it goes, when it was read. */
export function ClockTable({ clocks, nowMs }: { clocks: readonly ClockSummary[]; nowMs: number }) {
  if (clocks.length === 0)
    return (
      <EmptySheet heading="No clock to read">
        There is no station yet. A scheduler adds stations under Stations; their operators keep the log.
      </EmptySheet>
    );
  return (
    <div className="mx-auto w-full max-w-[1180px] px-3.5 py-[18px] narrow:px-6">
      <header className="flex flex-wrap items-baseline justify-between gap-2 pb-2">
        <h1>Clocks</h1>
        <p className="help">station clock minus UTC, via GPS, positive = early</p>
      </header>
      <div className="relative overflow-x-auto" tabIndex={0} role="group" aria-label="Clocks">
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">Station</th>
              <th scope="col">Now</th>
              <th scope="col" className="num">
                Offset
                <br />
                µs
              </th>
              <th scope="col" className="num">
                ±<br />
                µs
              </th>
              <th scope="col" className="num">
                Rate
                <br />
                ps/s
              </th>
              <th scope="col" className="gap">
                In a day
              </th>
              <th scope="col" className="num">
                Used
              </th>
              <th scope="col" className="num">
                Set aside
              </th>
              <th scope="col" className="gap">
                Last reading
              </th>
              <th scope="col">State</th>
            </tr>
          </thead>
          <tbody>
            {clocks.map((clock) => (
              <tr key={clock.code}>
                <th scope="row" className="whitespace-nowrap">
                  <Link
                    href={`/stations/${clock.code}/clock` as Route}
                    className="underline underline-offset-[3px]"
                  >
                    <span className="code">{clock.code}</span> {clock.name}
                  </Link>
                </th>
                {clock.now ? (
                  <>
                    <td className="whitespace-nowrap font-strong">{offsetWords(clock.now.offsetSeconds)}</td>
                    <td className="num">{signedText(clock.now.offsetSeconds * 1e6, 3)}</td>
                    <td className="num">{numberText(clock.now.sigmaSeconds * 1e6, 3)}</td>
                    <td className="num">{signedText(clock.now.rate * 1e12, 3)}</td>
                    <td className="gap whitespace-nowrap">{rateWords(clock.now.rate)}</td>
                  </>
                ) : (
                  <td colSpan={5} className="text-ink3">
                    not known
                  </td>
                )}
                <td className="num">{clock.used}</td>
                <td className="num">{clock.setAside}</td>
                <td
                  className="gap whitespace-nowrap"
                  title={clock.readAtMs === null ? undefined : fullTimeText(clock.readAtMs)}
                >
                  {clock.readAtMs === null ? 'never' : ageText(nowMs - clock.readAtMs)}
                </td>
                <td>
                  <State clock={clock} nowMs={nowMs} />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="help pt-2">
        A reading older than {NOTE_HOURS} h is a note, one older than {UNKNOWN_DAYS} days says nothing of the
        clock: these are the limits that sessions start from, and each session may set its own.
      </p>
    </div>
  );
}

function State({ clock, nowMs }: { clock: ClockSummary; nowMs: number }) {
  const hours = clock.readAtMs === null ? Infinity : (nowMs - clock.readAtMs) / HOUR_MS;
  if (clock.waiting > 0) return <Chip tone="warn">{clock.waiting} waiting</Chip>;
  if (hours > UNKNOWN_DAYS * 24) return <Chip tone="bad">not known</Chip>;
  if (hours > NOTE_HOURS) return <Chip tone="warn">read it</Chip>;
  return <Chip tone="ok">read</Chip>;
}

function ageText(ms: number): string {
  const minutes = Math.floor(ms / 60_000);
  if (minutes < 60) return `${minutes} min ago`;
  if (minutes < 48 * 60) return `${Math.floor(minutes / 60)} h ago`;
  return `${Math.floor(minutes / 1440)} days ago`;
}
