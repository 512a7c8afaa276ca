import { Button } from '@mantine/core';
import {
  IconArrowBackUp,
  IconArrowForwardUp,
  IconCheck,
  IconCut,
  IconPointOff,
  IconTrash,
} from '@tabler/icons-react';
import classes from './boundary-panel.module.css';
import { dropLastCorner, EMPTY, isComplete, openRing, removeRing } from './shape';
import type { BoundaryEditor } from './use-boundary-editor';

/** Finish, take back, start over: everything drawing needs, as buttons a thumb can hit. */
export function DrawTools({ editor }: { editor: BoundaryEditor }) {
  const { shape, cutting } = editor;
  const index = openRing(shape);
  const open = index >= 0 ? shape.rings[index] : null;
  const complete = isComplete(shape);
  return (
    <>
      <p className={classes.hint} role="status">
        {hintFor(shape.rings.length, open?.corners.length ?? 0, complete, cutting)}
      </p>
      <div className={classes.tools}>
        {open && (
          <>
            <Button
              leftSection={<IconCheck size={16} />}
              disabled={open.corners.length < 3}
              onClick={editor.finish}
            >
              Finish
            </Button>
            <Button
              variant="default"
              leftSection={<IconPointOff size={16} stroke={1.6} />}
              onClick={() => editor.edit(dropLastCorner(shape))}
            >
              Undo point
            </Button>
          </>
        )}
        {complete && (
          <Button
            variant="default"
            leftSection={<IconCut size={16} stroke={1.6} />}
            onClick={() => editor.cut(!cutting)}
            aria-pressed={cutting}
          >
            {cutting ? 'No cut-out' : 'Cut out a part'}
          </Button>
        )}
        <Button
          variant="default"
          aria-label="Undo"
          disabled={!editor.canUndo}
          onClick={editor.undo}
          px="xs"
        >
          <IconArrowBackUp size={18} stroke={1.6} />
        </Button>
        <Button
          variant="default"
          aria-label="Redo"
          disabled={!editor.canRedo}
          onClick={editor.redo}
          px="xs"
        >
          <IconArrowForwardUp size={18} stroke={1.6} />
        </Button>
        {shape.rings.length > 0 && (
          <Button
            variant="subtle"
            leftSection={<IconTrash size={16} stroke={1.6} />}
            onClick={() =>
              editor.edit(
                shape.rings.length > 1 ? removeRing(shape, shape.rings.length - 1) : EMPTY,
              )
            }
          >
            {shape.rings.length > 1 ? 'Remove cut-out' : 'Clear'}
          </Button>
        )}
      </div>
    </>
  );
}

function hintFor(rings: number, corners: number, complete: boolean, cutting: boolean): string {
  if (cutting && complete) return 'Tap the corners of the part that is not farmed.';
  if (rings === 0) return 'Tap the corners of the field on the map, one after the other.';
  if (!complete && corners < 3)
    return `${3 - corners} more ${corners === 2 ? 'corner' : 'corners'} at least.`;
  if (!complete) return 'Go on, or finish: tap the first corner again or press Finish.';
  return 'Drag a corner to move it, a small dot to add one. Select a corner and use the arrow keys for single metres.';
}
