import { normalise360, radToDeg } from '../units/angle';
import { SIDEREAL_DAY_SECONDS } from '../units/constants';
import { MS_PER_SECOND } from '../units/time';
import type { Interval } from '../units/time';
import type { Vector3 } from '../units/vector';
import { catalogueDirection, earthFixed, horizontal, placeOfDate } from './direction';
import { earthFrameAt } from './engine';
import type { EarthFrame } from './engine';
import type { RotationOptions } from './position';
import { siteFrame } from './site';
import type { SiteFrame } from './site';
import type { AzEl, Geodetic, SkyPosition } from './types';

/** a + b·x + c·x², x = (t − start of the panel) / half its length; siderealRad is what is left over from uniform turning */
export type Quadratic = readonly [number, number, number];

export type Panel = { x: Quadratic; y: Quadratic; z: Quadratic; siderealRad: Quadratic };

/** A source's apparent place and the Earth's turn over a span, ready for many cheap evaluations. */
export type Track = {
  startMs: number;
  endMs: number;
  /** half a panel, the distance between nodes */
  nodeMs: number;
  panels: readonly Panel[];
  middle: MiddlePlace;
};

/** Apparent place in the middle of a track, and how far from it the place may come within the track. */
export type MiddlePlace = {
  raRad: number;
  cosRa: number;
  sinRa: number;
  cosDec: number;
  sinDec: number;
  driftRad: number;
};

/** Distance between nodes at most; sets the error together with the fortnightly nutation. */
const NODE_LIMIT_MS = 86_400_000;
/** Nodes closer than this would magnify rounding when a short track is carried on. */
const NODE_LEAST_MS = 10_800_000;
/** A quadratic exceeds its three nodes by this factor at most. */
const BETWEEN_NODES = 1.25;
const TURN = 2 * Math.PI;
/** Uniform turning; what the true turning has beyond it is in each panel's siderealRad. */
export const SIDEREAL_RAD_PER_MS = TURN / (SIDEREAL_DAY_SECONDS * MS_PER_SECOND);

/**
 * The fast form of a source for a span: exact at nodes at most a day apart, a quadratic between.
 *
 * @param source  ICRS place
 * @param span    half-open span of UTC, 1900–2100; longer than zero
 * @param opts    dut1Seconds = UT1 − UTC, default 0
 * @throws RangeError if an input is not finite or out of range, or the span is empty (programmer error)
 *
 * Error   ≤ 0.001″ from azEl inside the span, ≤ 0.01″ within a day outside it (tests/sky/track.test.ts); the rest is
 *         azEl's own error. Cost: 0.1 ms for two days, 0.2 µs an evaluation
 * Source  quadratic interpolation of the apparent place; aberration turns it by at most 0.35″ a day
 */
export function trackOf(source: SkyPosition, span: Interval, opts: RotationOptions = {}): Track {
  return trackMaker(span, opts)(source);
}

/**
 * The fast form of several sources over one span: the Earth's frames are worked out once (0.2 µs a source after that).
 *
 * Error   as trackOf
 */
export function tracksOf(
  sources: readonly SkyPosition[],
  span: Interval,
  opts: RotationOptions = {},
): Track[] {
  return sources.map(trackMaker(span, opts));
}

/** A site made ready once, for loops over times. */
export function prepareSite(site: Geodetic): SiteFrame {
  return siteFrame(site);
}

/**
 * Azimuth and elevation on a track.
 *
 * @param track  from trackOf
 * @param site   geodetic place, or prepareSite's answer in loops
 * @param atMs   UTC, epoch ms; outside the span the end panel is carried on
 * @returns azimuthDeg [0, 360); elevationDeg, geometric (no refraction)
 *
 * Error   as trackOf
 */
export function trackAzEl(track: Track, site: Geodetic | SiteFrame, atMs: number): AzEl {
  return horizontal(trackDirection(track, atMs), asFrame(site));
}

/**
 * Elevation on a track: half the cost of trackAzEl.
 *
 * @returns degrees, geometric (no refraction)
 *
 * Error   as trackOf
 */
export function trackElevationDeg(track: Track, site: Geodetic | SiteFrame, atMs: number): number {
  const frame = asFrame(site);
  const [x, y, z] = trackDirection(track, atMs);
  const east = x * frame.east[0] + y * frame.east[1];
  const up = x * frame.up[0] + y * frame.up[1] + z * frame.up[2];
  // diurnal aberration adds eastSpeed to the east component of a unit vector; the length grows by east · eastSpeed
  return radToDeg(Math.asin(Math.max(-1, Math.min(1, up * (1 - east * frame.eastSpeed)))));
}

/**
 * Local hour angle of the apparent place on a track, positive after transit.
 *
 * @returns degrees [-180, 180); diurnal aberration (≤ 0.3″ / cos dec) left out
 */
export function trackHourAngleDeg(track: Track, site: Geodetic | SiteFrame, atMs: number): number {
  const [x, y] = trackDirection(track, atMs);
  const angle = radToDeg(asFrame(site).longitudeRad - Math.atan2(y, x));
  return normalise360(angle + 180) - 180;
}

