import { describe, expect, it } from 'vitest';
import { readLengthEntry, readTimeEntry } from '@/src/units/entry';

const near = Date.UTC(2027, 1, 12, 23, 50);

describe('a time as people type it', () => {
  it.each([
    ['0046', Date.UTC(2027, 1, 13, 0, 46)],
    ['00:46', Date.UTC(2027, 1, 13, 0, 46)],
    ['23:10:05', Date.UTC(2027, 1, 12, 23, 10, 5)],
    ['231005', Date.UTC(2027, 1, 12, 23, 10, 5)],
    ['044 00:46', Date.UTC(2027, 1, 13, 0, 46)],
    ['44 00:46', Date.UTC(2027, 1, 13, 0, 46)],
    ['2026-044 00:46', Date.UTC(2026, 1, 13, 0, 46)],
    ['365 12:00', Date.UTC(2026, 11, 31, 12)],
  ])('%s is read, the nearest where day or year is left out', (text, ms) => {
    expect(readTimeEntry(text, near)).toEqual({ ok: true, value: ms });
  });

  it.each(['', 'soon', '24:00', '00:60', '400 00:46', '000 00:46', '2027-366 00:46', '1:2', '2027- 00:46'])(
    '“%s” is refused with a sentence',
    (text) => {
      const entry = readTimeEntry(text, near);
      expect(entry.ok).toBe(false);
      if (!entry.ok) expect(entry.message).toMatch(/\.$/);
    },
  );
});

describe('a length as people type it', () => {
  it.each([
    ['12', 720],
    ['12 min', 720],
    ['720 s', 720],
    ['12:30', 750],
    ['1 h 30 min', 5400],
    ['1h', 3600],
    ['2 min 5 s', 125],
  ])('%s is read', (text, seconds) => {
    expect(readLengthEntry(text)).toEqual({ ok: true, value: seconds });
  });

  it.each(['', '0', '0 s', 'long', '-5', '12.5', '25 h', '99999999'])(
    '“%s” is refused with a sentence',
    (text) => {
      const entry = readLengthEntry(text);
      expect(entry.ok).toBe(false);
      if (!entry.ok) expect(entry.message).toMatch(/\.$/);
    },
  );
});
