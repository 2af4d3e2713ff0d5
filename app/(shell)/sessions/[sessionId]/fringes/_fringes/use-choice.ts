import { useState, type KeyboardEvent } from 'react';
import type { OutlookCell } from '@/src/outlook/fringe-outlook';
import type { ScanId } from '@/src/schedule/plan';
import { fails, keyOf, type Pair, type Row } from './model';

export type Choice = {
  scanId: ScanId | null;
  pairKey: string | null;
  choose: (scanId: ScanId, pairKey: string) => void;
  /** the next cell in reading order that is so, round the end */
  toNext: (isSought: (cell: OutlookCell) => boolean) => void;
  onKeyDown: (event: KeyboardEvent) => void;
};

/** The chosen cell, moved by arrow keys; N goes to the next that fails. */
export function useChoice(rows: readonly Row[], columns: readonly Pair[]): Choice {
  const [place, setPlace] = useState<{ scanId: ScanId; pairKey: string } | null>(null);
  const row = rows.findIndex(({ scan }) => scan.id === place?.scanId);
  const column = columns.findIndex((pair) => keyOf(pair) === place?.pairKey);

  const choose = (scanId: ScanId, pairKey: string) => setPlace({ scanId, pairKey });
  const go = (toRow: number, toColumn: number) => {
    const scan = rows[Math.max(0, Math.min(rows.length - 1, toRow))]?.scan;
    const pair = columns[Math.max(0, Math.min(columns.length - 1, toColumn))];
    if (scan && pair) choose(scan.id, keyOf(pair));
  };
  const toNext = (isSought: (cell: OutlookCell) => boolean) => {
    const places = rows.flatMap(({ cells }, r) =>
      columns.flatMap((pair, c) => {
        const cell = cells.find((one) => keyOf(one) === keyOf(pair));
        return cell && isSought(cell) ? [{ r, c }] : [];
      }),
    );
    const next = places.find(({ r, c }) => r > row || (r === row && c > column)) ?? places[0];
    if (next) go(next.r, next.c);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const moves: Readonly<Record<string, readonly [number, number]>> = {
      ArrowUp: [-1, 0],
      ArrowDown: [1, 0],
      ArrowLeft: [0, -1],
      ArrowRight: [0, 1],
      PageUp: [-10, 0],
      PageDown: [10, 0],
    };
    const move = moves[event.key];
    if (move) go(row < 0 ? 0 : row + move[0], column < 0 ? 0 : column + move[1]);
    else if (event.key === 'Home') go(Math.max(0, row), 0);
    else if (event.key === 'End') go(Math.max(0, row), columns.length - 1);
    else if (event.key.toLowerCase() === 'n') toNext(fails);
    else return;
    event.preventDefault();
  };
  // what a filter has taken away is not chosen, and comes back with its row
  const shown = row < 0 || column < 0 ? null : place;
  return { scanId: shown?.scanId ?? null, pairKey: shown?.pairKey ?? null, choose, toNext, onKeyDown };
}
