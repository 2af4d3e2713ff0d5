import { normalise180 } from '../units/angle';
import { utcParts } from '../units/time';
import type { Interval } from '../units/time';
import { trackAzEl, trackOf } from './track';
import type { Track } from './track';
import { scanPath, turnsFor } from './cable';
import type { ScanPath } from './cable';
import { siteFrame } from './site';
import type { AzEl, Axis, Geodetic, Mount, Pointing, SkyPosition } from './types';

/** Why a dish cannot do it; the sentence goes on after the station's name. */
export type Impossible = { impossible: string; limit: 'azimuth' | 'elevation'; atMs: number | null };

export type SlewStation = { site: Geodetic; mount: Mount };

/** A source and the time it is to be tracked; `track` saves its making and must cover the scan. */
export type SlewTarget = { source: SkyPosition; scan: Interval; track?: Track };

/** Two slews within this time of each other are equally quick. */
const TIE_SECONDS = 1e-9;

/**
 * Time of one axis from rest to rest.
 *
 * @param distanceDeg  way to go, either sign
 * @param axis         rateDegPerS > 0, accelDegPerS2 > 0 (the same for braking)
 * @returns seconds
 * @throws RangeError if the distance is not finite or a drive's figure is not positive (programmer error)
 *
 * Error   closed form; ≤ 0.01 s against an integrated speed of 20 000 steps (tests/sky/slew.test.ts)
 * Source  uniform acceleration: 2√(d/a) when d < v²/a, else d/v + v/a
 */
export function axisSeconds(distanceDeg: number, axis: Axis): number {
  const { rateDegPerS: v, accelDegPerS2: a } = axis;
  if (!Number.isFinite(distanceDeg)) throw new RangeError(`Not a distance: ${distanceDeg}`);
  if (!(v > 0 && a > 0)) throw new RangeError(`A drive needs a rate and an acceleration: ${v}, ${a}`);
  const d = Math.abs(distanceDeg);
  return d < (v * v) / a ? 2 * Math.sqrt(d / a) : d / v + v / a;
}

/**
 * Quickest legal motion from one pointing to a direction.
 *
 * @param mount  limits inclusive; settleSeconds is added when anything moves
 * @param from   where the dish points, its cable's turn in motorAzimuthDeg
 * @param to     direction to reach
 * @returns seconds and the motor azimuth reached; or why there is none. Of equally quick turns the one nearest to
 *          the middle of the cable's range
 * @throws RangeError if an input is not finite (programmer error)
 *
 * Error   ≤ 1e-6 s on the reference (tests/sky/slew.test.ts)
 * Source  both axes start together, each as axisSeconds; azimuth moves monotonically, so no limit is passed
 */
export function slewMotion(
  mount: Mount,
  from: Pointing,
  to: AzEl,
): { seconds: number; motorAzimuthDeg: number } | Impossible {
  const blocked = elevationOutside(mount, to.elevationDeg);
  if (blocked) return blocked;
  const turns = turnsFor(mount, to.azimuthDeg);
  return quickest(mount, from, to.elevationDeg, turns) ?? deadZone(to.azimuthDeg);
}

/**
 * Slew to the start of a scan, on a turn of the cable on which the whole scan can be tracked.
 *
 * @param station  site and mount
 * @param from     where the dish points before
 * @param to       source and scan; scan longer than zero
 * @returns seconds and the pointing at the START of the scan (carry on from pointingAtEnd); or why it is impossible
 * @throws RangeError if an input is not finite or the scan is empty (programmer error)
 *
 * Error   times in the sentence ≤ 1 s (truncated to the second); the scan is sampled each 60 s, closer where azimuth
 *         runs fast. Drive rates while tracking (keyhole) are not checked here
 * Source  science: shortest slew among turns that meet no limit
 */
export function slewBetween(
  station: SlewStation,
  from: Pointing,
  to: SlewTarget,
): { seconds: number; pointing: Pointing } | Impossible {
  const path = pathOf(station, to);
  const blocked = elevationAlong(station.mount, path);
  if (blocked) return blocked;
  const turns = turnsFor(station.mount, path.start.azimuthDeg);
  const whole = turns.filter((turn) => path.leavesRangeAtMs(station.mount, turn) === null);
  const motion = quickest(station.mount, from, path.start.elevationDeg, whole);
  if (!motion) return noTurn(station.mount, path, turns);
  return { seconds: motion.seconds, pointing: { ...path.start, motorAzimuthDeg: motion.motorAzimuthDeg } };
}

/**
 * Pointing at the END of a scan that was tracked without a break from its start.
 *
 * @param start  pointing at the scan's start, as slewBetween or firstPointing gave it
 * @throws RangeError if an input is not finite or the scan is empty (programmer error)
 */
