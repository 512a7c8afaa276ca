import type { Field } from '@furrowlight/shared/contract/fields';
import type { LaidRows } from '@furrowlight/shared/layout/rows-over-field';
import { useMemo } from 'react';
import { Polygon, Polyline } from 'react-leaflet';
import { BaseMap } from '../../map/base-map';
import { boxOf, ringsOf, toPair, type LatLngPair } from '../../map/lat-lng';
import { usePalette } from '../../map/use-palette';
import classes from './designer.module.css';

interface Props {
  field: Field;
  laid: LaidRows | null;
  /** Rows as they were saved, shown faintly while others are tried; null when nothing changed. */
  saved: LaidRows | null;
}

const outlinesOf = (laid: LaidRows | null) =>
  (laid?.outlines ?? []).map((ring) => [ring.map(([lon, lat]): LatLngPair => [lat, lon])]);

/** The rows as they lie over the boundary, redrawn as they change. */
export function RowsMap({ field, laid, saved }: Props) {
  const palette = usePalette();
  const bounds = useMemo(
    () => (field.boundary ? (boxOf(field.boundary.coordinates[0]) ?? undefined) : undefined),
    [field.boundary],
  );
  const rings = useMemo(() => (field.boundary ? ringsOf(field.boundary) : []), [field.boundary]);
  const outlines = useMemo(() => outlinesOf(laid), [laid]);
  const ghost = useMemo(() => outlinesOf(saved), [saved]);
  return (
    <BaseMap
      label={`Rows on ${field.name}`}
      bounds={bounds}
      center={bounds ? undefined : toPair(field.pin)}
      className={classes.map}
    >
      {rings.length > 0 && (
        <Polygon
          positions={rings}
          interactive={false}
          pathOptions={{
            color: palette.ink,
            weight: 2,
            fillColor: palette.leaf,
            fillOpacity: 0.18,
          }}
        />
      )}
      {field.occluders.map((occluder, i) => (
        <Polyline
          key={i}
          positions={occluder.line.map(toPair)}
          interactive={false}
          pathOptions={{ color: palette.soil, weight: 5, opacity: 0.8 }}
        />
      ))}
      <Polygon
        positions={ghost}
        interactive={false}
        pathOptions={{ color: palette.soil, weight: 1.2, dashArray: '3 3', fill: false }}
      />
      <Polygon
        positions={outlines}
        interactive={false}
        pathOptions={{
          color: palette.dusk,
          weight: 1.2,
          fillColor: palette.dusk,
          fillOpacity: 0.85,
        }}
      />
    </BaseMap>
  );
}
