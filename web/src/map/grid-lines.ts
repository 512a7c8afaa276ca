/** Metres per degree of latitude on the mean sphere (radius 6 371 008.8 m). */
const METRES_PER_DEGREE = (Math.PI / 180) * 6_371_008.8;

export interface GridLines {
  /** Side of one square, m. */
  step: number;
  /** Longitudes and latitudes of the lines; every fifth is a strong one. */
  lons: { at: number; strong: boolean }[];
  lats: { at: number; strong: boolean }[];
}

/** Side of a square that is drawn about 24-60 px wide, in the 1-2-5 series. */
export function gridStep(metresPerPixel: number): number {
  const wanted = metresPerPixel * 28;
  const power = 10 ** Math.floor(Math.log10(wanted));
  return ([1, 2, 5, 10].find((n) => n * power >= wanted) ?? 10) * power;
}

function lines(from: number, to: number, degrees: number): { at: number; strong: boolean }[] {
  const first = Math.ceil(from / degrees);
  const last = Math.floor(to / degrees);
  if (last - first > 400) return [];
  return Array.from({ length: last - first + 1 }, (_, i) => ({
    at: (first + i) * degrees,
    strong: (first + i) % 5 === 0,
  }));
}

/**
 * Lines of a grid of squares over a view, true to the metre near its middle.
 *
 * East-west spacing follows the middle latitude rounded to 0.1 degree, so that lines stay put while
 * the view is panned.
 */
export function gridLines(
  view: { west: number; east: number; south: number; north: number },
  metresPerPixel: number,
): GridLines {
  const step = gridStep(metresPerPixel);
  const middle = Math.round(((view.south + view.north) / 2) * 10) / 10;
  const perLon = METRES_PER_DEGREE * Math.cos((middle * Math.PI) / 180);
  return {
    step,
    lons: lines(view.west, view.east, step / perLon),
    lats: lines(view.south, view.north, step / METRES_PER_DEGREE),
  };
}
