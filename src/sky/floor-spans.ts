import { searchedFloor } from './floor-search';
import type { Floor } from './floor';
import type { Spans } from './interval-set';
import { SIDEREAL_RAD_PER_MS, panelAt, trackTurnRad, valueAt } from './track';
import type { Track } from './track';
import { GUESS_RAD, NEVER, TURN, withinTurn } from './view';
import type { View } from './view';

/** Where a source passes the floor. */
type Crossing = {
  arc: number;
  /** 0 at the arc's first corner, 1 at its last */
  along: number;
  isRise: boolean;
  /** radians of uniform turning since the view's start, [0, 2π) */
  turned: number;
  /** the point itself where its neighbourhood may be taken for straight; null near a corner */
  point: ArcPoint | null;
};

/** A point of an arc: its parts toward east and toward the meridian on the equator, and what is near it. */
type ArcPoint = {
  along: number;
  east: number;
  towardMeridian: number;
  sinDec: number;
  /** change of hour angle with the sine of declination along the arc */
  perSinDec: number;
};

/** A place so near the Earth's axis hardly moves. */
const LEAST_COS_DEC = 1e-3;
/** A step of 3 s, in which the apparent place moves by 2·10⁻⁵″. */
const LAST_STEP_RAD = 2e-4;
const MOST_STEPS = 12;
const ROOT = 1e-13;
/** Good enough where the rest is taken for straight. */
const ROUGH_ROOT = 2e-6;
/** As sines of declination: nearer to a corner than this, or with more drift, an arc is bent (1 ms). */
const STRAIGHT = 4e-3;
const STRAIGHT_SLACK = 1e-5;

/**
 * Times in which a source is on or above a floor.
 *
 * @returns sorted and disjoint; view.whole itself where it always is
 *
 * Error   ≤ 1 ms from the track; where the source grazes a corner or a turn of the floor, as searchedFloor
 * Source  a source passes an arc of the floor when the declinations of the arc's ends are on both sides of its own; the
 *         point of the arc with its declination gives the hour angle
 */
export function floorSpans(track: Track, floor: Floor, view: View): Spans {
  const { sinDec, cosDec } = track.middle;
  const slack = view.driftRad + 2 * floor.site.eastSpeed;
  if (cosDec < LEAST_COS_DEC || cosDec < 50 * slack) return searchedFloor(track, floor, view);
  const crossings = crossingsOf(track, floor, view, slack);
  if (!crossings) return searchedFloor(track, floor, view);
  const first = crossings[0];
  if (!first) return isAbove(floor, sinDec, cosDec) ? view.whole : NEVER;

  let spans: [number, number][] | null = null;
  for (let turn = -TURN; turn < view.lengthRad + GUESS_RAD; turn += TURN) {
    for (let index = first.isRise ? 0 : 1; index < crossings.length; index += 2) {
      const up = crossings[index];
      const down = crossings[index + 1] ?? first;
      if (!up) break;
      const rise = turn + up.turned;
      const set = turn + down.turned + (down === first ? TURN : 0);
      if (set < -GUESS_RAD || rise > view.lengthRad + GUESS_RAD) continue;
      const riseMs = rise < -GUESS_RAD ? view.startMs : edgeMs(track, floor, view, up, rise);
      const setMs = set > view.lengthRad + GUESS_RAD ? view.endMs : edgeMs(track, floor, view, down, set);
      const startMs = riseMs < view.startMs ? view.startMs : riseMs;
      const endMs = setMs > view.endMs ? view.endMs : setMs;
      if (!(endMs > startMs)) continue;
      if (spans) spans.push([startMs, endMs]);
      else spans = [[startMs, endMs]];
    }
  }
  return spans ?? NEVER;
}

/** In the order of time from the view's start, rises and sets by turns; null where the source grazes a corner. */
function crossingsOf(track: Track, floor: Floor, view: View, slack: number): Crossing[] | null {
  const { sinDec: corners, site } = floor;
  const { sinDec, raRad } = track.middle;
  const found: Crossing[] = [];
  let before = (corners[0] ?? NaN) - sinDec;
  for (let corner = 1; corner < corners.length; corner += 1) {
    const here = (corners[corner] ?? NaN) - sinDec;
    if (here < slack && here > -slack) return null;
    if (here > 0 !== before > 0) {
      const arc = corner - 1;
      const isStraight = Math.min(Math.abs(here), Math.abs(before)) > STRAIGHT && slack < STRAIGHT_SLACK;
      const point = pointOnArc(floor, arc, sinDec, before / (before - here), ROUGH_ROOT);
      const { along, east, towardMeridian } = point;
      const turned = withinTurn(
        raRad + Math.atan2(-east, towardMeridian) - site.longitudeRad - view.startTurnRad,
      );
      // along the floor with azimuth rising, declination falls where sources come up
      insertByTime(found, { arc, along, isRise: here < before, turned, point: isStraight ? point : null });
    }
    before = here;
  }
  const alternates = found.every((one, index) => index === 0 || one.isRise !== found[index - 1]?.isRise);
  return alternates && found.length % 2 === 0 ? found : null;
}

function insertByTime(found: Crossing[], crossing: Crossing): void {
  let at = found.length;
  found.push(crossing);
  for (; at > 0; at -= 1) {
    const before = found[at - 1];
    if (!before || before.turned <= crossing.turned) break;
    found[at] = before;
  }
  found[at] = crossing;
}

