import { axisFrame, type AxisFrame } from '../sky/axis-frame';
import { scanEnd, scanPath, type ScanPath } from '../sky/cable';
import { horizonElevationDeg, prepareHorizon, type Horizon } from '../sky/horizon';
import { prepareSite, trackAzEl, trackOf, type Track } from '../sky/track';
import type { AzEl, Geodetic, Interval } from '../sky/types';
import { windowsBySearch } from '../sky/windows-by-search';
import type { PlanContext, PlanSource, PlanStation } from './context';
import { elevationsOf, skyStation } from './sky-station';

/** How near a station comes to its limits while it follows a source. */
export type Sight = {
  startAzEl: AzEl;
  stopAzEl: AzEl;
  minElevationDeg: number;
  /** least room to a limit, negative outside it; at the instant and by the limit told */
  worst: {
    marginDeg: number;
    elevationDeg: number;
    limitDeg: number;
    side: 'low' | 'mask' | 'high';
    atMs: number;
  };
  /** first instant outside the limits, of those looked at; null if none */
  outFromMs: number | null;
  path: ScanPath;
};

const STEP_MS = 60_000;
/** A mask may have narrow steps, so it is looked at more often. */
const MASK_STEP_MS = 15_000;
const TRACK_MS = 2 * 86_400_000;

/**
 * A station's view of a source from start to stop.
 *
 * @param startMs  epoch ms, UTC; less than stopMs
 * @returns limits are the stricter of mask, station, session and mount
 * @throws RangeError if the span is empty (programmer error)
 *
 * Error   looked at every minute (15 s with a mask) and at both ends: a dip between is missed only if it lasts less;
 *         at a start and stop above the limits elevation cannot dip by more than 0.01° in a minute
 */
export function sightOf(
  station: PlanStation,
  source: PlanSource,
  settings: PlanContext['settings'],
  startMs: number,
  stopMs: number,
): Sight {
  const at = directionAt(station, source, startMs);
  const limits = limitsOf(station, settings);
  const path = axisPath(station, trackNear(source, startMs), startMs, stopMs);
  const startAzEl = at(startMs);
  let worst = roomAt(limits, startAzEl, startMs);
  let minElevationDeg = startAzEl.elevationDeg;
  let outFromMs = worst.marginDeg < 0 ? startMs : null;
  let stopAzEl = startAzEl;
  const stepMs = limits.horizon ? MASK_STEP_MS : STEP_MS;
  for (let atMs = startMs; atMs < stopMs;) {
    atMs = Math.min(atMs + stepMs, stopMs);
    stopAzEl = at(atMs);
    const room = roomAt(limits, stopAzEl, atMs);
    if (room.marginDeg < 0) outFromMs ??= atMs;
    if (room.marginDeg < worst.marginDeg) worst = room;
    minElevationDeg = Math.min(minElevationDeg, stopAzEl.elevationDeg);
  }
  return { startAzEl, stopAzEl, minElevationDeg, worst, outFromMs, path };
}

/**
 * Times from start to stop in which a station sees a source above all its limits.
 *
 * @returns sorted, disjoint, half-open
 *
 * Error   as `windowsBySearch`
 */
export function upWithin(
  station: PlanStation,
  source: PlanSource,
  settings: PlanContext['settings'],
  startMs: number,
  stopMs: number,
): Interval[] {
  const span = { start: new Date(startMs), end: new Date(stopMs) };
  return windowsBySearch(trackNear(source, startMs), skyStation(station, settings), span);
}

/**
 * The way of a station's axes while it follows a source.
 *
 * @param track  of the source; holds the span, or ends less than a day from it
 * @throws RangeError if the span is empty (programmer error)
 */
export function axisPath(station: PlanStation, track: Track, startMs: number, stopMs: number): ScanPath {
  const axes = frames.get(station) ?? axisFrame(station.mount.kind, frameOf(station.site));
  frames.set(station, axes);
  return scanPath(axes, track, scanEnd(track, startMs), scanEnd(track, stopMs));
}

/**
 * A source's fast track about an instant, made once for each two days.
 *
 * @returns a track good for a day outside its own span
 */
export function trackNear(source: PlanSource, atMs: number): Track {
  const bucket = Math.floor(atMs / TRACK_MS);
  const known = tracks.get(source) ?? new Map<number, Track>();
  tracks.set(source, known);
  const track = known.get(bucket);
  if (track) return track;
  const start = new Date(bucket * TRACK_MS);
  const made = trackOf(source.position, { start, end: new Date((bucket + 1) * TRACK_MS) });
  known.set(bucket, made);
  return made;
}

const tracks = new WeakMap<PlanSource, Map<number, Track>>();
const frames = new WeakMap<PlanStation, AxisFrame>();
const sites = new WeakMap<Geodetic, ReturnType<typeof prepareSite>>();
const horizons = new WeakMap<PlanStation, { horizon: Horizon | null }>();

/**
 * Where a station sees a source.
 *
 * @param startMs  within a day of the instants asked for
 */
export function directionAt(
  station: PlanStation,
  source: PlanSource,
  startMs: number,
): (atMs: number) => AzEl {
  const frame = frameOf(station.site);
  const track = trackNear(source, startMs);
  return (atMs) => trackAzEl(track, frame, atMs);
}

function frameOf(site: Geodetic) {
  const frame = sites.get(site) ?? prepareSite(site);
  sites.set(site, frame);
  return frame;
}

type Limits = { lowestDeg: number; highestDeg: number; horizon: Horizon | null };

function limitsOf(station: PlanStation, settings: PlanContext['settings']): Limits {
  const known = horizons.get(station) ?? { horizon: prepareHorizon(station.horizon) };
  horizons.set(station, known);
  const { minElevationDeg, maxElevationDeg } = elevationsOf(station);
  return {
    lowestDeg: Math.max(minElevationDeg, settings.minElevationDeg),
    highestDeg: maxElevationDeg,
    horizon: known.horizon,
  };
}

function roomAt(limits: Limits, { azimuthDeg, elevationDeg }: AzEl, atMs: number): Sight['worst'] {
  const maskDeg = limits.horizon ? horizonElevationDeg(limits.horizon, azimuthDeg) : -90;
  const isMask = maskDeg > limits.lowestDeg;
  const floorDeg = isMask ? maskDeg : limits.lowestDeg;
  const below = elevationDeg - floorDeg;
  const above = limits.highestDeg - elevationDeg;
  // close to the highest is no matter until it is passed
  if (above < 0 && above < below)
    return { marginDeg: above, elevationDeg, limitDeg: limits.highestDeg, side: 'high', atMs };
  return { marginDeg: below, elevationDeg, limitDeg: floorDeg, side: isMask ? 'mask' : 'low', atMs };
}
