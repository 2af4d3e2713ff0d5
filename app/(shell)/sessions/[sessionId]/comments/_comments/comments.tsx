'use client';

import { useId, useState } from 'react';
import { reach } from '@/app/_ui/reach';
import { useActId } from '@/app/_ui/use-act-id';
import type { CommentDto } from '@/src/data/comment/read';
import type { SessionHead } from '@/src/data/session/dto';
import { fullTimeText } from '@/src/schedule/words';
import { say } from '../actions';
import './comments.css';

type Props = { session: SessionHead; comments: readonly CommentDto[]; canWrite: boolean };

/** What was said of a session, oldest first, each by its role. */
export function Comments({ session, comments, canWrite }: Props) {
  return (
    <div className="comments">
      <section aria-labelledby="comments-title" className="comments-said">
        <h1 id="comments-title">Comments</h1>
        {comments.length === 0 ? (
          <p>
            Nothing was said of {session.code} yet. What is written here is read by all who have a part in it.
          </p>
        ) : (
          <ol>
            {comments.map(({ id, by, isMine, atMs, text }) => (
              <li key={id}>
                <p className="comments-by">
                  <b>{by}</b>
                  {isMine && <span className="text-ink2">you</span>}
                  <time dateTime={new Date(atMs).toISOString()}>{fullTimeText(atMs)}</time>
                </p>
                <p className="comments-text">{text}</p>
              </li>
            ))}
          </ol>
        )}
      </section>
      {canWrite && (
        <aside aria-label="Write" className="comments-write">
          <Write sessionId={session.id} />
        </aside>
      )}
    </div>
  );
}

function Write({ sessionId }: { sessionId: string }) {
  const [text, setText] = useState('');
  const [error, setError] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const act = useActId();
  const field = useId();
  const send = async () => {
    if (isSending) return;
    if (text.trim() === '') return setError('The comment is empty. Write it first.');
    setIsSending(true);
    const answer = await reach(() => say(sessionId, { id: act.idOf({ text }), text }));
    setIsSending(false);
    if (!answer.ok) return setError(answer.fields?.text?.join(' ') ?? answer.message);
    act.forget();
    setText('');
    setError(null);
  };
  return (
    <form
      className="flex flex-col gap-2"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <h2>
        <label htmlFor={field}>Your comment</label>
      </h2>
      <textarea
        id={field}
        rows={6}
        maxLength={2000}
        className="field h-auto py-2"
        value={text}
        aria-invalid={error !== null || undefined}
        aria-describedby={error ? `${field}-error` : undefined}
        onChange={({ target }) => setText(target.value)}
      />
      {error && (
        <p id={`${field}-error`} role="alert" className="text-small font-strong text-verm">
          {error}
        </p>
      )}
      <p className="help">Read by all who have a part in the session. It cannot be taken back.</p>
      <div>
        <button type="submit" className="btn btn-primary" aria-disabled={isSending}>
          {isSending ? 'Sending' : 'Send the comment'}
        </button>
      </div>
    </form>
  );
}
