import { describe, expect, it } from 'vitest';
import { dayOfYear, intervalSeconds, utcParts, extentOf } from '@/src/units/time';

describe('time', () => {
  it('counts days of the year from one, leap years included', () => {
    expect(dayOfYear(Date.UTC(2027, 0, 1))).toBe(1);
    expect(dayOfYear(Date.UTC(2027, 11, 31, 23, 59, 59, 999))).toBe(365);
    expect(dayOfYear(Date.UTC(2028, 1, 29, 12))).toBe(60);
    expect(dayOfYear(Date.UTC(2028, 11, 31))).toBe(366);
  });

  it('takes an instant apart in UTC', () => {
    expect(utcParts(Date.UTC(2028, 1, 29, 23, 5, 7, 40))).toEqual({
      year: 2028,
      month: 2,
      day: 29,
      dayOfYear: 60,
      hour: 23,
      minute: 5,
      second: 7,
      millisecond: 40,
    });
  });

  it('refuses what is no instant', () => {
    expect(() => dayOfYear(NaN)).toThrow(RangeError);
    expect(() => utcParts(Infinity)).toThrow(RangeError);
  });

  it('measures an interval in seconds', () => {
    expect(intervalSeconds({ start: new Date(0), end: new Date(90_500) })).toBe(90.5);
  });
});

describe('extentOf', () => {
  it('is the first and the last of instants in any order', () => {
    expect(extentOf([5, 2, 9])).toEqual({ startMs: 2, endMs: 9 });
    expect(extentOf(Float64Array.of(7))).toEqual({ startMs: 7, endMs: 7 });
  });

  it('refuses none, and what is no instant', () => {
    expect(() => extentOf([])).toThrow(RangeError);
    expect(() => extentOf([1, NaN])).toThrow(RangeError);
  });
});