/** Earth-fixed unit direction of the apparent place on a track. */
export function trackDirection(track: Track, atMs: number): Vector3 {
  const { panel, x } = panelAt(track, atMs);
  const sidereal = (atMs - track.startMs) * SIDEREAL_RAD_PER_MS;
  return earthFixed(
    [valueAt(panel.x, x), valueAt(panel.y, x), valueAt(panel.z, x)],
    sidereal + valueAt(panel.siderealRad, x),
  );
}

/** The panel that holds an instant, the first or last outside them, and the instant's place in it. */
export function panelAt(track: Track, atMs: number): { panel: Panel; x: number } {
  const along = (atMs - track.startMs) / track.nodeMs;
  const index = Math.max(0, Math.min(track.panels.length - 1, Math.floor(along / 2)));
  const panel = track.panels[index];
  if (!panel) throw new RangeError('A track without panels');
  return { panel, x: along - 2 * index };
}

/** Greenwich apparent sidereal time on a track, radians, counted without a break in each panel. */
export function trackTurnRad(track: Track, atMs: number): number {
  const { panel, x } = panelAt(track, atMs);
  return (atMs - track.startMs) * SIDEREAL_RAD_PER_MS + valueAt(panel.siderealRad, x);
}

/** What the tracks of one span share: their nodes, the Earth's frames there and its turning. */
function trackMaker(span: Interval, { dut1Seconds }: RotationOptions): (source: SkyPosition) => Track {
  const startMs = span.start.getTime();
  const endMs = span.end.getTime();
  if (!(endMs > startMs)) throw new RangeError('A track needs a span longer than zero');
  const panelCount = Math.ceil((endMs - startMs) / (2 * NODE_LIMIT_MS));
  const nodeMs = Math.max(NODE_LEAST_MS, (endMs - startMs) / (2 * panelCount));
  const frames = Array.from({ length: 2 * panelCount + 1 }, (_, index) =>
    earthFrameAt(startMs + index * nodeMs, dut1Seconds),
  );
  const turnings = siderealRests(frames, nodeMs);
  const places = new Float64Array(3 * frames.length);
  return (source) => {
    const direction = catalogueDirection(source);
    frames.forEach((frame, index) => placeOfDate(direction, frame, places, 3 * index));
    const panels = turnings.map((siderealRad, panel) => ({
      x: coordinateThrough(places, 6 * panel),
      y: coordinateThrough(places, 6 * panel + 1),
      z: coordinateThrough(places, 6 * panel + 2),
      siderealRad,
    }));
    return { startMs, endMs, nodeMs, panels, middle: middleOf(places, panelCount) };
  };
}

/** In each panel, the Earth's turn since the start less uniform turning. */
function siderealRests(frames: readonly EarthFrame[], nodeMs: number): Quadratic[] {
  const startRad = frames[0]?.gastRad ?? NaN;
  const rests = frames.map((frame, index) => {
    const rest = frame.gastRad - startRad - index * nodeMs * SIDEREAL_RAD_PER_MS;
    return startRad + rest - TURN * Math.round(rest / TURN);
  });
  return Array.from({ length: (frames.length - 1) / 2 }, (_, panel) => {
    const [first = NaN, second = NaN, third = NaN] = rests.slice(2 * panel, 2 * panel + 3);
    return through(first, second, third);
  });
}

function coordinateThrough(places: Float64Array, at: number): Quadratic {
  return through(places[at] ?? NaN, places[at + 3] ?? NaN, places[at + 6] ?? NaN);
}

function middleOf(places: Float64Array, node: number): MiddlePlace {
  const [x = NaN, y = NaN, z = NaN] = [places[3 * node], places[3 * node + 1], places[3 * node + 2]];
  let farthest = 0;
  for (let at = 0; at < places.length; at += 3) {
    const [byX, byY, byZ] = [
      (places[at] ?? NaN) - x,
      (places[at + 1] ?? NaN) - y,
      (places[at + 2] ?? NaN) - z,
    ];
    farthest = Math.max(farthest, byX * byX + byY * byY + byZ * byZ);
  }
  const cosDec = Math.sqrt(x * x + y * y);
  return {
    raRad: Math.atan2(y, x),
    cosRa: cosDec > 0 ? x / cosDec : 1,
    sinRa: cosDec > 0 ? y / cosDec : 0,
    cosDec,
    sinDec: z,
    driftRad: BETWEEN_NODES * Math.sqrt(farthest),
  };
}

/** The quadratic through the values at x = 0, 1 and 2. */
function through(v0: number, v1: number, v2: number): Quadratic {
  const bend = (v2 - 2 * v1 + v0) / 2;
  return [v0, v1 - v0 - bend, bend];
}

/** A quadratic's value. */
export function valueAt(q: Quadratic, x: number): number {
  return q[0] + x * (q[1] + x * q[2]);
}

function asFrame(site: Geodetic | SiteFrame): SiteFrame {
  return 'eastSpeed' in site ? site : siteFrame(site);
}
