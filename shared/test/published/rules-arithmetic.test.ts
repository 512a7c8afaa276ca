import { describe, expect, it } from 'vitest';
import { Layout } from '../../src/contract/layout.js';
import { Rule } from '../../src/contract/rules.js';
import { cautionsFor } from '../../src/rules/cautions.js';
import { DEFAULT_RULES } from '../../src/rules/default-rules.js';
import { evaluateRules } from '../../src/rules/evaluate.js';
import { planFacts, type PlanFacts } from '../../src/rules/facts.js';

const layout = Layout.parse({
  kind: 'overhead-fixed',
  pitchM: 10,
  collectorWidthM: 3,
  tiltDeg: 20,
  azimuthDeg: 180,
  clearHeightM: 2.1,
  headlandM: 12,
  sideMarginM: 3,
  stripWidthM: 0.8,
  offsetM: 0,
  postSpacingM: 6,
  structureShade: 0.02,
  module: {
    powerWm2: 210,
    lengthM: 1.1,
    transmittance: 0,
    frontReflectance: 0.06,
    rearReflectance: 0.1,
    bifaciality: 0.7,
    temperaturePercentPerK: -0.35,
  },
  gaps: null,
  tracker: null,
  dcAcRatio: 1.2,
  lossesPercent: 14.1,
});

const plan: PlanFacts = {
  layout,
  fieldAreaM2: 40_000,
  moduleAreaM2: 9_000,
  landLostShare: 0.1,
  kwp: 1890,
  yieldRange: { low: 0.7, high: 0.95, cropName: 'Winter wheat' },
  seasonShade: { share: 0.28, cropName: 'Winter wheat' },
  darkestLoss: 0.4,
  bayClearWidthM: 7.18,
  widestMachineM: 7,
  highestMachineM: 4,
};

const finding = (id: string, facts = plan) => {
  const context = { layout: facts.layout, kwp: facts.kwp, fruit: false };
  return evaluateRules(DEFAULT_RULES, planFacts(facts), context).find(({ rule }) => rule.id === id);
};

describe('rule arithmetic, hand-made cases', () => {
  it('takes a height exactly on the limit as kept', () => {
    expect(finding('de_din_clear_height_cat1')?.outcome).toBe('pass');
  });

  it('multiplies the yield on the farmed strip by the farmed share (0.66 on all land)', () => {
    const { outcome, low, high } = finding('de_din_yield_min')!;
    expect(low).toBeCloseTo(0.63, 12);
    expect(high).toBeCloseTo(0.855, 12);
    expect(outcome).toBe('unclear');
  });

  it('lets a ten per cent land loss pass in Germany and leaves 0.733 to be grown on the strip', () => {
    expect(finding('de_din_land_loss_cat1')?.outcome).toBe('pass');
    const strip = { ...plan, yieldRange: { low: 0.66 / 0.9, high: 0.9, cropName: 'Wheat' } };
    expect(finding('de_din_yield_min', strip)?.outcome).toBe('pass');
  });

  it('uses the projected width for coverage and the slant width for LAOR', () => {
    const facts = planFacts(plan);
    expect(facts.laor?.low).toBeCloseTo(9000 / 40_000, 12);
    expect(facts.coverage_ratio?.low).toBeCloseTo(
      (9000 * Math.cos((20 * Math.PI) / 180)) / 40_000,
      12,
    );
    const tracker = planFacts({ ...plan, layout: { ...layout, kind: 'single-axis-tracker' } });
    expect(tracker.coverage_ratio?.low).toBeCloseTo(9000 / 40_000, 12);
  });

  it('leaves out rules whose case is not this plan', () => {
    expect(finding('de_eeg_premium_vertical')).toBeUndefined();
    expect(finding('fr_coverage_10mw')).toBeUndefined();
    expect(finding('fr_coverage_10mw', { ...plan, kwp: 12_000 })?.outcome).toBe('pass');
  });

  it('says a missing value is unchecked, never a pass', () => {
    expect(finding('de_din_yield_min', { ...plan, yieldRange: null })?.outcome).toBe('unchecked');
    expect(finding('it_energy')?.outcome).toBe('unchecked');
  });

  it('shows documents as duties and broken heights as failures with the sum', () => {
    expect(finding('de_din_use_concept')?.outcome).toBe('duty');
    const low = finding('gen_vehicle_height')!;
    expect(low.outcome).toBe('fail');
    expect(low.arithmetic).toContain('2.10 m - highest machine 4.00 m = -1.900');
  });

  it('refuses a comparing rule without a value', () => {
    const rule = { ...DEFAULT_RULES[0], value: null };
    const parsed = Rule.safeParse(rule);
    expect(parsed.success).toBe(false);
    expect(parsed.error?.issues[0].path).toEqual(['value']);
  });

  it('ships every rule valid, with source, version and a unique id', () => {
    const ids = DEFAULT_RULES.map((rule) => Rule.parse(rule).id);
    expect(new Set(ids).size).toBe(48);
  });
});

describe('cautions', () => {
  const keys = (slopePercent: number, kind: Layout['kind']) =>
    cautionsFor({
      layout: { ...layout, kind },
      slopePercent,
      irrigated: false,
      livestock: true,
    }).map(({ key }) => key);

  it('always prints scope, structure and electricity, and adds what the plan contains', () => {
    expect(keys(2, 'overhead-fixed')).toEqual(
      expect.arrayContaining(['scope', 'structure', 'electric']),
    );
    expect(keys(2, 'overhead-fixed')).not.toContain('tracker');
    expect(keys(6, 'single-axis-tracker')).toEqual(
      expect.arrayContaining(['tracker', 'slope', 'livestock']),
    );
  });
});
