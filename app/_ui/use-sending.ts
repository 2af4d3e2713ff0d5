import { useEffect, useRef, useState } from 'react';
import { reach, type Unreached } from './reach';

type Refusal = { ok: false; message: string; fields?: Record<string, string[] | undefined> };
type Fields = Record<string, string>;

/** What a form says of its sending: what is wrong beside which field, what went wrong at all; one at a time. */
export function useSending() {
  const [fields, setFields] = useState<Fields>({});
  const [trouble, setTrouble] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const isBusy = useRef(false);
  const form = useRef<HTMLFormElement & HTMLDivElement>(null);
  // the first field that is wrong has the focus
  useEffect(() => {
    if (Object.keys(fields).length > 0)
      form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [fields]);

  const say = (wrong: Fields = {}) => {
    setFields(wrong);
    setTrouble(null);
  };
  /** Null while another sending is on its way. */
  const send = async <Answer extends { ok: true } | Refusal>(
    act: () => Promise<Answer>,
  ): Promise<Answer | Unreached | null> => {
    if (isBusy.current) return null;
    isBusy.current = true;
    setIsSending(true);
    say();
    const answer = await reach(act);
    isBusy.current = false;
    setIsSending(false);
    const outcome: { ok: true } | Refusal = answer;
    if (!outcome.ok) {
      const back = fieldWords(outcome.fields);
      setFields(back);
      if (Object.keys(back).length === 0) setTrouble(outcome.message);
    }
    return answer;
  };
  return { form, fields, trouble, isSending, say, send };
}

/** What is wrong, by field, as one line each. */
export function fieldWords(fields: Refusal['fields'] = {}): Fields {
  return Object.fromEntries(
    Object.entries(fields).flatMap(([field, words]) => (words ? [[field, words.join(' ')]] : [])),
  );
}
