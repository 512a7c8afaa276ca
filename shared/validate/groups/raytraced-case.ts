import { readFileSync } from 'node:fs';
import { toRadians } from '../../src/light/angles.js';
import type { RowGeometry, RowOptics } from '../../src/light/rows/geometry.js';

/** A ray-traced sky value per receiver with its standard error (one for all, or one each). */
export interface SkyReference {
  ref: number[];
  se: number | number[];
}

export interface ReflectedReference {
  ref: number[];
  se: number;
}

export interface SunReference {
  sun: { azimuth: number; elevation: number; dni?: number; dhi?: number };
  panels_crossed: number[];
  disc_black: number[];
  disc_trans: number[];
  near_edge: number[];
  reflected: ReflectedReference;
  reflected_alb0?: ReflectedReference;
}

export interface DailyReference {
  unobstructed: { total: number };
  black: { total_disc: number[] };
  trans: { total_disc: number[] };
  refl: { total_disc: number[] };
}

export interface RaytracedCase {
  id: string;
  geometry: {
    slant_width: number;
    pitch: number;
    mid_height: number;
    tilt: number;
    row_azimuth: number;
    surface_azimuth: number;
    receiver_height: number;
    module_length?: number;
    gap_length?: number;
    checkerboard?: boolean;
    n_rows?: number | string;
    row_length?: number | string;
  };
  receivers: { s: number[]; along: number | number[] };
  sky: Record<'black' | 'refl' | 'refl_alb0' | 'trans', SkyReference>;
  beam: SunReference[];
  daily?: DailyReference;
}

/** Surfaces of the reference's variants. */
export const VARIANTS = {
  black: optics(0, 0, 0.2),
  trans: optics(0.3, 0, 0.2),
  refl: optics(0, 0.1, 0.2),
  refl_alb0: optics(0, 0.1, 0),
} satisfies Record<string, RowOptics>;

function optics(transmittance: number, reflectance: number, albedo: number): RowOptics {
  return {
    transmittance,
    frontReflectance: reflectance,
    rearReflectance: reflectance,
    albedo,
    structureShade: 0,
  };
}

/** @throws SyntaxError or a file error when the file cannot be read as cases. */
export function readCases(path: string): RaytracedCase[] {
  const file = JSON.parse(readFileSync(path, 'utf8')) as { cases: RaytracedCase[] };
  return file.cases;
}

export function rowGeometry({ geometry }: RaytracedCase): RowGeometry {
  return {
    pitch: geometry.pitch,
    width: geometry.slant_width,
    tilt: toRadians(geometry.tilt),
    midHeight: geometry.mid_height,
    surfaceAzimuth: toRadians(geometry.surface_azimuth),
  };
}

/** +1 where the front looks towards row azimuth + 90 (the reference's positive s), else -1. */
export function frontSide({ geometry }: RaytracedCase): 1 | -1 {
  const turn = (((geometry.surface_azimuth - geometry.row_azimuth) % 360) + 360) % 360;
  return Math.abs(turn - 90) < 1e-6 ? 1 : -1;
}

/** Receivers across the rows, positive on the front side. */
export function acrossPositions(reference: RaytracedCase): Float64Array {
  const side = frontSide(reference);
  return Float64Array.from(reference.receivers.s, (s) => s * side);
}

export const standardError = (reference: { se: number | number[] }, index: number): number =>
  typeof reference.se === 'number' ? reference.se : reference.se[index];
