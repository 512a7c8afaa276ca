import { ActionIcon, Tooltip } from '@mantine/core';
import { IconFocus2, IconMinus, IconPlus } from '@tabler/icons-react';
import L, { type LatLngBoundsExpression } from 'leaflet';
import { useEffect, useRef, useState } from 'react';
import { useMap, useMapEvents } from 'react-leaflet';
import classes from './base-map.module.css';
import { gridStep } from './grid-lines';

/** Metres of a round number that fit in about 96 px at the map's middle, and their width. */
function scaleBar(map: L.Map): { metres: number; width: number; square: number } {
  const y = map.getSize().y / 2;
  const across = map.distance(
    map.containerPointToLatLng([0, y]),
    map.containerPointToLatLng([96, y]),
  );
  if (!(across > 0)) return { metres: 0, width: 0, square: 0 };
  const power = 10 ** Math.floor(Math.log10(across));
  const metres = [5, 2, 1].map((n) => n * power).find((n) => n <= across) ?? power;
  return { metres, width: (96 * metres) / across, square: gridStep(across / 96) };
}

const inWords = (metres: number) => (metres >= 1000 ? `${metres / 1000} km` : `${metres} m`);

/** Zoom, back to all, and a scale bar; large enough for thumbs. */
export function MapButtons({ home, grid }: { home?: LatLngBoundsExpression; grid: boolean }) {
  const map = useMap();
  const box = useRef<HTMLDivElement>(null);
  const [scale, setScale] = useState(() => scaleBar(map));
  useMapEvents({
    moveend: () => setScale(scaleBar(map)),
    zoomend: () => setScale(scaleBar(map)),
    resize: () => setScale(scaleBar(map)),
  });
  useEffect(() => {
    if (box.current) {
      L.DomEvent.disableClickPropagation(box.current);
      L.DomEvent.disableScrollPropagation(box.current);
    }
  }, []);
  const button = (label: string, icon: React.ReactNode, onClick: () => void) => (
    <Tooltip label={label} position="left">
      <ActionIcon
        variant="default"
        size={40}
        aria-label={label}
        onClick={onClick}
        className={classes.button}
      >
        {icon}
      </ActionIcon>
    </Tooltip>
  );
  return (
    <>
      <div ref={box} className={classes.buttons}>
        {button('Closer', <IconPlus size={18} stroke={1.7} />, () => map.zoomIn(1))}
        {button('Farther', <IconMinus size={18} stroke={1.7} />, () => map.zoomOut(1))}
        {home &&
          button('Show all', <IconFocus2 size={18} stroke={1.7} />, () =>
            map.fitBounds(L.latLngBounds(home as L.LatLngBoundsLiteral), {
              padding: [32, 32],
              maxZoom: 17,
            }),
          )}
      </div>
      <div className={classes.scale} aria-hidden>
        <span style={{ width: scale.width }} />
        {inWords(scale.metres)}
        {grid && <small>one square {inWords(scale.square)}</small>}
      </div>
    </>
  );
}
