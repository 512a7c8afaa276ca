import type { Layout } from '../contract/layout.js';
import type { RuleParameter } from '../contract/rules.js';

/** A number a rule can be held against: its range, and the sum that made it. */
export interface Fact {
  low: number;
  high: number;
  arithmetic: string;
}

/** What is known of a plan when rules are checked; null where it is not. */
export interface PlanFacts {
  layout: Layout;
  fieldAreaM2: number | null;
  moduleAreaM2: number | null;
  landLostShare: number | null;
  kwp: number | null;
  /** Relative yield of the crop that loses most, from light alone; null where evidence ends. */
  yieldRange: { low: number; high: number; cropName: string } | null;
  /** Shade in the season of the crop that loses most, 1 - share of open field. */
  seasonShade: { share: number; cropName: string } | null;
  /** Light lost at the darkest strip, March to October, share of open field. */
  darkestLoss: number | null;
  /** Clear width between the panels' edges of neighbouring rows, m. */
  bayClearWidthM: number;
  /** Machines that must pass, m. */
  widestMachineM: number | null;
  highestMachineM: number | null;
}

const n = (value: number, digits = 2) => value.toFixed(digits);
const exact = (value: number, arithmetic: string): Fact => ({
  low: value,
  high: value,
  arithmetic,
});

/** Largest horizontal projection of one row's panels, m: flat for trackers, as tilted otherwise. */
export function largestProjectionM(layout: Layout): number {
  if (layout.kind === 'single-axis-tracker') return layout.collectorWidthM;
  return layout.collectorWidthM * Math.cos((layout.tiltDeg * Math.PI) / 180);
}

function areaRatios(plan: PlanFacts): Partial<Record<RuleParameter, Fact>> {
  const { layout, fieldAreaM2: field, moduleAreaM2: modules, landLostShare: lost } = plan;
  const facts: Partial<Record<RuleParameter, Fact>> = {};
  facts.gcr = exact(
    layout.collectorWidthM / layout.pitchM,
    `collector width ${n(layout.collectorWidthM)} m / pitch ${n(layout.pitchM)} m`,
  );
  if (field !== null) {
    facts.project_area = exact(field / 10_000, `field area ${n(field / 10_000)} ha`);
  }
  if (lost !== null) {
    facts.land_loss_share = exact(
      lost,
      `uncropped strips and posts / field area = ${n(lost * 100, 1)} %`,
    );
    facts.agri_area_share = exact(1 - lost, `1 - land lost ${n(lost * 100, 1)} %`);
  }
  if (field !== null && modules !== null) {
    const projected = (modules * largestProjectionM(layout)) / layout.collectorWidthM;
    facts.coverage_ratio = exact(
      projected / field,
      `largest projected module area ${n(projected, 0)} m2 / field area ${n(field, 0)} m2`,
    );
    facts.laor = exact(
      modules / field,
      `module area ${n(modules, 0)} m2 / field area ${n(field, 0)} m2`,
    );
  }
  return facts;
}

function yieldFacts(plan: PlanFacts): Partial<Record<RuleParameter, Fact>> {
  const { yieldRange, landLostShare: lost } = plan;
  if (!yieldRange) return {};
  const { low, high, cropName } = yieldRange;
  const range = `${cropName}: ${n(low)} to ${n(high)} of open field by light`;
  const facts: Partial<Record<RuleParameter, Fact>> = {
    relative_yield_per_ha: { low, high, arithmetic: `${range}, per hectare farmed` },
  };
  if (lost !== null) {
    facts.relative_yield_total = {
      low: low * (1 - lost),
      high: high * (1 - lost),
      arithmetic: `${range}, times farmed share ${n(1 - lost, 3)}`,
    };
  }
  return facts;
}

function machineFacts(plan: PlanFacts): Partial<Record<RuleParameter, Fact>> {
  const facts: Partial<Record<RuleParameter, Fact>> = {
    bay_clear_width: exact(
      plan.bayClearWidthM,
      `clear width between rows ${n(plan.bayClearWidthM)} m`,
    ),
  };
  if (plan.widestMachineM !== null) {
    facts.post_gap_fits_machines = exact(
      plan.bayClearWidthM - plan.widestMachineM,
      `clear width ${n(plan.bayClearWidthM)} m - widest machine with margins ${n(plan.widestMachineM)} m`,
    );
  }
  if (plan.highestMachineM !== null) {
    facts.machine_height_clearance = exact(
      plan.layout.clearHeightM - plan.highestMachineM,
      `clear height ${n(plan.layout.clearHeightM)} m - highest machine ${n(plan.highestMachineM)} m`,
    );
  }
  return facts;
}

/**
 * Every number the rules may ask for, each from one geometry with its own denominator.
 *
 * @param plan what is known; missing parts make no fact, so that their rules stay unchecked
 */
export function planFacts(plan: PlanFacts): Partial<Record<RuleParameter, Fact>> {
  const { layout, kwp, seasonShade, darkestLoss } = plan;
  const facts: Partial<Record<RuleParameter, Fact>> = {
    clear_height: exact(
      layout.clearHeightM,
      `lowest panel edge ${n(layout.clearHeightM)} m above ground in the worst position`,
    ),
    ...areaRatios(plan),
    ...yieldFacts(plan),
    ...machineFacts(plan),
  };
  if (kwp !== null) {
    const ac = kwp / layout.dcAcRatio / 1000;
    facts.ac_power = exact(
      ac,
      `${n(kwp, 0)} kWp / DC/AC ratio ${n(layout.dcAcRatio)} = ${n(ac, 3)} MW AC`,
    );
  }
  if (seasonShade) {
    facts.season_shade = exact(
      seasonShade.share,
      `${seasonShade.cropName}: 1 - share of open field = ${n(seasonShade.share, 3)}`,
    );
  }
  if (darkestLoss !== null) {
    facts.sunlight_reduction_max_point = exact(
      darkestLoss,
      `darkest strip, March to October: 1 - share of open field = ${n(darkestLoss, 3)} (all light; the rule asks for direct sun)`,
    );
  }
  return facts;
}
