import { baselineLengthM } from '../array/baseline';
import { sweep, spansOf, type Spans } from '../sky/interval-set';
import { geodeticToItrf } from '../sky/site';
import type { SkyPosition, SkyStation } from '../sky/types';
import { windowsFor } from '../sky/windows';
import type { Interval } from '../units/time';

export type ProspectStation = SkyStation & {
  code: string;
  bits: 1 | 2;
  /** free on the recorder; null where it was not said */
  recorderFreeBytes: number | null;
};

export type ProspectInput = {
  stations: readonly ProspectStation[];
  sources: readonly { id: string; position: SkyPosition; isTarget: boolean }[];
  span: Interval;
  /** lowest elevation for all, on top of masks */
  minElevationDeg: number;
  /** what is recorded: bandwidth summed over channels, and bits; null while no mode is chosen */
  recording: { bandwidthHz: number; bits: 1 | 2 } | null;
};

export type Prospect = {
  /** per source: how many stations see it, from edge to edge over the whole span */
  counts: { id: string; steps: { startMs: number; endMs: number; up: number }[] }[];
  /** seconds in which some target is seen by all stations, and by all but one */
  allSeconds: number;
  allButOneSeconds: number;
  baselines: { count: number; longestM: number };
  /** bits a second and bytes of each station, with half the time on source */
  recorded: { code: string; bitsPerS: number; bytes: number; freeBytes: number | null }[];
};

const ON_SOURCE = 0.5;

/**
 * What a session would find, before a scan is laid out.
 *
 * @param input  span half-open UTC, 1900–2100; minElevationDeg 0–90
 * @returns counts of stations up per source, time with all (and all but one) on some target, baselines in metres (0
 *          with fewer than two stations), bytes recorded if half the time is on source
 * @throws RangeError if a place, an angle or the span is out of range (programmer error)
 *
 * Error   as windowsFor
 * Source  data rate 2 · B · bits (Nyquist), bits the lesser of mode and station; half the time on source is common
 *         practice, no source
 */
export function prospectOf(input: ProspectInput): Prospect {
  const { stations, sources, span, minElevationDeg, recording } = input;
  const limited = stations.map((station) => ({
    ...station,
    minElevationDeg: Math.max(station.minElevationDeg, minElevationDeg),
  }));
  const seen = windowsFor(
    sources.map(({ position }) => position),
    limited.filter(({ minElevationDeg: low, maxElevationDeg = 90 }) => low < maxElevationDeg),
    span,
  ).map((perStation) => perStation.map(spansOf));
  const targets = seen.filter((_, index) => sources[index]?.isTarget);
  const withAtLeast = (atLeast: number) =>
    atLeast < 1
      ? 0
      : secondsOf(
          sweep(
            targets.map((sets) => sweep(sets, atLeast)),
            1,
          ),
        );
  return {
    counts: sources.map(({ id }, index) => ({ id, steps: stepsOf(seen[index] ?? [], span) })),
    allSeconds: withAtLeast(stations.length),
    allButOneSeconds: withAtLeast(stations.length - 1),
    baselines: baselinesOf(stations),
    recorded: recording ? stations.map((station) => recordedAt(station, recording, span)) : [],
  };
}

function stepsOf(sets: readonly Spans[], span: Interval): Prospect['counts'][number]['steps'] {
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  const edges = [...new Set([startMs, endMs, ...sets.flat(2)])].sort((a, b) => a - b);
  return edges.slice(1).map((end, index) => {
    const start = edges[index] ?? startMs;
    const up = sets.filter((set) => set.some(([from, to]) => from <= start && end <= to)).length;
    return { startMs: start, endMs: end, up };
  });
}

function baselinesOf(stations: readonly ProspectStation[]): Prospect['baselines'] {
  const places = stations.map(({ site }) => geodeticToItrf(site));
  const lengths = places.flatMap((first, index) =>
    places.slice(index + 1).map((second) => baselineLengthM(first, second)),
  );
  return { count: lengths.length, longestM: Math.max(0, ...lengths) };
}

function recordedAt(
  { code, bits, recorderFreeBytes }: ProspectStation,
  recording: { bandwidthHz: number; bits: 1 | 2 },
  span: Interval,
): Prospect['recorded'][number] {
  const bitsPerS = 2 * recording.bandwidthHz * Math.min(bits, recording.bits);
  const seconds = ((span.end.getTime() - span.start.getTime()) / 1000) * ON_SOURCE;
  return { code, bitsPerS, bytes: (bitsPerS * seconds) / 8, freeBytes: recorderFreeBytes };
}

const secondsOf = (spans: Spans) => spans.reduce((sum, [from, to]) => sum + (to - from) / 1000, 0);
