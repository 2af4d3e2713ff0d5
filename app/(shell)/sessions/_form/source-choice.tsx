'use client';

import { useId, useRef, useState } from 'react';
import type { SessionChoices } from '@/src/data/session/choices';
import type { Wrong } from '@/src/exchange/catalogue/block';

type Chosen = readonly { id: string; wanted: string }[];
type Props = {
  choices: SessionChoices['sources'];
  chosen: Chosen;
  wrong: readonly Wrong[];
  onChoose: (sources: Chosen) => void;
};

const ROLES: Readonly<Record<SessionChoices['sources'][number]['role'], string>> = {
  target: 'target',
  'phase-ref': 'phase ref',
  finder: 'finder',
  polarisation: 'polarisation',
};

/** The sources of a session with the scans that are wanted of each; more are added by name. */
export function SourceChoice({ choices, chosen, wrong, onChoose }: Props) {
  const [name, setName] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const id = useId();
  const field = useRef<HTMLInputElement>(null);
  const left = choices.filter((choice) => !chosen.some((one) => one.id === choice.id) && !choice.isRetired);
  const error = problem ?? wrong.find(({ field }) => field === 'sources')?.message;

  const add = () => {
    const typed = name.trim().toLowerCase();
    if (typed === '') return setProblem('Type the name of a source, or choose one of the list.');
    const found =
      left.find((choice) => choice.name.toLowerCase() === typed) ??
      (left.filter((choice) => choice.name.toLowerCase().includes(typed)).length === 1
        ? left.find((choice) => choice.name.toLowerCase().includes(typed))
        : undefined);
    if (!found) {
      const isIn = choices.some((choice) => choice.name.toLowerCase() === typed);
      return setProblem(
        isIn
          ? `${name.trim()} is in the session already, or retired.`
          : `No one source of the catalogue is called “${name.trim()}”.`,
      );
    }
    setProblem(null);
    setName('');
    onChoose([...chosen, { id: found.id, wanted: '0' }]);
  };

  return (
    <div className="flex flex-col gap-2">
      {chosen.length > 0 && (
        <table className="tt sform-sources">
          <thead>
            <tr>
              <th scope="col">Source</th>
              <th scope="col">Role</th>
              <th scope="col">Scans wanted</th>
              <th scope="col">
                <span className="sr-only">Take out</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {chosen.map(({ id: sourceId, wanted }) => {
              const choice = choices.find((one) => one.id === sourceId);
              const wrongWanted = wrong.find(({ field }) => field === `sources.${sourceId}`)?.message;
              return (
                <tr key={sourceId}>
                  <th scope="row" className="font-strong">
                    {choice?.name ?? sourceId}
                  </th>
                  <td>{choice ? ROLES[choice.role] : ''}</td>
                  <td>
                    <input
                      className="field w-[84px]"
                      inputMode="numeric"
                      aria-label={`Scans wanted of ${choice?.name ?? sourceId}`}
                      aria-invalid={wrongWanted !== undefined || undefined}
                      value={wanted}
                      onChange={({ target }) =>
                        onChoose(
                          chosen.map((one) => (one.id === sourceId ? { ...one, wanted: target.value } : one)),
                        )
                      }
                    />
                    {wrongWanted && <p className="text-small font-strong text-verm">{wrongWanted}</p>}
                  </td>
                  <td className="text-right">
                    <button
                      type="button"
                      className="link min-h-[24px]"
                      onClick={() => {
                        onChoose(chosen.filter((one) => one.id !== sourceId));
                        field.current?.focus();
                      }}
                    >
                      Take out<span className="sr-only"> {choice?.name ?? sourceId}</span>
                    </button>
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      )}
      <div className="flex flex-wrap items-end gap-2">
        <div>
          <label className="label" htmlFor={id}>
            Add a source by name
          </label>
          <input
            ref={field}
            id={id}
            className="field h-field w-[240px]"
            list={`${id}-list`}
            autoComplete="off"
            value={name}
            aria-invalid={error !== undefined || undefined}
            aria-describedby={error ? `${id}-error` : undefined}
            onChange={({ target }) => {
              setName(target.value);
              setProblem(null);
            }}
            onKeyDown={(event) => {
              if (event.key !== 'Enter') return;
              event.preventDefault();
              add();
            }}
          />
          <datalist id={`${id}-list`}>
            {left.map((choice) => (
              <option key={choice.id} value={choice.name}>
                {ROLES[choice.role]}
              </option>
            ))}
          </datalist>
        </div>
        <button type="button" className="btn h-field" onClick={add}>
          Add the source
        </button>
      </div>
      {error && (
        <p id={`${id}-error`} className="text-small font-strong text-verm">
          {error}
        </p>
      )}
    </div>
  );
}
