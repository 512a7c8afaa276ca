import L from 'leaflet';
import { useEffect } from 'react';
import { useMap } from 'react-leaflet';
import { gridLines } from './grid-lines';

/** Share of the view drawn beyond each edge, so that dragging uncovers lines and not void. */
const MARGIN = 0.4;

class GridLayer extends L.Layer {
  private canvas = document.createElement('canvas');

  override onAdd(map: L.Map): this {
    const pane = map.getPane('metre-grid') ?? map.createPane('metre-grid');
    pane.style.zIndex = '150';
    pane.style.pointerEvents = 'none';
    pane.append(this.canvas);
    this.canvas.setAttribute('aria-hidden', 'true');
    this.draw(map);
    return this;
  }

  override onRemove(): this {
    this.canvas.remove();
    return this;
  }

  override getEvents() {
    return {
      moveend: () => this.draw(this._map),
      resize: () => this.draw(this._map),
      zoomstart: () => {
        this.canvas.style.opacity = '0';
      },
    };
  }

  private draw(map: L.Map): void {
    const size = map.getSize();
    const pad = size.multiplyBy(MARGIN).round();
    const full = size.add(pad.multiplyBy(2));
    const ratio = window.devicePixelRatio || 1;
    this.canvas.width = full.x * ratio;
    this.canvas.height = full.y * ratio;
    this.canvas.style.width = `${full.x}px`;
    this.canvas.style.height = `${full.y}px`;
    this.canvas.style.opacity = '1';
    L.DomUtil.setPosition(this.canvas, map.containerPointToLayerPoint(pad.multiplyBy(-1)));
    const context = this.canvas.getContext('2d');
    if (!context || size.x === 0) return;
    context.scale(ratio, ratio);
    this.strokes(map, context, pad, full);
  }

  private strokes(
    map: L.Map,
    context: CanvasRenderingContext2D,
    pad: L.Point,
    full: L.Point,
  ): void {
    const northWest = map.containerPointToLatLng(pad.multiplyBy(-1));
    const southEast = map.containerPointToLatLng(full.subtract(pad));
    const middle = map.getSize().y / 2;
    const metresPerPixel =
      map.distance(
        map.containerPointToLatLng([0, middle]),
        map.containerPointToLatLng([100, middle]),
      ) / 100;
    if (!(metresPerPixel > 0)) return;
    const grid = gridLines(
      { west: northWest.lng, east: southEast.lng, south: southEast.lat, north: northWest.lat },
      metresPerPixel,
    );
    const style = getComputedStyle(map.getContainer());
    const soft = style.getPropertyValue('--fl-grid-soft');
    const strong = style.getPropertyValue('--fl-grid-strong');
    context.lineWidth = 1;
    const line = (isStrong: boolean, x1: number, y1: number, x2: number, y2: number) => {
      context.strokeStyle = isStrong ? strong : soft;
      context.beginPath();
      context.moveTo(x1, y1);
      context.lineTo(x2, y2);
      context.stroke();
    };
    for (const { at, strong: isStrong } of grid.lons) {
      const x = Math.round(map.latLngToContainerPoint([northWest.lat, at]).x + pad.x) + 0.5;
      line(isStrong, x, 0, x, full.y);
    }
    for (const { at, strong: isStrong } of grid.lats) {
      const y = Math.round(map.latLngToContainerPoint([at, northWest.lng]).y + pad.y) + 0.5;
      line(isStrong, 0, y, full.x, y);
    }
  }
}

/** A grid of whole metres under everything: a useful ground without any map server. */
export function MetreGrid() {
  const map = useMap();
  useEffect(() => {
    const layer = new GridLayer();
    layer.addTo(map);
    const scheme = new MutationObserver(() => map.fire('resize'));
    scheme.observe(document.documentElement, { attributeFilter: ['data-mantine-color-scheme'] });
    return () => {
      scheme.disconnect();
      layer.remove();
    };
  }, [map]);
  return null;
}
