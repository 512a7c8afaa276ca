import { useHotkeys } from '@mantine/hooks';
import { useCallback, useMemo, useState } from 'react';
import { useBasedDraft, type Base } from '../../../lib/use-based-draft';
import { redo, startHistory, step, undo, type History } from './history';
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
  /** The saved shape this work was begun from, and its row's version. */
  base: Base<Shape>;
  /** Forget all steps and the draft on this device, and go back to the saved shape. */
  restart: () => void;
}

/**
 * A boundary with its steps back and forth, kept as a draft on this device.
 *
 * @param key names the draft, e.g. `boundary:new`
 * @param saved the shape as the server has it; a stable object while it does not change
 * @param version version of its row
 */
export function useBoundaryEditor(key: string, saved: Shape, version: number): BoundaryEditor {
  const { value, base, set, clear, savedAt, restored } = useBasedDraft(key, saved, version);
  const [steps, setSteps] = useState<History<Shape> | null>(null);
  const history = useMemo(() => steps ?? startHistory(value), [steps, value]);
  const [preview, setPreview] = useState<Shape | null>(null);
  const [active, activate] = useState<CornerRef | null>(null);
  const [cutting, cut] = useState(false);

  const move = useCallback(
    (next: typeof history) => {
      if (next === history) return;
      setSteps(next);
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
      base,
      restart: () => {
        setSteps(null);
        setPreview(null);
        activate(null);
        cut(false);
        clear();
      },
    }),
    [history, preview, active, cutting, savedAt, restored, base, move, back, forth, clear],
  );
}
