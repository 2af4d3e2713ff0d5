'use client';

import { useEffect, useRef, useState, type RefObject } from 'react';

/** The width of an element, px, as it changes; the given one before it is known. */
export function useWidth<T extends HTMLElement>(first: number): [RefObject<T | null>, number] {
  const element = useRef<T>(null);
  const [width, setWidth] = useState(first);
  useEffect(() => {
    if (!element.current) return;
    const observer = new ResizeObserver(([entry]) => entry && setWidth(Math.round(entry.contentRect.width)));
    observer.observe(element.current);
    return () => observer.disconnect();
  }, []);
  return [element, width];
}
