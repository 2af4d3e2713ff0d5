/** How a point is spread along one axis of a grid padded to twice the field. */
export type SpreadKernel = {
  /** cells, whole; nil outside −width/2 … width/2 */
  width: number;
  /** @param x  cells from the point */
  at: (x: number) => number;
};

const WIDE = 6;
const WIDE_STEEPNESS = 2.3 * WIDE;

/**
 * Six cells wide: what comes in from outside the field is below 3·10⁻⁵ of a point.
 *
 * Source  exp(β(√(1 − (2x/w)²) − 1)), β = 2.3 w: Barnett, Magland & af Klinteberg, SIAM J. Sci. Comput. 41, C479 (2019)
 */
export const wideKernel: SpreadKernel = {
  width: WIDE,
  at: (x) => {
    const inside = 1 - (2 * x) ** 2 / WIDE ** 2;
    return inside <= 0 ? 0 : Math.exp(WIDE_STEEPNESS * (Math.sqrt(inside) - 1));
  },
};

/** Middle cell 1 + q₁t + q₂t², t = f(1 − f); outer cells f²(p₂ + p₃f), f from 0 at the outer edge to 1. */
export const NARROW = { q1: 1.63392421, q2: 0.17992334, p2: 1.37349448, p3: -0.38432685 };

/**
 * Three cells wide, without a call or a table: what comes in from outside the field is below 8·10⁻³ of a point.
 *
 * Source  own fit: coefficients that make the largest of it least
 */
export const narrowKernel: SpreadKernel = {
  width: 3,
  at: (x) => {
    const far = Math.abs(x);
    if (far >= 1.5) return 0;
    const f = far <= 0.5 ? 0.5 - far : 1.5 - far;
    const t = f * (1 - f);
    return far <= 0.5 ? 1 + t * (NARROW.q1 + t * NARROW.q2) : f * f * (NARROW.p2 + NARROW.p3 * f);
  },
};

/** Points of the midpoint rule in one cell of a kernel. */
const QUADRATURE = 200;

/**
 * What takes a kernel's taper out of the transformed field.
 *
 * @param cells     of the padded grid, along one axis
 * @param furthest  cell of the field, counted from the middle; ≤ cells/4
 * @returns factor for cells 0 … furthest
 *
 * Error   1e-5 relative: the midpoint rule
 */
export function taperCure({ width, at }: SpreadKernel, cells: number, furthest: number): Float64Array {
  const count = width * QUADRATURE;
  const places = Float64Array.from({ length: count }, (_, point) => (point + 0.5) / QUADRATURE - width / 2);
  const heights = places.map(at);
  return Float64Array.from({ length: furthest + 1 }, (_, cell) => {
    const turn = (2 * Math.PI * cell) / cells;
    return (
      QUADRATURE /
      heights.reduce((sum, height, point) => sum + height * Math.cos(turn * (places[point] ?? NaN)), 0)
    );
  });
}
