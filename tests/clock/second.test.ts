import { describe, expect, it } from 'vitest';
import { secondState, type SecondCheck } from '@/src/clock/second';

const yes = (atMs: number): SecondCheck => ({ atMs, check: 'yes', off: null });
const no = (atMs: number): SecondCheck => ({ atMs, check: 'no', off: null });
const off = (atMs: number, seconds: number): SecondCheck => ({ atMs, check: 'off', off: seconds });

describe('secondState', () => {
  it.each<[string, SecondCheck[], number[], ReturnType<typeof secondState>]>([
    ['nothing without readings', [], [5], null],
    ['checked where the newest word is yes', [no(3), yes(2), off(1, 1)], [], { kind: 'checked' }],
    [
      'off where the newest word is off',
      [yes(1), off(2, -1), no(3)],
      [],
      { kind: 'off', seconds: -1, atMs: 2 },
    ],
    ['not checked since a re-sync', [yes(1), no(6)], [5], { kind: 'unchecked', sinceMs: 5 }],
    ['not off any more after a re-sync', [off(1, 1)], [5], { kind: 'unchecked', sinceMs: 5 }],
    ['checked after the last of two re-syncs', [yes(7)], [2, 5], { kind: 'checked' }],
    ['never checked at all', [no(1), no(2)], [], { kind: 'unchecked', sinceMs: null }],
  ])('is %s', (_, checks, resyncs, state) => {
    expect(secondState(checks, resyncs)).toEqual(state);
  });
});
