import { useRef } from 'react';
import { newId } from './new-id';

/**
 * The id of an act: the same for the same words sent again, so that they stand once; another for other words, and
 * for the same ones once an act was taken and forgotten.
 */
export function useActId(): { idOf: (words: object) => string; forget: () => void } {
  const last = useRef({ words: '', id: '' });
  return {
    idOf: (body) => {
      const words = JSON.stringify(body);
      if (last.current.words !== words) last.current = { words, id: newId() };
      return last.current.id;
    },
    forget: () => {
      last.current = { words: '', id: '' };
    },
  };
}
