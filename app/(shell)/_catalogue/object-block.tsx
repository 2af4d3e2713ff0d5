'use client';

import { useEffect, useRef, type ReactNode } from 'react';
import { writeBlock, type AnyBlock, type Block, type Values } from '@/src/exchange/catalogue/block';
import { BlockForm, type Aid, type Keep } from './block-form';

export type Editing = {
  /** the block that is open */
  open: string | null;
  setOpen: (name: string | null) => void;
  can: (name: string) => boolean;
  keep: Keep;
};

type Props<V, T> = {
  name: string;
  block: Block<V, T>;
  value: Values<V, T>;
  editing: Editing;
  /** what stands above the fields in edit */
  aid?: Aid;
  /** how it reads */
  children: ReactNode;
};

/** A block of an object's page with its own Edit; one at a time is open, the others stay readable. */
export function ObjectBlock<V, T>({ name, block, value, editing, aid, children }: Props<V, T>) {
  const { open, setOpen, can, keep } = editing;
  const isOpen = open === name;
  const edit = useRef<HTMLButtonElement>(null);
  const wasOpen = useRef(false);
  // the focus goes back to where the form was opened from
  useEffect(() => {
    if (wasOpen.current && !isOpen) edit.current?.focus();
    wasOpen.current = isOpen;
  }, [isOpen]);
  if (isOpen) {
    return (
      <BlockForm
        name={name}
        block={block as unknown as AnyBlock}
        stored={writeBlock(block, value)}
        keep={keep}
        aid={aid}
        onLeave={() => setOpen(null)}
      />
    );
  }
  return (
    <section className="block" aria-labelledby={`block-${name}`}>
      <header className="block-head">
        <h2 id={`block-${name}`}>{block.title}</h2>
        {can(name) && (
          <button
            ref={edit}
            type="button"
            className="link"
            aria-label={`Edit: ${block.title}`}
            aria-disabled={open !== null}
            title={open === null ? undefined : 'Keep or leave the block that is open first.'}
            onClick={() => {
              if (open === null) setOpen(name);
            }}
          >
            Edit
          </button>
        )}
      </header>
      {children}
    </section>
  );
}
