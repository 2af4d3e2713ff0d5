'use client';

import { useState } from 'react';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { Segments } from '@/app/_ui/segments';
import type { LocalMessage } from '@/src/data/mail/read';

const FORMS = [
  { value: 'html', label: 'As sent' },
  { value: 'text', label: 'Plain text' },
] as const;

/** What would have been sent, newest on top; nothing leaves this machine. */
export function Mailbox({ messages }: { messages: readonly LocalMessage[] }) {
  const [chosenId, setChosenId] = useState<string | null>(messages[0]?.id ?? null);
  const [form, setForm] = useState<'html' | 'text'>('html');
  const chosen = messages.find(({ id }) => id === chosenId) ?? messages[0];
  if (!chosen)
    return (
      <EmptySheet heading="No message yet">
        Messages that would have been sent stand here. Offer a session to its stations, and each of their
        operators gets one.
      </EmptySheet>
    );
  return (
    <>
      <header className="mail-head">
        <h1>Mailbox of this computer</h1>
        <span className="chip border-ochre text-ochre">demo: nothing leaves this machine</span>
        <p className="help">Messages that would have been sent, newest on top: {messages.length}.</p>
      </header>
      <div className="mail">
        <nav aria-label="Messages" className="mail-list">
          {messages.map(({ id, to, subject }) => (
            <button key={id} type="button" aria-pressed={id === chosen.id} onClick={() => setChosenId(id)}>
              <b>{to.join(', ')}</b>
              <span>{subject}</span>
            </button>
          ))}
        </nav>
        <article aria-labelledby="mail-subject" className="mail-read">
          <div className="flex flex-wrap items-center justify-between gap-2">
            <h2 id="mail-subject">{chosen.subject}</h2>
            <Segments label="Form" value={form} options={FORMS} onChoose={setForm} />
          </div>
          <dl className="mail-facts">
            <div>
              <dt>To</dt>
              <dd>{chosen.to.join(', ')}</dd>
            </div>
            <div>
              <dt>From</dt>
              <dd>{chosen.from}</dd>
            </div>
            <div>
              <dt>Sent by</dt>
              <dd>no mail service is set: kept here</dd>
            </div>
          </dl>
          {form === 'html' ? (
            <iframe title={chosen.subject} srcDoc={chosen.html} sandbox="" className="mail-page" />
          ) : (
            <pre className="mail-text" tabIndex={0}>
              {chosen.text}
            </pre>
          )}
        </article>
      </div>
    </>
  );
}
