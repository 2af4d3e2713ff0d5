/** What a reading said of the formatter's whole second, which a counter does not see. */
export type SecondCheck = { atMs: number; check: 'yes' | 'no' | 'off'; off: number | null };

/** What is known of a station's whole second; sinceMs is the last re-sync, null where none is known. */
export type SecondState =
  | { kind: 'checked' }
  | { kind: 'unchecked'; sinceMs: number | null }
  | { kind: 'off'; seconds: number; atMs: number };

/**
 * The whole second of a formatter, as the log says it.
 *
 * @param checks   of readings, in any order; off = whole seconds from UTC where check is 'off'
 * @param resyncs  instants at which the formatter was set anew, epoch ms
 * @returns what the newest check since the last re-sync says; null without readings: then nothing is known of the clock
 *
 * Source  science: not checked since the last re-sync is a note, off by n ≠ 0 must be fixed
 */
export function secondState(checks: readonly SecondCheck[], resyncs: readonly number[]): SecondState | null {
  if (checks.length === 0) return null;
  const sinceMs = resyncs.length > 0 ? Math.max(...resyncs) : null;
  const said = checks
    .filter(({ check, atMs }) => check !== 'no' && atMs >= (sinceMs ?? -Infinity))
    .reduce<SecondCheck | null>((last, one) => (last === null || one.atMs > last.atMs ? one : last), null);
  if (said === null) return { kind: 'unchecked', sinceMs };
  return said.check === 'off' && said.off !== null
    ? { kind: 'off', seconds: said.off, atMs: said.atMs }
    : { kind: 'checked' };
}
