/** Changes are found to this, in milliseconds. */
const CHANGE_MS = 0.5;
/** Extrema are found to this; the function is flat there, so its value is known far better. */
const EXTREMUM_MS = 100;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * Instant at which a condition becomes true.
 *
 * @param holds    condition at an instant, epoch ms; false at falseMs, true at trueMs
 * @param falseMs  one end of the bracket
 * @param trueMs   the other end, earlier or later
 * @returns epoch ms, within 0.5 ms on the true side; with several changes inside, one of them
 *
 * Source  bisection
 */
export function changeMs(holds: (ms: number) => boolean, falseMs: number, trueMs: number): number {
  let [no, yes] = [falseMs, trueMs];
  while (Math.abs(yes - no) > CHANGE_MS) {
    const middle = (no + yes) / 2;
    if (holds(middle)) yes = middle;
    else no = middle;
  }
  return yes;
}

/**
 * Instant at which a function with one maximum inside a bracket is highest.
 *
 * @param f      function of epoch ms, a kink allowed
 * @param aMs    start of the bracket
 * @param bMs    end of the bracket
 * @returns epoch ms, within 0.1 s (a source's elevation is then within 2·10⁻⁷° of its extreme)
 *
 * Source  golden section; Kiefer, Proc. AMS 4, 502 (1953)
 */
export function highestMs(f: (ms: number) => number, aMs: number, bMs: number): number {
  let [a, b] = [aMs, bMs];
  let left = b - GOLDEN * (b - a);
  let right = a + GOLDEN * (b - a);
  let [atLeft, atRight] = [f(left), f(right)];
  while (b - a > EXTREMUM_MS) {
    if (atLeft > atRight) {
      [b, right, atRight] = [right, left, atLeft];
      left = b - GOLDEN * (b - a);
      atLeft = f(left);
    } else {
      [a, left, atLeft] = [left, right, atRight];
      right = a + GOLDEN * (b - a);
      atRight = f(right);
    }
  }
  return (a + b) / 2;
}
