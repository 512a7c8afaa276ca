import type { Field } from '@furrowlight/shared/contract/fields';
import type { FieldEntity } from './field.entity.js';

/** What a field's answer holds beyond its own row. */
export interface FieldSurroundings {
  farmName: string;
  seasonCount: number;
  scenarioCount: number;
}

/** A row as the contract shows it. */
export function toField(row: FieldEntity, around: FieldSurroundings): Field {
  const { areaM2, perimeterM, longestSideBearingDeg, longestSideM } = row;
  const measured =
    areaM2 !== null &&
    perimeterM !== null &&
    longestSideBearingDeg !== null &&
    longestSideM !== null;
  return {
    id: row.id,
    version: row.version,
    farmId: row.farmId,
    farmName: around.farmName,
    name: row.name,
    pin: [row.longitude, row.latitude],
    boundary: row.boundary,
    elevationM: row.elevationM,
    slopePercent: row.slopePercent,
    aspectDeg: row.aspectDeg,
    albedo: row.albedo,
    occluders: row.occluders,
    notes: row.notes,
    geometry: measured ? { areaM2, perimeterM, longestSideBearingDeg, longestSideM } : null,
    timeZone: row.timeZone,
    seasonCount: around.seasonCount,
    scenarioCount: around.scenarioCount,
    updatedAt: row.updatedAt,
  };
}
