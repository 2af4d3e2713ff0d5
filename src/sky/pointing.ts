import { anglesToward, axisFrame, type AxisFrame } from './axis-frame';
import { scanEnd, scanPath, type ScanEnd, type ScanPath } from './cable';
import type { Impossible } from './impossible';
import type { RotationOptions } from './position';
import { siteFrame } from './site';
import { checkMount, motionTo, type Held, type Motion, type SlewStation } from './slew';
import { tracksOf, type Track } from './track';
import type { Interval, Mount, SkyPosition } from './types';

/** A scan of a pointing file; stations by their place in the list, all of them where absent. */
export type PointedScan = { source: SkyPosition; scan: Interval; stations?: readonly number[] };

/**
 * Where the dishes point through a list of scans: [scan][station] → index scan · stations + station. NaN where a
 * station is not in a scan or cannot do it.
 */
export type Pointings = {
  stations: number;
  /** at the start of the scan, degrees; elevation geometric */
  azimuthDeg: Float64Array;
  elevationDeg: Float64Array;
  /** of the first axis, at the start and at the end; of az–el, the turn of the cable */
  motorDeg: Float64Array;
  endMotorDeg: Float64Array;
  /** of the second axis */
  secondDeg: Float64Array;
  endSecondDeg: Float64Array;
  /** settling included, from the scan before that the dish could do; NaN for its first */
  slewSeconds: Float64Array;
  /** why a dish cannot do a scan, by index */
  impossible: ReadonlyMap<number, Impossible>;
};

/** `level` holds the axes of azimuth and elevation, whatever the mount's are. */
type Dish = { mount: Mount; axes: AxisFrame; level: AxisFrame; held: Held | null };

/**
 * Pointings and slews of many scans at many stations in one pass, each dish's turn of the cable carried from scan to
 * scan. A dish begins on the turn nearest to mid-range and passes over what it cannot do.
 *
 * @param scans     in the order in which they are done, each longer than zero; a source that is the same object is
 *                  worked out once
 * @param stations  sites and mounts
 * @param opts      dut1Seconds = UT1 − UTC, default 0
 * @throws RangeError if an input is not finite or out of range, a scan is empty, a mount cannot be or a station is not
 *         in the list (programmer error)
 *
 * Shape   each Float64Array(scans · stations)
 * Error   of firstPointing, slewBetween and pointingAtEnd one by one ≤ 1e-9° and 1e-6 s (tests/sky/pointing.test.ts)
 * Source  as slewBetween
 */
export function pointingsOf(
  scans: readonly PointedScan[],
  stations: readonly SlewStation[],
  opts: RotationOptions = {},
): Pointings {
  const dishes = stations.map(dishOf);
  const size = scans.length * dishes.length;
  const impossible = new Map<number, Impossible>();
  const table = { ...columns(size), stations: dishes.length, impossible };
  const tracks = tracksFor(scans, opts);
  scans.forEach(({ source, scan, stations: members }, row) => {
    const track = tracks.get(source);
    if (!track) throw new RangeError('A scan without its source');
    const start = scanEnd(track, scan.start.getTime());
    const end = scanEnd(track, scan.end.getTime());
    const take = (dish: Dish, column: number) => {
      const at = row * dishes.length + column;
      const path = scanPath(dish.axes, track, start, end);
      const motion = motionTo(dish.mount, path, dish.held);
      if ('impossible' in motion) impossible.set(at, motion);
      else dish.held = keep(table, at, { path, motion, start, level: dish.level });
    };
    if (!members) dishes.forEach(take);
    else for (const column of members) take(dishAt(dishes, column), column);
  });
  return table;
}

function keep(
  table: Pointings,
  at: number,
  { path, motion, start, level }: { path: ScanPath; motion: Motion; start: ScanEnd; level: AxisFrame },
): Held {
  const seen = path.axes === level ? path.start : anglesToward(level, start.direction);
  const endMotorDeg = motion.motorDeg + path.endTurnDeg;
  table.azimuthDeg[at] = seen.firstDeg;
  table.elevationDeg[at] = seen.secondDeg;
  table.motorDeg[at] = motion.motorDeg;
  table.endMotorDeg[at] = endMotorDeg;
  table.secondDeg[at] = path.start.secondDeg;
  table.endSecondDeg[at] = path.end.secondDeg;
  table.slewSeconds[at] = motion.seconds;
  return { motorDeg: endMotorDeg, secondDeg: path.end.secondDeg };
}

function dishOf({ site, mount }: SlewStation): Dish {
  checkMount(mount);
  const frame = siteFrame(site);
  const level = axisFrame('az-el', frame);
  return { mount, axes: mount.kind === 'az-el' ? level : axisFrame(mount.kind, frame), level, held: null };
}

function dishAt(dishes: readonly Dish[], column: number): Dish {
  const dish = dishes[column];
  if (!dish) throw new RangeError(`No station ${column} among ${dishes.length}`);
  return dish;
}

function columns(size: number) {
  const column = () => new Float64Array(size).fill(NaN);
  return {
    azimuthDeg: column(),
    elevationDeg: column(),
    motorDeg: column(),
    endMotorDeg: column(),
    secondDeg: column(),
    endSecondDeg: column(),
    slewSeconds: column(),
  };
}

/** One track for each source, over the span of all scans. */
function tracksFor(scans: readonly PointedScan[], opts: RotationOptions): Map<SkyPosition, Track> {
  let [startMs, endMs] = [Infinity, -Infinity];
  for (const { scan } of scans) {
    startMs = Math.min(startMs, scan.start.getTime());
    endMs = Math.max(endMs, scan.end.getTime());
  }
  const sources = [...new Set(scans.map(({ source }) => source))];
  if (sources.length === 0) return new Map();
  const tracks = tracksOf(sources, { start: new Date(startMs), end: new Date(endMs) }, opts);
  return new Map(sources.flatMap((source, index) => (tracks[index] ? [[source, tracks[index]]] : [])));
}
