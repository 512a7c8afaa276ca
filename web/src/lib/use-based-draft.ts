import { useCallback, useMemo } from 'react';
import { useDraft } from './use-draft';

/** The saved state a draft was begun from. */
export interface Base<T> {
  value: T;
  version: number;
}

export interface BasedDraft<T> {
  value: T;
  base: Base<T>;
  set: (next: T) => void;
  /** Forget the draft and follow the saved state again. */
  clear: () => void;
  savedAt: Date | null;
  restored: boolean;
  /** Something was typed that is not saved. */
  changed: boolean;
}

/**
 * A draft over a saved row. Until something is typed it follows the row as others change it; from
 * then on it remembers the row it was begun from, so that a save can tell whose change is whose.
 */
export function useBasedDraft<T>(key: string, saved: T, version: number): BasedDraft<T> {
  const draft = useDraft<{ value: T; base: Base<T> } | null>(key, null);
  const { value: stored, set: store, clear: drop, savedAt, restored } = draft;
  const base = useMemo(() => stored?.base ?? { value: saved, version }, [stored, saved, version]);
  const set = useCallback((next: T) => store({ value: next, base }), [store, base]);
  const clear = useCallback(() => drop(null), [drop]);
  return {
    value: stored ? stored.value : saved,
    base,
    set,
    clear,
    savedAt,
    restored,
    changed: stored !== null,
  };
}
