'use client';

import { type RefObject, useEffect, useRef, useState } from 'react';

/** The width of an element in whole pixels, kept up to date; null until it is known in the browser. */
export function useWidth<Kind extends HTMLElement>(): readonly [RefObject<Kind | null>, number | null] {
  const element = useRef<Kind>(null);
  const [width, setWidth] = useState<number | null>(null);
  useEffect(() => {
    if (element.current === null) return;
    const observer = new ResizeObserver(([entry]) => {
      if (entry !== undefined) setWidth(Math.floor(entry.contentRect.width));
    });
    observer.observe(element.current);
    return () => observer.disconnect();
  }, []);
  return [element, width];
}
