import 'leaflet/dist/leaflet.css';
import type { LatLngBoundsExpression, LatLngExpression } from 'leaflet';
import { useState, type ReactNode } from 'react';
import { MapContainer } from 'react-leaflet';
import classes from './base-map.module.css';
import { MapButtons } from './map-buttons';
import { MapSize } from './map-size';
import { MetreGrid } from './metre-grid';
import { Tiles } from './tiles';

interface Props {
  /** Spoken name of the map. */
  label: string;
  bounds?: LatLngBoundsExpression;
  center?: LatLngExpression;
  zoom?: number;
  children?: ReactNode;
  className?: string;
}

const MIDDLE_OF_EUROPE: LatLngExpression = [50.2, 11];

/** A map with the configured tiles, and a metre grid wherever they are missing. */
export function BaseMap({ label, bounds, center, zoom, children, className }: Props) {
  const [grid, setGrid] = useState(true);
  const view = bounds
    ? { bounds, boundsOptions: { padding: [32, 32] as [number, number], maxZoom: 17 } }
    : { center: center ?? MIDDLE_OF_EUROPE, zoom: zoom ?? (center ? 16 : 5) };
  return (
    <div className={`${classes.frame} ${className ?? ''}`} role="region" aria-label={label}>
      <MapContainer
        {...view}
        className={classes.map}
        zoomControl={false}
        attributionControl={false}
        preferCanvas
        maxZoom={21}
        zoomSnap={0.5}
        wheelPxPerZoomLevel={120}
      >
        <Tiles onMissing={setGrid} />
        {grid && <MetreGrid />}
        <MapSize />
        <MapButtons home={bounds} grid={grid} />
        {children}
      </MapContainer>
    </div>
  );
}
