import { describe, expect, it } from 'vitest';
import { giveLetters, letterAt } from '@/app/(shell)/sessions/[sessionId]/timeline/_timeline/letters';
import type { Problem } from '@/src/schedule/checks';

const problem = (key: string, atMs: number, severity: Problem['severity'] = 'fix'): Problem => ({
  key,
  kind: 'outside',
  severity,
  scanId: key,
  station: null,
  atMs,
  values: { beforeSeconds: 0, afterSeconds: 1 },
});

describe('letters of problems', () => {
  it('skip i, l and o, and go on with aa after z', () => {
    const letters = Array.from({ length: 24 }, (_, index) => letterAt(index));
    expect(letters.join(' ')).toBe('a b c d e f g h j k m n p q r s t u v w x y z aa');
  });

  it('go in time order when first found', () => {
    const letters = giveLetters(new Map(), [problem('late', 20), problem('early', 10)]);
    expect([letters.get('early'), letters.get('late')]).toEqual(['a', 'b']);
  });

  it('stay with their problem, and are not used again when it is solved', () => {
    const first = giveLetters(new Map(), [problem('one', 10), problem('two', 20)]);
    const solved = giveLetters(first, [problem('two', 20)]);
    const again = giveLetters(solved, [problem('zero', 5), problem('two', 20)]);
    expect([again.get('two'), again.get('zero')]).toEqual(['b', 'c']);
  });

  it('go to everything that must be fixed and to 26 notes', () => {
    const notes = Array.from({ length: 40 }, (_, index) => problem(`n${index}`, index, 'note'));
    const letters = giveLetters(new Map(), [...notes, problem('fix', 100)]);
    expect(notes.filter(({ key }) => letters.has(key))).toHaveLength(26);
    expect(letters.has('fix')).toBe(true);
  });
});
