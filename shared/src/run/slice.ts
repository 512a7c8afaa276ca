import type { Layout } from '../contract/layout.js';
import type { Site } from '../contract/run.js';
import { requireWithin } from '../errors.js';
import { toDegrees } from '../light/angles.js';
import {
  atAltitude,
  emptyBandSplit,
  parOf,
  PHOTONS,
  splitBands,
  type BandTable,
} from '../light/band-table.js';
import { fixedRowLight } from '../light/row-light.js';
import type { EndlessRowsInput } from '../light/rows/endless.js';
import { panelEndsAbove, profileTangent } from '../light/rows/geometry.js';
import { circumsolarShare } from '../light/sky.js';
import { slopeSkyView, sunOverSlope } from '../light/slope.js';
import { distanceFactor, SOLAR_CONSTANT, sunPosition, type SunPosition } from '../light/sun.js';
import { groundOf, rowsOfLayout, stripMiddles } from './layout-geometry.js';
import { steeringOf } from './state.js';
import { rotationAt } from './steering.js';

/** A field with the make-up of its cloudless light (tableOf, or a PreviewPlace). */
export interface SlicePlace {
  site: Site;
  table: BandTable;
}

/** Moment of a slice: 0-based day of a year and local standard hour. */
export interface SliceTime {
  year: number;
  day: number;
  hour: number;
  utcOffsetHours: number;
}

/** Cross-section of one pitch under a cloudless sky. Metres across from a row's centre line. */
export interface RowSlice {
  sunAzimuthDeg: number;
  sunAltitudeDeg: number;
  /** Sun's angle from the field's normal in the slice, positive on the front side; null with the sun down. */
  profileAngleDeg: number | null;
  /** Tilt of the panel, positive where the front looks the way of the layout's azimuth. */
  tiltDeg: number;
  /** Edges of the panel of the row at 0. */
  edges: [{ u: number; z: number }, { u: number; z: number }];
  /** Shadows at canopy height between -pitch/2 and pitch/2; empty with the sun down. */
  shadows: { from: number; to: number }[];
  positionsM: number[];
  /** PPFD at each position and in open field, umol m-2 s-1. */
  ppfd: number[];
  openPpfd: number;
}

const HOUR_MS = 3_600_000;

/** Sun below this altitude counts as down, radians. */
const SUN_DOWN = 0.005;

/** Sun over a field at one moment, with the photons of a cloudless sky, umol m-2 s-1. */
interface Moment {
  sun: SunPosition;
  overPlane: SunPosition;
  /** The sun is over the horizon and over the field's own plane. */
  up: boolean;
  fromSun: number;
  fromSky: number;
}

function momentAt({ site, table }: SlicePlace, time: SliceTime): Moment {
  const epochMs =
    Date.UTC(time.year, 0, 1) + (time.day * 24 + time.hour - time.utcOffsetHours) * HOUR_MS;
  const ground = groundOf(site);
  const sun = sunPosition(epochMs, site.latitude, site.longitude);
  const overPlane = sunOverSlope(sun, ground);
  const up = sun.altitude > SUN_DOWN && overPlane.altitude > SUN_DOWN;
  if (sun.altitude <= SUN_DOWN) return { sun, overPlane, up, fromSun: 0, fromSky: 0 };
  const distance = distanceFactor(Math.min(time.day + 1, 365));
  const split = emptyBandSplit();
  const dni = atAltitude(table.directWm2, sun.altitude) * distance;
  const dhi = atAltitude(table.diffuseWm2, sun.altitude) * distance;
  splitBands(table, sun.altitude, dni, distance, split);
  const index = circumsolarShare(dni, SOLAR_CONSTANT * distance);
  const straight = Math.max(Math.sin(overPlane.altitude), 0);
  const around = (dhi * index * straight) / Math.sin(sun.altitude);
  const perDiffuse = parOf(split.diffuse, PHOTONS);
  const fromSun = dni * straight * parOf(split.direct, PHOTONS) + around * perDiffuse;
  return {
    sun,
    overPlane,
    up,
    fromSun,
    fromSky: dhi * (1 - index) * slopeSkyView(ground) * perDiffuse,
  };
}

