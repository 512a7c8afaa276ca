import type { Field } from '@furrowlight/shared/contract/fields';
import { useMemo } from 'react';
import { CircleMarker, Polygon, Polyline, Tooltip, useMapEvents } from 'react-leaflet';
import { withUnit } from '../../../lib/format';
import { BaseMap } from '../../../map/base-map';
import { boxOf, fromLatLng, ringsOf, toPair } from '../../../map/lat-lng';
import { usePalette } from '../../../map/use-palette';
import { BoundaryLayer } from '../boundary/boundary-layer';
import type { BoundaryEditor } from '../boundary/use-boundary-editor';
import { FieldsLayer } from '../fields-layer';
import { OCCLUDER_KINDS } from './occluder-kinds';
import classes from './overview.module.css';
import type { OccluderDrawing } from './use-occluder-drawing';

interface Props {
  field: Field;
  /** Fields around it, for orientation and snapping. */
  around: readonly Field[];
  /** Set while the boundary is being changed. */
  editor: BoundaryEditor | null;
  drawing: OccluderDrawing;
}

/** The field on its ground, with what stands around it. */
export function OverviewMap({ field, around, editor, drawing }: Props) {
  const palette = usePalette();
  const bounds = useMemo(() => {
    const corners = field.boundary?.coordinates[0];
    const tall = field.occluders.flatMap(({ line }) => line);
    return corners ? (boxOf([...corners, ...tall]) ?? undefined) : undefined;
  }, [field.boundary, field.occluders]);
  const snapTo = useMemo(
    () => around.flatMap(({ boundary }) => boundary?.coordinates.flat() ?? []),
    [around],
  );
  return (
    <BaseMap
      label={`Map of ${field.name}`}
      bounds={bounds}
      center={bounds ? undefined : toPair(field.pin)}
      className={classes.map}
    >
      <FieldsLayer key="around" fields={around} selectedId={null} faint />
      {field.boundary && !editor && (
        <Polygon
          positions={ringsOf(field.boundary)}
          interactive={false}
          pathOptions={{
            color: palette.ink,
            weight: 2.5,
            fillColor: palette.leaf,
            fillOpacity: 0.22,
          }}
        />
      )}
      {!field.boundary && !editor && (
        <CircleMarker
          center={toPair(field.pin)}
          radius={9}
          interactive={false}
          pathOptions={{ color: palette.ink, fillColor: palette.straw, fillOpacity: 0.9 }}
        />
      )}
      {field.occluders.map((occluder, i) => (
        <Polyline
          key={i}
          positions={occluder.line.map(toPair)}
          pathOptions={{ color: palette.soil, weight: 6, opacity: 0.85 }}
        >
          <Tooltip sticky>
            {OCCLUDER_KINDS[occluder.kind]}, {withUnit(occluder.heightM, 'm', 1)} high
          </Tooltip>
        </Polyline>
      ))}
      {editor && <BoundaryLayer editor={editor} taps snapTo={snapTo} />}
      {drawing.line && <OccluderTaps drawing={drawing} />}
    </BaseMap>
  );
}

function OccluderTaps({ drawing }: { drawing: OccluderDrawing }) {
  const palette = usePalette();
  useMapEvents({ click: ({ latlng }) => drawing.add(fromLatLng(latlng)) });
  const line = drawing.line ?? [];
  return (
    <>
      <Polyline
        positions={line.map(toPair)}
        interactive={false}
        pathOptions={{ color: palette.soil, weight: 6, dashArray: '8 8' }}
      />
      {line.map((at, i) => (
        <CircleMarker
          key={i}
          center={toPair(at)}
          radius={6}
          interactive={false}
          pathOptions={{ color: palette.ink, fillColor: palette.sheet, fillOpacity: 1, weight: 2 }}
        />
      ))}
    </>
  );
}
