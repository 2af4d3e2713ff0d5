'use client';

import { useId, useRef, useState } from 'react';
import { liveKeys } from '@/app/_ui/live-keys';
import { newId } from '@/app/_ui/new-id';
import RefreshOn from '@/app/_ui/refresh-on';
import type { CommentDto } from '@/src/data/comment/read';
import type { SessionHead } from '@/src/data/session/dto';
import { fullTimeText } from '@/src/schedule/words';
import { say } from '../actions';

type Props = { session: SessionHead; comments: readonly CommentDto[]; canWrite: boolean };

/** What was said of a session, oldest first, each by its role. */
export function Comments({ session, comments, canWrite }: Props) {
  return (
    <div className="mx-auto flex w-full max-w-[820px] flex-1 flex-col gap-3.5 px-3.5 py-[18px] desk:overflow-y-auto">
      <RefreshOn address={liveKeys.stationsStamp(session.id)} />
      <h1>Comments</h1>
      {comments.length === 0 ? (
        <p className="help">
          Nothing was said of {session.code} yet. What is written here is read by all who have a part in it.
        </p>
      ) : (
        <ol className="flex flex-col border-t-head border-ink">
          {comments.map(({ id, by, isMine, atMs, text }) => (
            <li key={id} className="border-b border-hair py-2.5">
              <p className="flex flex-wrap justify-between gap-2">
                <b>
                  {by}
                  {isMine && ', you'}
                </b>
                <time className="text-ink2" dateTime={new Date(atMs).toISOString()}>
                  {fullTimeText(atMs)}
                </time>
              </p>
              <p className="whitespace-pre-wrap break-words">{text}</p>
            </li>
          ))}
        </ol>
      )}
      {canWrite && <Write sessionId={session.id} />}
    </div>
  );
}

function Write({ sessionId }: { sessionId: string }) {
  const [text, setText] = useState('');
  const [error, setError] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const id = useRef<string | null>(null);
  const field = useId();
  const send = async () => {
    if (text.trim() === '') return setError('The comment is empty. Write it first.');
    id.current ??= newId();
    setIsSending(true);
    try {
      const answer = await say(sessionId, { id: id.current, text });
      if (!answer.ok) return setError(answer.fields?.text?.join(' ') ?? answer.message);
      id.current = null;
      setText('');
      setError(null);
    } catch (failure) {
      if (!(failure instanceof TypeError)) throw failure;
      setError('There is no line. What you wrote is kept: send it again when the line is back.');
    } finally {
      setIsSending(false);
    }
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
      <label className="label" htmlFor={field}>
        Your comment
      </label>
      <textarea
        id={field}
        rows={4}
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
      <div>
        <button type="submit" className="btn btn-primary" disabled={isSending}>
          {isSending ? 'Sending' : 'Send the comment'}
        </button>
      </div>
    </form>
  );
}
