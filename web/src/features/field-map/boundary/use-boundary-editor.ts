import { useHotkeys } from '@mantine/hooks';
import { useCallback, useMemo, useState } from 'react';
import { useDraft } from '../../../lib/use-draft';
import { redo, startHistory, step, undo } from './history';
import { closeRing, openRing, type CornerRef, type Shape } from './shape';

export interface BoundaryEditor {
  /** The shape of the last finished step. */
  shape: Shape;
  /** What is to be drawn: the shape, or what a handle under the finger makes of it. */
  shown: Shape;
  active: CornerRef | null;
  canUndo: boolean;
  canRedo: boolean;
  draft: { savedAt: Date | null; restored: boolean };
  /** A tap on the map adds a corner: while nothing is finished, or for a cut-out. */
  drawing: boolean;
  /** A cut-out is asked for. */
  cutting: boolean;
  cut: (cutting: boolean) => void;
  edit: (next: Shape) => void;
  /** Close the ring being drawn. */
  finish: () => void;
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
  const [cutting, cut] = useState(false);

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
      drawing: history.present.rings.length === 0 || openRing(history.present) >= 0 || cutting,
      cutting,
      cut,
      canUndo: history.past.length > 0,
      canRedo: history.future.length > 0,
      draft: { savedAt, restored },
      edit: (next) => move(step(history, next)),
      finish: () => {
        move(step(history, closeRing(history.present)));
        cut(false);
      },
      preview: setPreview,
      activate,
      undo: back,
      redo: forth,
      restart: (from) => {
        setHistory(startHistory(from));
        setPreview(null);
        activate(null);
        cut(false);
        clear(from);
      },
    }),
    [history, preview, active, cutting, savedAt, restored, move, back, forth, clear],
  );
}
