'use client';

import { useActs } from '../_timeline/acts';
import { useDerived } from '../_timeline/derived';
import { columnLengthText, signedText } from '@/app/_ui/format';
import { predictClock } from '@/src/clock/fit';
import { offsetWords } from '@/src/clock/reading';
import { useTimeline } from '../_timeline/store';
import { toggleStation } from '@/src/schedule/gestures/toggle-station';
import type { PathLeg } from '@/src/schedule/paths';
import type { Scan, StationCode } from '@/src/schedule/plan';

const MS_PER_HOUR = 3_600_000;

/** Where each dish points, how long it slews and what time it has to spare. */
export function StationTable({ scan }: { scan: Scan }) {
  const stations = useTimeline((state) => state.stations);
  const least = useTimeline((state) => state.context.settings.leastSpareSeconds);
  const chosen = useTimeline((state) => state.chosen?.station ?? null);
  const canEdit = useTimeline((state) => state.canEdit);
  const legs = useDerived((derived) => derived.legs);
  const { dispatch } = useActs();
  return (
    <table className="tt tt-tight">
      <caption className="sr-only">
        Stations of the scan; clocks are station clock minus UTC, via GPS, positive = early
      </caption>
      <thead>
        <tr>
          <th scope="col">
            <span className="sr-only">Station</span>
          </th>
          <Head name="Az" />
          <Head name="El" />
          <Head name="Slew" unit="min:s" />
          <Head name="Spare" unit="min:s" />
          <Head name="Clock minus" unit="UTC, µs" />
          <Head name="Age" unit="h" />
        </tr>
      </thead>
      <tbody>
        {stations.map(({ code, name }) => {
          const leg = legs.get(code)?.find(({ scanId }) => scanId === scan.id);
          const takesPart = scan.stations.some(({ station }) => station === code);
          return (
            <tr key={code} className={chosen === code ? 'bg-wash' : ''}>
              <th scope="row">
                <label className="flex items-center gap-1.5" title={name}>
                  {canEdit && (
                    <input
                      type="checkbox"
                      aria-label={`${code} takes part`}
                      checked={takesPart}
                      onChange={() => dispatch((plan) => toggleStation(plan, scan.id, code))}
                    />
                  )}
                  <span className={`code ${takesPart ? 'text-ink' : 'text-ink3'}`}>{code}</span>
                </label>
              </th>
              {leg ? (
                <LegCells leg={leg} least={least} />
              ) : (
                <td className="num text-ink3" colSpan={4}>
                  left out
                </td>
              )}
              <ClockCells code={code} scan={scan} />
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}

function Head({ name, unit }: { name: string; unit?: string }) {
  return (
    <th scope="col" className="num">
      {name}
      {unit !== undefined && (
        <>
          <br />
          {unit}
        </>
      )}
    </th>
  );
}

/** What the clock log predicts for the middle of the scan, and how old its newest reading is now. */
function ClockCells({ code, scan }: { code: StationCode; scan: Scan }) {
  const clock = useTimeline((state) => state.clocks[code]);
  const nowMs = useTimeline((state) => state.context.nowMs);
  const noteAfterHours = useTimeline((state) => state.context.settings.clockRules.noteAfterHours);
  if (!clock?.fit || clock.readAtMs === null)
    return (
      <td className="num text-ink3" colSpan={2}>
        not read
      </td>
    );
  const middle = new Date(scan.startMs + scan.lengthSeconds * 500);
  const { offsetSeconds } = predictClock(clock.fit, middle);
  const hours = Math.floor((nowMs - clock.readAtMs) / MS_PER_HOUR);
  const isOld = hours >= noteAfterHours;
  return (
    <>
      <td className="num" title={`${code} clock: ${offsetWords(offsetSeconds)}`}>
        {signedText(offsetSeconds * 1e6, 3)}
      </td>
      <td
        className={`num ${isOld ? 'font-strong text-ochre' : ''}`}
        title={isOld ? 'older than the note age' : undefined}
      >
        {isOld && 'clk '}
        {hours}
      </td>
    </>
  );
}

function LegCells({ leg, least }: { leg: PathLeg; least: number }) {
  const spare = leg.spareSeconds;
  return (
    <>
      <td className="num">{leg.startAzEl.azimuthDeg.toFixed(0)}°</td>
      <td className="num">{leg.startAzEl.elevationDeg.toFixed(0)}°</td>
      <td className="num">{leg.slewSeconds === null ? '–' : columnLengthText(leg.slewSeconds)}</td>
      <td
        className={`num ${spare !== null && spare < 0 ? 'font-strong text-verm' : spare !== null && spare < least ? 'text-ochre' : ''}`}
      >
        {spare === null ? '–' : columnLengthText(spare)}
      </td>
    </>
  );
}
