'use client';

import { useState } from 'react';
import { Dialog } from '@/app/_ui/dialog';
import { dayText, spanText } from '@/app/_ui/format';
import { newId } from '@/app/_ui/new-id';
import { showToast } from '@/app/_ui/toast';
import { Trouble } from '@/app/_ui/trouble';
import { useActId } from '@/app/_ui/use-act-id';
import { useSending } from '@/app/_ui/use-sending';
import type { SkySheet, StartSheet } from '@/src/data/sky/dto';
import { SPAN_SUBJECT } from '@/src/schedule/commands';
import { clockText } from '@/src/schedule/words';
import { moveHours } from '../actions';

type Hours = { startMs: number; lengthSeconds: number };
type Props = { session: SkySheet['session']; move: NonNullable<StartSheet['move']>; to: Hours };

/** Sets the session's start to the one chosen; asked first where scans stand in the plan. */
export function MoveHours({ session, move, to }: Props) {
  const [isAsked, setIsAsked] = useState(false);
  const { trouble, isSending, send } = useSending();
  const act = useActId();
  const isThere = to.startMs === session.startMs && to.lengthSeconds === session.lengthSeconds;
  const isSame = to.lengthSeconds === session.lengthSeconds;
  const label = `Start at ${clockText(to.startMs)}`;

  const go = async () => {
    const command = { verb: 'change-span', edits: [{ kind: 'change-span', span: to }] };
    const body = { kind: 'do', actId: act.idOf(to), command, seen: { [SPAN_SUBJECT]: move.spanRev } };
    const answer = await send(() => moveHours(session.id, body));
    if (!answer?.ok) return;
    act.forget();
    setIsAsked(false);
    showToast({
      message: `${session.code} starts on day ${dayText(to.startMs)} at ${clockText(to.startMs)}, for ${spanText(to.lengthSeconds)}.`,
      action: { label: 'Undo', run: () => void undo(session.id) },
    });
  };

  return (
    <>
      <button
        type="button"
        className="btn btn-primary"
        aria-disabled={isThere || isSending}
        title={isThere ? 'The session starts then' : undefined}
        onClick={() => {
          if (isThere) return;
          if (move.scans.length > 0) setIsAsked(true);
          else void go();
        }}
      >
        {label}
      </button>
      {!isSame && <p className="help mt-1">and last {spanText(to.lengthSeconds)}</p>}
      {!isAsked && <Trouble says={trouble} />}
      <Dialog
        isOpen={isAsked}
        title={`${label}?`}
        onClose={() => setIsAsked(false)}
        actions={
          <>
            <button type="button" className="btn" onClick={() => setIsAsked(false)}>
              Leave it
            </button>
            <button
              type="button"
              className="btn btn-primary"
              aria-disabled={isSending}
              onClick={() => void go()}
            >
              {isSending ? 'Sending' : label}
            </button>
          </>
        }
      >
        <p>
          {session.code} would start on day {dayText(to.startMs)} at {clockText(to.startMs)} and last{' '}
          {spanText(to.lengthSeconds)}. {scansSentence(move.scans, to)}
        </p>
        <Trouble says={trouble} />
      </Dialog>
    </>
  );
}

async function undo(sessionId: string) {
  const answer = await moveHours(sessionId, { kind: 'undo', actId: newId() });
  showToast({ message: answer.ok ? 'The session’s hours are as they were.' : answer.message });
}

function scansSentence(
  scans: NonNullable<StartSheet['move']>['scans'],
  { startMs, lengthSeconds }: Hours,
): string {
  const endMs = startMs + lengthSeconds * 1000;
  const outside = scans.filter(([from, until]) => from < startMs || until > endMs).length;
  const all = `Its ${scans.length} ${scans.length === 1 ? 'scan stays where it is' : 'scans stay where they are'}`;
  if (outside === 0) return `${all}, all inside the new hours.`;
  return `${all}: ${outside} would be outside its hours, and the timeline would name ${outside === 1 ? 'it' : 'each'}.`;
}
