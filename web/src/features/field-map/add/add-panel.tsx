import type { Field, LonLat } from '@furrowlight/shared/contract/fields';
import { SegmentedControl } from '@mantine/core';
import { DraftNote } from '../../../components/draft-note';
import { DrawTools } from '../boundary/draw-tools';
import { CornerTable } from '../boundary/corner-table';
import { NextSide } from '../boundary/next-side';
import { ShapeFigures } from '../boundary/shape-figures';
import { boundaryOf, openRing } from '../boundary/shape';
import type { BoundaryEditor } from '../boundary/use-boundary-editor';
import { ImportPanel } from '../import/import-panel';
import type { ReadPolygon } from '../import/parse-geojson';
import type { AddMode } from './add-mode';
import classes from './add-panel.module.css';
import { FirstCorner } from './first-corner';
import { NewFieldForm } from './new-field-form';
import { PinForm } from './pin-form';

interface Props {
  mode: AddMode;
  onMode: (mode: AddMode) => void;
  onClose: () => void;
  editor: BoundaryEditor;
  pin: LonLat | null;
  onPin: (pin: LonLat | null) => void;
  importing: readonly ReadPolygon[];
  onImporting: (polygons: ReadPolygon[]) => void;
  fields: readonly Field[];
  farmId: string | null;
}

const WAYS: { value: AddMode; label: string }[] = [
  { value: 'draw', label: 'Draw' },
  { value: 'type', label: 'Type' },
  { value: 'pin', label: 'Pin' },
  { value: 'import', label: 'Import' },
];

/** Everything a new field needs, in the order of the hand: shape first, then its name. */
export function AddPanel(props: Props) {
  const { mode, editor, pin } = props;
  const boundary = boundaryOf(editor.shape);
  const finish = () => {
    editor.restart();
    props.onPin(null);
    props.onClose();
  };
  return (
    <div className={classes.panel}>
      <SegmentedControl
        fullWidth
        aria-label="How the field comes in"
        data={WAYS}
        value={mode}
        onChange={(value) => props.onMode(value as AddMode)}
      />
      {mode === 'draw' && <DrawTools editor={editor} />}
      {mode === 'type' &&
        (editor.shape.rings.length === 0 ? (
          <FirstCorner
            key={props.fields.length > 0 ? 'near' : 'nowhere'}
            editor={editor}
            fields={props.fields}
          />
        ) : (
          <DrawTools editor={editor} />
        ))}
      {(mode === 'draw' || mode === 'type') && editor.shown.rings.length > 0 && (
        <>
          <ShapeFigures shape={editor.shown} />
          <NextSide editor={editor} />
          {mode === 'type' &&
            editor.shape.rings.map((_, ring) => (
              <CornerTable key={ring} editor={editor} ring={ring} />
            ))}
          <DraftNote {...editor.draft} onDrop={editor.restart} />
        </>
      )}
      {mode === 'pin' && <PinForm pin={pin} onPin={props.onPin} />}
      {mode === 'import' ? (
        <ImportPanel
          polygons={props.importing}
          onPolygons={props.onImporting}
          fields={props.fields}
          farmId={props.farmId}
          onDone={finish}
        />
      ) : (
        <NewFieldForm
          boundary={mode === 'pin' ? null : boundary}
          pin={mode === 'pin' ? pin : null}
          unfinished={mode !== 'pin' && openRing(editor.shape) >= 0}
          farmId={props.farmId}
          onSaved={finish}
          onClose={props.onClose}
        />
      )}
    </div>
  );
}
