import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  foldCounter,
  offsetFromCounter,
  offsetFromWords,
  offsetWords,
  rateWords,
  readSize,
  type CounterWiring,
} from '@/src/clock/reading';

const byStation: CounterWiring = {
  start: 'formatter',
  stop: 'gps',
  stationCableSeconds: 0,
  gpsCableSeconds: 0,
};
const byGps: CounterWiring = { ...byStation, start: 'gps', stop: 'formatter' };

describe('a counter', () => {
  it('that shows nearly a second means a pulse just after', () => {
    expect(foldCounter(3.214e-6)).toBe(3.214e-6);
    expect(foldCounter(0.999996786)).toBeCloseTo(-3.214e-6, 12);
    expect(foldCounter(0.5)).toBe(-0.5);
    expect(() => foldCounter(1)).toThrow(RangeError);
    expect(() => foldCounter(-1e-6)).toThrow(RangeError);
  });

  /** The station's pulse comes 3.214 µs before GPS: EARLY, whichever of the two starts the count. */
  it.each([
    ['the station starts', byStation, 3.214e-6, 3.214e-6],
    ['GPS starts, and waits for the next station pulse', byGps, 1 - 3.214e-6, 3.214e-6],
    ['the station starts and is late', byStation, 1 - 3.214e-6, -3.214e-6],
    ['GPS starts and the station is late', byGps, 3.214e-6, -3.214e-6],
  ])('planted: %s', (_, wiring, shown, offset) => {
    expect(offsetFromCounter(shown, wiring)).toBeCloseTo(offset, 12);
  });

  it.each([
    ['the station', byStation],
    ['GPS', byGps],
  ])('started by %s: cables are taken out, each of them a late arrival', (_, wiring) => {
    const cabled = { ...wiring, stationCableSeconds: 40e-9, gpsCableSeconds: 150e-9 };
    // at the counter the station's pulse is 40 ns late and GPS 150 ns: what is 1 µs early looks 1.11 µs early
    const seen = 1e-6 - 40e-9 + 150e-9;
    const shown = wiring.start === 'gps' ? 1 - seen : seen;
    expect(offsetFromCounter(shown, cabled)).toBeCloseTo(1e-6, 12);
  });
});

describe('the size of an offset', () => {
  it('is read with a point or a comma, to 0.1 ns', () => {
    expect(readSize('3.214', 'µs')).toEqual({ ok: true, seconds: 3.214e-6 });
    expect(readSize('3,2144', 'µs')).toEqual({ ok: true, seconds: 3.2144e-6 });
    expect(readSize('12', 'ns')).toEqual({ ok: true, seconds: 12e-9 });
    expect(readSize('0', 'µs')).toEqual({ ok: true, seconds: 0 });
  });

  it.each(['-3.214', '\u22123.214', '+3.2', ' - 3'])('%s is refused: the sign is a word', (text) => {
    expect(readSize(text, 'µs')).toEqual({
      ok: false,
      isSigned: true,
      message: 'Type the size without a sign. Which tick came first?',
    });
  });

  it.each([
    ['', 'By how much?'],
    ['three', 'is no size'],
    ['1.2.3', 'is no size'],
    ['600000', 'more than half a second'],
  ])('"%s" is refused in words', (text, words) => {
    const entry = readSize(text, 'µs');
    expect(entry).toMatchObject({ ok: false, isSigned: false });
    expect(entry.ok ? '' : entry.message).toContain(words);
  });

  it('and its word come back as said', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 999_999 }),
        fc.constantFrom('early' as const, 'late' as const),
        (ns, tick) => {
          const words = offsetWords(offsetFromWords(tick, ns * 1e-9));
          expect(words).toBe(`${tick.toUpperCase()} by ${(ns / 1000).toFixed(3)} µs`);
        },
      ),
    );
  });
});

describe('words', () => {
  it('say early for positive and late for negative', () => {
    expect(offsetWords(3.214e-6)).toBe('EARLY by 3.214 µs');
    expect(offsetWords(-6.93e-6)).toBe('LATE by 6.930 µs');
    expect(offsetWords(0.0123)).toBe('EARLY by 12.300 ms');
    expect(offsetWords(1e-11)).toBe('on time');
  });

  it('say gains for a positive rate', () => {
    expect(rateWords(0.667e-12)).toBe('gains 57.6 ns a day');
    expect(rateWords(-3.1e-12)).toBe('loses 267.8 ns a day');
    expect(rateWords(0)).toBe('keeps its rate');
  });
});
