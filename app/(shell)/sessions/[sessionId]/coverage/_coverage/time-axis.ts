const HOUR_MS = 3_600_000;
const ROOM = 30;

/** Whole hours of UT inside a span, as many as have room on so many pixels. */
export function hourTicks(
  startMs: number,
  endMs: number,
  width: number,
): { ms: number; isMidnight: boolean }[] {
  const hours = (endMs - startMs) / HOUR_MS;
  const step = [1, 2, 3, 4, 6, 12, 24].find((one) => (hours / one) * ROOM <= width) ?? 24;
  const first = Math.ceil(startMs / (step * HOUR_MS));
  const last = Math.floor(endMs / (step * HOUR_MS));
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => {
    const ms = (first + index) * step * HOUR_MS;
    return { ms, isMidnight: ms % (24 * HOUR_MS) === 0 };
  });
}
