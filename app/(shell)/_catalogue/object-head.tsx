'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useState, useTransition, type ReactNode } from 'react';
import { Chip } from '@/app/_ui/chip';
import { Dialog } from '@/app/_ui/dialog';
import { reach } from '@/app/_ui/reach';
import { showToast } from '@/app/_ui/toast';
import type { Failure } from '@/src/data/errors';
import { fullTimeText } from '@/src/schedule/words';

type Props = {
  list: { href: Route; label: string };
  name: string;
  /** before the name */
  mark?: ReactNode;
  sub: string;
  noun: string;
  retiredAtMs: number | null;
  sessionsAhead: readonly { code: string }[];
  /** null where the viewer may not */
  retire: ((isRetired: boolean) => Promise<{ ok: true } | Failure>) | null;
  /** links of the page */
  children?: ReactNode;
};

export function ObjectHead(props: Props) {
  const { list, name, mark, sub, noun, retiredAtMs, sessionsAhead, retire, children } = props;
  const [isAsked, setIsAsked] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [isPending, startTransition] = useTransition();
  const change = (isRetired: boolean) =>
    startTransition(async () => {
      if (!retire) return;
      const answer = await reach(() => retire(isRetired));
      setRefusal(answer.ok ? null : answer.message);
      setIsAsked(false);
      if (!answer.ok) return;
      showToast({ message: isRetired ? `${name} is retired.` : `${name} is in use again.` });
    });

  return (
    <>
      <div className="object-head">
        <nav aria-label="Where this stands">
          <Link href={list.href} className="link">
            {list.label}
          </Link>
          <span aria-hidden="true"> /</span>
        </nav>
        {mark}
        <h1>{name}</h1>
        <span className="text-ink2">{sub}</span>
        <div className="object-acts">
          {retiredAtMs !== null && <Chip tone="warn">retired</Chip>}
          <Chip>{sessionsText(sessionsAhead.length)}</Chip>
          {children}
          {retire && retiredAtMs === null && (
            <button type="button" className="btn btn-danger" onClick={() => setIsAsked(true)}>
              Retire
            </button>
          )}
          {retire && retiredAtMs !== null && (
            <button type="button" className="btn" aria-disabled={isPending} onClick={() => change(false)}>
              Use again
            </button>
          )}
        </div>
      </div>
      {retiredAtMs !== null && (
        <p className="object-note">
          Retired {fullTimeText(retiredAtMs)}. It stays in the sessions that have it and cannot be chosen for
          new ones.
        </p>
      )}
      {refusal !== null && (
        <div role="alert" className="error-box">
          {refusal}
        </div>
      )}
      <Dialog
        isOpen={isAsked}
        title={`Retire ${name}?`}
        onClose={() => setIsAsked(false)}
        actions={
          <>
            <button type="button" className="btn" onClick={() => setIsAsked(false)}>
              Leave it in use
            </button>
            <button
              type="button"
              className="btn btn-danger"
              aria-disabled={isPending}
              onClick={() => change(true)}
            >
              Retire {name}
            </button>
          </>
        }
      >
        <p>
          The {noun} stays readable and in{' '}
          {sessionsAhead.length === 0
            ? 'its past sessions'
            : `${sessionsAhead.map(({ code }) => code).join(', ')}`}
          . It cannot be chosen for new sessions. It can be taken into use again.
        </p>
      </Dialog>
    </>
  );
}

const sessionsText = (count: number) =>
  count === 0 ? 'in no session ahead' : `in ${count} ${count === 1 ? 'session' : 'sessions'} ahead`;
