import type { PlanContext } from '@/src/schedule/context';
import type { Row } from './model';

const HEAD =
  'scan,start_utc,length_s,source,first,second,verdict,reason,missing,snr,overlap_s,correlated_flux_jy,sefd_first_jy,sefd_second_jy,baseline_m,noise_jy';

/** One line for each scan and baseline; ASCII minus, no thousands mark, and no cell a spreadsheet would run. */
export function outlookCsv(rows: readonly Row[], context: PlanContext): string {
  const lines = rows.flatMap(({ scan, number, cells }) =>
    cells.map((cell) =>
      [
        number,
        new Date(scan.startMs).toISOString(),
        scan.lengthSeconds,
        context.sources[scan.sourceId]?.name ?? scan.sourceId,
        cell.first,
        cell.second,
        cell.verdict,
        cell.reason ?? '',
        cell.missing ?? '',
        figure(cell.snr),
        cell.overlapSeconds,
        figure(cell.correlatedFluxJy),
        figure(cell.sefd1Jy),
        figure(cell.sefd2Jy),
        figure(cell.baselineM),
        figure(cell.sigmaJy),
      ]
        .map(quoted)
        .join(','),
    ),
  );
  return [HEAD, ...lines].join('\r\n') + '\r\n';
}

const figure = (value: number | null) => (value === null ? '' : String(Number(value.toPrecision(6))));

function quoted(value: string | number): string {
  const text = String(value);
  const safe =
    /^[=+@\t\r]/.test(text) || (/^-/.test(text) && !Number.isFinite(Number(text))) ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
