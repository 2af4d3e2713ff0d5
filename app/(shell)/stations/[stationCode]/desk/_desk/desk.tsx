'use client';

import { useState } from 'react';
import useSWR from 'swr';
import { liveKeys } from '@/app/_ui/live-keys';
import { serverNowMs, useServerSecond } from '@/app/_ui/server-clock';
import type { DeskDto, DeskScan } from '@/src/data/desk/dto';
import { Cautions } from './cautions';
import { Coming } from './coming';
import { HowDidItGo } from './how-did-it-go';
import { Nothing } from './nothing';
import { ScanList } from './scan-list';
import { Slots } from './slots';
import { Tabs } from './tabs';
import { useSaying } from './use-saying';

const EVERY_MS = 5000;

/** What is next, how the last went, the slot: in that order on a phone, side by side where there is room. */
export function Desk({ desk: first }: { desk: DeskDto }) {
  const { code } = first.station;
  const { data, error } = useSWR(liveKeys.desk(code), readDesk, {
    fallbackData: first,
    refreshInterval: EVERY_MS,
    revalidateOnMount: false,
  });
  const desk = data ?? first;
  const now = useServerSecond(first.nowMs);
  const saying = useSaying(desk);
  const [chosenId, setChosenId] = useState<string | null>(null);
  const { run } = desk;
  if (!run) return <Nothing desk={desk} now={now} />;
  const asked = askedOf(run.scans, chosenId, (scanId) => saying.outcomeOf(scanId) !== undefined, now);
  return (
    <>
      {error instanceof Error && (
        <p role="status" className="desk-line">
          No line. What stands here was read at the last contact; it is read again as soon as the line is
          back.
        </p>
      )}
      <div className="desk">
        <section aria-label="Next" className="desk-next">
          <Coming desk={desk} run={run} now={now} />
          {asked && desk.canSay && (
            <HowDidItGo key={asked.scanId} scan={asked} saying={saying} onDone={() => setChosenId(null)} />
          )}
        </section>
        <aside aria-label="Station" className="desk-side">
          <Slots desk={desk} now={now} />
          <Cautions />
        </aside>
        <ScanList run={run} now={now} saying={saying} canSay={desk.canSay} onChoose={setChosenId} />
      </div>
      <Tabs code={code} />
    </>
  );
}

/** The scan that is asked about: the chosen one, else the last that ended without a word. */
function askedOf(
  scans: readonly DeskScan[],
  chosenId: string | null,
  isSaid: (scanId: string) => boolean,
  now: number,
): DeskScan | undefined {
  const chosen = scans.find(({ scanId }) => scanId === chosenId);
  return chosen ?? scans.findLast(({ scanId, stopMs }) => stopMs <= now && !isSaid(scanId));
}

async function readDesk(address: string): Promise<DeskDto> {
  const response = await fetch(address, { cache: 'no-store' });
  const answer = (await response.json()) as { ok: true; desk: DeskDto } | { ok: false; message: string };
  if (!answer.ok) throw new Error(answer.message);
  return { ...answer.desk, nowMs: serverNowMs() };
}
