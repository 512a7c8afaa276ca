import type { LonLat } from '@furrowlight/shared/contract/fields';
import L from 'leaflet';
import { useMemo, useRef } from 'react';
import { Marker, useMapEvents } from 'react-leaflet';
import { fromLatLng, toPair } from '../../../map/lat-lng';
import { pinIcon } from '../boundary/corner-icons';

interface Props {
  pin: LonLat | null;
  onPin: (pin: LonLat) => void;
}

/** One pin, set by a tap and moved by dragging. */
export function PinLayer({ pin, onPin }: Props) {
  const marker = useRef<L.Marker>(null);
  useMapEvents({ click: ({ latlng }) => onPin(fromLatLng(latlng)) });
  const position = useMemo(() => pin && toPair(pin), [pin]);
  if (!position) return null;
  return (
    <Marker
      ref={marker}
      position={position}
      icon={pinIcon}
      draggable
      alt="Pin of the field"
      eventHandlers={{
        dragend: () => onPin(fromLatLng((marker.current as L.Marker).getLatLng())),
      }}
    />
  );
}
