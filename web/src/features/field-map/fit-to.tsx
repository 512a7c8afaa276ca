import { useEffect } from 'react';
import { useMap } from 'react-leaflet';
import type { LatLngPair } from '../../map/lat-lng';

/** Shows a box whenever it becomes another one. */
export function FitTo({ box }: { box: [LatLngPair, LatLngPair] | null }) {
  const map = useMap();
  const key = box?.flat().join(',');
  useEffect(() => {
    if (!key) return;
    const [south, west, north, east] = key.split(',').map(Number);
    map.fitBounds(
      [
        [south, west],
        [north, east],
      ],
      { padding: [48, 48], maxZoom: 17, animate: false },
    );
  }, [map, key]);
  return null;
}
