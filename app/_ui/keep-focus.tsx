'use client';

import { useEffect } from 'react';

/** Parts of a page that are worth landing in. */
const PARTS = 'section, aside, form, fieldset, dialog, main, [role="grid"], [role="group"]';
const TOASTS = '[data-sonner-toaster]';

/** What has the focus may go away with its row, form or dialog: the nearest part that held it takes the focus. */
export function KeepFocus() {
  useEffect(() => {
    let had: Element | null = null;
    /** from what has the focus outwards; of a dialog, on to what it was opened from */
    let way: readonly Element[] = [];
    let opener: readonly Element[] = [];
    let frame = 0;

    const remember = ({ target }: FocusEvent) => {
      if (!(target instanceof Element)) return;
      had = target;
      // a toast ends by itself: from there the focus goes back to where it came from
      if (target.closest(TOASTS)) return;
      const dialog = target.closest('dialog');
      if (!dialog) opener = outwards(target, document.body);
      way = dialog ? [...outwards(target, dialog), ...opener] : opener;
    };
    const look = () => {
      frame = 0;
      if (!had || document.activeElement !== document.body) return;
      // left on purpose: a press beside everything
      if (isThere(had)) had = null;
      else
        land(
          way.find((one, index) => isThere(one) && (index === 0 || one === opener[0] || one.matches(PARTS))),
        );
    };
    const lookSoon = () => {
      frame ||= requestAnimationFrame(look);
    };

    const observer = new MutationObserver(lookSoon);
    observer.observe(document.body, { childList: true, subtree: true });
    document.addEventListener('focusin', remember);
    document.addEventListener('focusout', lookSoon);
    return () => {
      cancelAnimationFrame(frame);
      observer.disconnect();
      document.removeEventListener('focusin', remember);
      document.removeEventListener('focusout', lookSoon);
    };
  }, []);
  return null;
}

function outwards(from: Element, end: Element): Element[] {
  const parts: Element[] = [];
  for (let at: Element | null = from; at && at !== end; at = at.parentElement) parts.push(at);
  return parts;
}

const isThere = (one: Element) => one.isConnected && one.checkVisibility() && !one.matches(':disabled');

function land(on: Element = document.getElementById('main') ?? document.body) {
  if (!(on instanceof HTMLElement || on instanceof SVGElement)) return;
  if (on.tabIndex < 0 && !on.hasAttribute('tabindex')) {
    on.setAttribute('tabindex', '-1');
    on.addEventListener('blur', () => on.removeAttribute('tabindex'), { once: true });
  }
  on.focus({ preventScroll: true });
}
