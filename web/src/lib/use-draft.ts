import { useCallback, useEffect, useRef, useState } from 'react';

const PREFIX = 'furrowlight-draft:';
const DELAY_MS = 800;

interface Stored<T> {
  at: string;
  value: T;
}

function readDraft<T>(key: string): Stored<T> | null {
  try {
    const text = localStorage.getItem(PREFIX + key);
    return text ? (JSON.parse(text) as Stored<T>) : null;
  } catch {
    return null;
  }
}

export interface Draft<T> {
  value: T;
  set: (next: T) => void;
  /** When the draft on this device was written; null when nothing is unsaved. */
  savedAt: Date | null;
  /** True when the value came back from an earlier visit. */
  restored: boolean;
  /** Forget the draft, after a save or on purpose, and go on from `next`. */
  clear: (next: T) => void;
}

/**
 * Form state that survives a closed tab and an expired session: written to this device within two
 * seconds of a change and restored when the same form opens again.
 *
 * @param key names the form and the row, e.g. `field:new`
 * @param initial the saved state to start from when there is no draft
 */
export function useDraft<T>(key: string, initial: T): Draft<T> {
  const [start] = useState(() => readDraft<T>(key));
  const [value, setValue] = useState<T>(start?.value ?? initial);
  const [savedAt, setSavedAt] = useState<Date | null>(start ? new Date(start.at) : null);
  const [restored, setRestored] = useState(start !== null);
  const pending = useRef<{ value: T } | null>(null);

  const write = useCallback(() => {
    if (!pending.current) return;
    const at = new Date();
    try {
      localStorage.setItem(
        PREFIX + key,
        JSON.stringify({ at: at.toISOString(), value: pending.current.value }),
      );
      setSavedAt(at);
    } catch {
      setSavedAt(null);
    }
    pending.current = null;
  }, [key]);

  useEffect(() => {
    if (!pending.current) return undefined;
    const timer = setTimeout(write, DELAY_MS);
    return () => clearTimeout(timer);
  }, [value, write]);

  useEffect(() => {
    window.addEventListener('pagehide', write);
    return () => {
      window.removeEventListener('pagehide', write);
      write();
    };
  }, [write]);

  const set = useCallback((next: T) => {
    pending.current = { value: next };
    setValue(next);
  }, []);

  const clear = useCallback(
    (next: T) => {
      pending.current = null;
      localStorage.removeItem(PREFIX + key);
      setSavedAt(null);
      setRestored(false);
      setValue(next);
    },
    [key],
  );

  return { value, set, savedAt, restored, clear };
}
