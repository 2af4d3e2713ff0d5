import { describe, expect, it } from 'vitest';
import { readBlock } from '@/src/exchange/catalogue/block';
import { WHEN } from '@/src/exchange/session-form';

const lengthOf = (length: string) => {
  const read = readBlock(WHEN, { startMs: '2027-050 18:00', lengthSeconds: length, dut1Seconds: '0' });
  return read.ok
    ? read.value.lengthSeconds
    : read.wrong.find(({ field }) => field === 'lengthSeconds')?.message;
};

describe('the length of a session', () => {
  it.each([
    ['24', 86_400],
    ['1.5', 5400],
    ['30 h', 108_000],
    ['48 h', 172_800],
    ['2 d', 172_800],
    ['1 d 6 h', 108_000],
    ['7 h 30 min', 27_000],
    ['7:30', 27_000],
    ['36:00', 129_600],
    ['90 min', 5400],
    ['14 d', 1_209_600],
  ])('“%s” is %d s', (text, seconds) => {
    expect(lengthOf(text)).toBe(seconds);
  });

  it.each([
    ['500 h', 'A session lasts at most 14 days. Make several of it.'],
    ['30 s', 'A session lasts at least a minute. Give a longer length.'],
    ['0', 'A session lasts at least a minute. Give a longer length.'],
    ['a day', '“a day” is no length. Write it as 24 h, or as 7 h 30 min.'],
    ['7:75', '“7:75” is no length. Write it as 24 h, or as 7 h 30 min.'],
    ['-3', 'A session lasts at least a minute. Give a longer length.'],
  ])('“%s” is refused in a sentence', (text, message) => {
    expect(lengthOf(text)).toBe(message);
  });

  it('is written as it is read', () => {
    for (const seconds of [60, 5400, 27_000, 86_400, 108_000, 1_209_600]) {
      expect(lengthOf(WHEN.fields.lengthSeconds.write(seconds))).toBe(seconds);
    }
  });
});
