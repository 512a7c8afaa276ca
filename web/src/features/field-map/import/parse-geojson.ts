import type { Boundary, LonLat } from '@furrowlight/shared/contract/fields';

export interface ReadPolygon {
  /** Name found beside the shape, or an empty text. */
  name: string;
  boundary: Boundary;
}

export interface ImportReading {
  polygons: ReadPolygon[];
  /** Shapes that were left out, with the place in the file and the reason. */
  skipped: { at: string; why: string }[];
  /** Set when the whole text could not be used. */
  problem: string | null;
}

type Json = Record<string, unknown>;

const MAX_SHAPES = 500;
const NAME_KEYS = ['name', 'title', 'label', 'field', 'field_name', 'parcel', 'id'];

const isObject = (value: unknown): value is Json =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function nameFrom(properties: unknown): string {
  if (!isObject(properties)) return '';
  const found = Object.entries(properties).find(
    ([key, value]) =>
      NAME_KEYS.includes(key.toLowerCase()) &&
      (typeof value === 'string' || typeof value === 'number') &&
      String(value).trim() !== '',
  );
  return found ? String(found[1]).trim().slice(0, 120) : '';
}

function readRing(raw: unknown): LonLat[] | string {
  if (!Array.isArray(raw)) return 'a ring is no list of positions';
  const ring: LonLat[] = [];
  for (const position of raw) {
    if (!Array.isArray(position) || position.length < 2) return 'a position is not two numbers';
    const [lon, lat] = position as unknown[];
    if (typeof lon !== 'number' || typeof lat !== 'number' || !Number.isFinite(lon + lat)) {
      return 'a position is not two numbers';
    }
    const last = ring.at(-1);
    if (!last || last[0] !== lon || last[1] !== lat) ring.push([lon, lat]);
  }
  const [first, last] = [ring[0], ring.at(-1)];
  if (first && last && (first[0] !== last[0] || first[1] !== last[1])) ring.push([...first]);
  if (ring.length < 4) return 'it has fewer than three different corners';
  if (ring.length > 2000) return `it has ${ring.length} corners; at most 2000 are kept`;
  return ring;
}

function readPolygon(coordinates: unknown): Boundary | string {
  if (!Array.isArray(coordinates) || coordinates.length === 0) return 'it has no rings';
  if (coordinates.length > 20) return 'it has more than 19 cut-outs';
  const rings: LonLat[][] = [];
  for (const raw of coordinates) {
    const ring = readRing(raw);
    if (typeof ring === 'string') return ring;
    rings.push(ring);
  }
  return { type: 'Polygon', coordinates: rings };
}

function takeGeometry(geometry: unknown, at: string, name: string, into: ImportReading): void {
  if (!isObject(geometry)) {
    into.skipped.push({ at, why: 'it has no geometry' });
    return;
  }
  const keep = (coordinates: unknown, where: string, label: string) => {
    const boundary = readPolygon(coordinates);
    if (typeof boundary === 'string') into.skipped.push({ at: where, why: boundary });
    else into.polygons.push({ name: label, boundary });
  };
  if (geometry.type === 'Polygon') keep(geometry.coordinates, at, name);
  else if (geometry.type === 'MultiPolygon' && Array.isArray(geometry.coordinates)) {
    const parts = geometry.coordinates as unknown[];
    parts.forEach((part, i) =>
      keep(
        part,
        parts.length > 1 ? `${at}, part ${i + 1}` : at,
        name && parts.length > 1 ? `${name} ${i + 1}` : name,
      ),
    );
  } else if (geometry.type === 'GeometryCollection' && Array.isArray(geometry.geometries)) {
    (geometry.geometries as unknown[]).forEach((part, i) =>
      takeGeometry(part, `${at}, part ${i + 1}`, name, into),
    );
  } else {
    into.skipped.push({
      at,
      why: `a ${String(geometry.type ?? 'nameless shape')} encloses no area`,
    });
  }
}

/**
 * Read polygons out of GeoJSON text (RFC 7946): a FeatureCollection, Feature or bare geometry.
 *
 * Altitudes are dropped, repeated positions joined, open rings closed. Whatever is left out is
 * listed with its reason; nothing is dropped in silence.
 */
export function parseGeoJson(text: string): ImportReading {
  const reading: ImportReading = { polygons: [], skipped: [], problem: null };
  let root: unknown;
  try {
    root = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch {
    return {
      ...reading,
      problem: 'This is no GeoJSON: the text is cut short or not JSON at all.',
    };
  }
  if (!isObject(root)) return { ...reading, problem: 'This JSON holds no GeoJSON object.' };
  if (root.type === 'FeatureCollection' && Array.isArray(root.features)) {
    (root.features as unknown[]).forEach((feature, i) => {
      const at = `feature ${i + 1}`;
      if (isObject(feature))
        takeGeometry(feature.geometry, at, nameFrom(feature.properties), reading);
      else reading.skipped.push({ at, why: 'it is no feature' });
    });
  } else if (root.type === 'Feature') {
    takeGeometry(root.geometry, 'the feature', nameFrom(root.properties), reading);
  } else {
    takeGeometry(root, 'the geometry', '', reading);
  }
  if (reading.polygons.length > MAX_SHAPES) {
    return {
      ...reading,
      polygons: [],
      problem: `The file holds ${reading.polygons.length} polygons; at most ${MAX_SHAPES} are taken at once.`,
    };
  }
  return reading;
}