/** Rotation of a tracker at a moment, radians: flat with the sun down; null for rows that stand still. */
function rotationOf(layout: Layout, time: SliceTime, moment: Moment): number | null {
  const steering = steeringOf(layout);
  if (!steering) return null;
  if (!moment.up) return 0;
  const { azimuth, altitude } = moment.overPlane;
  const ppfd = moment.fromSun + moment.fromSky;
  return rotationAt(steering, layout, azimuth, altitude, Math.min(time.day, 364), time.hour, ppfd);
}

/** Rows as they stand at a rotation: a turn to the back is a turn to the front of turned rows. */
function rowsAt(rows: EndlessRowsInput, rotation: number | null): EndlessRowsInput {
  if (rotation === null) return rows;
  const turned = rotation < 0 ? Math.PI : 0;
  const surfaceAzimuth = rows.geometry.surfaceAzimuth + turned;
  return { ...rows, geometry: { ...rows.geometry, tilt: Math.abs(rotation), surfaceAzimuth } };
}

/** Shadow of all rows at the receivers' height within one pitch about 0, merged and sorted. */
function shadowsOf(rows: EndlessRowsInput, tangent: number): { from: number; to: number }[] {
  const { pitch } = rows.geometry;
  const ends = panelEndsAbove(rows.geometry, rows.receiverHeight);
  if (!ends.above) return [];
  const foot = (u: number, z: number) => u - (z - rows.receiverHeight) * tangent;
  const one = foot(ends.u1, ends.z1);
  const other = foot(ends.u2, ends.z2);
  const length = Math.abs(one - other);
  if (length >= pitch) return [{ from: -pitch / 2, to: pitch / 2 }];
  const start = Math.min(one, other) + pitch / 2;
  const from = start - Math.floor(start / pitch) * pitch - pitch / 2;
  const to = from + length;
  if (to <= pitch / 2) return [{ from, to }];
  return [
    { from: -pitch / 2, to: to - pitch },
    { from, to: pitch / 2 },
  ];
}

/**
 * Cross-section of a layout at one moment: where the sun, the shadows and the light are.
 *
 * @param place field and the make-up of its light
 * @param layout checked layout
 * @param canopyHeightM height at which light is counted, m
 * @param time moment, 0-based day and local standard hour 0-24
 * @param positions strips across the pitch
 * @throws InputError naming what cannot be shown
 */
export function sliceAt(
  place: SlicePlace,
  layout: Layout,
  canopyHeightM: number,
  time: SliceTime,
  positions = 100,
): RowSlice {
  requireWithin('hour', time.hour, 0, 24, 'h');
  requireWithin('day', time.day, 0, 365);
  const moment = momentAt(place, time);
  const { sun, up, fromSun, fromSky } = moment;
  const rotation = rotationOf(layout, time, moment);
  const middles = stripMiddles(layout.pitchM, positions);
  const rows = rowsAt(rowsOfLayout(layout, place.site, canopyHeightM, middles), rotation);
  const altitude = Math.max(moment.overPlane.altitude, SUN_DOWN);
  const { azimuth } = moment.overPlane;
  const light = fixedRowLight({ ...rows, quality: 'preview' });
  light.set(azimuth, altitude, 0);
  const ppfd = Array.from(
    light.sky,
    (share, i) => share * fromSky + (up ? light.beam[i] * fromSun : 0),
  );
  const tangent = profileTangent(rows.geometry, azimuth, altitude);
  const shadows = up ? shadowsOf(rows, tangent) : [];
  const turned = (rotation ?? 0) < 0;
  const side = turned ? -1 : 1;
  const { tilt, width, midHeight } = rows.geometry;
  const across = (width / 2) * Math.cos(tilt) * side;
  const rise = (width / 2) * Math.sin(tilt);
  return {
    sunAzimuthDeg: toDegrees(sun.azimuth),
    sunAltitudeDeg: toDegrees(sun.altitude),
    profileAngleDeg: up ? toDegrees(Math.atan(tangent)) * side : null,
    tiltDeg: toDegrees(tilt) * side,
    edges: [
      { u: -across, z: midHeight + rise },
      { u: across, z: midHeight - rise },
    ],
    shadows: turned ? shadows.map(({ from, to }) => ({ from: -to, to: -from })).reverse() : shadows,
    positionsM: Array.from(middles),
    ppfd: turned ? ppfd.reverse() : ppfd,
    openPpfd: fromSun + fromSky,
  };
}
