import type { LonLat } from '@furrowlight/shared/contract/fields';
import L from 'leaflet';
import { useEffect, useMemo, useRef, useState } from 'react';
import { Marker, useMap, useMapEvents } from 'react-leaflet';
import { toPair } from '../../../map/lat-lng';
import { cornerIcon, middleIcon } from './corner-icons';
import { shifted } from './measure';
import { insertCorner, moveCorner, removeCorner, type CornerRef } from './shape';
import { snapped } from './snap';
import type { BoundaryEditor } from './use-boundary-editor';

const MOST_HANDLES = 160;
const ROOM_FOR_MIDDLE_PX = 96;

interface Props {
  editor: BoundaryEditor;
  snapTo: readonly LonLat[];
}

interface Handle extends CornerRef {
  at: LonLat;
  next: LonLat | null;
}

function handlesOf(editor: BoundaryEditor): Handle[] {
  return editor.shape.rings.flatMap(({ corners, closed }, ring) =>
    corners.map((at, corner) => ({
      ring,
      corner,
      at,
      next: closed ? corners[(corner + 1) % corners.length] : (corners[corner + 1] ?? null),
    })),
  );
}

/** Handles of 44 px on every corner in view, and between corners where there is room. */
export function CornerHandles({ editor, snapTo }: Props) {
  const map = useMap();
  const [, redraw] = useState(0);
  useMapEvents({ moveend: () => redraw((n) => n + 1), zoomend: () => redraw((n) => n + 1) });
  const view = map.getBounds().pad(0.1);
  const seen = handlesOf(editor).filter(({ at }) => view.contains(toPair(at)));
  return seen
    .slice(0, MOST_HANDLES)
    .map((handle) => (
      <HandlePair
        key={`${handle.ring}-${handle.corner}`}
        handle={handle}
        editor={editor}
        snapTo={snapTo}
      />
    ));
}

function HandlePair({ handle, editor, snapTo }: Props & { handle: Handle }) {
  const map = useMap();
  const { ring, corner, at, next } = handle;
  const roomy =
    next !== null &&
    map.latLngToContainerPoint(toPair(at)).distanceTo(map.latLngToContainerPoint(toPair(next))) >
      ROOM_FOR_MIDDLE_PX;
  return (
    <>
      <Corner handle={handle} editor={editor} snapTo={snapTo} />
      {roomy && (
        <Middle key={`middle-${ring}-${corner}`} handle={handle} editor={editor} snapTo={snapTo} />
      )}
    </>
  );
}

const STEPS: Record<string, [east: number, north: number]> = {
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
};

function Corner({ handle, editor, snapTo }: Props & { handle: Handle }) {
  const map = useMap();
  const marker = useRef<L.Marker>(null);
  const { ring, corner, at } = handle;
  const open = !editor.shape.rings[ring].closed;
  const active = editor.active?.ring === ring && editor.active.corner === corner;
  const ref = useMemo(() => ({ ring, corner }), [ring, corner]);
  // Stable while a drag previews, or React would put the marker back under the finger.
  const position = useMemo(() => toPair(at), [at]);

  useEffect(() => {
    const element = marker.current?.getElement();
    if (!element) return undefined;
    const onKey = (event: KeyboardEvent) => {
      const way = STEPS[event.key];
      const size = event.shiftKey ? 10 : event.altKey ? 0.1 : 1;
      if (way) {
        editor.edit(moveCorner(editor.shape, ref, shifted(at, way[0] * size, way[1] * size)));
      } else if (event.key === 'Delete' || event.key === 'Backspace') {
        editor.edit(removeCorner(editor.shape, ref));
      } else return;
      event.preventDefault();
      event.stopPropagation();
    };
    const onFocus = () => editor.activate(ref);
    element.addEventListener('keydown', onKey);
    element.addEventListener('focus', onFocus);
    return () => {
      element.removeEventListener('keydown', onKey);
      element.removeEventListener('focus', onFocus);
    };
  }, [editor, ref, at]);

  // A new icon would replace the element and end a drag under way; an attribute does not.
  useEffect(() => {
    const state = active ? 'active' : open && corner === 0 ? 'first' : 'plain';
    marker.current?.getElement()?.setAttribute('data-state', state);
  }, [active, open, corner]);

  const moved = () => {
    const to = snapped(map, (marker.current as L.Marker).getLatLng(), snapTo);
    return moveCorner(editor.shape, ref, to);
  };
  return (
    <Marker
      ref={marker}
      position={position}
      icon={cornerIcon}
      draggable
      autoPanOnFocus={false}
      zIndexOffset={active ? 1000 : 500}
      alt={`Corner ${corner + 1}${ring > 0 ? ` of cut-out ${ring}` : ''}`}
      title={`Corner ${corner + 1}: drag, or arrow keys to nudge by 1 m`}
      eventHandlers={{
        drag: () => editor.preview(moved()),
        dragend: () => editor.edit(moved()),
        click: () => {
          if (open && corner === 0) editor.finish();
          else editor.activate(ref);
        },
      }}
    />
  );
}

function Middle({ handle, editor, snapTo }: Props & { handle: Handle }) {
  const map = useMap();
  const marker = useRef<L.Marker>(null);
  const { ring, corner, at, next } = handle;
  const between = useMemo<LonLat>(
    () => (next ? [(at[0] + next[0]) / 2, (at[1] + next[1]) / 2] : at),
    [at, next],
  );
  const position = useMemo(() => toPair(between), [between]);
  const inserted = () => {
    const to = snapped(map, (marker.current as L.Marker).getLatLng(), snapTo);
    return insertCorner(editor.shape, { ring, corner }, to);
  };
  return (
    <Marker
      ref={marker}
      position={position}
      icon={middleIcon}
      draggable
      keyboard={false}
      alt=""
      title="Drag to add a corner here"
      eventHandlers={{
        drag: () => editor.preview(inserted()),
        dragend: () => editor.edit(inserted()),
        click: () => editor.edit(insertCorner(editor.shape, { ring, corner }, between)),
      }}
    />
  );
}
