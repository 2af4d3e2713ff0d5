import type { Coverage, UvTrack } from '@/src/outlook/coverage';
import type { StationCode } from '@/src/schedule/plan';

export type Ends = { first: StationCode; second: StationCode };

export const MEGA = 1e6;
/** Milliarcseconds in a radian. */
export const MAS_PER_RAD = (180 / Math.PI) * 3_600_000;

export const endsText = ({ first, second }: Ends) => `${first}–${second}`;

export type BaselineRow = Ends & {
  seconds: number;
  scanCount: number;
  /** projected, in wavelengths */
  shortest: number;
  longest: number;
};

/** Each baseline that is on source together, with its reach in the uv plane. */
export function baselineRowsOf({ tracks, baselineSeconds }: Coverage): BaselineRow[] {
  return baselineSeconds.flatMap(({ first, second, seconds }) => {
    const own = tracks.filter((track) => track.first === first && track.second === second);
    if (own.length === 0) return [];
    const lengths = own.flatMap(({ points }) => points.map(([u, v]) => Math.hypot(u, v)));
    return [
      {
        first,
        second,
        seconds,
        scanCount: new Set(own.map(({ scanId }) => scanId)).size,
        shortest: Math.min(...lengths),
        longest: Math.max(...lengths),
      },
    ];
  });
}

export const scansOf = ({ tracks }: Coverage, code: StationCode): number =>
  new Set(tracks.flatMap(({ scanId, first, second }) => (first === code || second === code ? [scanId] : [])))
    .size;

export const baselineHours = ({ baselineSeconds }: Coverage): number =>
  baselineSeconds.reduce((sum, { seconds }) => sum + seconds, 0) / 3600;

/** Frame of the uv plane: half its side, its grid and its two rings, in Mλ. */
export type UvScale = { half: number; step: number; rings: readonly [number, number] };

/** A frame that holds the longest baseline, ruled at round numbers. */
export function uvScaleOf(longestMega: number): UvScale {
  const half = Math.max(longestMega, 1e-6) * 1.06;
  const rough = half / 5;
  const decade = 10 ** Math.floor(Math.log10(rough));
  const step = ([1, 2, 5].find((digit) => digit * decade >= rough) ?? 10) * decade;
  const outer = Math.floor(half / step) * step;
  const inner = outer > step ? Math.round(outer / step / 2) * step : outer / 2;
  return { half, step, rings: [inner, outer] };
}

/** One path for all tracks and their conjugates; u to the left is east. */
export function pathOf(
  tracks: readonly UvTrack[],
  place: (u: number, v: number) => [number, number],
): string {
  return tracks
    .flatMap(({ points }) =>
      [1, -1].map((sign) =>
        points
          .map(([u, v], index) => {
            const [x, y] = place((sign * u) / MEGA, (sign * v) / MEGA);
            return `${index === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`;
          })
          .join(''),
      ),
    )
    .join('');
}

/** Where the longest baselines are named: at the right-hand end of their tracks, the longest first. */
export function rightEnds(
  tracks: readonly UvTrack[],
  rows: readonly BaselineRow[],
  count: number,
): (Ends & { u: number; v: number })[] {
  const far = [...rows].sort((a, b) => b.longest - a.longest).slice(0, count);
  return far.flatMap(({ first, second }) => {
    const points = tracks
      .filter((track) => track.first === first && track.second === second)
      .flatMap((track) => track.points.flatMap(([u, v]) => [[u, v] as const, [-u, -v] as const]));
    const right = points.reduce((best, point) => (point[0] < best[0] ? point : best), points[0] ?? [0, 0]);
    return [{ first, second, u: right[0] / MEGA, v: right[1] / MEGA }];
  });
}
