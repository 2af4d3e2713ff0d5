'use client';

import { useState } from 'react';
import { reach } from '@/app/_ui/reach';
import { showToast } from '@/app/_ui/toast';
import type { SlotBoard } from '@/src/data/slot/dto';
import { resend } from '../actions';

/** Messages that did not go out; the offer itself stands, and the slots are on the desks. */
export function Unsent({ sessionId, unsent }: { sessionId: string; unsent: SlotBoard['unsent'] }) {
  const [isSending, setIsSending] = useState(false);
  const again = async () => {
    if (isSending) return;
    setIsSending(true);
    const answer = await reach(() => resend(sessionId));
    setIsSending(false);
    showToast({ message: answer.ok ? `${answer.sent} of ${unsent.length} sent now.` : answer.message });
  };
  const [first] = unsent;
  return (
    <div role="status" className="error-box flex flex-wrap items-center gap-2">
      <p className="min-w-0 flex-1">
        <b>
          {unsent.length} {unsent.length === 1 ? 'message was' : 'messages were'} not sent
        </b>
        , to {unsent.map(({ to }) => to).join(', ')}. {first?.trouble || 'They wait to be sent.'} The slots
        stand on the desks all the same.
      </p>
      <button type="button" className="btn btn-sm" aria-disabled={isSending} onClick={() => void again()}>
        {isSending ? 'Sending' : 'Send again'}
      </button>
    </div>
  );
}
