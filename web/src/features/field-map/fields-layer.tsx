import type { Field } from '@furrowlight/shared/contract/fields';
import L from 'leaflet';
import { memo, useCallback, useEffect, useMemo, useRef, useState } from 'react';
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

export function FieldsLayer({ fields, selectedId, onSelect, faint = false }: Props) {
  const { labelled, outlines } = useDetail(fields);
  const latest = useRef(onSelect);
  useEffect(() => {
    latest.current = onSelect;
  });
  const select = useCallback((id: string) => latest.current?.(id), []);
  return fields.map((field) => (
    <FieldShape
      key={`${field.id}-${field.boundary && outlines ? 'outline' : 'dot'}`}
      field={field}
      selected={field.id === selectedId}
      labelled={labelled.has(field.id)}
      outline={outlines}
      faint={faint}
      onSelect={onSelect ? select : undefined}
    />
  ));
}

interface ShapeProps {
  field: Field;
  selected: boolean;
  labelled: boolean;
  outline: boolean;
  faint: boolean;
  onSelect?: (id: string) => void;
}

/** One field; drawn anew only when something about it changes, so that hundreds stay fluid. */
const FieldShape = memo(function FieldShape(props: ShapeProps) {
  const { field, selected, labelled, outline, faint, onSelect } = props;
  const palette = usePalette();
  const pathOptions: L.PathOptions = {
    color: selected ? palette.ink : palette.leaf,
    weight: selected ? 3 : 1.5,
    fillColor: selected ? palette.straw : palette.leaf,
    fillOpacity: faint ? 0.06 : selected ? 0.55 : 0.18,
    opacity: faint ? 0.5 : 1,
    interactive: Boolean(onSelect),
    dashArray: field.boundary ? undefined : '3 3',
  };
  const eventHandlers = onSelect ? { click: () => onSelect(field.id) } : {};
  const label = (
    <Tooltip
      key={labelled ? 'stay' : 'hover'}
      permanent={labelled}
      direction="center"
      className={classes.label}
      interactive={false}
    >
      {field.name}
    </Tooltip>
  );
  if (field.boundary && outline) {
    return (
      <Polygon
        positions={ringsOf(field.boundary)}
        pathOptions={pathOptions}
        eventHandlers={eventHandlers}
      >
        {label}
      </Polygon>
    );
  }
  return (
    <CircleMarker
      center={toPair(field.pin)}
      radius={selected ? 9 : 6}
      pathOptions={pathOptions}
      eventHandlers={eventHandlers}
    >
      {label}
    </CircleMarker>
  );
});

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
