import type { Field } from '@furrowlight/shared/contract/fields';
import L from 'leaflet';
import { useEffect, useMemo, useState } from 'react';
import { CircleMarker, Polygon, Tooltip, useMap, useMapEvents } from 'react-leaflet';
import { boxOf, ringsOf, toPair } from '../../map/lat-lng';
import { usePalette } from '../../map/use-palette';
import classes from './fields-layer.module.css';

interface Props {
  fields: readonly Field[];
  selectedId: string | null;
  onSelect?: (id: string) => void;
  /** Drawn faintly, as surroundings of something that is being edited. */
  faint?: boolean;
}

const LABEL_ZOOM = 14.5;
const MOST_LABELS = 80;
/** Below this zoom a field is a dot: its outline would be a few pixels. */
const OUTLINE_ZOOM = 13;

/** Ids of the fields whose names fit on the map as it is, and whether outlines can be seen. */
function useDetail(fields: readonly Field[]): { labelled: ReadonlySet<string>; outlines: boolean } {
  const map = useMap();
  const find = () => {
    const outlines = map.getZoom() >= OUTLINE_ZOOM;
    if (map.getZoom() < LABEL_ZOOM) return { labelled: new Set<string>(), outlines };
    const view = map.getBounds();
    const seen = fields.filter((field) => view.contains(toPair(field.pin)));
    return { labelled: new Set(seen.slice(0, MOST_LABELS).map((field) => field.id)), outlines };
  };
  const [detail, setDetail] = useState(find);
  useMapEvents({ moveend: () => setDetail(find()), zoomend: () => setDetail(find()) });
  return detail;
}

export function FieldsLayer({ fields, selectedId, onSelect, faint }: Props) {
  const palette = usePalette();
  const { labelled, outlines } = useDetail(fields);
  return fields.map((field) => {
    const selected = field.id === selectedId;
    const style: L.PathOptions = {
      color: selected ? palette.ink : palette.leaf,
      weight: selected ? 3 : 1.5,
      fillColor: selected ? palette.straw : palette.leaf,
      fillOpacity: faint ? 0.06 : selected ? 0.55 : 0.18,
      opacity: faint ? 0.5 : 1,

      interactive: Boolean(onSelect),
    };
    const events = onSelect ? { click: () => onSelect(field.id) } : {};
    const label = (
      <Tooltip
        key={labelled.has(field.id) ? 'stay' : 'hover'}
        permanent={labelled.has(field.id)}
        direction="center"
        className={classes.label}
        interactive={false}
      >
        {field.name}
      </Tooltip>
    );
    return field.boundary && outlines ? (
      <Polygon
        key={field.id}
        positions={ringsOf(field.boundary)}
        pathOptions={style}
        eventHandlers={events}
      >
        {label}
      </Polygon>
    ) : (
      <CircleMarker
        key={`${field.id}-dot`}
        center={toPair(field.pin)}
        radius={selected ? 9 : 6}
        pathOptions={{ ...style, dashArray: field.boundary ? undefined : '3 3' }}
        eventHandlers={events}
      >
        {label}
      </CircleMarker>
    );
  });
}

/** Brings the chosen field into view, gently, when it is not already well in it. */
export function FlyToSelected({ field }: { field: Field | undefined }) {
  const map = useMap();
  const box = useMemo(
    () => field && boxOf(field.boundary ? field.boundary.coordinates[0] : [field.pin]),
    [field],
  );
  useEffect(() => {
    if (!box) return;
    const target = L.latLngBounds(box);
    if (map.getBounds().contains(target) && map.getZoom() >= 14) return;
    const calm = window.matchMedia('(prefers-reduced-motion: reduce)').matches;
    map.flyToBounds(target, { maxZoom: 16, padding: [80, 80], animate: !calm, duration: 0.6 });
  }, [map, box]);
  return null;
}
