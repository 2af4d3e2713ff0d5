import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ID_PATTERN, idOf } from '@/src/schedule/plan-ids';

describe('ids of a plan', () => {
  it('made from any bytes have the pattern that the server takes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ minLength: 16, maxLength: 32 }), (bytes) => {
        expect(idOf(bytes)).toMatch(ID_PATTERN);
      }),
    );
  });

  it('use all 32 letters, each for one value of five bits', () => {
    const letters = [
      idOf(Uint8Array.from({ length: 16 }, (_, n) => n)),
      idOf(Uint8Array.from({ length: 16 }, (_, n) => n + 16)),
    ];
    expect(new Set(letters.join('')).size).toBe(32);
  });

  it('are not made of too few bytes', () => {
    expect(() => idOf(new Uint8Array(15))).toThrow(RangeError);
  });
});
