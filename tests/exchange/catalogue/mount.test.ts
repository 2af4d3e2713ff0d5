import { describe, expect, it } from 'vitest';
import { readBlock } from '@/src/exchange/catalogue/block';
import { mount } from '@/src/exchange/catalogue/station-site';

const TYPED = {
  mountKind: 'xy-ns',
  dishM: '12',
  axisOffsetM: '2.2',
  axis1MinDeg: '-85',
  axis1MaxDeg: '85',
  axis1RateDegPerS: '0.5',
  axis1AccelDegPerS2: '0.2',
  axis2MinDeg: '-80',
  axis2MaxDeg: '80',
  axis2RateDegPerS: '0.5',
  axis2AccelDegPerS2: '0.2',
  settleSeconds: '5',
  minElevationDeg: '10',
  maxElevationDeg: '90',
};

describe('a mount', () => {
  it.each(['az-el', 'ha-dec', 'xy-ns', 'xy-ew'])(
    'of kind %s is read, an empty Sun limit left out',
    (kind) => {
      const typed = { ...TYPED, mountKind: kind, axis2MinDeg: '5' };
      expect(readBlock(mount, typed)).toMatchObject({
        ok: true,
        value: { mountKind: kind, axis1MaxDeg: 85, axis2RateDegPerS: 0.5, sunLimitDeg: null },
      });
    },
  );

  it.each([
    ['xy-ew', { axis1RateDegPerS: '0' }, 'axis1RateDegPerS', '0 is out of range. “X rate” lies'],
    ['ha-dec', { axis1RateDegPerS: '0' }, 'axis1RateDegPerS', '0 is out of range. “Hour angle rate” lies'],
    ['az-el', { axis2AccelDegPerS2: '-1' }, 'axis2AccelDegPerS2', '“Elevation axis start” lies'],
    ['xy-ns', { axis2MinDeg: '' }, 'axis2MinDeg', 'Type a number for “Y from”.'],
    ['xy-ns', { axis1MaxDeg: '-90' }, 'axis1MaxDeg', 'X ends before it begins.'],
    ['xy-ns', { axis2MaxDeg: '91' }, 'axis2MaxDeg', 'Y goes from −90° to 90°.'],
    ['ha-dec', { axis1MinDeg: '-181' }, 'axis1MinDeg', 'Hour angle goes from −180° to 180°.'],
    ['ha-dec', { axis2MaxDeg: '-80' }, 'axis2MaxDeg', 'Declination ends before it begins.'],
    ['az-el', { axis2MinDeg: '-11' }, 'axis2MinDeg', 'The elevation axis goes from −10° to 180°.'],
    ['az-el', { axis2MinDeg: '5', axis1MinDeg: 'NaN' }, 'axis1MinDeg', '“NaN” is no number.'],
    ['polar', {}, 'mountKind', ''],
  ])('of kind %s with %j is refused beside its field', (mountKind, change, field, words) => {
    const read = readBlock(mount, { ...TYPED, mountKind, ...change });
    if (read.ok) throw new Error('it was read');
    const found = read.wrong.find((one) => one.field === field);
    expect(found?.message).toContain(words);
  });
});
