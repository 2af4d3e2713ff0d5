'use client';

import { useActionState, useEffect, useRef, useState } from 'react';
import { Field } from '@/app/_ui/field';
import { Mark } from '@/app/_ui/mark';
import { signIn } from './actions';

export type DemoAccounts = { password: string; accounts: readonly { email: string; label: string }[] };

export function SignInForm({ next, demo }: { next: string; demo: DemoAccounts | null }) {
  const [state, submit, isPending] = useActionState(signIn, null);
  const [isShown, setIsShown] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const problem = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (state) problem.current?.focus();
  }, [state]);

  function fill(email: string, password: string) {
    const { elements } = form.current ?? {};
    setInput(elements?.namedItem('email'), email);
    setInput(elements?.namedItem('password'), password);
  }

  return (
    <form ref={form} action={submit} className="sign-in-form" noValidate>
      <h1 className="sign-in-logo">
        <Mark size={34} />
        Antiphon
      </h1>
      {state && (
        <div ref={problem} tabIndex={-1} role="alert" className="error-box">
          <p className="font-strong">{state.message}</p>
          {state.advice !== undefined && <p>{state.advice}</p>}
        </div>
      )}
      <input type="hidden" name="next" value={next} />
      <Field
        label="E-mail"
        name="email"
        type="email"
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        defaultValue={state?.email ?? ''}
        error={state?.fields?.email?.[0]}
      />
      <Field
        label="Password"
        name="password"
        type={isShown ? 'text' : 'password'}
        autoComplete="current-password"
        className="pr-[64px]"
        error={state?.fields?.password?.[0]}
        end={
          <button
            type="button"
            className="link"
            aria-label="Show password"
            aria-pressed={isShown}
            onClick={() => setIsShown(!isShown)}
          >
            {isShown ? 'Hide' : 'Show'}
          </button>
        }
      />
      <button type="submit" className="btn btn-primary" aria-disabled={isPending}>
        {isPending ? 'Signing in' : 'Sign in'}
      </button>
      <p className="help">New here? An administrator gives you an account. All times in Antiphon are UT.</p>
      {demo && <DemoList demo={demo} onChoose={fill} />}
    </form>
  );
}

type DemoListProps = { demo: DemoAccounts; onChoose: (email: string, password: string) => void };

function DemoList({ demo, onChoose }: DemoListProps) {
  return (
    <section className="demo-list" aria-labelledby="demo-heading">
      <h2 id="demo-heading">Demo accounts</h2>
      <p className="help">
        Invented; each has the password <code>{demo.password}</code>. Choose one to fill the form.
      </p>
      <ul>
        {demo.accounts.map(({ email, label }) => (
          <li key={email}>
            <button type="button" onClick={() => onChoose(email, demo.password)}>
              <b>{label}</b> <span>{email}</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}

function setInput(element: Element | RadioNodeList | null | undefined, value: string) {
  if (element instanceof HTMLInputElement) element.value = value;
}
