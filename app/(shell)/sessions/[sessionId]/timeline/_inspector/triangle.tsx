'use client';

import { FringeMark, FringeMarkShape } from '@/app/_ui/fringe-mark';
import { useDerived } from '../_timeline/derived';
import { useTimeline } from '../_timeline/store';
import { isExpected, snrText, type OutlookCell, type Verdict } from '@/src/outlook/fringe-outlook';
import type { PlanStation } from '@/src/schedule/context';
import type { Scan } from '@/src/schedule/plan';

const CELL = { width: 42, height: 27 };
const LEFT = 32;

/** Expected fringes of the chosen scan: one cell for each baseline, in stave order. */
export function Triangle({ scan }: { scan: Scan }) {
  const stations = useTimeline((state) => state.stations);
  const limits = useTimeline((state) => state.context.settings.snrLimits);
  const mode = useTimeline((state) => state.context.modes[scan.modeId]);
  const cells = useDerived((derived) => derived.outlook.get(scan.id)) ?? [];
  if (stations.length < 2) return null;
  const expected = cells.filter(isExpected).length;
  const missing = [...new Set(cells.flatMap((cell) => (cell.missing === null ? [] : [cell.missing])))];
  return (
    <section aria-labelledby="expected-fringes">
      <div className="mb-1.5 flex items-baseline justify-between">
        <h2 id="expected-fringes" className="text-lead">
          Expected fringes
        </h2>
        <span>
          <b>
            {expected} of {cells.length}
          </b>{' '}
          <span className="text-ink2">baselines</span>
        </span>
      </div>
      <div className="overflow-x-auto">
        <TriangleDrawing cells={cells} stations={stations} />
      </div>
      <CellTable cells={cells} />
      <dl className="mt-[5px] grid grid-cols-2 gap-x-[12px] gap-y-px text-[11.5px] text-ink2">
        <Key verdict="strong" word={`strong, ${limits.strong}+`} />
        <Key verdict="fair" word={`fair, ${limits.fair}–${limits.strong}`} />
        <Key verdict="doubtful" word={`doubtful, ${limits.doubtful}–${limits.fair}`} />
        <Key verdict="none" word={`none, under ${limits.doubtful}`} />
        <Key verdict="unknown" word="no data" />
        <Key verdict="not-on" word="not on source" />
        {cells.some(({ reason }) => reason === 'clock') && (
          <div className="inline-flex items-center gap-[5px]">
            <dt className="font-strong">clk</dt>
            <dd>the clock limits</dd>
          </div>
        )}
      </dl>
      {missing.length > 0 && <p className="help mt-2">No data: {missing.join(', ')}.</p>}
      <p className="help mt-2">
        From zenith SEFDs, without opacity and gain curve; bandwidth, time, flux and source size
        {mode?.coherenceSeconds ? `, with ${mode.coherenceSeconds} s of coherence` : ''}; clocks from the log,
        against the correlator’s search window.
      </p>
    </section>
  );
}

function Key({ verdict, word }: { verdict: Verdict; word: string }) {
  return (
    <div className="inline-flex items-center gap-[5px]">
      <dt>
        <FringeMark verdict={verdict} />
      </dt>
      <dd>{word}</dd>
    </div>
  );
}

const TINT: Readonly<Record<Verdict, string>> = {
  strong: 'var(--teal-wash)',
  fair: 'var(--teal-wash)',
  doubtful: 'var(--ochre-wash)',
  none: 'var(--verm-wash)',
  unknown: 'var(--sheet)',
  'not-on': 'var(--sheet)',
};

function TriangleDrawing({
  cells,
  stations,
}: {
  cells: readonly OutlookCell[];
  stations: readonly PlanStation[];
}) {
  const rows = stations.length - 1;
  const foot = rows * CELL.height + 13;
  return (
    <svg width={LEFT + rows * CELL.width} height={foot + 5} aria-hidden="true" className="block">
      {stations.flatMap((row, i) =>
        stations.slice(0, i).map((column, j) => {
          const cell = cells.find(({ first, second }) => isPair(first, second, row.code, column.code));
          return (
            cell && (
              <Cell
                key={row.code + column.code}
                cell={cell}
                x={LEFT + j * CELL.width}
                y={(i - 1) * CELL.height}
              />
            )
          );
        }),
      )}
      {stations.slice(1).map(({ code }, i) => (
        <text key={code} className="s" x={0} y={i * CELL.height + 18} fontSize={13.5} fontWeight={600}>
          {code}
        </text>
      ))}
      {stations.slice(0, -1).map(({ code }, i) => (
        <text
          key={code}
          className="s"
          x={LEFT + i * CELL.width + CELL.width / 2 - 1}
          y={foot}
          fontSize={13.5}
          fontWeight={600}
          textAnchor="middle"
        >
          {code}
        </text>
      ))}
    </svg>
  );
}

function Cell({ cell, x, y }: { cell: OutlookCell; x: number; y: number }) {
  return (
    <g>
      <rect
        x={x}
        y={y}
        width={CELL.width - 2}
        height={CELL.height - 2}
        fill={TINT[cell.verdict]}
        fillOpacity={cell.verdict === 'fair' ? 0.55 : 1}
      />
      <FringeMarkShape verdict={cell.verdict} x={x + 4} y={y + 7.5} />
      <text
        x={x + CELL.width - 6}
        y={y + 17}
        fontSize={cell.snr === null ? 10.5 : 12}
        fontWeight={560}
        textAnchor="end"
        className={cell.snr === null ? 'fill-ink3' : ''}
        style={{ fontStretch: cell.snr === null ? '70%' : cell.snr >= 1000 ? '64%' : '80%' }}
      >
        {cellWord(cell)}
      </text>
    </g>
  );
}

/** The same as a table, for those who do not see the drawing. */
function CellTable({ cells }: { cells: readonly OutlookCell[] }) {
  return (
    <div className="sr-only">
      <table aria-labelledby="expected-fringes">
        <thead>
          <tr>
            <th scope="col">Baseline</th>
            <th scope="col">Verdict</th>
            <th scope="col">SNR</th>
          </tr>
        </thead>
        <tbody>
          {cells.map((cell) => (
            <tr key={cell.first + cell.second}>
              <th scope="row">
                {cell.first}–{cell.second}
              </th>
              <td>
                {cell.verdict === 'unknown'
                  ? `no data: ${cell.missing}`
                  : cell.verdict === 'not-on'
                    ? reasonWord(cell)
                    : `${cell.verdict}${cell.reason === 'clock' ? ', the clock limits' : ''}`}
              </td>
              <td>{cell.snr === null ? 'none' : snrText(cell.snr)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

const REASON_WORDS: Readonly<Record<string, string>> = {
  low: 'low',
  out: 'out',
  declined: 'decl.',
  mode: 'mode',
};

const reasonWord = (cell: OutlookCell) =>
  cell.reason === null ? 'not on' : (REASON_WORDS[cell.reason] ?? cell.reason);

function cellWord(cell: OutlookCell): string {
  if (cell.verdict === 'unknown') return '';
  if (cell.verdict === 'not-on') return reasonWord(cell);
  if (cell.reason === 'clock') return 'clk';
  return cell.snr === null ? '' : snrText(cell.snr);
}

const isPair = (a: string, b: string, c: string, d: string) => (a === c && b === d) || (a === d && b === c);
