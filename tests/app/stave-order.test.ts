import { expect, test } from 'vitest';
import { staveOrder } from '@/app/_ui/stave-order';

const at = (code: string, longitudeDeg: number) => ({ code, site: { longitudeDeg } });
const codes = (...stations: ReturnType<typeof at>[]) => staveOrder(stations).map(({ code }) => code);

test('staves run eastward from the widest gap in longitude', () => {
  expect(codes(at('Bm', 27.6), at('Em', -109.9), at('Fn', -3.4), at('Dp', -67.9))).toEqual([
    'Em',
    'Dp',
    'Fn',
    'Bm',
  ]);
});

test('a network across the date line is not torn apart there', () => {
  expect(codes(at('Aa', -170), at('Bb', 175), at('Cc', 140))).toEqual(['Cc', 'Bb', 'Aa']);
});

test('stations at one longitude stand by code, and one station or none is no special case', () => {
  expect(codes(at('Bb', 10), at('Aa', 10), at('Cc', 20))).toEqual(['Aa', 'Bb', 'Cc']);
  expect(codes(at('Aa', 10))).toEqual(['Aa']);
  expect(codes()).toEqual([]);
});
