import { useEffect, useState } from 'react';
import type { SkyTable } from '@/src/schedule/sky-table';
import { computeSky } from '../actions';
import { useTimeline } from './store';

type Sky = { table: SkyTable | null; problem: string | null; again: () => void };

/** The server's sky of the session; asked for again when its span changes. */
export function useSky(): Sky {
  const sessionId = useTimeline((state) => state.session.id);
  const startMs = useTimeline((state) => state.confirmed.span.startMs);
  const lengthSeconds = useTimeline((state) => state.confirmed.span.lengthSeconds);
  const [table, setTable] = useState<SkyTable | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [tries, setTries] = useState(0);
  useEffect(() => {
    let isOver = false;
    computeSky(sessionId).then(
      (answer) => {
        if (isOver) return;
        if (answer.ok) setTable(answer.table);
        setProblem(answer.ok ? null : answer.message);
      },
      () => {
        if (!isOver) setProblem('The elevations did not arrive: the line or the server is down.');
      },
    );
    return () => {
      isOver = true;
    };
  }, [sessionId, startMs, lengthSeconds, tries]);
  return { table, problem, again: () => setTries(tries + 1) };
}
