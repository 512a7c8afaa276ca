/** Words of light and land that need a sentence the first time they are met. */
export const GLOSSARY = {
  PAR: {
    name: 'Photosynthetically active radiation',
    text: 'The light between 400 and 700 nm that leaves can use to grow.',
  },
  PPFD: {
    name: 'Photosynthetic photon flux density',
    text: 'How many photons of usable light fall on a square metre in a second, in µmol m⁻² s⁻¹. Full summer sun gives about 2000.',
  },
  DLI: {
    name: 'Daily light integral',
    text: 'All photons of usable light that fall on a square metre in one day, in mol m⁻² d⁻¹. Bright summer days in Central Europe reach 40 to 60, grey winter days 3 to 8.',
  },
  GCR: {
    name: 'Ground cover ratio',
    text: 'Width of the panel table over the distance from row to row. At 0.30 the panels, laid flat, would cover 30 % of the land.',
  },
  BBCH: {
    name: 'BBCH growth stage',
    text: 'A two-digit code for how far a crop has grown: 00 dry seed, 30 stems lengthen, 61 first flowers, 89 ripe.',
  },
  LER: {
    name: 'Land equivalent ratio',
    text: 'How much land would be needed to grow the same crop and make the same electricity apart from each other. Above 1, sharing the land pays.',
  },
  'R:FR': {
    name: 'Red to far-red ratio',
    text: 'Photons near 660 nm over photons near 730 nm. About 1.1 in daylight; leaves lower it, opaque panels hardly do.',
  },
  albedo: {
    name: 'Albedo',
    text: 'Share of light the ground throws back. Green crops about 0.20, dry straw 0.30, dark wet soil 0.10, fresh snow 0.80.',
  },
  aspect: {
    name: 'Aspect',
    text: 'The way a slope falls, clockwise from north: 180° falls to the south and gathers more sun.',
  },
  pitch: {
    name: 'Pitch',
    text: 'Distance from one panel row to the next, measured from post line to post line.',
  },
  tilt: {
    name: 'Tilt',
    text: 'Angle between the panel face and the level ground.',
  },
  azimuth: {
    name: 'Azimuth',
    text: 'The way the panel face looks, clockwise from north; 180° is south.',
  },
  headland: {
    name: 'Headland',
    text: 'The strip at the ends of the field kept free so that machines can turn.',
  },
  kWp: {
    name: 'Kilowatt peak',
    text: 'Rated power of the modules under the test light of 1000 W m⁻² at 25 °C.',
  },
  'open field': {
    name: 'Open field',
    text: 'The same place without panels. Every share of light is measured against it.',
  },
  'darkest strip': {
    name: 'Darkest strip',
    text: 'The part across one pitch that receives least light over the period shown.',
  },
  'light budget': {
    name: 'Light budget',
    text: 'Light received over a season, set against what the crop needs.',
  },
  season: {
    name: 'Season',
    text: 'One crop standing on the field from sowing to harvest. Seasons in order make the rotation.',
  },
  scenario: {
    name: 'Scenario',
    text: 'One layout of panel rows with its inputs frozen, so that its result can be checked later.',
  },
} as const;

export type GlossaryWord = keyof typeof GLOSSARY;
