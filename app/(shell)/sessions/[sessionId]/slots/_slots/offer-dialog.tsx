'use client';

import { useState } from 'react';
import { Dialog } from '@/app/_ui/dialog';
import { Field } from '@/app/_ui/field';
import { showToast } from '@/app/_ui/toast';
import { Trouble } from '@/app/_ui/trouble';
import { useActId } from '@/app/_ui/use-act-id';
import { useSending } from '@/app/_ui/use-sending';
import type { SlotBoard } from '@/src/data/slot/dto';
import { readTimeEntry } from '@/src/units/entry';
import { offer } from '../actions';

type Props = { board: SlotBoard; kind: 'offer' | 'publish' | null; toFix: number; onClose: () => void };

/** What an offer or a publication does, said before it is done; an open problem is named. */
export function OfferDialog({ board, kind, toFix, onClose }: Props) {
  const { session, draft, nowMs } = board;
  const [note, setNote] = useState('');
  const [answerBy, setAnswerBy] = useState('');
  const [isTicked, setIsTicked] = useState(false);
  const { form, fields, trouble, isSending, say, send: sendOff } = useSending();
  const act = useActId();
  const isHeld = toFix > 0 && !isTicked;

  const send = async () => {
    if (isHeld) return;
    const by =
      answerBy.trim() === '' ? null : readTimeEntry(answerBy, Math.min(nowMs + 43_200_000, session.startMs));
    if (by && !by.ok) return say({ answerByMs: by.message });
    const body = { kind, note, answerByMs: by?.value ?? null };
    const answer = await sendOff(() => offer(session.id, { ...body, id: act.idOf(body) }));
    if (!answer?.ok) return;
    act.forget();
    const word = kind === 'publish' ? 'Version' : 'Offer';
    const told = `${answer.sent} ${answer.sent === 1 ? 'message' : 'messages'} sent`;
    const left = answer.failed.length > 0 ? `, ${answer.failed.length} not sent` : '';
    showToast({ message: `${word} ${answer.number} is out: ${told}${left}.` });
    onClose();
  };

  const problems = `${toFix} ${toFix === 1 ? 'problem' : 'problems'}`;
  return (
    <Dialog
      isOpen={kind !== null}
      title={kind === 'publish' ? `Publish ${session.code}?` : `Offer ${session.code} to its stations?`}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Not yet
          </button>
          <button
            type="button"
            className="btn btn-primary"
            aria-disabled={isHeld || isSending}
            title={isHeld ? 'Tick the box first' : undefined}
            onClick={() => void send()}
          >
            {isSending ? 'Sending' : kind === 'publish' ? 'Publish' : 'Offer'}
            {toFix > 0 && ` with ${problems}`}
          </button>
        </>
      }
    >
      <div ref={form} className="flex flex-col gap-2.5">
        <p>
          {kind === 'publish'
            ? 'The plan as it stands now is stored as a version that never changes. Stations whose slot left the hours they gave are asked again, the others are told.'
            : 'The plan as it stands now is stored, each station that has a scan gets its slot on its desk, and its operators get a message.'}
          {draft && ` It has ${draft.scans} ${draft.scans === 1 ? 'scan' : 'scans'}.`}
        </p>
        {toFix > 0 && (
          <div className="error-box flex flex-col gap-1.5">
            <p>
              <b>{problems} must be fixed.</b> The timeline names{' '}
              {toFix === 1 ? 'it, with what mends it' : 'each, with what mends it'}.
            </p>
            <label className="flex items-center gap-2">
              <input
                type="checkbox"
                checked={isTicked}
                onChange={(event) => setIsTicked(event.target.checked)}
              />
              Go on with {problems}
            </label>
          </div>
        )}
        <Field
          label="Answer by, UT"
          value={answerBy}
          placeholder="042 12:00"
          help="Left empty, no time is named."
          error={fields.answerByMs}
          onChange={(event) => setAnswerBy(event.target.value)}
        />
        <Field
          label="A note to the stations"
          value={note}
          maxLength={500}
          error={fields.note}
          onChange={(event) => setNote(event.target.value)}
        />
        <Trouble says={trouble} />
      </div>
    </Dialog>
  );
}
