export type Tick = 'early' | 'late';
export type Pulse = 'formatter' | 'maser' | 'gps';

/** Which pulse starts the counter and which stops it (one of the two is GPS), and how late each arrives there. */
export type CounterWiring = {
  start: Pulse;
  stop: Pulse;
  stationCableSeconds: number;
  gpsCableSeconds: number;
};

/** Fraction of a second a counter sees; whole seconds are checked apart. */
const LARGEST_SECONDS = 0.5;

/**
 * The interval that a counter means: it only counts forward, so what is 3 µs before the next pulse reads 0.999 997 s.
 *
 * @param counterSeconds  what it shows, [0, 1)
 * @returns seconds, [−0.5, 0.5)
 * @throws RangeError outside [0, 1) (programmer error: forms refuse it in words)
 */
export function foldCounter(counterSeconds: number): number {
  if (!(counterSeconds >= 0 && counterSeconds < 1)) throw new RangeError('A counter shows 0 to 1 s.');
  return counterSeconds < LARGEST_SECONDS ? counterSeconds : counterSeconds - 1;
}

/**
 * Station clock minus UTC, via GPS, positive = early, from what the counter shows.
 *
 * @param counterSeconds  [0, 1)
 * @returns started by the station's pulse: interval + d_station − d_gps; started by GPS: −interval + d_station − d_gps
 *
 * Source  definition of this project; planted cases in tests/clock/reading.test.ts
 */
export function offsetFromCounter(counterSeconds: number, wiring: CounterWiring): number {
  const interval = foldCounter(counterSeconds);
  const cables = wiring.stationCableSeconds - wiring.gpsCableSeconds;
  return (wiring.start === 'gps' ? -interval : interval) + cables;
}

/** A size and a word to a signed offset: early is positive. */
export const offsetFromWords = (tick: Tick, sizeSeconds: number): number =>
  tick === 'early' ? sizeSeconds : -sizeSeconds;

export type SizeEntry =
  | { ok: true; seconds: number }
  /** a sign was typed: the tick must be chosen anew */
  | { ok: false; message: string; isSigned: boolean };

/** How a size is written in each unit, in seconds. */
export const SIZE_UNITS = { µs: 1e-6, ns: 1e-9, ms: 1e-3, s: 1 } as const;
export type SizeUnit = keyof typeof SIZE_UNITS;

/**
 * The size of an offset as a person types it, without a sign.
 *
 * @param text  a decimal number; a decimal comma, spaces and U+2212 are read
 * @returns seconds, (0, 0.5], to 0.1 ns; or a sentence: a sign is refused, and so is what a counter cannot see
 */
export function readSize(text: string, unit: SizeUnit): SizeEntry {
  const typed = text
    .trim()
    .replaceAll('\u2212', '-')
    .replaceAll(/[\s\u2009]/g, '');
  const refuse = (message: string, isSigned = false): SizeEntry => ({ ok: false, message, isSigned });
  if (/^[+-]/.test(typed)) return refuse('Type the size without a sign. Which tick came first?', true);
  if (typed === '') return refuse(`By how much? Type the size in ${unit}.`);
  if (!/^\d*[.,]?\d+$|^\d+[.,]$/.test(typed))
    return refuse(`“${text.trim()}” is no size. Type a number, for example 3.214.`);
  const seconds = Number(typed.replace(',', '.')) * SIZE_UNITS[unit];
  if (seconds > LARGEST_SECONDS)
    return refuse(
      `${text.trim()} ${unit} is more than half a second. Type the part of a second here, and whole seconds under “Formatter second checked”.`,
    );
  return { ok: true, seconds: Math.round(seconds * 1e10) / 1e10 };
}

/**
 * A clock's offset in words, as screens say it.
 *
 * @returns "EARLY by 3.214 µs"; "LATE by 12.0 ms" from 1 ms up; "on time" where it is 0 to the last decimal
 */
export function offsetWords(offsetSeconds: number, decimals = 3): string {
  const size = Math.abs(offsetSeconds);
  const [value, unit] = size >= 1e-3 ? [size * 1e3, 'ms'] : [size * 1e6, 'µs'];
  const text = value.toFixed(decimals);
  if (Number(text) === 0) return 'on time';
  return `${offsetSeconds > 0 ? 'EARLY' : 'LATE'} by ${text} ${unit}`;
}

/** What the rate does in a day: "gains 57.6 ns a day"; "keeps its rate" below 0.05 ns. */
export function rateWords(rate: number): string {
  const nanoseconds = Math.abs(rate) * 86_400 * 1e9;
  const text = nanoseconds.toFixed(1);
  if (Number(text) === 0) return 'keeps its rate';
  return `${rate > 0 ? 'gains' : 'loses'} ${text} ns a day`;
}
