'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useEffect, useRef, useState, useTransition, type FormEvent } from 'react';
import { Field } from '@/app/_ui/field';
import { reach } from '@/app/_ui/reach';
import type { Failure } from '@/src/data/errors';
import { readBlock, type AnyBlock, type Typed, type Wrong } from '@/src/exchange/catalogue/block';
import type { Field as Entry } from '@/src/exchange/catalogue/field';
import { BlockFields } from './block-fields';
import { NotKept } from './not-kept';
import { focusWrong, wrongOf } from './wrong';
import './object.css';

type Whole = Readonly<Record<string, Typed | string>>;

type Props = {
  title: string;
  list: { href: Route; label: string };
  /** "Add the station" */
  label: string;
  blocks: readonly { name: string; block: AnyBlock; start: Typed }[];
  /** a word of its own beside the blocks: a station's code */
  code?: Entry<string>;
  note?: string;
  add: (typed: Whole) => Promise<{ ok: true; href: Route } | Failure>;
};

/** Something new: the blocks that it cannot be without, kept in one step. */
export function NewObject({ title, list, label, blocks, code, note, add }: Props) {
  const [typed, setTyped] = useState<Whole>({
    ...(code && { code: '' }),
    ...Object.fromEntries(blocks.map(({ name, start }) => [name, start])),
  });
  const [wrong, setWrong] = useState<readonly Wrong[]>([]);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [isPending, startTransition] = useTransition();
  const form = useRef<HTMLFormElement>(null);
  const router = useRouter();
  const codeText = typeof typed.code === 'string' ? typed.code : '';

  useEffect(() => {
    if (wrong.length > 0) focusWrong(form.current);
  }, [wrong]);

  const problems = (): Wrong[] => {
    const read = code?.read(codeText);
    const ofCode = read && !read.ok ? [{ field: 'code', message: read.message }] : [];
    const ofBlocks = blocks.flatMap(({ name, block }) => {
      const answer = readBlock(block, typed[name]);
      return answer.ok ? [] : answer.wrong.map((one) => ({ ...one, field: `${name}.${one.field}` }));
    });
    return [...ofCode, ...ofBlocks];
  };

  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (isPending) return;
    setRefusal(null);
    const found = problems();
    setWrong(found);
    if (found.length > 0) return;
    startTransition(async () => {
      const answer = await reach(() => add(typed));
      if (answer.ok) return router.push(answer.href);
      if (answer.fields) setWrong(wrongOf(answer.fields));
      else setRefusal(answer.message);
    });
  };

  return (
    <form ref={form} className="new-object" noValidate onSubmit={submit} aria-label={title}>
      <div className="object-head">
        <nav aria-label="Where this stands">
          <Link href={list.href} className="link">
            {list.label}
          </Link>
          <span aria-hidden="true"> /</span>
        </nav>
        <h1>{title}</h1>
      </div>
      <div className="new-blocks">
        <NotKept refusal={refusal} wrong={wrong.length} />
        {code && (
          <div className="new-code">
            <Field
              label={code.label}
              name="code"
              className="h-field"
              autoComplete="off"
              value={codeText}
              onChange={({ target }) => setTyped({ ...typed, code: target.value })}
              help={code.help}
              error={wrong.find(({ field }) => field === 'code')?.message}
            />
          </div>
        )}
        {blocks.map(({ name, block }) => {
          const text = typed[name];
          const of = typeof text === 'string' || text === undefined ? {} : text;
          const read = readBlock(block, of);
          return (
            <section key={name} className="block" aria-labelledby={`new-${name}`}>
              <header className="block-head">
                <h2 id={`new-${name}`}>{block.title}</h2>
              </header>
              <BlockFields
                block={block}
                typed={of}
                wrong={wrong
                  .filter(({ field }) => field.startsWith(`${name}.`))
                  .map((one) => ({ ...one, field: one.field.slice(name.length + 1) }))}
                onType={(field, value) => setTyped({ ...typed, [name]: { ...of, [field]: value } })}
              />
              {read.ok && block.note && <p className="help mt-2">{block.note(read.value)}</p>}
            </section>
          );
        })}
        {note !== undefined && <p className="help">{note}</p>}
        <div className="block-acts">
          <button type="submit" className="btn btn-primary" aria-disabled={isPending}>
            {isPending ? 'Adding' : label}
          </button>
          <Link href={list.href} className="btn">
            Leave
          </Link>
        </div>
      </div>
    </form>
  );
}
