'use client';

import {
  useEffect,
  useRef,
  useState,
  useTransition,
  type FormEvent,
  type KeyboardEvent,
  type ReactNode,
} from 'react';
import { reach } from '@/app/_ui/reach';
import { showToast } from '@/app/_ui/toast';
import type { BlockAct } from '@/src/data/blocks';
import type { Failure } from '@/src/data/errors';
import {
  readBlock,
  type AnyBlock,
  type Typed,
  type TypedRow,
  type Wrong,
} from '@/src/exchange/catalogue/block';
import { BlockFields } from './block-fields';
import { focusWrong, wrongOf, wrongText } from './wrong';

export type Keep = (act: BlockAct) => Promise<{ ok: true } | Failure>;

/** More than fields: drawn from what is typed, and typing into it. */
export type Aid = (
  typed: Typed,
  onType: (field: string, value: string | readonly TypedRow[]) => void,
) => ReactNode;

type Props = {
  name: string;
  block: AnyBlock;
  /** as it is stored */
  stored: Typed;
  keep: Keep;
  aid?: Aid;
  onLeave: () => void;
};

/** One block of an object in edit: the same parser here and on the server says what is wrong. */
export function BlockForm({ name, block, stored, keep, aid, onLeave }: Props) {
  const [was] = useState(stored);
  const [typed, setTyped] = useState(stored);
  const [wrong, setWrong] = useState<readonly Wrong[]>([]);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [isPending, startTransition] = useTransition();
  const form = useRef<HTMLFormElement>(null);
  const read = readBlock(block, typed);
  const note = read.ok ? block.note?.(read.value) : null;

  useEffect(() => {
    form.current
      ?.querySelector<HTMLElement>(':is(input, select, textarea, button):not([tabindex="-1"])')
      ?.focus();
  }, []);
  useEffect(() => {
    if (wrong.length > 0) focusWrong(form.current);
  }, [wrong]);

  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (isPending) return;
    setRefusal(null);
    if (!read.ok) return setWrong(read.wrong);
    setWrong([]);
    startTransition(async () => {
      const answer = await reach(() => keep({ block: name, typed, was }));
      if (answer.ok) {
        showToast({ message: `“${block.title}” is kept.` });
        return onLeave();
      }
      if (answer.fields) setWrong(wrongOf(answer.fields));
      else setRefusal(answer.message);
    });
  };
  const onType = (field: string, value: string | readonly TypedRow[]) => {
    setTyped({ ...typed, [field]: value });
    setWrong(wrong.filter((one) => one.field !== field && !one.field.startsWith(`${field}.`)));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    // a dialog over the form closes by itself
    const isOver = event.target instanceof Element && event.target.closest('dialog') !== null;
    if (event.key === 'Escape' && !isOver) onLeave();
  };

  return (
    <form
      ref={form}
      className="block-edit block"
      aria-label={block.title}
      noValidate
      onSubmit={submit}
      onKeyDown={onKeyDown}
    >
      <header className="block-head">
        <h2>{block.title}</h2>
        <kbd className="kbd">Esc</kbd>
      </header>
      {refusal !== null && (
        <div role="alert" className="error-box mb-2">
          {refusal}
        </div>
      )}
      {aid?.(typed, onType)}
      <BlockFields block={block} typed={typed} wrong={wrong} onType={onType} />
      {note != null && <p className="help mt-2">{note}</p>}
      <div className="block-acts">
        <button type="submit" className="btn btn-primary" aria-disabled={isPending}>
          {isPending ? 'Keeping' : block.keep}
        </button>
        <button type="button" className="btn" onClick={onLeave}>
          Leave as it was
        </button>
      </div>
      <p className="sr-only" role="status">
        {wrong.length > 0 && wrongText(wrong.length)}
      </p>
    </form>
  );
}
