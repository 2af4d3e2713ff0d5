import { angleText, dayText, spanText } from '@/app/_ui/format';
import type { DeskDto, DeskScan } from '@/src/data/desk/dto';
import { clockText, lengthText } from '@/src/schedule/words';
import { SmallStave } from './small-stave';
import { countText, countUnit, localTime, siderealTime } from './times';

type Run = NonNullable<DeskDto['run']>;

/** The scan that runs or comes next, with the time to its stop or start. */
export function Coming({ desk, run, now }: { desk: DeskDto; run: Run; now: number }) {
  const current = run.scans.find(({ startMs, stopMs }) => startMs <= now && now < stopMs);
  const next = run.scans.find(({ startMs }) => startMs > now);
  const shown = current ?? next;
  return (
    <>
      <div className="desk-head">
        <h1>
          {shown
            ? `${current ? 'Now' : 'Next'}: scan ${shown.number}, ${shown.source}`
            : `${run.code} is over at ${desk.station.code}`}
        </h1>
        <p className="help">
          Local time <b>{localTime(now, desk.station.timeZone)}</b> {desk.station.timeZone} · GMST{' '}
          <b>{siderealTime(now, desk)}</b>
        </p>
      </div>
      {shown ? (
        <Countdown scan={shown} isCurrent={shown === current} now={now} />
      ) : (
        <p>
          The last scan stopped at {clockText(run.scans.at(-1)?.stopMs ?? run.endMs)} UT, day{' '}
          {dayText(run.endMs)}.
        </p>
      )}
      <SmallStave scans={run.scans} now={now} minElevationDeg={desk.station.minElevationDeg} />
      {current && next && (
        <p className="desk-then">
          <span>
            Then {next.number}, {next.source}
          </span>
          <b>
            {clockText(next.startMs)} to {clockText(next.stopMs)}
          </b>
        </p>
      )}
    </>
  );
}

const WASH_MS = 60_000;
const FRAME_MS = 10_000;

function Countdown({ scan, isCurrent, now }: { scan: DeskScan; isCurrent: boolean; now: number }) {
  const leftMs = (isCurrent ? scan.stopMs : scan.startMs) - now;
  const near = isCurrent ? '' : leftMs <= FRAME_MS ? 'is-framed' : leftMs <= WASH_MS ? 'is-washed' : '';
  return (
    <div className={`desk-count ${near}`}>
      <div>
        <div className="desk-figure" role="timer" aria-label={isCurrent ? 'Time to stop' : 'Time to start'}>
          {countText(leftMs)}
        </div>
        <p className="help">
          {countUnit(leftMs)} to {isCurrent ? 'stop' : 'start'}
        </p>
      </div>
      <dl>
        <Line name="Starts">
          <b>{clockText(scan.startMs)}</b>, day {dayText(scan.startMs)}
        </Line>
        <Line name="Stops">
          <b>{clockText(scan.stopMs)}</b>, {spanText((scan.stopMs - scan.startMs) / 1000)}
        </Line>
        <Line name="Turn">
          {scan.fromAzDeg === null ? 'to' : `${angleText(scan.fromAzDeg)} to`}{' '}
          <b>{angleText(scan.startAzDeg)}</b>, elevation{' '}
          {scan.fromElDeg === null ? '' : `${angleText(scan.fromElDeg)} to `}
          <b>{angleText(scan.startElDeg)}</b>
        </Line>
        <Line name="Motor">
          {scan.motorAxis} <b>{angleText(scan.motorStartDeg)}</b>
          {scan.turn === null ? '' : `, turn ${scan.turn}`}
        </Line>
        <Line name="Slew ends">{slewWords(scan)}</Line>
        <Line name="Mode">{scan.mode}</Line>
      </dl>
    </div>
  );
}

const Line = ({ name, children }: { name: string; children: React.ReactNode }) => (
  <div>
    <dt>{name}</dt>
    <dd>{children}</dd>
  </div>
);

function slewWords({ impossible, slewSeconds, fromStopMs, startMs, spareSeconds }: DeskScan) {
  if (impossible !== null) return <b className="text-verm">The dish {impossible}</b>;
  if (slewSeconds === null || fromStopMs === null) return 'first scan: be there in time';
  const arriveMs = fromStopMs + slewSeconds * 1000;
  const isLate = (spareSeconds ?? 0) < 0;
  return (
    <>
      <b>{clockText(Math.ceil(arriveMs / 1000) * 1000)}</b>,{' '}
      {isLate ? (
        <b className="text-verm">{lengthText(Math.ceil((arriveMs - startMs) / 1000))} late</b>
      ) : (
        `${lengthText(Math.floor((startMs - arriveMs) / 1000))} before start`
      )}
    </>
  );
}
