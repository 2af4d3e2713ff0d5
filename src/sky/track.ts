import { normalise360, radToDeg } from '../units/angle';
import { SIDEREAL_DAY_SECONDS } from '../units/constants';
import { MS_PER_SECOND } from '../units/time';
import type { Interval } from '../units/time';
import type { Vector3 } from '../units/vector';
import { apparentOfDate, earthFixed, horizontal } from './direction';
import { earthFrameAt } from './engine';
import type { RotationOptions } from './position';
import { siteFrame } from './site';
import type { SiteFrame } from './site';
import type { AzEl, Geodetic, SkyPosition } from './types';

/** a + b·x + c·x², x = (t − start of the panel) / half its length; siderealRad is what is left over from uniform turning */
type Quadratic = readonly [number, number, number];

type Panel = { x: Quadratic; y: Quadratic; z: Quadratic; siderealRad: Quadratic };

/** A source's apparent place and the Earth's turn over a span, ready for many cheap evaluations. */
export type Track = {
  startMs: number;
  endMs: number;
  /** half a panel, the distance between nodes */
  nodeMs: number;
  panels: readonly Panel[];
};

/** Distance between nodes at most; sets the error together with the fortnightly nutation. */
const NODE_LIMIT_MS = 86_400_000;
/** Nodes closer than this would magnify rounding when a short track is carried on. */
const NODE_LEAST_MS = 10_800_000;
const TURN = 2 * Math.PI;
const SIDEREAL_RAD_PER_MS = TURN / (SIDEREAL_DAY_SECONDS * MS_PER_SECOND);

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
  const startMs = span.start.getTime();
  const endMs = span.end.getTime();
  if (!(endMs > startMs)) throw new RangeError('A track needs a span longer than zero');
  const panelCount = Math.ceil((endMs - startMs) / (2 * NODE_LIMIT_MS));
  const nodeMs = Math.max(NODE_LEAST_MS, (endMs - startMs) / (2 * panelCount));
  const panels = Array.from({ length: panelCount }, (_, index) =>
    panelOf(source, startMs, startMs + 2 * index * nodeMs, nodeMs, opts.dut1Seconds),
  );
  return { startMs, endMs, nodeMs, panels };
}

/**
 * The fast form of several sources over one span: the Earth's frames are worked out once (5 µs a source after that).
 *
 * Error   as trackOf
 */
export function tracksOf(sources: SkyPosition[], span: Interval, opts: RotationOptions = {}): Track[] {
  return sources.map((source) => trackOf(source, span, opts));
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
  const along = (atMs - track.startMs) / track.nodeMs;
  const index = Math.max(0, Math.min(track.panels.length - 1, Math.floor(along / 2)));
  const panel = track.panels[index];
  if (!panel) throw new RangeError('A track without panels');
  const x = along - 2 * index;
  const sidereal = (atMs - track.startMs) * SIDEREAL_RAD_PER_MS;
  return earthFixed(
    [valueAt(panel.x, x), valueAt(panel.y, x), valueAt(panel.z, x)],
    sidereal + valueAt(panel.siderealRad, x),
  );
}

function panelOf(
  source: SkyPosition,
  trackStartMs: number,
  panelMs: number,
  nodeMs: number,
  dut1Seconds?: number,
): Panel {
  const nodes = [panelMs, panelMs + nodeMs, panelMs + 2 * nodeMs] as const;
  const frames = mapNodes(nodes, (ms) => earthFrameAt(ms, dut1Seconds));
  const places = mapNodes(frames, (frame) => apparentOfDate(source, frame));
  const uniform = mapNodes(nodes, (ms) => (ms - trackStartMs) * SIDEREAL_RAD_PER_MS);
  const start = frames[0].gastRad - uniform[0];
  const excess = (index: 0 | 1 | 2) => {
    const turn = frames[index].gastRad - uniform[index] - start;
    return start + turn - TURN * Math.round(turn / TURN);
  };
  return {
    x: through(places[0][0], places[1][0], places[2][0]),
    y: through(places[0][1], places[1][1], places[2][1]),
    z: through(places[0][2], places[1][2], places[2][2]),
    siderealRad: through(excess(0), excess(1), excess(2)),
  };
}

function mapNodes<A, B>(nodes: readonly [A, A, A], f: (node: A) => B): readonly [B, B, B] {
  return [f(nodes[0]), f(nodes[1]), f(nodes[2])];
}

/** The quadratic through the values at x = 0, 1 and 2. */
function through(v0: number, v1: number, v2: number): Quadratic {
  const bend = (v2 - 2 * v1 + v0) / 2;
  return [v0, v1 - v0 - bend, bend];
}

function valueAt(q: Quadratic, x: number): number {
  return q[0] + x * (q[1] + x * q[2]);
}

function asFrame(site: Geodetic | SiteFrame): SiteFrame {
  return 'eastSpeed' in site ? site : siteFrame(site);
}
