import type { Field } from '@furrowlight/shared/contract/fields';
import { Button, Group, SegmentedControl } from '@mantine/core';
import { notifications } from '@mantine/notifications';
import { useState } from 'react';
import { DraftNote } from '../../../components/draft-note';
import { middleOf } from '../add/middle-of';
import { CornerTable } from '../boundary/corner-table';
import { DrawTools } from '../boundary/draw-tools';
import { NextSide } from '../boundary/next-side';
import { ShapeFigures } from '../boundary/shape-figures';
import { boundaryOf } from '../boundary/shape';
import type { BoundaryEditor } from '../boundary/use-boundary-editor';
import classes from './overview.module.css';
import { SaveAnswers } from './save-answers';
import { useFieldSave } from './use-field-save';

interface Props {
  field: Field;
  editor: BoundaryEditor;
  onDone: () => void;
}

/** Tools beside the map while the boundary is drawn or changed. */
export function BoundaryEdit({ field, editor, onDone }: Props) {
  const [view, setView] = useState('hand');
  const write = useFieldSave(field);
  const boundary = boundaryOf(editor.shape);
  const saved = () => {
    editor.restart();
    notifications.show({ message: `The boundary of ${field.name} is saved.` });
    onDone();
  };
  const save = async () => {
    if (!boundary) return;
    const { value, version } = editor.base;
    const base = { value: { boundary: boundaryOf(value), pin: field.pin }, version };
    if (await write.save({ boundary, pin: middleOf(boundary) }, base)) saved();
  };
  return (
    <div className={classes.editor}>
      <SegmentedControl
        fullWidth
        aria-label="How the boundary is changed"
        value={view}
        onChange={setView}
        data={[
          { value: 'hand', label: 'By hand' },
          { value: 'numbers', label: 'As numbers' },
        ]}
      />
      <DrawTools editor={editor} />
      <ShapeFigures shape={editor.shown} />
      <NextSide editor={editor} />
      {view === 'numbers' &&
        editor.shape.rings.map((_, ring) => <CornerTable key={ring} editor={editor} ring={ring} />)}
      {Object.values(write.messages).map((message) => (
        <p key={message} role="alert" className={classes.refusal}>
          {message}
        </p>
      ))}
      <SaveAnswers write={write} onTheirs={editor.restart} onSaved={saved} />
      <Group gap="xs">
        <Button disabled={!boundary} loading={write.saving} onClick={() => void save()}>
          Save the boundary
        </Button>
        <Button
          variant="subtle"
          onClick={() => {
            editor.restart();
            onDone();
          }}
        >
          Cancel
        </Button>
      </Group>
      <DraftNote {...editor.draft} onDrop={editor.restart} />
      <p className={classes.hint}>
        A scenario with a result keeps the boundary it was worked out with.
      </p>
    </div>
  );
}
