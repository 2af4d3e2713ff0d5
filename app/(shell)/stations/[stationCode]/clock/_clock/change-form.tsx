'use client';

import { useId, useState } from 'react';
import { Dialog } from '@/app/_ui/dialog';
import { Field } from '@/app/_ui/field';
import { serverNowMs } from '@/app/_ui/server-clock';
import { showToast } from '@/app/_ui/toast';
import { Trouble } from '@/app/_ui/trouble';
import { useActId } from '@/app/_ui/use-act-id';
import { useSending } from '@/app/_ui/use-sending';
import type { ChangeDto, StationClockDto } from '@/src/data/clock/dto';
import { readTimeEntry } from '@/src/units/entry';
import { change } from '../actions';
import { CHANGE_WORDS } from './change-words';

const KINDS = Object.keys(CHANGE_WORDS) as ChangeDto['kind'][];

/** What was changed at the station, and when: the fit starts anew there. */
export function ChangeForm({
  clock,
  isOpen,
  onClose,
}: {
  clock: StationClockDto;
  isOpen: boolean;
  onClose: () => void;
}) {
  const { code } = clock.station;
  const kindId = useId();
  const [kind, setKind] = useState<ChangeDto['kind']>('resync');
  const [time, setTime] = useState('');
  const [note, setNote] = useState('');
  const { form, fields, trouble, isSending, say, send: sendOff } = useSending();
  const act = useActId();

  const send = async () => {
    const at = readTimeEntry(time, serverNowMs());
    if (!at.ok) return say({ atMs: at.message });
    const words = { kind, atMs: at.value, note };
    const body = { ...words, id: act.idOf(words) };
    const answer = await sendOff(() => change(code, body));
    if (!answer?.ok) return;
    act.forget();
    setTime('');
    setNote('');
    showToast({ message: `Stored: ${CHANGE_WORDS[kind]} at ${code}. The fit starts anew there.` });
    onClose();
  };

  return (
    <Dialog
      isOpen={isOpen}
      title={`Change at ${clock.station.name}`}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Leave
          </button>
          <button
            type="button"
            className="btn btn-primary"
            aria-disabled={isSending}
            onClick={() => void send()}
          >
            {isSending ? 'Sending' : 'Store the change'}
          </button>
        </>
      }
    >
      <div ref={form} className="flex flex-col gap-2.5">
        <p className="help">Readings before and after it are fitted apart.</p>
        <div>
          <label className="label" htmlFor={kindId}>
            What was changed
          </label>
          <select
            id={kindId}
            className="field"
            value={kind}
            onChange={(event) => setKind(KINDS.find((one) => one === event.target.value) ?? 'other')}
          >
            {KINDS.map((one) => (
              <option key={one} value={one}>
                {CHANGE_WORDS[one]}
              </option>
            ))}
          </select>
        </div>
        <Field
          label="When, UT"
          placeholder="036 10:05"
          value={time}
          error={fields.atMs}
          onChange={(event) => setTime(event.target.value)}
        />
        <Field
          label="In a few words"
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
