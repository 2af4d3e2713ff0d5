'use client';

import { useActs } from '../_timeline/acts';
import { useDerived } from '../_timeline/derived';
import { columnLengthText } from '@/app/_ui/format';
import { useTimeline } from '../_timeline/store';
import { toggleStation } from '@/src/schedule/gestures/toggle-station';
import type { PathLeg } from '@/src/schedule/paths';
import type { Scan } from '@/src/schedule/plan';

/** Where each dish points, how long it slews and what time it has to spare. */
export function StationTable({ scan }: { scan: Scan }) {
  const stations = useTimeline((state) => state.stations);
  const least = useTimeline((state) => state.context.settings.leastSpareSeconds);
  const chosen = useTimeline((state) => state.chosen?.station ?? null);
  const canEdit = useTimeline((state) => state.canEdit);
  const legs = useDerived((derived) => derived.legs);
  const { dispatch } = useActs();
  return (
    <table className="tt">
      <caption className="sr-only">Stations of the scan</caption>
      <thead>
        <tr>
          <th scope="col">
            <span className="sr-only">Station</span>
          </th>
          <th scope="col" className="num">
            Az
          </th>
          <th scope="col" className="num">
            El
          </th>
          <th scope="col" className="num">
            Slew
            <br />
            min:s
          </th>
          <th scope="col" className="num">
            Spare
            <br />
            min:s
          </th>
          {canEdit && (
            <th scope="col" className="num">
              <span className="sr-only">Take out or put in</span>
            </th>
          )}
        </tr>
      </thead>
      <tbody>
        {stations.map(({ code, name }) => {
          const leg = legs.get(code)?.find(({ scanId }) => scanId === scan.id);
          const takesPart = scan.stations.some(({ station }) => station === code);
          return (
            <tr key={code} className={chosen === code ? 'bg-wash' : ''}>
              <th scope="row">
                <span className={`code ${takesPart ? 'text-ink' : 'text-ink3'}`} title={name}>
                  {code}
                </span>
              </th>
              {leg ? (
                <LegCells leg={leg} least={least} />
              ) : (
                <td className="num text-ink3" colSpan={4}>
                  left out
                </td>
              )}
              {canEdit && (
                <td className="num whitespace-nowrap">
                  <button
                    type="button"
                    className="text-small text-ink2 underline underline-offset-[3px]"
                    aria-label={`${takesPart ? 'Take' : 'Put'} ${code} ${takesPart ? 'out' : 'in'}`}
                    onClick={() => dispatch((plan) => toggleStation(plan, scan.id, code))}
                  >
                    {takesPart ? 'out' : 'in'}
                  </button>
                </td>
              )}
            </tr>
          );
        })}
      </tbody>
    </table>
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
