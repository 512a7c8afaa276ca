import { useHotkeys } from '@mantine/hooks';
import { useCallback, useMemo, useState } from 'react';
import { useDraft } from '../../../lib/use-draft';
import { redo, startHistory, step, undo } from './history';
import type { CornerRef, Shape } from './shape';

export interface BoundaryEditor {
  /** The shape of the last finished step. */
  shape: Shape;
  /** What is to be drawn: the shape, or what a handle under the finger makes of it. */
  shown: Shape;
  active: CornerRef | null;
  canUndo: boolean;
  canRedo: boolean;
  draft: { savedAt: Date | null; restored: boolean };
  edit: (next: Shape) => void;
  preview: (shape: Shape | null) => void;
  activate: (corner: CornerRef | null) => void;
  undo: () => void;
  redo: () => void;
  /** Forget all steps and the draft on this device. */
  restart: (from: Shape) => void;
}

/**
 * A boundary with its steps back and forth, kept as a draft on this device.
 *
 * @param key names the draft, e.g. `boundary:new`
 */
export function useBoundaryEditor(key: string, initial: Shape): BoundaryEditor {
  const { value, set, clear, savedAt, restored } = useDraft(key, initial);
  const [history, setHistory] = useState(() => startHistory(value));
  const [preview, setPreview] = useState<Shape | null>(null);
  const [active, activate] = useState<CornerRef | null>(null);

  const move = useCallback(
    (next: typeof history) => {
      if (next === history) return;
      setHistory(next);
      setPreview(null);
      set(next.present);
    },
    [history, set],
  );
  const back = useCallback(() => move(undo(history)), [history, move]);
  const forth = useCallback(() => move(redo(history)), [history, move]);
  useHotkeys([
    ['mod+Z', back],
    ['mod+shift+Z', forth],
    ['mod+Y', forth],
  ]);

  return useMemo(
    () => ({
      shape: history.present,
      shown: preview ?? history.present,
      active,
      canUndo: history.past.length > 0,
      canRedo: history.future.length > 0,
      draft: { savedAt, restored },
      edit: (next) => move(step(history, next)),
      preview: setPreview,
      activate,
      undo: back,
      redo: forth,
      restart: (from) => {
        setHistory(startHistory(from));
        setPreview(null);
        activate(null);
        clear(from);
      },
    }),
    [history, preview, active, savedAt, restored, move, back, forth, clear],
  );
}
