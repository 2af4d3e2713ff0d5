import { describe, expect, test } from 'vitest';
import {
  angleText,
  beginsText,
  columnLengthText,
  dayText,
  longTimeText,
  minuteText,
  numberText,
  signedText,
  spanText,
} from '@/app/_ui/format';
import { fullTimeText } from '@/src/schedule/words';

const at = (text: string) => Date.parse(text);

describe('times', () => {
  const ms = at('2027-02-12T20:00:00Z');

  test('a day of year has three digits, and 31 December of a leap year is 366', () => {
    expect(dayText(ms)).toBe('043');
    expect(dayText(at('2028-12-31T23:59:59Z'))).toBe('366');
    expect(dayText(at('2027-01-01T00:00:00Z'))).toBe('001');
  });

  test('prose gives year, day and minutes, and seconds only where they are set', () => {
    expect(longTimeText(ms)).toBe('2027 day 043, 20:00 UT');
    expect(longTimeText(ms + 10_000)).toBe('2027 day 043, 20:00:10 UT');
  });

  test('forms and files give date, day and seconds', () => {
    expect(fullTimeText(at('2027-04-12T18:30:00Z'))).toBe('2027-04-12 (102) 18:30:00 UT');
  });

  test('minutes are cut off, never rounded up', () => {
    expect(minuteText(ms + 59_999)).toBe('20:00');
  });
});

describe('lengths', () => {
  test('a column gives minutes and two digits of seconds, past the hour too', () => {
    expect(columnLengthText(289)).toBe('4:49');
    expect(columnLengthText(5)).toBe('0:05');
    expect(columnLengthText(4325)).toBe('72:05');
  });

  test('a negative length has a true minus, and what rounds to zero has none', () => {
    expect(columnLengthText(-49)).toBe('\u22120:49');
    expect(columnLengthText(-0.4)).toBe('0:00');
  });

  test('a span names only the units it has', () => {
    expect(spanText(86_400)).toBe('24 h');
    expect(spanText(27_660)).toBe('7 h 41 min');
    expect(spanText(90)).toBe('1 min 30 s');
    expect(spanText(0)).toBe('0 s');
  });

  test('a session begins in days and hours, runs now, or has ended', () => {
    const start = at('2027-02-12T20:00:00Z');
    expect(beginsText(start, 86_400, at('2027-02-10T14:32:00Z'))).toBe('In 2 d 5 h');
    expect(beginsText(start, 86_400, at('2027-02-01T14:32:00Z'))).toBe('In 11 d');
    expect(beginsText(start, 86_400, start - 41 * 60_000)).toBe('In 41 min');
    expect(beginsText(start, 86_400, start)).toBe('Now');
    expect(beginsText(start, 86_400, start + 86_400_000)).toBe('Ended');
  });
});

describe('numbers', () => {
  test('the minus is U+2212, and a negative that rounds to zero has no sign', () => {
    expect(numberText(-6.93, 2)).toBe('\u22126.93');
    expect(numberText(-0.001, 2)).toBe('0.00');
  });

  test('five digits and more are parted by thin spaces, four are not', () => {
    expect(numberText(11_838)).toBe('11\u2009838');
    expect(numberText(1020)).toBe('1020');
    expect(numberText(1_234_567.25, 1)).toBe('1\u2009234\u2009567.3');
  });

  test('a signed number says plus too, and zero stands bare', () => {
    expect(signedText(3.2144, 3)).toBe('+3.214');
    expect(signedText(-6.93, 3)).toBe('\u22126.930');
    expect(signedText(0, 3)).toBe('0.000');
  });

  test('an angle is whole degrees, with a decimal in detail', () => {
    expect(angleText(39.24)).toBe('39°');
    expect(angleText(39.24, 1)).toBe('39.2°');
  });
});
