import { useRef } from 'react';
import { newId } from '@/app/_ui/new-id';

/** The id of an act: the same for the same words sent again, so that they stand once; another for other words. */
export function useActId(): (body: object) => string {
  const last = useRef({ words: '', id: '' });
  return (body) => {
    const words = JSON.stringify(body);
    if (last.current.words !== words) last.current = { words, id: newId() };
    return last.current.id;
  };
}
