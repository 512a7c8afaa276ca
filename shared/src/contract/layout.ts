import { z } from 'zod';
import { MonthDay, within } from './common.js';

/** How the panels stand. */
export const LayoutKind = z.enum([
  'overhead-fixed',
  'between-fixed',
  'vertical-bifacial',
  'single-axis-tracker',
]);
export type LayoutKind = z.infer<typeof LayoutKind>;

/** A date and hour window in which a tracker serves the crop before the meter. */
export const CropFirstWindow = z.strictObject({
  from: MonthDay,
  to: MonthDay,
  /** Local standard hours, [start, end). */
  startHour: within('Start hour', 0, 24, 'h'),
  endHour: within('End hour', 0, 24, 'h'),
  /** Only while open-field PPFD is below this, umol m-2 s-1; null means always. */
  belowPpfd: within('Light threshold', 0, 3000, 'umol m-2 s-1').nullable(),
});
export type CropFirstWindow = z.infer<typeof CropFirstWindow>;

export const TrackerSettings = z.strictObject({
  maxAngleDeg: within('Largest rotation', 10, 90, 'degrees'),
  programme: z.enum(['true', 'backtracking', 'crop-first']),
  cropFirst: z.array(CropFirstWindow).max(12),
});
export type TrackerSettings = z.infer<typeof TrackerSettings>;

/** Gaps along the row; null where modules touch. */
export const RowGaps = z.strictObject({
  gapM: within('Gap', 0.05, 20, 'm'),
  checkerboard: z.boolean(),
});

export const ModuleSpec = z.strictObject({
  /** Rated power per module area at standard test conditions, W m-2. */
  powerWm2: within('Module power', 40, 300, 'W/m2'),
  /** Length of one module along the row, m. */
  lengthM: within('Module length', 0.3, 6, 'm'),
  /** Share of light that passes straight through (gaps between cells, glass), 0-0.9. */
  transmittance: within('Light transmittance', 0, 0.9),
  frontReflectance: within('Front reflectance', 0, 0.5),
  rearReflectance: within('Rear reflectance', 0, 0.9),
  /** Rear to front efficiency; 0 for single-sided modules. */
  bifaciality: within('Bifaciality', 0, 1),
  /** Power change with temperature, % per K (negative). */
  temperaturePercentPerK: within('Temperature coefficient', -1, 0, '%/K'),
});
export type ModuleSpec = z.infer<typeof ModuleSpec>;

/**
 * One layout of panel rows. Lengths m, angles degrees. `azimuthDeg` is the way the front face
 * looks, clockwise from north; rows run at right angles to it. A tracker with rows north-south has
 * azimuth 90 (it turns from east to west). `collectorWidthM` is the slant width of the table.
 * `clearHeightM` is the lowest panel edge above ground in the worst position.
 */
export const Layout = z
  .strictObject({
    kind: LayoutKind,
    pitchM: within('Pitch', 1, 60, 'm'),
    collectorWidthM: within('Collector width', 0.3, 12, 'm'),
    tiltDeg: within('Tilt', 0, 90, 'degrees'),
    azimuthDeg: within('Azimuth', 0, 360, 'degrees'),
    clearHeightM: within('Clear height', 0, 12, 'm'),
    headlandM: within('Headland', 0, 60, 'm'),
    sideMarginM: within('Side margin', 0, 60, 'm'),
    /** Width kept out of cultivation along each row (posts, guards, drip strip), m. */
    stripWidthM: within('Uncropped strip', 0, 20, 'm'),
    /** Shift of the whole pattern across the rows, m; used to lock rows to tramlines. */
    offsetM: within('Offset', -60, 60, 'm'),
    postSpacingM: within('Post spacing', 1, 40, 'm'),
    /** Extra shade of sub-frames, tubes and posts, share 0-0.2. */
    structureShade: within('Structure allowance', 0, 0.2),
    module: ModuleSpec,
    gaps: RowGaps.nullable(),
    tracker: TrackerSettings.nullable(),
    /** Rated DC power over inverter AC power. */
    dcAcRatio: within('DC/AC ratio', 0.5, 3),
    /** System losses without temperature, row shade and inverter, %. */
    lossesPercent: within('Losses', 0, 60, '%'),
  })
  .superRefine((layout, context) => {
    const across = layout.collectorWidthM * Math.cos((layout.tiltDeg * Math.PI) / 180);
    const flat = layout.kind === 'single-axis-tracker' ? layout.collectorWidthM : across;
    if (layout.pitchM < flat + 0.05) {
      context.addIssue({
        code: 'custom',
        path: ['pitchM'],
        message: `Rows would collide: the pitch must be at least ${(flat + 0.05).toFixed(2)} m for this collector width and tilt.`,
      });
    }
    if (layout.kind === 'single-axis-tracker' && !layout.tracker) {
      context.addIssue({
        code: 'custom',
        path: ['tracker'],
        message: 'Tracker settings are missing.',
      });
    }
    const { transmittance, frontReflectance, rearReflectance } = layout.module;
    if (transmittance + Math.max(frontReflectance, rearReflectance) > 1) {
      context.addIssue({
        code: 'custom',
        path: ['module', 'transmittance'],
        message: 'The module would pass on and throw back more light than falls on it.',
      });
    }
    if (layout.stripWidthM >= layout.pitchM) {
      context.addIssue({
        code: 'custom',
        path: ['stripWidthM'],
        message: 'The uncropped strip is as wide as the pitch: nothing would be farmed.',
      });
    }
  });
export type Layout = z.infer<typeof Layout>;
