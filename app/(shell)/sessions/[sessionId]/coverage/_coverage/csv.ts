import { csvText } from '@/app/_ui/csv';
import type { Coverage } from '@/src/outlook/coverage';

const HEAD = ['scan', 'first', 'second', 'u_wavelengths', 'v_wavelengths'];

/** One line for each point of each track, second minus first; the conjugates are left to the reader. */
export function uvCsv(
  { tracks }: Pick<Coverage, 'tracks'>,
  scanNumbers: Readonly<Record<string, string>>,
): string {
  return csvText([
    HEAD,
    ...tracks.flatMap(({ scanId, first, second, points }) =>
      points.map(([u, v]) => [scanNumbers[scanId] ?? '', first, second, Math.round(u), Math.round(v)]),
    ),
  ]);
}
