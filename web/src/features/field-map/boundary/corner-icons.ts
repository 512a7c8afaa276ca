import L from 'leaflet';
import classes from './boundary-layer.module.css';

const SIZE = 44;

function handle(name: string): L.DivIcon {
  return L.divIcon({
    className: `${classes.handle} ${name}`,
    html: '<span></span>',
    iconSize: [SIZE, SIZE],
    iconAnchor: [SIZE / 2, SIZE / 2],
  });
}

export const cornerIcon = handle(classes.corner);
export const middleIcon = handle(classes.middle);
export const pinIcon = handle(classes.pin);
