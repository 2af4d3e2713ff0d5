'use client';

import { useRef, useState } from 'react';

/** A text with a button that copies it; where the browser may not, it is selected to be copied by hand. */
export function CopyText({ text }: { text: string }) {
  const shown = useRef<HTMLSpanElement>(null);
  const [answer, setAnswer] = useState('');

  async function copy() {
    try {
      await navigator.clipboard.writeText(text);
      setAnswer('Copied');
    } catch {
      if (shown.current) window.getSelection()?.selectAllChildren(shown.current);
      setAnswer('Selected: copy it by hand');
    }
  }

  return (
    <>
      <span ref={shown} className="select-all">
        {text}
      </span>
      <button type="button" className="btn btn-sm" onClick={() => void copy()}>
        Copy
      </button>
      <span role="status" className="text-small font-text text-ink2">
        {answer}
      </span>
    </>
  );
}