/** A source that never passes the floor is above it where it culminates, or never. */
function isAbove(floor: Floor, sinDec: number, cosDec: number): boolean {
  const culmination = floor.sinLat * sinDec + floor.cosLat * cosDec;
  const isSouth = sinDec * floor.cosLat < floor.sinLat * cosDec;
  return culmination >= Math.sin(isSouth ? floor.southRad : floor.northRad);
}

/** The point of an arc at a declination between those of its ends, by Newton's rule within a closing bracket. */
function pointOnArc(floor: Floor, arc: number, sinDec: number, guess: number, root: number): ArcPoint {
  const { sinLat, cosLat } = floor;
  const azimuth = floor.azimuthRad[arc] ?? NaN;
  const elevation = floor.elevationRad[arc] ?? NaN;
  const byAz = (floor.azimuthRad[arc + 1] ?? NaN) - azimuth;
  const byEl = (floor.elevationRad[arc + 1] ?? NaN) - elevation;
  const isRising = (floor.sinDec[arc + 1] ?? NaN) > (floor.sinDec[arc] ?? NaN);
  let [low, high, along] = [0, 1, guess];
  for (;;) {
    const sinEl = Math.sin(elevation + along * byEl);
    const cosEl = Math.cos(elevation + along * byEl);
    const sinAz = Math.sin(azimuth + along * byAz);
    const cosAz = Math.cos(azimuth + along * byAz);
    const off = sinLat * sinEl + cosLat * cosEl * cosAz - sinDec;
    if (off > 0 === isRising) high = along;
    else low = along;
    const slope = byEl * (sinLat * cosEl - cosLat * sinEl * cosAz) - byAz * cosLat * cosEl * sinAz;
    let next = along - off / slope;
    if (!(next >= low && next <= high)) next = (low + high) / 2;
    if (Math.abs(off) < root || next === along) {
      const east = cosEl * sinAz;
      const towardMeridian = cosLat * sinEl - sinLat * cosEl * cosAz;
      const eastward = byAz * cosEl * cosAz - byEl * sinEl * sinAz;
      const meridianward = byEl * (cosLat * cosEl + sinLat * sinEl * cosAz) + byAz * sinLat * east;
      const hourward =
        (east * meridianward - towardMeridian * eastward) / (east * east + towardMeridian * towardMeridian);
      return { along, east, towardMeridian, sinDec: sinDec + off, perSinDec: hourward / slope };
    }
    along = next;
  }
}

/**
 * The instant of a crossing.
 *
 * @param turned  guess: radians of uniform turning since the view's start
 */
function edgeMs(track: Track, floor: Floor, view: View, crossing: Crossing, turned: number): number {
  const ms = view.startMs + turned / SIDEREAL_RAD_PER_MS;
  const { point } = crossing;
  if (!point) return bentEdgeMs(track, floor, crossing, ms);
  const { cosRa, sinRa } = track.middle;
  const { eastSpeed } = floor.site;
  const { panel, x: at } = panelAt(track, ms);
  const [x, y, z] = [valueAt(panel.x, at), valueAt(panel.y, at), valueAt(panel.z, at)];
  const { east, towardMeridian } = point;
  // the floor is met by the place that diurnal aberration shows
  const byDec = point.perSinDec * (z * (1 - eastSpeed * east) - point.sinDec);
  const byAberration = (eastSpeed * towardMeridian) / (east * east + towardMeridian * towardMeridian);
  const byRa = (cosRa * y - sinRa * x) / (cosRa * x + sinRa * y);
  const turnedTo = (ms - track.startMs) * SIDEREAL_RAD_PER_MS + valueAt(panel.siderealRad, at);
  const ahead = turnedTo - view.startTurnRad - turned;
  return ms + (byDec + byAberration + byRa - ahead) / SIDEREAL_RAD_PER_MS;
}

/** The same where the arc turns: solved anew for the place at the instant, until that moves no more. */
function bentEdgeMs(track: Track, floor: Floor, crossing: Crossing, guessMs: number): number {
  const { cosRa, sinRa, raRad } = track.middle;
  const { eastSpeed, longitudeRad } = floor.site;
  let ms = guessMs;
  let { along } = crossing;
  let east: number | null = null;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const { panel, x: at } = panelAt(track, ms);
    const [x, y, z] = [valueAt(panel.x, at), valueAt(panel.y, at), valueAt(panel.z, at)];
    const turn = trackTurnRad(track, ms) + longitudeRad;
    east ??= y * Math.cos(turn) - x * Math.sin(turn);
    const point = pointOnArc(floor, crossing.arc, z * (1 - eastSpeed * east), along, ROOT);
    ({ along, east } = point);
    const hourAngle = Math.atan2(eastSpeed - east, point.towardMeridian);
    const ra = raRad + Math.atan((cosRa * y - sinRa * x) / (cosRa * x + sinRa * y));
    const stepRad = withinTurn(ra + hourAngle - turn + Math.PI) - Math.PI;
    ms += stepRad / SIDEREAL_RAD_PER_MS;
    if (Math.abs(stepRad) < LAST_STEP_RAD) return ms;
  }
  return ms;
}
