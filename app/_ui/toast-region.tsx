'use client';

import { useEffect } from 'react';
import { Toaster as Region, toast as put } from 'sonner';
import { setToastDoor, setToastEnd, type Toast } from './toast';

const SHOWN_MS = 6000;
const SLOT = 'only';

/** One at a time: each toast takes the same slot. */
export default function ToastRegion() {
  useEffect(() => {
    setToastDoor(({ message, action }: Toast) => {
      put(message, { id: SLOT, ...(action && { action: { label: action.label, onClick: action.run } }) });
    });
    setToastEnd(() => put.dismiss(SLOT));
    return () => {
      setToastDoor(null);
      setToastEnd(null);
    };
  }, []);
  return (
    <Region
      position="bottom-center"
      visibleToasts={1}
      duration={SHOWN_MS}
      toastOptions={{
        unstyled: true,
        classNames: { toast: 'toast', actionButton: 'btn btn-sm btn-quiet' },
      }}
    />
  );
}
