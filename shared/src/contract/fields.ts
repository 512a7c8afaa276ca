import { z } from 'zod';
import { Id, Instant, IsoDate, line, Version, within } from './common.js';

/** [longitude, latitude] in degrees, WGS 84, the order of GeoJSON (RFC 7946). */
export const LonLat = z.tuple([
  within('Longitude', -180, 180, 'degrees'),
  within('Latitude', -90, 90, 'degrees'),
]);
export type LonLat = z.infer<typeof LonLat>;

const Ring = z
  .array(LonLat)
  .min(4, 'A boundary needs at least three corners and must close on its first.')
  .max(2000, 'A boundary may have at most 2000 corners.');

/** GeoJSON Polygon (RFC 7946): outer ring, then cut-outs; every ring closed. */
export const Boundary = z.strictObject({
  type: z.literal('Polygon'),
  coordinates: z.array(Ring).min(1).max(20),
});
export type Boundary = z.infer<typeof Boundary>;

/** Something tall near the field that takes light: a hedge, wood or building. */
export const Occluder = z.strictObject({
  kind: z.enum(['hedge', 'wood', 'building']),
  heightM: within('Height', 0.2, 60, 'm'),
  /** Line (open) the obstacle stands along. */
  line: z.array(LonLat).min(2).max(200),
});
export type Occluder = z.infer<typeof Occluder>;

const fieldShape = {
  name: line('Field name'),
  /** Where the field is when there is no boundary yet. */
  pin: LonLat,
  boundary: Boundary.nullable(),
  elevationM: within('Elevation', -430, 5000, 'm'),
  slopePercent: within('Slope', 0, 60, '%'),
  /** Direction the slope falls towards, degrees clockwise from north. */
  aspectDeg: within('Aspect', 0, 360, 'degrees'),
  /** Share of light the ground and crop throw back, 0.05-0.9. */
  albedo: within('Albedo', 0.05, 0.9),
  occluders: z.array(Occluder).max(50),
  notes: z.string().max(4000),
};

export const FieldInput = z.strictObject({
  farmId: Id,
  ...fieldShape,
  boundary: fieldShape.boundary.default(null),
  elevationM: fieldShape.elevationM.default(0),
  slopePercent: fieldShape.slopePercent.default(0),
  aspectDeg: fieldShape.aspectDeg.default(180),
  albedo: fieldShape.albedo.default(0.2),
  occluders: fieldShape.occluders.default([]),
  notes: fieldShape.notes.default(''),
});
export type FieldInput = z.input<typeof FieldInput>;

export const FieldPatch = z.strictObject(fieldShape).partial();
export type FieldPatch = z.infer<typeof FieldPatch>;

/** Ground figures computed from the boundary by the server; null without a boundary. */
export const FieldGeometry = z.object({
  areaM2: z.number(),
  perimeterM: z.number(),
  /** Bearing of the longest side, degrees clockwise from north, 0-180. */
  longestSideBearingDeg: z.number(),
  longestSideM: z.number(),
});

export const Field = z.object({
  id: Id,
  version: Version,
  farmId: Id,
  farmName: z.string(),
  ...fieldShape,
  geometry: FieldGeometry.nullable(),
  /** IANA zone at the field. */
  timeZone: z.string(),
  seasonCount: z.int(),
  scenarioCount: z.int(),
  updatedAt: Instant,
});
export type Field = z.infer<typeof Field>;
export const FieldList = z.object({ items: z.array(Field) });
export type FieldList = z.infer<typeof FieldList>;

/** One crop standing on the field from sowing to harvest. */
const seasonShape = {
  cropId: z.string().min(1, 'Choose a crop.').max(60),
  sowing: IsoDate,
  harvest: IsoDate,
  /** Height of the canopy top at which light is counted, m. */
  canopyHeightM: within('Canopy height', 0, 8, 'm'),
};
export const SeasonInput = z.strictObject(seasonShape);
export type SeasonInput = z.infer<typeof SeasonInput>;
export const SeasonPatch = z.strictObject(seasonShape).partial();
export type SeasonPatch = z.infer<typeof SeasonPatch>;
export const FieldSeason = z.object({
  id: Id,
  version: Version,
  fieldId: Id,
  cropName: z.string(),
  ...seasonShape,
});
export type FieldSeason = z.infer<typeof FieldSeason>;
export const FieldSeasonList = z.object({ items: z.array(FieldSeason) });
