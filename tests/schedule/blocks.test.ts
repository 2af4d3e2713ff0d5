import { describe, expect, it } from 'vitest';
import { blocksOf } from '@/src/schedule/blocks';
import type { Scan } from '@/src/schedule/plan';

const scan = (id: string, startSeconds: number, groupId: string | null = null): Scan => ({
  id,
  sourceId: 's',
  modeId: 'm',
  startMs: startSeconds * 1000,
  lengthSeconds: 20,
  stations: [],
  groupId,
  leg: groupId === null ? null : 'target',
  comment: '',
});

describe('the blocks of a plan', () => {
  it('are its scans by start, a nodding group as one', () => {
    const scans = [scan('d', 300), scan('b', 100, 'g'), scan('a', 0), scan('c', 200, 'g')];
    expect(
      blocksOf({ scans }).map(({ id, startMs, stopMs, legs }) => [id, startMs, stopMs, legs.length]),
    ).toEqual([
      ['a', 0, 20_000, 1],
      ['b', 100_000, 220_000, 2],
      ['d', 300_000, 320_000, 1],
    ]);
  });

  it('are none of an empty plan', () => {
    expect(blocksOf({ scans: [] })).toEqual([]);
  });
});
