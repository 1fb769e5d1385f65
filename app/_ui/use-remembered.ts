'use client';

import { useCallback, useSyncExternalStore } from 'react';

const changed = 'remembered-change';

const subscribe = (listen: () => void) => {
  window.addEventListener('storage', listen);
  window.addEventListener(changed, listen);
  return () => {
    window.removeEventListener('storage', listen);
    window.removeEventListener(changed, listen);
  };
};

const read = (key: string): string | null => {
  try {
    return window.localStorage.getItem(key);
  } catch {
    return null; // storage is forbidden in this browser: nothing is remembered
  }
};

/** A choice this browser remembers between visits, in step over its open pages; `initial` until it was made. */
export function useRemembered(name: string, initial: string): readonly [string, (value: string) => void] {
  const key = `evenohm.${name}`;
  const value = useSyncExternalStore(
    subscribe,
    () => read(key) ?? initial,
    () => initial,
  );
  const remember = useCallback(
    (next: string) => {
      try {
        window.localStorage.setItem(key, next);
      } catch {
        return;
      }
      window.dispatchEvent(new Event(changed));
    },
    [key],
  );
  return [value, remember];
}
