'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import { useSWRConfig } from 'swr';
import { liveKeys } from '@/app/_ui/live-keys';
import { hideToast, showToast } from '@/app/_ui/toast';
import { newId } from '@/app/_ui/new-id';
import { serverNowMs } from '@/app/_ui/server-clock';
import type { DeskDto, DeskScan } from '@/src/data/desk/dto';
import type { OutcomeDto, Reason } from '@/src/data/outcome/read';

type Word =
  | { outcome: 'good'; text: string }
  | { outcome: 'partly'; lost: [number, number]; reason: Reason; text: string }
  | { outcome: 'lost'; reason: Reason; text: string };

type SayAnswer = { ok: true } | { ok: false; message: string; fields?: Record<string, string[]> };

export type Saying = {
  /** what was said last, one that is still to be sent included */
  outcomeOf: (scanId: string) => Pick<OutcomeDto, 'outcome' | 'reason' | 'times'> | undefined;
  /** sends at once */
  say: (scan: DeskScan, word: Word) => Promise<SayAnswer>;
  /** sends after six seconds, unless it is taken back */
  sayGood: (scan: DeskScan) => void;
  /** what the server refused last */
  trouble: string | null;
};

const UNDO_MS = 6000;

/** A station's words on its scans: one that may be taken back waits six seconds, or until the page is left. */
export function useSaying({ run, station }: DeskDto): Saying {
  const { mutate } = useSWRConfig();
  const [waiting, setWaiting] = useState<string | null>(null);
  const [said, setSaid] = useState<Readonly<Record<string, Word['outcome']>>>({});
  const [trouble, setTrouble] = useState<string | null>(null);
  const flush = useRef<(() => void) | null>(null);
  const sessionId = run?.sessionId ?? '';

  const say = useCallback(
    async (scan: DeskScan, word: Word): Promise<SayAnswer> => {
      const answer = await post(sessionId, station.code, { actId: newId(), scanId: scan.scanId, ...word });
      if (answer.ok) setSaid((before) => ({ ...before, [scan.scanId]: word.outcome }));
      setTrouble(answer.ok ? null : answer.message);
      void mutate(liveKeys.desk(station.code));
      return answer;
    },
    [mutate, sessionId, station.code],
  );

  const sayGood = useCallback(
    (scan: DeskScan) => {
      flush.current?.();
      setWaiting(scan.scanId);
      const send = () => {
        window.clearTimeout(timer);
        flush.current = null;
        const settle = () => setWaiting((held) => (held === scan.scanId ? null : held));
        say(scan, { outcome: 'good', text: '' }).then(settle, settle);
      };
      const timer = window.setTimeout(send, UNDO_MS);
      flush.current = send;
      showToast({
        message: `Scan ${scan.number} was good.`,
        action: {
          label: 'Undo',
          run: () => {
            window.clearTimeout(timer);
            flush.current = null;
            setWaiting(null);
            hideToast();
          },
        },
      });
    },
    [say],
  );

  useEffect(() => {
    const leave = () => flush.current?.();
    window.addEventListener('pagehide', leave);
    return () => {
      window.removeEventListener('pagehide', leave);
      leave();
    };
  }, []);

  const outcomeOf = (scanId: string) => {
    if (scanId === waiting) return { outcome: 'good' as const, reason: null, times: 0 };
    const stored = run?.outcomes.find((one) => one.scanId === scanId);
    const mine = said[scanId];
    if (stored && (mine === undefined || stored.outcome === mine)) return stored;
    return mine === undefined ? undefined : { outcome: mine, reason: null, times: 1 };
  };
  return { outcomeOf, say, sayGood, trouble };
}

async function post(sessionId: string, station: string, body: object): Promise<SayAnswer> {
  try {
    const response = await fetch(`/api/sessions/${sessionId}/outcomes/${station}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
      keepalive: true,
    });
    return (await response.json()) as SayAnswer;
  } catch (error) {
    if (!(error instanceof TypeError || error instanceof SyntaxError)) throw error;
    const at = new Date(serverNowMs()).toISOString().slice(11, 19);
    const why = error instanceof TypeError ? 'There was no line' : 'The server gave no answer';
    return { ok: false, message: `${why} at ${at}. Nothing was lost: say it again.` };
  }
}
