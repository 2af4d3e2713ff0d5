import { describe, expect, it } from 'vitest';
import { blocksOf, countBlocks } from '@/src/schedule/blocks';
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

  it('are counted for all, or for one station', () => {
    const joinedBy = (one: Scan, ...codes: string[]) => ({
      ...one,
      stations: codes.map((station) => ({ station, lateSeconds: 0, earlySeconds: 0 })),
    });
    const scans = [
      joinedBy(scan('a', 0), 'Af'),
      joinedBy(scan('b', 100, 'g'), 'Bm'),
      joinedBy(scan('c', 200, 'g'), 'Af', 'Bm'),
    ];
    expect([countBlocks({ scans }), countBlocks({ scans }, 'Af'), countBlocks({ scans }, 'Bm')]).toEqual([
      2, 2, 1,
    ]);
  });
});
