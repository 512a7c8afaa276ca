import type { LayoutKind } from '@furrowlight/shared/contract/layout';
import type { LayoutDraft, ModuleDraft } from './design';

type NumberKeys<T> = { [K in keyof T]: T[K] extends number | null ? K : never }[keyof T];

/** One quantity of the rows as it is offered. */
export interface Control<Key extends string> {
  key: Key;
  label: string;
  unit: string;
  min: number;
  max: number;
  step: number;
  scale?: number;
  /** Kinds for which it is not asked. */
  notFor?: LayoutKind[];
}

type LayoutControl = Control<NumberKeys<LayoutDraft> & string>;

export const ROW_CONTROLS: LayoutControl[] = [
  { key: 'pitchM', label: 'Pitch', unit: 'm', min: 2, max: 30, step: 0.1 },
  { key: 'collectorWidthM', label: 'Collector width', unit: 'm', min: 0.5, max: 8, step: 0.05 },
  {
    key: 'tiltDeg',
    label: 'Tilt',
    unit: '°',
    min: 0,
    max: 90,
    step: 1,
    notFor: ['single-axis-tracker'],
  },
  { key: 'azimuthDeg', label: 'Azimuth of the front', unit: '°', min: 0, max: 360, step: 1 },
  { key: 'clearHeightM', label: 'Clear height', unit: 'm', min: 0, max: 7, step: 0.1 },
];

export const GROUND_CONTROLS: LayoutControl[] = [
  { key: 'headlandM', label: 'Headland', unit: 'm', min: 0, max: 40, step: 0.5 },
  { key: 'sideMarginM', label: 'Side margin', unit: 'm', min: 0, max: 30, step: 0.5 },
  { key: 'stripWidthM', label: 'Uncropped strip', unit: 'm', min: 0, max: 6, step: 0.1 },
  { key: 'offsetM', label: 'Shift across the rows', unit: 'm', min: -15, max: 15, step: 0.1 },
  { key: 'postSpacingM', label: 'Post spacing', unit: 'm', min: 2, max: 14, step: 0.5 },
];

export const POWER_CONTROLS: LayoutControl[] = [
  {
    key: 'structureShade',
    label: 'Structure allowance',
    unit: '%',
    min: 0,
    max: 20,
    step: 0.5,
    scale: 100,
  },
  { key: 'dcAcRatio', label: 'DC/AC ratio', unit: '', min: 0.8, max: 1.8, step: 0.05 },
  { key: 'lossesPercent', label: 'System losses', unit: '%', min: 0, max: 30, step: 0.5 },
];

export const MODULE_CONTROLS: Control<keyof ModuleDraft>[] = [
  { key: 'powerWm2', label: 'Module power', unit: 'W/m²', min: 80, max: 260, step: 1 },
  { key: 'lengthM', label: 'Module length along the row', unit: 'm', min: 0.5, max: 3, step: 0.01 },
  {
    key: 'transmittance',
    label: 'Light transmittance',
    unit: '%',
    min: 0,
    max: 70,
    step: 1,
    scale: 100,
  },
  {
    key: 'frontReflectance',
    label: 'Front reflectance',
    unit: '%',
    min: 0,
    max: 30,
    step: 0.5,
    scale: 100,
  },
  {
    key: 'rearReflectance',
    label: 'Rear reflectance',
    unit: '%',
    min: 0,
    max: 80,
    step: 1,
    scale: 100,
  },
  { key: 'bifaciality', label: 'Bifaciality', unit: '%', min: 0, max: 100, step: 1, scale: 100 },
  {
    key: 'temperaturePercentPerK',
    label: 'Temperature coefficient',
    unit: '%/K',
    min: -0.6,
    max: 0,
    step: 0.01,
  },
];
