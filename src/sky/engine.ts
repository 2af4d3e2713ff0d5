import {
  AstroTime,
  BaryState,
  Body,
  GeoMoon,
  GeoVector,
  Rotation_EQJ_EQD,
  SiderealTime,
  e_tilt,
} from 'astronomy-engine';
import { ASTRONOMICAL_UNIT_M, SPEED_OF_LIGHT } from '../units/constants';
import { MS_PER_DAY } from '../units/time';
import type { Matrix3, Vector3 } from '../units/vector';

/** How the Earth stands and moves at one instant. */
export type EarthFrame = {
  /** rows turn ICRS components into those of the true equator and equinox of date */
  icrsToDate: Matrix3;
  /** Greenwich apparent sidereal time, radians [0, 2π) */
  gastRad: number;
  /** GAST − GMST, radians */
  equationOfEquinoxesRad: number;
  /** barycentric velocity of the geocentre in units of c, ICRS axes */
  velocity: Vector3;
};

const J2000_MS = Date.UTC(2000, 0, 1, 12);
const EARLIEST_MS = Date.UTC(1900, 0, 1);
const LATEST_MS = Date.UTC(2101, 0, 1);
const C_AU_PER_DAY = (SPEED_OF_LIGHT * 86_400) / ASTRONOMICAL_UNIT_M;

/** Frames of the instants asked for lately: every baseline and station of one instant shares one. */
const recent = new Map<number, EarthFrame>();
const RECENT_LIMIT = 1024;

/**
 * Orientation and motion of the Earth.
 *
 * @param atMs         UTC, epoch ms; valid 1900–2100
 * @param dut1Seconds  UT1 − UTC, |dut1| < 0.9 s, default 0
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   GMST ≤ 1e-7°, equation of the equinoxes ≤ 0.15″ against ERFA (tests/sky/position.test.ts). Left out:
 *         all but five terms of nutation (≤ 0.15″), frame bias (0.02″), polar motion (≤ 0.5″), bending of light by
 *         the Sun (0.5″ at 1° from it, 1.75″ at the limb). TT − UT1 is the engine's smooth model, 6 s too large in
 *         2026 and 10 s in 2032: precession 2·10⁻⁵″, aberration 4·10⁻⁵″, GMST 2·10⁻⁵″, the Moon 5″.
 * Source  astronomy-engine 2.1.19: precession IAU 2006 and leading terms of nutation IAU 2000B (IERS Conventions
 *         2010, ch. 5), Earth from VSOP87 truncated
 */
export function earthFrameAt(atMs: number, dut1Seconds = 0): EarthFrame {
  const ut1Ms = checkedUt1Ms(atMs, dut1Seconds);
  const known = recent.get(ut1Ms);
  if (known) return known;
  const frame = atTheDoor(() => makeFrame(new AstroTime((ut1Ms - J2000_MS) / MS_PER_DAY)));
  if (recent.size >= RECENT_LIMIT) recent.clear();
  recent.set(ut1Ms, frame);
  return frame;
}

/**
 * Apparent place of the Sun from the geocentre, aberration and light time included.
 *
 * @param atMs  UTC, epoch ms; valid 1900–2100
 * @returns ICRS axes, astronomical units
 * @throws RangeError if the instant is not finite or out of range (programmer error)
 *
 * Error   ≤ 0.001° against ERFA epv00 (tests/sky/position.test.ts)
 * Source  astronomy-engine 2.1.19, VSOP87 truncated
 */
export function sunVector(atMs: number): Vector3 {
  const ms = checkedUt1Ms(atMs, 0);
  return atTheDoor(() => {
    const v = GeoVector(Body.Sun, new AstroTime((ms - J2000_MS) / MS_PER_DAY), true);
    return [v.x, v.y, v.z];
  });
}

/**
 * Place of the Moon from the geocentre; its light time (0.7″) is left out.
 *
 * @param atMs  UTC, epoch ms; valid 1900–2100
 * @returns ICRS axes, astronomical units
 * @throws RangeError if the instant is not finite or out of range (programmer error)
 *
 * Error   ≤ 0.005° against ERFA moon98 (tests/sky/position.test.ts)
 * Source  astronomy-engine 2.1.19, Montenbruck & Pfleger lunar series
 */
export function moonVector(atMs: number): Vector3 {
  const ms = checkedUt1Ms(atMs, 0);
  return atTheDoor(() => {
    const v = GeoMoon(new AstroTime((ms - J2000_MS) / MS_PER_DAY));
    return [v.x, v.y, v.z];
  });
}

function makeFrame(time: AstroTime): EarthFrame {
  const { rot } = Rotation_EQJ_EQD(time);
  const cell = (row: number, column: number) => {
    const value = rot[column]?.[row];
    if (value === undefined) throw new RangeError('The engine gave a rotation that is not 3 × 3');
    return value;
  };
  const earth = BaryState(Body.Earth, time);
  return {
    icrsToDate: [
      [cell(0, 0), cell(0, 1), cell(0, 2)],
      [cell(1, 0), cell(1, 1), cell(1, 2)],
      [cell(2, 0), cell(2, 1), cell(2, 2)],
    ],
    gastRad: (SiderealTime(time) * Math.PI) / 12,
    // e_tilt gives it in seconds of time
    equationOfEquinoxesRad: (e_tilt(time).ee * Math.PI) / (12 * 3600),
    velocity: [earth.vx / C_AU_PER_DAY, earth.vy / C_AU_PER_DAY, earth.vz / C_AU_PER_DAY],
  };
}

function checkedUt1Ms(atMs: number, dut1Seconds: number): number {
  if (!(atMs >= EARLIEST_MS && atMs < LATEST_MS)) throw new RangeError(`Instant outside 1900–2100: ${atMs}`);
  if (!(Math.abs(dut1Seconds) < 0.9001)) throw new RangeError(`UT1 − UTC outside ±0.9 s: ${dut1Seconds}`);
  return atMs + dut1Seconds * 1000;
}

/** The engine throws strings; nothing past this file sees one. */
function atTheDoor<T>(compute: () => T): T {
  try {
    return compute();
  } catch (thrown) {
    if (thrown instanceof Error) throw thrown;
    throw new RangeError(`astronomy-engine: ${String(thrown)}`, { cause: thrown });
  }
}
