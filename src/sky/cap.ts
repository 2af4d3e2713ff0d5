import { add, dot, scale } from '../units/vector';
import type { Vector3 } from '../units/vector';
import { spansWhere, stepsOver } from './crossings';
import type { Spans } from './interval-set';
import type { SiteFrame } from './site';
import { SIDEREAL_RAD_PER_MS, panelAt, trackDirection, trackTurnRad, valueAt } from './track';
import type { Track } from './track';
import { GUESS_RAD, NEVER, TURN, withinTurn } from './view';
import type { View } from './view';

/** Directions whose cosine to an axis is at least a bound, on axes that turn with the Earth; seen with diurnal aberration. */
export type Cap = {
  /** parts of the axis across and along the Earth's axis, and the longitude of the first */
  across: number;
  along: number;
  longitudeRad: number;
  least: number;
  /** diurnal aberration of the site in radians, and the axis's longitude from the site's */
  speed: number;
  cosFromSite: number;
  sinFromSite: number;
};

/** Nearer than this to a culmination, as a difference of cosines, the heights themselves are looked at (2″). */
const GRAZING = 1e-5;
/** A place or an axis so near the Earth's axis hardly moves. */
const LEAST_REACH = 1e-3;
/** A step after which the next would be below 0.02 ms. */
const LAST_STEP_RAD = 2e-6;
const MOST_STEPS = 12;
const SEARCH_STEP_MS = 1_800_000;

/**
 * A cap about an axis of a site.
 *
 * @param axis   unit vector: components toward east, north and up
 * @param least  least cosine to it
 */
export function capOf(site: SiteFrame, axis: Vector3, least: number): Cap {
  const [east, north, up] = axis;
  const fixed = add(add(scale(site.east, east), scale(site.north, north)), scale(site.up, up));
  const across = Math.hypot(fixed[0], fixed[1]);
  const longitudeRad = across > 0 ? Math.atan2(fixed[1], fixed[0]) : 0;
  const fromSite = longitudeRad - site.longitudeRad;
  return {
    across,
    along: fixed[2],
    longitudeRad,
    least,
    speed: site.eastSpeed,
    cosFromSite: Math.cos(fromSite),
    sinFromSite: Math.sin(fromSite),
  };
}

/** The other side: cosine to the axis of capOf at most a bound. */
export function capBeyond(site: SiteFrame, axis: Vector3, most: number): Cap {
  return capOf(site, scale(axis, -1), -most);
}

/**
 * Times in which a source is inside a cap.
 *
 * @returns sorted and disjoint; view.whole itself where it always is
 *
 * Error   ≤ 0.02 ms from the track; where the source grazes the rim, edges ≤ 0.5 ms and the height of the turn
 *         ≤ 3·10⁻¹¹
 * Source  cos H₀ = (least − along · sin δ)/(across · cos δ) about the axis's meridian (science), then Newton's rule on
 *         the track
 */
export function capSpans(track: Track, cap: Cap, view: View): Spans {
  const { middle } = track;
  const base = cap.along * middle.sinDec - cap.least;
  const reach = cap.across * middle.cosDec;
  const slack = view.driftRad + 2 * cap.speed;
  if (base + reach < -slack) return NEVER;
  if (base - reach > slack) return view.whole;
  const grazing = Math.max(GRAZING, 4 * slack);
  const isPlain = base + reach > grazing && base - reach < -grazing;
  if (!isPlain || reach < LEAST_REACH || reach < 50 * slack) return searchedCap(track, cap, view);

  const cosHalf = -base / reach;
  const sinHalf = Math.sqrt(1 - cosHalf * cosHalf);
  const half = Math.acos(cosHalf);
  const first = withinTurn(middle.raRad - half - cap.longitudeRad - view.startTurnRad);
  let spans: [number, number][] | null = null;
  for (let rise = first - TURN; rise < view.lengthRad + GUESS_RAD; rise += TURN) {
    const set = rise + 2 * half;
    if (set < -GUESS_RAD) continue;
    const riseMs = rise < -GUESS_RAD ? view.startMs : edgeMs(track, cap, view, rise, cosHalf, -sinHalf);
    const setMs =
      set > view.lengthRad + GUESS_RAD ? view.endMs : edgeMs(track, cap, view, set, cosHalf, sinHalf);
    const startMs = riseMs < view.startMs ? view.startMs : riseMs;
    const endMs = setMs > view.endMs ? view.endMs : setMs;
    if (!(endMs > startMs)) continue;
    if (spans) spans.push([startMs, endMs]);
    else spans = [[startMs, endMs]];
  }
  return spans ?? NEVER;
}

/**
 * The instant at which the source passes the rim.
 *
 * @param turned   guess: radians of uniform turning since the view's start
 * @param cosHalf  and sinHalf: of the hour angle from the cap's meridian, which is that of the guess
 */
function edgeMs(
  track: Track,
  cap: Cap,
  view: View,
  turned: number,
  cosHalf: number,
  sinHalf: number,
): number {
  const { cosRa, sinRa } = track.middle;
  let ms = view.startMs + turned / SIDEREAL_RAD_PER_MS;
  let cos = cosRa * cosHalf - sinRa * sinHalf;
  let sin = sinRa * cosHalf + cosRa * sinHalf;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const { panel, x: at } = panelAt(track, ms);
    const x = valueAt(panel.x, at);
    const y = valueAt(panel.y, at);
    const z = valueAt(panel.z, at);
    if (step === 0) {
      const more =
        (ms - track.startMs) * SIDEREAL_RAD_PER_MS +
        valueAt(panel.siderealRad, at) -
        view.startTurnRad -
        turned;
      [cos, sin] = [cos - more * sin, sin + more * cos];
    } else {
      const turn = trackTurnRad(track, ms) + cap.longitudeRad;
      cos = Math.cos(turn);
      sin = Math.sin(turn);
    }
    const toward = x * cos + y * sin;
    const past = y * cos - x * sin;
    const east = past * cap.cosFromSite + toward * cap.sinFromSite;
    const shrink = 1 - cap.speed * east;
    const excess = (cap.along * z + cap.across * (toward + cap.speed * cap.sinFromSite)) * shrink - cap.least;
    const stepRad = -excess / (cap.across * past);
    ms += stepRad / SIDEREAL_RAD_PER_MS;
    if (Math.abs(stepRad) < LAST_STEP_RAD) return ms;
  }
  return ms;
}

/** Looks at the cosine itself every half hour and finds each extremum that could change the answer. */
function searchedCap(track: Track, cap: Cap, view: View): Spans {
  const axis: Vector3 = [
    cap.across * Math.cos(cap.longitudeRad),
    cap.across * Math.sin(cap.longitudeRad),
    cap.along,
  ];
  const siteRad = cap.longitudeRad - Math.atan2(cap.sinFromSite, cap.cosFromSite);
  const speed: Vector3 = [-cap.speed * Math.sin(siteRad), cap.speed * Math.cos(siteRad), 0];
  const margin = (ms: number) => {
    const seen = add(trackDirection(track, ms), speed);
    return dot(axis, seen) / Math.sqrt(dot(seen, seen)) - cap.least;
  };
  return spansWhere(margin, stepsOver(view.span, SEARCH_STEP_MS));
}
