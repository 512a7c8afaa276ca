import type { Field, LonLat } from '@furrowlight/shared/contract/fields';
import { useMemo } from 'react';
import { Polygon } from 'react-leaflet';
import { BaseMap } from '../../map/base-map';
import { boxOf, ringsOf } from '../../map/lat-lng';
import { usePalette } from '../../map/use-palette';
import type { AddMode } from './add/add-mode';
import { PinLayer } from './add/pin-layer';
import { BoundaryLayer } from './boundary/boundary-layer';
import type { BoundaryEditor } from './boundary/use-boundary-editor';
import { FieldsLayer, FlyToSelected } from './fields-layer';
import { FitTo } from './fit-to';
import type { ReadPolygon } from './import/parse-geojson';

interface Props {
  className: string;
  fields: readonly Field[];
  /** The farm the list is narrowed to. */
  farmId: string | null;
  selectedId: string | null;
  onSelect: (id: string) => void;
  mode: AddMode | null;
  editor: BoundaryEditor;
  pin: LonLat | null;
  onPin: (pin: LonLat) => void;
  importing: readonly ReadPolygon[];
}

/** The map beside the list: all fields, or what is being added among them. */
export function FieldsMap(props: Props) {
  const { fields, mode, editor, importing } = props;
  const palette = usePalette();
  const home = useMemo(
    () =>
      boxOf(
        fields.flatMap((field) => (field.boundary ? field.boundary.coordinates[0] : [field.pin])),
      ),
    [fields],
  );
  const farmBox = useMemo(() => {
    const own = fields.filter(({ farmId }) => farmId === props.farmId);
    return boxOf(own.flatMap(({ boundary, pin }) => boundary?.coordinates[0] ?? [pin]));
  }, [fields, props.farmId]);
  const incoming = useMemo(
    () => boxOf(importing.flatMap(({ boundary }) => boundary.coordinates[0])),
    [importing],
  );
  const snapTo = useMemo(
    () => fields.flatMap((field) => field.boundary?.coordinates.flat() ?? []),
    [fields],
  );
  return (
    <BaseMap label="Map of the fields" bounds={home ?? undefined} className={props.className}>
      <FieldsLayer
        key={mode ? 'around' : 'browse'}
        fields={fields}
        selectedId={props.selectedId}
        onSelect={mode ? undefined : props.onSelect}
        faint={mode !== null}
      />
      {!mode && <FlyToSelected field={fields.find(({ id }) => id === props.selectedId)} />}
      {(mode === 'draw' || mode === 'type') && (
        <BoundaryLayer editor={editor} taps={mode === 'draw'} snapTo={snapTo} />
      )}
      {mode === 'pin' && <PinLayer pin={props.pin} onPin={props.onPin} />}
      {mode === 'import' &&
        importing.map(({ boundary }, i) => (
          <Polygon
            key={i}
            positions={ringsOf(boundary)}
            interactive={false}
            pathOptions={{
              color: palette.ink,
              weight: 2,
              fillColor: palette.straw,
              fillOpacity: 0.5,
            }}
          />
        ))}
      {mode !== 'import' && !props.selectedId && <FitTo box={farmBox} />}
      {mode === 'import' && <FitTo box={incoming} />}
    </BaseMap>
  );
}