export function pointingAtEnd(station: SlewStation, start: Pointing, to: SlewTarget): Pointing {
  const path = pathOf(station, to);
  return { ...path.end, motorAzimuthDeg: start.motorAzimuthDeg + path.endTurnDeg };
}

/**
 * Pointing of a dish that stands on a direction at the start of a session: the turn nearest to the middle of its range.
 *
 * @returns the pointing, or why the mount cannot point there
 * @throws RangeError if an input is not finite (programmer error)
 */
export function startPointing(mount: Mount, direction: AzEl): Pointing | Impossible {
  const blocked = elevationOutside(mount, direction.elevationDeg);
  if (blocked) return blocked;
  const turn = turnsFor(mount, direction.azimuthDeg)[0];
  if (turn === undefined) return deadZone(direction.azimuthDeg);
  return { ...direction, motorAzimuthDeg: turn };
}

/**
 * Pointing at the start of a station's first scan: the turn nearest to mid-range on which the whole scan can be tracked.
 *
 * @returns the pointing at the START of the scan, or why it is impossible
 * @throws RangeError if an input is not finite or the scan is empty (programmer error)
 */
export function firstPointing(station: SlewStation, to: SlewTarget): Pointing | Impossible {
  const path = pathOf(station, to);
  const blocked = elevationAlong(station.mount, path);
  if (blocked) return blocked;
  const turns = turnsFor(station.mount, path.start.azimuthDeg);
  const turn = turns.find((candidate) => path.leavesRangeAtMs(station.mount, candidate) === null);
  if (turn === undefined) return noTurn(station.mount, path, turns);
  return { ...path.start, motorAzimuthDeg: turn };
}

function pathOf(station: SlewStation, to: SlewTarget): ScanPath {
  const track = to.track ?? trackOf(to.source, to.scan);
  const site = siteFrame(station.site);
  return scanPath((atMs) => trackAzEl(track, site, atMs), to.scan);
}

/** Turns come nearest to mid-range first, and a later one must be truly quicker. */
function quickest(
  mount: Mount,
  from: Pointing,
  elevationDeg: number,
  turns: readonly number[],
): { seconds: number; motorAzimuthDeg: number } | null {
  const elevationSeconds = axisSeconds(elevationDeg - from.elevationDeg, mount.elevation);
  let best: { seconds: number; motorAzimuthDeg: number } | null = null;
  for (const turn of turns) {
    const moving = Math.max(axisSeconds(turn - from.motorAzimuthDeg, mount.azimuth), elevationSeconds);
    const seconds = moving > 0 ? moving + mount.settleSeconds : 0;
    if (!best || seconds < best.seconds - TIE_SECONDS) best = { seconds, motorAzimuthDeg: turn };
  }
  return best;
}

function elevationOutside(mount: Mount, elevationDeg: number, atMs: number | null = null): Impossible | null {
  const { minDeg, maxDeg } = mount.elevation;
  const when = atMs === null ? '' : ` at ${clock(atMs)}`;
  if (!Number.isFinite(elevationDeg)) throw new RangeError(`Not an elevation: ${elevationDeg}`);
  if (elevationDeg < minDeg) {
    return { impossible: `would be below the mount’s lowest ${minDeg}°${when}`, limit: 'elevation', atMs };
  }
  if (elevationDeg > maxDeg) {
    return { impossible: `would be above the mount’s highest ${maxDeg}°${when}`, limit: 'elevation', atMs };
  }
  return null;
}

function elevationAlong(mount: Mount, path: ScanPath): Impossible | null {
  const { minDeg, maxDeg } = mount.elevation;
  const outside = path.leavesElevationsAt(minDeg, maxDeg);
  return outside && elevationOutside(mount, outside.elevationDeg, outside.atMs);
}

function noTurn(mount: Mount, path: ScanPath, turns: readonly number[]): Impossible {
  const ends = turns.map((turn) => path.leavesRangeAtMs(mount, turn)).filter((ms) => ms !== null);
  if (ends.length === 0) return deadZone(path.start.azimuthDeg);
  const atMs = Math.max(...ends);
  return { impossible: `would run into the azimuth limit at ${clock(atMs)}`, limit: 'azimuth', atMs };
}

function deadZone(azimuthDeg: number): Impossible {
  const shown = Math.round(normalise180(azimuthDeg) + 360) % 360;
  return { impossible: `cannot turn to azimuth ${shown}°`, limit: 'azimuth', atMs: null };
}

function clock(ms: number): string {
  const { hour, minute, second } = utcParts(ms);
  return [hour, minute, second].map((part) => String(part).padStart(2, '0')).join(':');
}
