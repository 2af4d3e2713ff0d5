import { describe, expect, it } from 'vitest';
import { readHorizonFile } from '@/src/exchange/horizon-file';

describe('a mask from a file of two columns', () => {
  it('takes blanks, tabs, commas and semicolons, a head line and remarks, and sorts by azimuth', () => {
    const text = 'azimuth elevation\r\n# the barn\n226, 18.5\n 47\t14.5 # barn\n\n148;9\n71 12\n';
    expect(readHorizonFile(text)).toEqual({
      corners: [
        { azimuthDeg: 47, elevationDeg: 14.5 },
        { azimuthDeg: 71, elevationDeg: 12 },
        { azimuthDeg: 148, elevationDeg: 9 },
        { azimuthDeg: 226, elevationDeg: 18.5 },
      ],
      wrong: [],
    });
  });

  it('keeps an upright step in the order of the file, and brings azimuths into one turn', () => {
    expect(readHorizonFile('360 3\n-90 5\n\u221290 7').corners).toEqual([
      { azimuthDeg: 0, elevationDeg: 3 },
      { azimuthDeg: 270, elevationDeg: 5 },
      { azimuthDeg: 270, elevationDeg: 7 },
    ]);
  });

  it.each([
    ['10 91', 'The elevation is outside 0° to 90°.'],
    ['10 -1', 'The elevation is outside 0° to 90°.'],
    ['400 5', 'The azimuth is outside −180° to 360°.'],
    ['10 5 7', 'It has 3 columns, not two: azimuth and elevation.'],
    ['10', 'It has 1 column, not two: azimuth and elevation.'],
    ['10 high', '“high” is no elevation.'],
    ['NaN 5', '“NaN” is no azimuth.'],
    ['Infinity 5', '“Infinity” is no azimuth.'],
  ])('says what is wrong with “%s”, by its line', (line, message) => {
    expect(readHorizonFile(`1 1\n${line}\n2 2`)).toEqual({
      corners: [
        { azimuthDeg: 1, elevationDeg: 1 },
        { azimuthDeg: 2, elevationDeg: 2 },
      ],
      wrong: [{ line: 2, text: line, message }],
    });
  });

  it('is empty for an empty file, and shortens a long line that it cannot read', () => {
    expect(readHorizonFile('\n# nothing\n')).toEqual({ corners: [], wrong: [] });
    expect(readHorizonFile(`1 1\n${'x'.repeat(500)}`).wrong[0]?.text).toHaveLength(61);
  });
});
