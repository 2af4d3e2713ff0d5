import { rotate } from '../units/vector';
import type { Vector3 } from '../units/vector';
import { apparentIcrs, catalogueDirection } from '../sky/direction';
import { earthFrameAt } from '../sky/engine';
import type { RotationOptions } from '../sky/position';
import type { SkyPosition } from '../sky/types';
import { EARTH_ROTATION_RAD_PER_S } from '../units/constants';
import { MS_PER_DAY, MS_PER_SECOND } from '../units/time';
import { carry, uvwAxes } from './celestial';

/**
 * Axes of u, v, w for a source over a span, ready for many cheap evaluations.
 *
 * At an instant the axes stand on the true equator and equinox of date; with the Earth's turn they are Earth-fixed.
 */
export type UvBasis = {
  startMs: number;
  /** distance between nodes; a panel has three */
  nodeMs: number;
  /** ten quadratics a panel, a + b·x + c·x², x in [−1, 1]: u, v, w (x, y, z each), what the turn has beyond uniform */
  panels: readonly Float64Array[];
};

/** Distance between nodes at most, and at least: closer ones would magnify rounding. */
const NODE_LIMIT_MS = MS_PER_DAY / 2;
const NODE_LEAST_MS = 10_800_000;
const VALUES = 10;
const TURN = 2 * Math.PI;
const TURN_RAD_PER_MS = EARTH_ROTATION_RAD_PER_S / MS_PER_SECOND;

/**
 * The axes of baselineUvw, exact at nodes at most half a day apart and quadratic between.
 *
 * @param source  ICRS place
 * @param spanMs  first and last instant, epoch ms UTC, 1900–2100; start ≤ end
 * @param opts    dut1Seconds = UT1 − UTC, default 0
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   ≤ 1e-9 of a baseline's length from baselineUvw (tests/array/uvw-tracks.test.ts). Cost: 30 µs a node
 * Source  quadratic interpolation: in half a day aberration turns the axes by at most 10⁻⁶
 */
export function uvBasisOf(
  source: SkyPosition,
  spanMs: { startMs: number; endMs: number },
  opts: RotationOptions = {},
): UvBasis {
  const { startMs, endMs } = spanMs;
  if (!(endMs >= startMs)) throw new RangeError(`A span that ends before it starts: ${startMs}, ${endMs}`);
  const count = Math.max(1, Math.ceil((endMs - startMs) / (2 * NODE_LIMIT_MS)));
  const nodeMs = Math.max(NODE_LEAST_MS, (endMs - startMs) / (2 * count));
  const axes = uvwAxes(source);
  const catalogue = catalogueDirection(source);
  let turnBefore = NaN;
  const nodes = Array.from({ length: 2 * count + 1 }, (_, index) => {
    const node = nodeAt(startMs + index * nodeMs, index * nodeMs, { source, catalogue, axes }, opts);
    const turn = node[VALUES - 1] ?? NaN;
    // counted on from node to node, so that no quadratic crosses 2π
    if (index > 0) node[VALUES - 1] = turn + TURN * Math.round((turnBefore - turn) / TURN);
    turnBefore = node[VALUES - 1] ?? NaN;
    return node;
  });
  return { startMs, nodeMs, panels: panelsOf(nodes) };
}

/**
 * The axes at an instant, Earth-fixed, and how they turn.
 *
 * @param atMs  epoch ms UTC; outside the span the end panel is carried on
 * @param into  twelve places: u (x, y, z), v, w, and dw/dt in 1/s
 */
export function basisAt(basis: UvBasis, atMs: number, into: Float64Array): void {
  const along = (atMs - basis.startMs) / basis.nodeMs;
  const index = Math.max(0, Math.min(basis.panels.length - 1, Math.floor(along / 2)));
  const panel = basis.panels[index];
  if (!panel) throw new RangeError('A basis without panels');
  const x = along - 2 * index - 1;
  const turn = (atMs - basis.startMs) * TURN_RAD_PER_MS + valueAt(panel, VALUES - 1, x);
  const [c, s] = [Math.cos(turn), Math.sin(turn)];
  for (let axis = 0; axis < 9; axis += 3) {
    const [px, py] = [valueAt(panel, axis, x), valueAt(panel, axis + 1, x)];
    into[axis] = px * c + py * s;
    into[axis + 1] = py * c - px * s;
    into[axis + 2] = valueAt(panel, axis + 2, x);
  }
  into[9] = EARTH_ROTATION_RAD_PER_S * (into[7] ?? NaN);
  into[10] = -EARTH_ROTATION_RAD_PER_S * (into[6] ?? NaN);
  into[11] = 0;
}

type Place = { source: SkyPosition; catalogue: Vector3; axes: readonly [Vector3, Vector3, Vector3] };

function nodeAt(atMs: number, sinceMs: number, place: Place, opts: RotationOptions): Float64Array {
  const frame = earthFrameAt(atMs, opts.dut1Seconds);
  const apparent = apparentIcrs(place.source, frame);
  const node = new Float64Array(VALUES);
  place.axes.forEach((axis, index) => {
    node.set(rotate(frame.icrsToDate, carry(axis, place.catalogue, apparent)), 3 * index);
  });
  node[VALUES - 1] = (frame.gastRad - sinceMs * TURN_RAD_PER_MS) % TURN;
  return node;
}

function panelsOf(nodes: readonly Float64Array[]): Float64Array[] {
  return Array.from({ length: (nodes.length - 1) / 2 }, (_, index) => {
    const panel = new Float64Array(3 * VALUES);
    for (let value = 0; value < VALUES; value += 1) {
      const [before, middle, after] = [0, 1, 2].map((step) => nodes[2 * index + step]?.[value] ?? NaN);
      if (before === undefined || middle === undefined || after === undefined) continue;
      panel[3 * value] = middle;
      panel[3 * value + 1] = (after - before) / 2;
      panel[3 * value + 2] = (after + before) / 2 - middle;
    }
    return panel;
  });
}

function valueAt(panel: Float64Array, value: number, x: number): number {
  const at = 3 * value;
  return (panel[at] ?? NaN) + x * ((panel[at + 1] ?? NaN) + x * (panel[at + 2] ?? NaN));
}
