'use client';

import { useState, type FormEvent } from 'react';
import { Dialog } from '@/app/_ui/dialog';
import { Field } from '@/app/_ui/field';
import { dayText } from '@/app/_ui/format';
import { editScan } from '@/src/schedule/gestures/edit-scan';
import type { Scan, StationCode } from '@/src/schedule/plan';
import { clockText, shortLengthText } from '@/src/schedule/words';
import { readLengthEntry, readTimeEntry } from '@/src/units/entry';
import { useActs } from '../_timeline/acts';
import { useTimeline } from '../_timeline/store';

type Props = { scan: Scan; number: string; onClose: () => void };

/** The scan as a form: start, length, stations and comment in one change, for those who cannot or will not drag. */
export default function EditScan({ scan, number, onClose }: Props) {
  const stations = useTimeline((state) => state.stations);
  const revs = useTimeline((state) => state.revs);
  const [seenRevs] = useState(revs);
  const { dispatch } = useActs();
  const [start, setStart] = useState(`${dayText(scan.startMs)} ${clockText(scan.startMs)}`);
  const [length, setLength] = useState(shortLengthText(scan.lengthSeconds));
  const [codes, setCodes] = useState<readonly StationCode[]>(scan.stations.map(({ station }) => station));
  const [comment, setComment] = useState(scan.comment);
  const [isTried, setIsTried] = useState(false);
  const [isRefused, setIsRefused] = useState(false);
  const refusal = useTimeline((state) => state.notice?.message);
  const startEntry = readTimeEntry(start, scan.startMs);
  const lengthEntry = readLengthEntry(length);

  const keep = (event: FormEvent) => {
    event.preventDefault();
    setIsTried(true);
    if (!startEntry.ok || !lengthEntry.ok) return;
    const lengthSeconds = lengthEntry.value;
    const members = [...codes].sort().map(
      (code) =>
        scan.stations.find(({ station }) => station === code) ?? {
          station: code,
          lateSeconds: 0,
          earlySeconds: 0,
        },
    );
    const changes = { startMs: startEntry.value, lengthSeconds, stations: members, comment: comment.trim() };
    if (dispatch((plan) => editScan(plan, scan.id, changes), seenRevs)) onClose();
    else setIsRefused(true);
  };

  const toggle = (code: StationCode) =>
    setCodes(codes.includes(code) ? codes.filter((one) => one !== code) : [...codes, code]);

  return (
    <Dialog
      isOpen
      title={`Edit scan ${number}`}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Leave as it is
          </button>
          <button type="submit" form="edit-scan" className="btn btn-primary">
            Keep scan {number}
          </button>
        </>
      }
    >
      <form id="edit-scan" onSubmit={keep} noValidate className="flex flex-col gap-3.5">
        {isRefused && refusal !== undefined && (
          <p role="alert" className="error-box">
            {refusal}
          </p>
        )}
        <div className="grid grid-cols-2 gap-3.5">
          <Field
            label="Start, day and UT"
            value={start}
            onChange={(event) => setStart(event.target.value)}
            error={isTried && !startEntry.ok ? startEntry.message : undefined}
          />
          <Field
            label="Length"
            value={length}
            onChange={(event) => setLength(event.target.value)}
            error={isTried && !lengthEntry.ok ? lengthEntry.message : undefined}
          />
        </div>
        <fieldset>
          <legend className="label">Stations</legend>
          <div className="flex flex-wrap gap-x-3.5 gap-y-1.5">
            {stations.map(({ code, name }) => (
              <label key={code} className="inline-flex items-center gap-1.5" title={name}>
                <input
                  type="checkbox"
                  className="h-[16px] w-[16px] accent-[var(--fill)]"
                  checked={codes.includes(code)}
                  onChange={() => toggle(code)}
                />
                <span className="code">{code}</span>
              </label>
            ))}
          </div>
        </fieldset>
        <Field
          label="Comment"
          value={comment}
          maxLength={2000}
          onChange={(event) => setComment(event.target.value)}
        />
      </form>
    </Dialog>
  );
}
