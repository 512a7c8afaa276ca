import { SegmentedControl } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import L from 'leaflet';
import { useEffect, useRef, useState } from 'react';
import { TileLayer } from 'react-leaflet';
import { configQuery } from '../queries/config';
import { Attribution } from './attribution';
import classes from './base-map.module.css';

const TRIES = 4;

/**
 * The configured background maps.
 *
 * @param onMissing told whether the ground is bare, so that the metre grid can stand in
 */
export function Tiles({ onMissing }: { onMissing: (missing: boolean) => void }) {
  const config = useQuery(configQuery);
  const layers = config.data?.tileLayers ?? [];
  const [chosen, setChosen] = useState<string | null>(null);
  const [silent, setSilent] = useState(false);
  const tally = useRef({ loaded: 0, failed: 0 });
  const box = useRef<HTMLDivElement>(null);
  const layer = layers.find(({ name }) => name === chosen) ?? layers[0];
  const missing = !layer || silent;

  useEffect(() => onMissing(missing), [missing, onMissing]);
  useEffect(() => {
    if (box.current) L.DomEvent.disableClickPropagation(box.current);
  }, []);

  const choose = (name: string) => {
    tally.current = { loaded: 0, failed: 0 };
    setSilent(false);
    setChosen(name);
  };

  return (
    <>
      {layer && (
        <TileLayer
          key={layer.name}
          url={layer.url}
          maxNativeZoom={layer.maxZoom}
          maxZoom={21}
          className={classes.tiles}
          eventHandlers={{
            tileload: () => {
              tally.current.loaded += 1;
              setSilent(false);
            },
            tileerror: () => {
              tally.current.failed += 1;
              if (tally.current.loaded === 0 && tally.current.failed >= TRIES) setSilent(true);
            },
          }}
        />
      )}
      <div ref={box} className={classes.ground}>
        {layers.length > 1 && (
          <SegmentedControl
            size="xs"
            aria-label="Background map"
            value={layer?.name}
            onChange={choose}
            data={layers.map(({ name }) => name)}
          />
        )}
      </div>
      <div className={classes.attribution}>
        {silent && (
          <span role="status">{layer?.name} does not answer; a metre grid stands in. </span>
        )}
        {layer && !silent && <Attribution html={layer.attribution} />}
      </div>
    </>
  );
}
