import { baselinesOf } from '../array/baseline';
import { imageNoiseJy } from '../array/sensitivity';
import { baselineUvw } from '../array/uvw';
import type { PlanContext, PlanMode, PlanStation } from '../schedule/context';
import { stationOnMs, type Plan, type Scan, type ScanId, type StationCode } from '../schedule/plan';
import { SPEED_OF_LIGHT } from '../units/constants';
import { scanEnd, togetherOn, type ScanEnd } from './together';

/** One baseline's way through the uv plane in one scan; the conjugate is left to the drawing. */
export type UvTrack = {
  scanId: ScanId;
  /** the western station */
  first: StationCode;
  second: StationCode;
  /** [u, v] in wavelengths, from start to stop of the time together */
  points: readonly (readonly [number, number])[];
};

export type Extreme = { first: StationCode; second: StationCode; wavelengths: number; metres: number };

export type Coverage = {
  tracks: readonly UvTrack[];
  scans: readonly ScanId[];
  /** projected baselines at their longest and shortest; null without a track */
  longest: Extreme | null;
  shortest: Extreme | null;
  /** λ/B at the longest and at the shortest projected baseline */
  resolutionRad: number | null;
  largestScaleRad: number | null;
  /** natural weights; null where no baseline has both SEFDs */
  imageNoiseJy: number | null;
  /** stations whose SEFD is not known: their baselines are not in the noise */
  withoutSefd: readonly StationCode[];
  /** time in which at least two stations are on the source */
  onSourceSeconds: number;
  stationSeconds: Readonly<Record<StationCode, number>>;
  baselineSeconds: readonly { first: StationCode; second: StationCode; seconds: number }[];
};

/**
 * What a plan's scans of a source give an image in a band.
 *
 * @param wanted       source and band; stepSeconds > 0 between points of a track, ends included
 * @returns numbers of the baselines that are on source together (neither low, out nor declined)
 *
 * Left out: the beam, SEFD's change with elevation (zenith value), loss of coherence.
 * Error   u, v as baselineUvw; noise 1e-9 relative (tests/outlook/coverage.test.ts)
 * Source  TMS eq. 4.1 and ch. 6
 */
export function coverageOf(
  plan: Plan,
  context: PlanContext,
  wanted: { sourceId: string; band: string; stepSeconds: number },
): Coverage {
  const source = context.sources[wanted.sourceId];
  const stations = plan.stations.flatMap((code) => context.stations[code] ?? []);
  const pieces = plan.scans.flatMap((scan) => {
    const mode = context.modes[scan.modeId];
    if (!source || scan.sourceId !== wanted.sourceId || mode?.band !== wanted.band) return [];
    return piecesOf(scan, mode, stations, context);
  });
  const tracks = source ? pieces.map((piece) => trackOf(piece, source.position, wanted.stepSeconds)) : [];
  const extremes = tracks.flatMap((track, index) => {
    const mode = pieces[index]?.mode;
    return mode ? track.points.map((point) => extremeOf(track, point, mode)) : [];
  });
  const longest = most(extremes, (a, b) => a.wavelengths > b.wavelengths);
  const shortest = most(extremes, (a, b) => a.wavelengths < b.wavelengths);
  const known = pieces.filter(({ first, second }) => sefdOf(first, wanted) && sefdOf(second, wanted));
  const scans = [...new Set(pieces.map(({ scan }) => scan.id))];
  return {
    tracks,
    scans,
    longest,
    shortest,
    resolutionRad: longest && 1 / longest.wavelengths,
    largestScaleRad: shortest && 1 / shortest.wavelengths,
    imageNoiseJy: known.length === 0 ? null : noiseOf(known, wanted),
    withoutSefd: [
      ...new Set(
        pieces.flatMap(({ first, second }) =>
          [first, second].filter((end) => !sefdOf(end, wanted)).map(({ code }) => code),
        ),
      ),
    ].sort(),
    onSourceSeconds: unionSeconds(pieces.map(({ startMs, stopMs }) => [startMs, stopMs])),
    stationSeconds: Object.fromEntries(
      stations.map(({ code }) => [
        code,
        unionSeconds(
          pieces
            .filter(({ first, second }) => first.code === code || second.code === code)
            .map(({ scan, startMs, stopMs }) => ownSpan(scan, code, [startMs, stopMs])),
        ),
      ]),
    ),
    baselineSeconds: baselinesOf(stations).map(({ first, second }) => ({
      first: first.code,
      second: second.code,
      seconds: pieces
        .filter((piece) => piece.first.code === first.code && piece.second.code === second.code)
        .reduce((sum, { startMs, stopMs }) => sum + (stopMs - startMs) / 1000, 0),
    })),
  };
}

