import type { Problem } from '@/src/schedule/checks';

const ALPHABET = [...'abcdefghjkmnpqrstuvwxyz'];
const NOTE_LETTERS = 26;

/** a … z without i, l, o, then aa, ab … */
export function letterAt(index: number): string {
  const size = ALPHABET.length;
  const last = ALPHABET[index % size] ?? '';
  return index < size ? last : letterAt(Math.floor(index / size) - 1) + last;
}

/**
 * Letters stay with their problem until it is solved and are never used twice: given in time order when first
 * found, to every problem that must be fixed and to the first 26 others.
 */
export function giveLetters(
  known: ReadonlyMap<string, string>,
  problems: readonly Problem[],
): Map<string, string> {
  const letters = new Map(known);
  let notes = problems.filter(({ key, severity }) => severity === 'note' && letters.has(key)).length;
  for (const problem of [...problems].sort((a, b) => a.atMs - b.atMs)) {
    if (letters.has(problem.key)) continue;
    if (problem.severity === 'note' && notes++ >= NOTE_LETTERS) continue;
    letters.set(problem.key, letterAt(letters.size));
  }
  return letters;
}
