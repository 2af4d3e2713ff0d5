import { describe, expect, it } from 'vitest';
import {
  declinationText,
  readDeclination,
  readRightAscension,
  rightAscensionText,
} from '@/src/units/sexagesimal';

describe('a right ascension', () => {
  it.each([
    ['08 25 50.3383', 126.459743],
    ['8:25:50.3383', 126.459743],
    ['8h25m50.3383s', 126.459743],
    ['08 25', 126.25],
    ['126.4597431', 126.4597431],
    ['126,46°', 126.46],
    ['0', 0],
    ['23 59 59.9', 359.999583],
  ])('%s is read', (text, deg) => {
    const read = readRightAscension(text);
    expect(read.ok && Math.abs(read.value - deg)).toBeLessThan(1e-6);
  });

  it.each(['', 'north', '24 00 00', '12 60 00', '12 30 60', '360', '-1', '-08 00 00'])(
    '“%s” is refused in a sentence',
    (text) => {
      const read = readRightAscension(text);
      expect(read).toMatchObject({ ok: false, message: expect.stringMatching(/\.$/) as string });
    },
  );
});

describe('a declination', () => {
  it.each([
    ['+03 09 24.52', 3.156811],
    ['\u221200 10 00', -0.166667],
    ['-24:07:38', -24.127222],
    ['3°9′24.52″', 3.156811],
    ['3d 9m 24.52s', 3.156811],
    ['-90', -90],
    ['1.7811722949', 1.7811722949],
  ])('%s is read, its sign kept', (text, deg) => {
    const read = readDeclination(text);
    expect(read.ok && Math.abs(read.value - deg)).toBeLessThan(1e-6);
  });

  it.each(['', 'x', '90 00 01', '-91', '12 60', '12 00 75'])('“%s” is refused in a sentence', (text) => {
    expect(readDeclination(text)).toMatchObject({ ok: false });
  });
});

describe('as text', () => {
  it('rounds its seconds up through minutes and hours', () => {
    expect(rightAscensionText(359.9999999)).toBe('00 00 00.0000');
    expect(declinationText(9.99999999)).toBe('+10 00 00.000');
    expect(declinationText(-0.166666667)).toBe('\u221200 10 00.000');
  });

  it('is read back to within 1 mas of arc and 0.1 ms of time', () => {
    for (let step = 0; step < 360; step += 7.3131) {
      const ra = readRightAscension(rightAscensionText(step));
      expect(ra.ok && Math.abs(ra.value - step) * 3600).toBeLessThan(0.00076);
      const dec = readDeclination(declinationText(step / 4 - 45));
      expect(dec.ok && Math.abs(dec.value - (step / 4 - 45)) * 3600).toBeLessThan(0.00051);
    }
  });
});