/** The sources a plan observes, each with the bands it is observed in, by first scan. */
export function observedIn(
  plan: Plan,
  context: Pick<PlanContext, 'modes'>,
): { sourceId: string; band: string }[] {
  const seen = new Map<string, { sourceId: string; band: string }>();
  for (const { sourceId, modeId } of plan.scans) {
    const band = context.modes[modeId]?.band;
    if (band !== undefined) seen.set(`${sourceId} ${band}`, { sourceId, band });
  }
  return [...seen.values()];
}

type Piece = { scan: Scan; mode: PlanMode; first: ScanEnd; second: ScanEnd; startMs: number; stopMs: number };
type Wanted = { band: string };

function piecesOf(
  scan: Scan,
  mode: PlanMode,
  stations: readonly PlanStation[],
  context: PlanContext,
): Piece[] {
  const ends = stations.map((station) => scanEnd(scan, station, context));
  return baselinesOf(ends).flatMap(({ first, second }) => {
    const together = togetherOn(first, second);
    if (together.reason !== null) return [];
    const half = together.seconds * 500;
    return [{ scan, mode, first, second, startMs: together.midMs - half, stopMs: together.midMs + half }];
  });
}

function trackOf(
  { scan, mode, first, second, startMs, stopMs }: Piece,
  position: Parameters<typeof baselineUvw>[2],
  stepSeconds: number,
): UvTrack {
  const steps = Math.max(1, Math.ceil((stopMs - startMs) / (stepSeconds * 1000)));
  const perMetre = mode.skyHz / SPEED_OF_LIGHT;
  const points = Array.from({ length: steps + 1 }, (_, index) => {
    const at = new Date(startMs + ((stopMs - startMs) * index) / steps);
    const { u, v } = baselineUvw(first.place, second.place, position, at);
    return [u * perMetre, v * perMetre] as const;
  });
  return { scanId: scan.id, first: first.code, second: second.code, points };
}

function extremeOf(
  { first, second }: UvTrack,
  [u, v]: readonly [number, number],
  { skyHz }: PlanMode,
): Extreme {
  const wavelengths = Math.hypot(u, v);
  return { first, second, wavelengths, metres: (wavelengths * SPEED_OF_LIGHT) / skyHz };
}

const most = (all: readonly Extreme[], isMore: (a: Extreme, b: Extreme) => boolean): Extreme | null =>
  all.reduce<Extreme | null>((best, one) => (best === null || isMore(one, best) ? one : best), null);

const sefdOf = ({ station }: ScanEnd, { band }: Wanted): number | undefined => station.sefdJy[band];

const bitsAt = ({ station }: ScanEnd, mode: PlanMode): 1 | 2 =>
  station.bits === 1 || mode.bits === 1 ? 1 : 2;

function noiseOf(pieces: readonly Piece[], wanted: Wanted): number {
  return imageNoiseJy(
    pieces.map(({ first, second, mode, startMs, stopMs }) => ({
      sefd1Jy: sefdOf(first, wanted) ?? Infinity,
      sefd2Jy: sefdOf(second, wanted) ?? Infinity,
      bandwidthHz: mode.channelBandwidthHz * mode.channelsPerPolarisation,
      seconds: (stopMs - startMs) / 1000,
      bits1: bitsAt(first, mode),
      bits2: bitsAt(second, mode),
      products: mode.polarisations,
    })),
  );
}

type Span = readonly [startMs: number, stopMs: number];

/** A station's own hours in a scan that are in a span. */
function ownSpan(scan: Scan, code: StationCode, [startMs, stopMs]: Span): Span {
  const member = scan.stations.find(({ station }) => station === code);
  if (!member) return [startMs, startMs];
  const own = stationOnMs(scan, member);
  return [Math.max(startMs, own.startMs), Math.min(stopMs, own.stopMs)];
}

function unionSeconds(spans: readonly Span[]): number {
  let total = 0;
  let untilMs = -Infinity;
  for (const [startMs, stopMs] of [...spans].sort((a, b) => a[0] - b[0])) {
    total += Math.max(0, stopMs - Math.max(startMs, untilMs));
    untilMs = Math.max(untilMs, stopMs);
  }
  return total / 1000;
}
