import { useEffect } from 'react';

/** Keys held during a drag: Alt = no snapping, Shift = drop all the same, Ctrl or ⌘ = copy. */
export const held = { alt: false, shift: false, copy: false };

export function useHeldKeys() {
  useEffect(() => {
    const note = (event: KeyboardEvent | PointerEvent) => {
      held.alt = event.altKey;
      held.shift = event.shiftKey;
      held.copy = event.ctrlKey || event.metaKey;
    };
    window.addEventListener('keydown', note, true);
    window.addEventListener('keyup', note, true);
    window.addEventListener('pointermove', note, true);
    return () => {
      window.removeEventListener('keydown', note, true);
      window.removeEventListener('keyup', note, true);
      window.removeEventListener('pointermove', note, true);
    };
  }, []);
}
