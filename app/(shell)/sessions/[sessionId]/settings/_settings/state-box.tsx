'use client';

import { useState } from 'react';
import { Chip } from '@/app/_ui/chip';
import { Dialog } from '@/app/_ui/dialog';
import { reach } from '@/app/_ui/reach';
import { showToast } from '@/app/_ui/toast';
import type { SessionHead } from '@/src/data/session/dto';
import { setState } from '../actions';
import { isEnded } from '@/src/schedule/ended';

type Ask = 'closed' | 'cancelled';

const WORDS = {
  closed: {
    title: 'Close',
    button: 'Close it',
    text: 'Its plan, the answers of its stations and what they said of its scans then stay as they are.',
  },
  cancelled: {
    title: 'Cancel',
    button: 'Cancel it',
    text: 'It is not observed. It leaves the desks of its stations; nothing of it is deleted.',
  },
} as const;

/** The state of a session, and the steps from it; each asks first. */
export function StateBox({ session }: { session: SessionHead }) {
  const [asked, setAsked] = useState<Ask | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const isOver = isEnded(session.state);
  const go = async (state: Ask | 'open') => {
    if (isSending) return;
    setIsSending(true);
    const answer = await reach(() => setState(session.id, state));
    setIsSending(false);
    setAsked(null);
    setTrouble(answer.ok ? null : answer.message);
    if (answer.ok) showToast({ message: `${session.code} is ${state === 'open' ? 'open again' : state}.` });
  };
  return (
    <div className="sform-state">
      <h1 className="text-h2">
        {session.code} {session.title}
      </h1>
      <Chip>{session.state}</Chip>
      {trouble !== null && (
        <p role="alert" className="error-box">
          {trouble}
        </p>
      )}
      <div className="ml-auto flex gap-2">
        {isOver ? (
          <button type="button" className="btn" aria-disabled={isSending} onClick={() => void go('open')}>
            Open it again
          </button>
        ) : (
          <>
            <button type="button" className="btn" onClick={() => setAsked('closed')}>
              Close the session
            </button>
            <button type="button" className="btn btn-danger" onClick={() => setAsked('cancelled')}>
              Cancel the session
            </button>
          </>
        )}
      </div>
      <Dialog
        isOpen={asked !== null}
        title={asked ? `${WORDS[asked].title} ${session.code} ${session.title}?` : ''}
        onClose={() => setAsked(null)}
        actions={
          <>
            <button type="button" className="btn" onClick={() => setAsked(null)}>
              Leave it as it is
            </button>
            <button
              type="button"
              className="btn btn-danger"
              aria-disabled={isSending}
              onClick={() => asked && void go(asked)}
            >
              {asked && WORDS[asked].button}
            </button>
          </>
        }
      >
        <p>{asked && WORDS[asked].text} It can be opened again.</p>
      </Dialog>
    </div>
  );
}
