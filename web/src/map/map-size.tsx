import { useEffect } from 'react';
import { useMap } from 'react-leaflet';

/** Tells Leaflet when its box changed, which it does not notice itself. */
export function MapSize() {
  const map = useMap();
  useEffect(() => {
    const observer = new ResizeObserver(() => map.invalidateSize({ animate: false }));
    observer.observe(map.getContainer());
    return () => observer.disconnect();
  }, [map]);
  return null;
}
