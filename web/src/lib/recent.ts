import { useSyncExternalStore } from 'react';

/** A place opened lately on this device. */
export interface Recent {
  to: string;
  label: string;
  under: string;
}

const LIMIT = 6;
const listeners = new Set<() => void>();
const cache = new Map<string, { text: string; value: Recent[] }>();
const NONE: Recent[] = [];

const storageKey = (memberId: string) => `furrowlight-recent:${memberId}`;

function read(memberId: string): Recent[] {
  const text = localStorage.getItem(storageKey(memberId));
  if (!text) return NONE;
  const known = cache.get(memberId);
  if (known?.text === text) return known.value;
  try {
    const value = JSON.parse(text) as Recent[];
    cache.set(memberId, { text, value });
    return value;
  } catch {
    return NONE;
  }
}

export function noteRecent(memberId: string, place: Recent): void {
  const rest = read(memberId).filter(({ to }) => to !== place.to);
  localStorage.setItem(storageKey(memberId), JSON.stringify([place, ...rest].slice(0, LIMIT)));
  listeners.forEach((listener) => listener());
}

/** Take a place off the list, for one that was removed; without a place, forget all. */
export function forgetRecent(memberId: string, to?: string): void {
  if (to === undefined) localStorage.removeItem(storageKey(memberId));
  else {
    const rest = read(memberId).filter((place) => place.to !== to);
    localStorage.setItem(storageKey(memberId), JSON.stringify(rest));
  }
  listeners.forEach((listener) => listener());
}

export function useRecent(memberId: string): Recent[] {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => read(memberId),
  );
}
