import type { Layout } from '../contract/layout.js';

/** A caution as it is printed on the plan and the farmer's page. */
export interface Caution {
  key: string;
  title: string;
  text: string;
}

/** What of the plan decides which cautions are printed. */
export interface CautionContext {
  layout: Layout;
  slopePercent: number;
  irrigated: boolean;
  livestock: boolean;
}

const ALWAYS: Caution[] = [
  {
    key: 'scope',
    title: 'This plans light',
    text: 'It is no structural, electrical or legal design. The rules shown are editable defaults; local law and the competent authority decide.',
  },
  {
    key: 'structure',
    title: 'Structure',
    text: 'Foundations, wind, snow and hail are for a licensed engineer (EN 1990, EN 1991-1-3, EN 1991-1-4). The drawings here are not statics.',
  },
  {
    key: 'electric',
    title: 'Live current in daylight',
    text: 'Panels carry direct current (up to 1500 V) whenever there is light. A licensed electrician plans and works on them (IEC 60364-7-712, 60364-7-705, IEC 62548). Keep sprayers, slurry guns and irrigation jets off modules and cables.',
  },
  {
    key: 'machines',
    title: 'Machines',
    text: 'Posts and edges must be marked, guarded and entered as no-go lines. Guidance signals can suffer under steel. Walk the passes with the real machine before sowing.',
  },
  {
    key: 'water',
    title: 'Drip edge',
    text: 'Rain gathers at the lower panel edge and can wash soil or drown plants there. Plan a grassed strip or spread the water.',
  },
  {
    key: 'frost',
    title: 'Frost, heat, leaf wetness',
    text: 'Still air between rows can hold frost, heat and dew longer than the open field; watch disease pressure, lodging and late ripening.',
  },
  {
    key: 'glare',
    title: 'Glare',
    text: 'Reflections can dazzle road, rail and air traffic and neighbours: have the angles checked where any is near.',
  },
  {
    key: 'fire',
    title: 'Fire access',
    text: 'Agree access (commonly 3.0 m wide, 3.5 m high) and hose distances with the local fire brigade and keep the switch plan at the gate.',
  },
];

const TRACKER: Caution = {
  key: 'tracker',
  title: 'Moving rows',
  text: 'Rows turn without warning. Stop and lock them before anyone or any machine works near; clear height is smallest at full rotation.',
};
const SLOPE: Caution = {
  key: 'slope',
  title: 'Slope',
  text: 'Above about 5 % slope (common practice) run-off between rows needs an erosion plan before building.',
};
const IRRIGATION: Caution = {
  key: 'irrigation',
  title: 'Irrigation',
  text: 'Never lift metal pipes under rows or lines. Keep reels, pivots and jets clear of modules and cables.',
};
const LIVESTOCK: Caution = {
  key: 'livestock',
  title: 'Livestock',
  text: 'Guard cables and edges against rubbing and biting; have stray voltage checked. Broken glass in feed injures animals.',
};

/** Slope above which an erosion plan is asked for, % (common practice). */
export const EROSION_SLOPE_PERCENT = 5;

/** The cautions that belong to a plan, picked by what it contains. */
export function cautionsFor({
  layout,
  slopePercent,
  irrigated,
  livestock,
}: CautionContext): Caution[] {
  const picked = [...ALWAYS];
  if (layout.kind === 'single-axis-tracker') picked.push(TRACKER);
  if (slopePercent > EROSION_SLOPE_PERCENT) picked.push(SLOPE);
  if (irrigated) picked.push(IRRIGATION);
  if (livestock) picked.push(LIVESTOCK);
  return picked;
}
