import type { Revs } from '@/src/data/plan/dto';

/**
 * How this window's own acts moved the revisions on: an act made on what an own act left behind does not conflict
 * with it, and one made on what someone else changed still does.
 */
export function createOwnRevs() {
  const next = new Map<string, number>();
  const advance = (id: string, rev: number): number => {
    const after = next.get(`${id}:${rev}`);
    return after === undefined ? rev : advance(id, after);
  };
  return {
    /** An own act that stood on `before` was taken and left `after`. */
    note(before: Revs, after: Revs): void {
      for (const [id, rev] of Object.entries(after)) {
        if ((before[id] ?? 0) < rev) next.set(`${id}:${before[id] ?? 0}`, rev);
      }
    },
    /** What an act seen at these revisions stands on now, own acts counted. */
    advanced: (seen: Revs): Revs =>
      Object.fromEntries(Object.entries(seen).map(([id, rev]) => [id, advance(id, rev)])),
  };
}
