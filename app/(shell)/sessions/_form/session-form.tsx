'use client';

import type { Route } from 'next';
import dynamic from 'next/dynamic';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useEffect, useId, useRef, useState, useTransition, type FormEvent, type ReactNode } from 'react';
import { Field } from '@/app/_ui/field';
import { reach } from '@/app/_ui/reach';
import { showToast } from '@/app/_ui/toast';
import { useActId } from '@/app/_ui/use-act-id';
import type { Failure } from '@/src/data/errors';
import type { SessionForm as FormDto } from '@/src/data/session/form';
import type { AnyBlock, Typed, Wrong } from '@/src/exchange/catalogue/block';
import { CODE_FIELD, readSession, RULES, WHAT, WHEN, type SessionTyped } from '@/src/exchange/session-form';
import { BlockFields } from '../../_catalogue/block-fields';
import { NotKept } from '../../_catalogue/not-kept';
import { focusWrong, wrongOf } from '../../_catalogue/wrong';
import { SourceChoice } from './source-choice';
import { StationChoice } from './station-choice';
import '../../_catalogue/object.css';
import './session-form.css';

const AsItStands = dynamic(() => import('./as-it-stands'), { ssr: false });

type Body = { id: string; typed: SessionTyped } | { actId: string; rev: number; typed: SessionTyped };

type Props = {
  form: FormDto;
  /** "Make session", "Keep the changes" */
  label: string;
  leave: Route;
  send: (body: Body) => Promise<{ ok: true; code: string } | Failure>;
  /** where to go once it is kept */
  next: 'timeline' | 'settings';
};

/** All of a session in one form; what is wrong is said beside its field, here and by the server alike. */
export function SessionForm({ form, label, leave, send, next }: Props) {
  const [typed, setTyped] = useState(form.typed);
  const [wrong, setWrong] = useState<readonly Wrong[]>([]);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [isPending, startTransition] = useTransition();
  const element = useRef<HTMLFormElement>(null);
  const act = useActId();
  const router = useRouter();
  const modeField = useId();
  const set = (changed: Partial<SessionTyped>) => setTyped((before) => ({ ...before, ...changed }));
  const errorOf = (field: string) => wrong.find((one) => one.field === field)?.message;

  useEffect(() => {
    if (wrong.length > 0) focusWrong(element.current);
  }, [wrong]);

  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (isPending) return;
    setRefusal(null);
    const read = readSession(typed);
    setWrong(read.ok ? [] : read.wrong);
    if (!read.ok) return;
    const body: Body =
      form.rev === null
        ? { id: act.idOf({ typed }), typed }
        : { actId: act.idOf({ typed }), rev: form.rev, typed };
    startTransition(async () => {
      const answer = await reach(() => send(body));
      if (answer.ok) {
        act.forget();
        showToast({ message: `${answer.code} is kept.` });
        router.push(`/sessions/${encodeURIComponent(answer.code)}/${next}` as Route);
        router.refresh();
        return;
      }
      if (answer.fields) setWrong(wrongOf(answer.fields));
      else setRefusal(answer.message);
    });
  };

  const partOf = (name: 'what' | 'when' | 'rules', block: unknown) => (
    <BlockFields
      block={block as AnyBlock}
      typed={typed[name]}
      wrong={wrong
        .filter(({ field }) => field.startsWith(`${name}.`))
        .map((one) => ({ ...one, field: one.field.slice(name.length + 1) }))}
      onType={(field, value) => set({ [name]: { ...typed[name], [field]: value } as Typed })}
    />
  );

  return (
    <form ref={element} className="sform" noValidate onSubmit={submit} aria-label={label}>
      <div className="sform-parts">
        <NotKept refusal={refusal} wrong={wrong.length} />
        <Part title="What it is" className="sform-what">
          <Field
            label={CODE_FIELD.label}
            className="h-field"
            autoComplete="off"
            value={typed.code}
            onChange={({ target }) => set({ code: target.value })}
            help={CODE_FIELD.help}
            error={errorOf('code')}
          />
          {partOf('what', WHAT)}
        </Part>
        <Part title="When">{partOf('when', WHEN)}</Part>
        <Part title="Stations">
          <StationChoice
            choices={form.choices.stations}
            chosen={typed.stations}
            error={errorOf('stations')}
            onChoose={(stations) => set({ stations })}
          />
        </Part>
        <Part title="Sources">
          <SourceChoice
            choices={form.choices.sources}
            chosen={typed.sources}
            wrong={wrong}
            onChoose={(sources) => set({ sources })}
          />
        </Part>
        <Part title="Mode">
          <label className="label" htmlFor={modeField}>
            Mode that new scans are laid out in
          </label>
          <select
            id={modeField}
            className="field h-field"
            value={typed.modeId}
            aria-invalid={errorOf('modeId') !== undefined || undefined}
            aria-describedby={errorOf('modeId') ? `${modeField}-error` : undefined}
            onChange={({ target }) => set({ modeId: target.value })}
          >
            {typed.modeId === '' && <option value="">Choose</option>}
            {form.choices.modes.map(({ id, name, isRetired }) => (
              <option key={id} value={id}>
                {name}
                {isRetired ? ' (retired)' : ''}
              </option>
            ))}
          </select>
          {errorOf('modeId') && (
            <p id={`${modeField}-error`} className="mt-1 text-small font-strong text-verm">
              {errorOf('modeId')}
            </p>
          )}
        </Part>
        <Part title="Settings">{partOf('rules', RULES)}</Part>
      </div>
      <AsItStands typed={typed} choices={form.choices} />
      <footer className="sform-foot">
        <span className="help">
          {form.rev === null
            ? 'Nobody is told yet: stations see that it is planned, and its scans once it is offered.'
            : 'The stations are told by the next offer.'}
        </span>
        <Link href={leave} className="btn ml-auto">
          Leave
        </Link>
        <button type="submit" className="btn btn-primary" aria-disabled={isPending}>
          {isPending ? 'Keeping' : label}
        </button>
      </footer>
    </form>
  );
}

function Part({
  title,
  className = '',
  children,
}: {
  title: string;
  className?: string;
  children: ReactNode;
}) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="sform-part">
      <h2 id={id}>{title}</h2>
      <div className={`min-w-0 ${className}`}>{children}</div>
    </section>
  );
}
