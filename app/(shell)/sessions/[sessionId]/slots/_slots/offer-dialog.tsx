'use client';

import { useRef, useState } from 'react';
import { Dialog } from '@/app/_ui/dialog';
import { Field } from '@/app/_ui/field';
import { newId } from '@/app/_ui/new-id';
import { showToast } from '@/app/_ui/toast';
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
  const [fields, setFields] = useState<Record<string, string>>({});
  const [trouble, setTrouble] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const id = useRef<string | null>(null);
  const isHeld = toFix > 0 && !isTicked;

  const send = async () => {
    const by =
      answerBy.trim() === '' ? null : readTimeEntry(answerBy, Math.min(nowMs + 43_200_000, session.startMs));
    setTrouble(null);
    if (by && !by.ok) return setFields({ answerByMs: by.message });
    id.current ??= newId();
    setIsSending(true);
    const answer = await offer(session.id, {
      id: id.current,
      kind,
      note,
      answerByMs: by?.value ?? null,
    }).finally(() => setIsSending(false));
    if (answer.ok) {
      id.current = null;
      const told = `${answer.sent} ${answer.sent === 1 ? 'message' : 'messages'} sent`;
      const word = kind === 'publish' ? 'Version' : 'Offer';
      showToast({ message: `${word} ${answer.number} is out: ${told}.` });
      return onClose();
    }
    const back = Object.entries(answer.fields ?? {}).map(([field, words]) => [field, words.join(' ')]);
    if (back.length === 0) setTrouble(answer.message);
    setFields(Object.fromEntries(back) as Record<string, string>);
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
            disabled={isHeld || isSending}
            title={isHeld ? 'Tick the box first' : undefined}
            onClick={() => void send()}
          >
            {isSending ? 'Sending' : kind === 'publish' ? 'Publish' : 'Offer'}
            {toFix > 0 && ` with ${problems}`}
          </button>
        </>
      }
    >
      <div className="flex flex-col gap-2.5">
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
        {trouble !== null && (
          <p role="alert" className="error-box">
            {trouble}
          </p>
        )}
      </div>
    </Dialog>
  );
}
