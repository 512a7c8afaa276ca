import type { LonLat } from '@furrowlight/shared/contract/fields';
import L from 'leaflet';
import { useEffect, useMemo, useState } from 'react';
import { CircleMarker, Polygon, Polyline, useMap, useMapEvents } from 'react-leaflet';
import { toPair } from '../../../map/lat-lng';
import { usePalette } from '../../../map/use-palette';
import classes from './boundary-layer.module.css';
import { CornerHandles } from './corner-handles';
import { crossingOf } from './measure';
import { addCorner, openRing } from './shape';
import { snapped } from './snap';
import type { BoundaryEditor } from './use-boundary-editor';

interface Props {
  editor: BoundaryEditor;
  /** Taps on the ground may add corners. */
  taps: boolean;
  /** Corners of neighbouring fields that a new corner joins when it comes close. */
  snapTo: readonly LonLat[];
}

const CLOSE_PX = 16;

/** The boundary under work: its lines, its handles and the taps that make it. */
export function BoundaryLayer({ editor, taps, snapTo }: Props) {
  const palette = usePalette();
  const { shown } = editor;
  const closed = shown.rings.filter((ring) => ring.closed);
  const open = shown.rings.find((ring) => !ring.closed);
  const crossing = crossingOf(shown);
  return (
    <>
      {closed.length > 0 && (
        <Polygon
          positions={closed.map((ring) => ring.corners.map(toPair))}
          interactive={false}
          pathOptions={{
            color: palette.ink,
            weight: 2.5,
            fillColor: palette.straw,
            fillOpacity: 0.35,
          }}
        />
      )}
      {open && open.corners.length > 1 && (
        <Polyline
          positions={open.corners.map(toPair)}
          interactive={false}
          pathOptions={{ color: palette.ink, weight: 2.5 }}
        />
      )}
      {crossing && (
        <CircleMarker
          center={toPair(crossing)}
          radius={12}
          interactive={false}
          pathOptions={{ color: palette.danger, weight: 4, fill: false }}
        />
      )}
      {taps && editor.drawing && <DrawTaps editor={editor} snapTo={snapTo} />}
      <CornerHandles editor={editor} snapTo={snapTo} />
    </>
  );
}

/** Adds a corner per tap, draws the next side to the pointer and closes on the first corner. */
function DrawTaps({ editor, snapTo }: Omit<Props, 'taps'>) {
  const map = useMap();
  const palette = usePalette();
  const [pointer, setPointer] = useState<L.LatLng | null>(null);
  const index = openRing(editor.shape);
  const corners = useMemo(
    () => (index >= 0 ? editor.shape.rings[index].corners : []),
    [editor.shape, index],
  );

  useEffect(() => {
    const box = map.getContainer();
    map.doubleClickZoom.disable();
    box.style.cursor = 'crosshair';
    return () => {
      map.doubleClickZoom.enable();
      box.style.cursor = '';
    };
  }, [map]);

  useMapEvents({
    mousemove: ({ latlng }) => setPointer(latlng),
    mouseout: () => setPointer(null),
    click: ({ latlng, containerPoint }) => {
      const first = corners.length >= 3 && map.latLngToContainerPoint(toPair(corners[0]));
      if (first && first.distanceTo(containerPoint) <= CLOSE_PX) {
        editor.finish();
      } else editor.edit(addCorner(editor.shape, snapped(map, latlng, snapTo)));
    },
  });

  const last = corners.at(-1);
  if (!last) return <CloserHint />;
  if (!pointer) return null;
  const lead = [toPair(last), [pointer.lat, pointer.lng] as [number, number]];
  return (
    <Polyline
      positions={corners.length >= 2 ? [...lead, toPair(corners[0])] : lead}
      interactive={false}
      pathOptions={{ color: palette.ink, weight: 1.5, dashArray: '5 6' }}
    />
  );
}

/** Below this zoom a finger's width is wider than most fields. */
const DRAW_ZOOM = 13.5;

function CloserHint() {
  const map = useMap();
  const [far, setFar] = useState(() => map.getZoom() < DRAW_ZOOM);
  useMapEvents({ zoomend: () => setFar(map.getZoom() < DRAW_ZOOM) });
  if (!far) return null;
  return (
    <div className={classes.closer} role="status">
      Go closer first: single fields must be in sight.
    </div>
  );
}
