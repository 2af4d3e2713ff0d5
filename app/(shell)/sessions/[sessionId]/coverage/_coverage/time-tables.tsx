'use client';

import { numberText } from '@/app/_ui/format';
import type { CoverageSheet } from '@/src/data/coverage/dto';
import type { Coverage } from '@/src/outlook/coverage';
import { endsText, MEGA, scansOf, type BaselineRow, type Ends } from './model';

type Props = {
  coverage: Coverage;
  stations: CoverageSheet['stations'];
  rows: readonly BaselineRow[];
  lit: Ends | null;
  onLight: (ends: Ends | null) => void;
};

/** Time on source: of each station, and of each baseline with its reach; a baseline is lit in the plot. */
export function TimeTables({ coverage, stations, rows, lit, onLight }: Props) {
  return (
    <>
      <h2 className="mb-1.5">Time on source</h2>
      <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-x-6 gap-y-3.5 narrow:grid-cols-[minmax(0,2fr)_minmax(0,3fr)]">
        <table className="tt">
          <caption className="sr-only">Time on source of each station</caption>
          <thead>
            <tr>
              <th scope="col">Station</th>
              <th scope="col" className="num">
                Scans
              </th>
              <th scope="col" className="num">
                On source
                <br />
                min
              </th>
            </tr>
          </thead>
          <tbody>
            {stations.map(({ code, name }) => (
              <tr key={code}>
                <th scope="row" className="text-left">
                  <span className="code">{code}</span> <span className="text-ink2">{name}</span>
                </th>
                <td className="num">{scansOf(coverage, code)}</td>
                <td className="num">{minutes(coverage.stationSeconds[code] ?? 0)}</td>
              </tr>
            ))}
          </tbody>
        </table>
        <table className="tt">
          <caption className="sr-only">Time on source and reach of each baseline</caption>
          <thead>
            <tr>
              <th scope="col">Baseline</th>
              <th scope="col" className="num">
                Scans
              </th>
              <th scope="col" className="num">
                On source
                <br />
                min
              </th>
              <th scope="col" className="num">
                Shortest
                <br />
                Mλ
              </th>
              <th scope="col" className="num">
                Longest
                <br />
                Mλ
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => {
              const isLit = row.first === lit?.first && row.second === lit.second;
              return (
                <tr key={endsText(row)} className={isLit ? 'bg-wash' : ''}>
                  <th scope="row" className={`text-left ${isLit ? 'shadow-[inset_5px_0_0_var(--ink)]' : ''}`}>
                    <button
                      type="button"
                      aria-pressed={isLit}
                      title="Show in the plot"
                      onClick={() => onLight(isLit ? null : row)}
                      className={`code min-h-row underline decoration-rule underline-offset-[3px] hover:decoration-ink ${isLit ? 'pl-2.5' : ''}`}
                    >
                      {endsText(row)}
                    </button>
                  </th>
                  <td className="num">{row.scanCount}</td>
                  <td className="num">{minutes(row.seconds)}</td>
                  <td className="num">{mega(row.shortest)}</td>
                  <td className="num">{mega(row.longest)}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
    </>
  );
}

const minutes = (seconds: number) => numberText(seconds / 60, seconds % 60 === 0 ? 0 : 1);
const mega = (wavelengths: number) => numberText(wavelengths / MEGA, wavelengths < 10 * MEGA ? 1 : 0);
