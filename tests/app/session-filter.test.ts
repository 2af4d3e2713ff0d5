import { expect, test } from 'vitest';
import { shownSessions } from '@/app/(shell)/sessions/_list/filter';
import type { SessionListItem } from '@/src/data/session/dto';

const HOUR_MS = 3_600_000;
const nowMs = 1_000 * HOUR_MS;

const session = (code: string, startHours: number, stations = ['Af', 'Bm']): SessionListItem => ({
  id: code,
  code,
  title: `Arc ${code}`,
  state: 'draft',
  startMs: nowMs + startHours * HOUR_MS,
  lengthSeconds: 2 * 3600,
  stations,
  scanCount: 0,
  canReadPlan: true,
  offer: null,
  answers: {},
});

const all = [
  session('FAR-1', 50),
  session('NEAR-1', 5),
  session('RUN-1', -1),
  session('OLD-1', -9),
  session('OLD-2', -2),
];
const shown = (show: 'ahead' | 'past' | 'all', find = '') =>
  shownSessions(all, { show, find, nowMs }).map(({ code }) => code);

test('ahead holds what runs and what comes, nearest first', () => {
  expect(shown('ahead')).toEqual(['RUN-1', 'NEAR-1', 'FAR-1']);
});

test('a session is past from its very end on, the newest first', () => {
  expect(shown('past')).toEqual(['OLD-2', 'OLD-1']);
});

test('all words must be found, in whatever case, in code, title or stations', () => {
  expect(shown('all', 'arc near')).toEqual(['NEAR-1']);
  expect(shown('all', ' af ')).toHaveLength(5);
  expect(shown('all', 'zz')).toEqual([]);
});
