/** Steps that can be taken back and forth again. */
export interface History<T> {
  past: readonly T[];
  present: T;
  future: readonly T[];
}

export const STEPS = 100;

export function startHistory<T>(present: T): History<T> {
  return { past: [], present, future: [] };
}

/** A new step; what had been undone before is forgotten. An unchanged value is no step. */
export function step<T>(history: History<T>, next: T): History<T> {
  if (next === history.present) return history;
  return { past: [...history.past, history.present].slice(-STEPS), present: next, future: [] };
}

export function undo<T>(history: History<T>): History<T> {
  const before = history.past.at(-1);
  if (before === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: before,
    future: [history.present, ...history.future],
  };
}

export function redo<T>(history: History<T>): History<T> {
  const [after, ...rest] = history.future;
  if (after === undefined) return history;
  return { past: [...history.past, history.present], present: after, future: rest };
}
