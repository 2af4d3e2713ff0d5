import { minuteText, spanText } from '@/app/_ui/format';
import type { SlotDto } from '@/src/data/slot/dto';
import { within, type Hours } from '@/src/schedule/slots';
import { listText } from '@/src/schedule/words';

const MOST = 6;

type Hit = { number: string; startMs: number; stopMs: number; source: string; seconds: number; lost: number };

/** Which scans an answer costs, before it is sent: what is left of each. */
export function Cost({ slot, without }: { slot: SlotDto; without: readonly Hours[] }) {
  const hits = hitsOf(slot, without);
  if (hits.length === 0) return <p className="help">No scan lies in these hours.</p>;
  const isAll = hits.length === slot.scanCount && hits.every(({ seconds, lost }) => lost >= seconds);
  const named = hits.map(({ number }) => number);
  return (
    <div role="status" className="slots-cost">
      <p>
        <b>
          {isAll
            ? `Hits all ${slot.scanCount} ${slot.scanCount === 1 ? 'scan' : 'scans'} of ${slot.stationCode}`
            : `Hits ${hits.length} of ${slot.scanCount} scans`}
        </b>
        {isAll
          ? '. No baseline with it is left.'
          : `: ${nameThem(named)}. What lies outside these hours is kept.`}
      </p>
      {!isAll && hits.length <= MOST && (
        <table className="tt">
          <caption className="sr-only">Scans in the hours you cannot</caption>
          <thead>
            <tr>
              <th scope="col">Scan</th>
              <th scope="col">UT</th>
              <th scope="col">Source</th>
              <th scope="col" className="num">
                Left of it
              </th>
            </tr>
          </thead>
          <tbody>
            {hits.map(({ number, startMs, stopMs, source, seconds, lost }) => (
              <tr key={number}>
                <th scope="row">{number}</th>
                <td>
                  {minuteText(startMs)}–{minuteText(stopMs)}
                </td>
                <td>{source}</td>
                <td className={`num ${lost >= seconds ? 'font-strong text-verm' : ''}`}>
                  {lost >= seconds ? 'none' : `${spanText(seconds - lost)} of ${spanText(seconds)}`}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </div>
  );
}

const nameThem = (names: readonly string[]): string =>
  listText(names.length > MOST + 1 ? [...names.slice(0, MOST), `${names.length - MOST} more`] : names);

/** The legs of a nodding group count as one. */
function hitsOf(slot: SlotDto, without: readonly Hours[]): Hit[] {
  const groups = new Map<string, Hit>();
  for (const { number, startMs, stopMs, source } of slot.scans) {
    const name = number.replace(/\.\d+$/, '');
    const lost = within([startMs, stopMs], without).reduce((sum, [a, b]) => sum + (b - a) / 1000, 0);
    const seconds = (stopMs - startMs) / 1000;
    const known = groups.get(name);
    groups.set(name, {
      number: name,
      startMs: Math.min(known?.startMs ?? startMs, startMs),
      stopMs: Math.max(known?.stopMs ?? stopMs, stopMs),
      source: known && known.source !== source ? joined(known.source, source) : source,
      seconds: (known?.seconds ?? 0) + seconds,
      lost: (known?.lost ?? 0) + lost,
    });
  }
  return [...groups.values()].filter(({ lost }) => lost > 0);
}

const joined = (known: string, source: string): string =>
  known.split(', ').includes(source) ? known : `${known}, ${source}`;
