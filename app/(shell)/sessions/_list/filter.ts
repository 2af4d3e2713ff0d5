import type { SessionListItem } from '@/src/data/session/dto';

export type Show = 'ahead' | 'past' | 'all';

/** Ahead counts what runs now; it stands nearest first, the past newest first. */
export function shownSessions(
  sessions: readonly SessionListItem[],
  { show, find, nowMs }: { show: Show; find: string; nowMs: number },
): SessionListItem[] {
  const words = find.toLowerCase().split(/\s+/).filter(Boolean);
  const found = sessions.filter((session) => {
    const isPast = session.startMs + session.lengthSeconds * 1000 <= nowMs;
    if (show !== 'all' && isPast !== (show === 'past')) return false;
    const text = `${session.code} ${session.title} ${session.stations.join(' ')}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const direction = show === 'past' ? -1 : 1;
  return found.sort((a, b) => direction * (a.startMs - b.startMs) || (a.code < b.code ? -1 : 1));
}
