import { formatInTimeZone } from 'date-fns-tz';
import { dayText, minuteText } from '@/app/_ui/format';
import type { Absence } from '@/src/exchange/catalogue/station';
import { Scroll } from '../../../_catalogue/scroll';

type AwayProps = { away: readonly Absence[]; timeZone: string; nowMs: number };

export function AwayView({ away, timeZone, nowMs }: AwayProps) {
  const ahead = away.filter(({ endMs }) => endMs > nowMs);
  const past = away.length - ahead.length;
  const past0 = past === 0 ? '' : ` ${past} ${past === 1 ? 'time is' : 'times are'} past.`;
  if (ahead.length === 0) {
    return <p className="help">No time ahead is planned in which it cannot observe.{past0}</p>;
  }
  return (
    <>
      <Scroll label="Times">
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">From, UT</th>
              <th scope="col">To, UT</th>
              <th scope="col">Why</th>
            </tr>
          </thead>
          <tbody>
            {ahead.map(({ startMs, endMs, why }) => (
              <tr key={`${startMs} ${endMs} ${why}`}>
                {[startMs, endMs].map((ms) => (
                  <td key={ms} className="whitespace-nowrap">
                    {new Date(ms).toISOString().slice(0, 10)} ({dayText(ms)}) {minuteText(ms)}
                    <span className="block text-small text-ink2">
                      {formatInTimeZone(ms, timeZone, 'yyyy-MM-dd HH:mm')}
                    </span>
                  </td>
                ))}
                <td>{why}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </Scroll>
      <p className="help mt-1">
        The second line is local time, {timeZone}.{past0}
      </p>
    </>
  );
}

export function ContactsView({ contacts }: { contacts: string }) {
  return contacts === '' ? (
    <p className="help">No contacts are given.</p>
  ) : (
    <p className="whitespace-pre-line break-words">{contacts}</p>
  );
}
