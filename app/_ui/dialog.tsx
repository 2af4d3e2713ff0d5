'use client';

import { useEffect, useId, useRef, type ReactNode } from 'react';

type DialogProps = {
  isOpen: boolean;
  title: string;
  onClose: () => void;
  children: ReactNode;
  /** the safe one first */
  actions: ReactNode;
};

/** The browser's own dialog: it holds the focus, closes on Escape and gives the focus back. */
export function Dialog({ isOpen, title, onClose, children, actions }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const id = useId();

  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (isOpen && !element.open) element.showModal();
    if (!isOpen && element.open) element.close();
  }, [isOpen]);

  return (
    <dialog ref={dialog} className="float dialog" aria-labelledby={id} onClose={onClose}>
      {isOpen && (
        <>
          <header className="dialog-head">
            <h2 id={id}>{title}</h2>
            <kbd className="kbd">Esc</kbd>
          </header>
          {children}
          <footer className="dialog-actions">{actions}</footer>
        </>
      )}
    </dialog>
  );
}
