'use client';

import Link from 'next/link';
import type { Route } from 'next';
import { FringeMark } from '@/app/_ui/fringe-mark';
import { dayText, numberText } from '@/app/_ui/format';
import { isExpected, snrText, type OutlookCell } from '@/src/outlook/fringe-outlook';
import { verdictWords, whySentences } from '@/src/outlook/why';
import type { PageContext } from '../../../_plan/plan-context';
import { ClockPlace } from './clock-place';
import { scanStopMs, type PlanSpan } from '@/src/schedule/plan';
import { clockText, lengthText } from '@/src/schedule/words';
import { ElevationChart } from './elevation-chart';
import { keyOf, type Row } from './model';

type Props = {
  cell: OutlookCell | null;
  row: Row | null;
  context: PageContext;
  span: PlanSpan;
  sessionCode: string;
  onNext: () => void;
};

/** The chosen cell: verdict, why, the signal chain, both elevations. */
export function CellPanel({ cell, row, context, span, sessionCode, onNext }: Props) {
  return (
    <aside
      aria-label="Chosen cell"
      className="flex min-h-0 flex-col gap-2 overflow-y-auto border-t border-rule px-[18px] py-[12px] desk:border-l desk:border-t-0"
    >
      {cell && row ? (
        <Chosen cell={cell} row={row} context={context} span={span} />
      ) : (
        <div className="help">
          <h1 className="mb-2 text-[22px] leading-[26px] text-ink">No cell chosen</h1>
          <p>
            Click a cell of the matrix, or move to one with the arrow keys, to see why it has its verdict.
          </p>
        </div>
      )}
      <div className="mt-auto flex gap-2 pb-0.5 pt-2">
        {row && (
          <Link
            className="btn"
            href={`/sessions/${encodeURIComponent(sessionCode)}/timeline?scan=${row.scan.id}` as Route}
          >
            Show on timeline
          </Link>
        )}
        <button type="button" className="btn" onClick={onNext}>
          Next that fails
        </button>
      </div>
    </aside>
  );
}

function Chosen({
  cell,
  row,
  context,
  span,
}: {
  cell: OutlookCell;
  row: Row;
  context: PageContext;
  span: PlanSpan;
}) {
  const { scan, number } = row;
  const source = context.sources[scan.sourceId];
  const { head, detail } = verdictWords(cell, context.settings.snrLimits);
  const why = whySentences(cell, scan, context);
  return (
    <>
      <div>
        <h1 className="text-[22px] leading-[26px]">
          {keyOf(cell)}, scan {number}
        </h1>
        <p className="help">
          {source?.name} · day {dayText(scan.startMs)}, {clockText(scan.startMs)} to{' '}
          {clockText(scanStopMs(scan))} UT
        </p>
      </div>
      <div
        className={`flex items-center gap-[12px] border-l-bar px-[12px] py-[9px] ${tone(cell)}`}
        role="status"
      >
        <FringeMark verdict={cell.verdict} />
        <div>
          <b className="text-lead">{head}</b>
          <div>{detail}</div>
        </div>
      </div>
      {why.length > 0 && (
        <section>
          <h2 className="mb-0.5 font-ui text-body font-strong">Why</h2>
          <p>{why.join(' ')}</p>
        </section>
      )}
      <SignalChain cell={cell} row={row} context={context} />
      {source && (
        <section>
          <h2 className="mb-1 font-ui text-body font-strong">Elevation</h2>
          <div className="grid grid-cols-2 gap-[12px]">
            {[cell.first, cell.second].map((code) => {
              const station = context.stations[code];
              return (
                station && (
                  <ElevationChart
                    key={code}
                    station={station}
                    source={source}
                    scan={scan}
                    span={span}
                    settings={context.settings}
                  />
                )
              );
            })}
          </div>
        </section>
      )}
      {cell.verdict !== 'not-on' && <ClockPlace cell={cell} scan={scan} context={context} />}
    </>
  );
}

function tone(cell: OutlookCell): string {
  if (isExpected(cell)) return 'border-teal bg-teal-wash';
  if (cell.verdict === 'doubtful') return 'border-ochre bg-ochre-wash';
  if (cell.verdict === 'none') return 'border-verm bg-verm-wash';
  return 'border-edge bg-sheet';
}

function SignalChain({ cell, row, context }: { cell: OutlookCell; row: Row; context: PageContext }) {
  const mode = context.modes[row.scan.modeId];
  const components = mode && context.sources[row.scan.sourceId]?.components[mode.band];
  if (!mode || cell.verdict === 'not-on') return null;
  const whole = components?.reduce((sum, { fluxJy }) => sum + fluxJy, 0);
  const bits = (code: string) => Math.min(mode.bits, context.stations[code]?.bits ?? mode.bits);
  const bandwidthMhz = (mode.channelBandwidthHz * mode.channelsPerPolarisation) / 1e6;
  const lines: [string, string | null][] = [
    ['Source, whole', jansky(whole ?? null, 2)],
    ['Source, on this baseline', jansky(cell.correlatedFluxJy, 3)],
    ['Baseline', cell.baselineM === null ? null : `${numberText(cell.baselineM / 1000)} km`],
    [`SEFD ${cell.first} at zenith`, jansky(cell.sefd1Jy, 0)],
    [`SEFD ${cell.second} at zenith`, jansky(cell.sefd2Jy, 0)],
    ['Levels', `${cell.first} ${bits(cell.first)} bit, ${cell.second} ${bits(cell.second)} bit`],
    ['Bandwidth', `${bandwidthMhz} MHz × ${mode.polarisations} pol`],
    ['On source together', lengthText(cell.overlapSeconds)],
    ['Kept by coherence', cell.coherence === null ? null : `${(cell.coherence * 100).toFixed(0)} %`],
    ['Noise, one product', cell.sigmaJy === null ? null : `${numberText(cell.sigmaJy * 1000, 2)} mJy`],
    [
      'SNR',
      cell.snr === null
        ? null
        : `${snrText(cell.snr)}, limit ${context.settings.snrLimits.doubtful.toFixed(1)}`,
    ],
  ];
  return (
    <section>
      <h2 className="mb-0.5 font-ui text-body font-strong">Signal</h2>
      <dl className="grid grid-cols-[1fr_auto] text-table [&>*]:border-b [&>*]:border-hair [&>*]:py-[3px]">
        {lines.map(([name, value]) => (
          <div key={name} className="col-span-2 grid grid-cols-subgrid">
            <dt>{name}</dt>
            <dd className={`text-right ${value === null ? 'text-ink3' : ''}`}>{value ?? 'not known'}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

const jansky = (value: number | null, decimals: number) =>
  value === null ? null : `${numberText(value, decimals)} Jy`;
