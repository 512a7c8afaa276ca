// Four families of layouts on demo fields: raised, between strips, upright, and tracking.
const module = {
  powerWm2: 215,
  lengthM: 1.13,
  transmittance: 0,
  frontReflectance: 0.06,
  rearReflectance: 0.1,
  bifaciality: 0.75,
  temperaturePercentPerK: -0.34,
};

const common = {
  headlandM: 14,
  sideMarginM: 4,
  offsetM: 0,
  postSpacingM: 6,
  structureShade: 0.02,
  module,
  gaps: null,
  tracker: null,
  dcAcRatio: 1.15,
  lossesPercent: 12,
};

export const raised = {
  ...common,
  kind: 'overhead-fixed',
  pitchM: 11,
  collectorWidthM: 3.4,
  tiltDeg: 20,
  azimuthDeg: 200,
  clearHeightM: 4.6,
  stripWidthM: 0.8,
  structureShade: 0.03,
};

export const raisedOpen = { ...raised, pitchM: 14 };

export const betweenStrips = {
  ...common,
  kind: 'between-fixed',
  pitchM: 16,
  collectorWidthM: 4.2,
  tiltDeg: 25,
  azimuthDeg: 180,
  clearHeightM: 0.9,
  stripWidthM: 4.4,
};

export const upright = {
  ...common,
  kind: 'vertical-bifacial',
  pitchM: 13,
  collectorWidthM: 2.2,
  tiltDeg: 90,
  azimuthDeg: 90,
  clearHeightM: 0.9,
  stripWidthM: 0.9,
  module: { ...module, bifaciality: 0.85 },
};

export const tracking = {
  ...common,
  kind: 'single-axis-tracker',
  pitchM: 12,
  collectorWidthM: 2.4,
  tiltDeg: 0,
  azimuthDeg: 90,
  clearHeightM: 2.2,
  stripWidthM: 1,
  tracker: { maxAngleDeg: 55, programme: 'backtracking', cropFirst: [] },
};

export const trackingForCrop = {
  ...tracking,
  tracker: {
    maxAngleDeg: 55,
    programme: 'crop-first',
    cropFirst: [{ from: '05-01', to: '06-30', startHour: 6, endHour: 11, belowPpfd: null }],
  },
};

/** What stands on which field; the first field carries the whole comparison. */
export const layoutFamilies = [
  { field: 'field-01', name: 'Raised, 11 m', notes: 'Combine passes below.', layout: raised },
  { field: 'field-01', name: 'Raised, 14 m', notes: '', layout: raisedOpen },
  { field: 'field-01', name: 'Upright, 13 m', notes: '', layout: upright },
  { field: 'field-01', name: 'Tracking, 12 m', notes: '', layout: tracking },
  { field: 'field-05', name: 'Between strips', notes: '', layout: betweenStrips },
  { field: 'field-05', name: 'Upright', notes: '', layout: upright },
  { field: 'field-09', name: 'Tracking for the crop', notes: 'May and June mornings for the crop.', layout: trackingForCrop },
  { field: 'field-12', name: 'Raised', notes: '', layout: raised },
];
