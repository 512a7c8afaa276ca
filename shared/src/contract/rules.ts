import { z } from 'zod';
import { IsoDate, line } from './common.js';

/** What a rule measures; each is computed in one place from one geometry (rules/facts). */
export const RuleParameter = z.enum([
  'clear_height',
  'land_loss_share',
  'agri_area_share',
  'coverage_ratio',
  'laor',
  'gcr',
  'project_area',
  'relative_yield_total',
  'relative_yield_per_ha',
  'season_shade',
  'sunlight_reduction_max_point',
  'bay_clear_width',
  'machine_height_clearance',
  'post_gap_fits_machines',
  'ac_power',
  'control_zone_area',
  'energy_ratio',
  'document',
  'statement',
]);
export type RuleParameter = z.infer<typeof RuleParameter>;

/** When a rule counts. `asked` rules count only where someone confirms the case. */
export const RuleCondition = z.enum([
  'always',
  'farming-under',
  'farming-between',
  'vertical',
  'not-vertical',
  'fixed',
  'tracking',
  'overhead',
  'over-10-mwp',
  'fruit',
  'asked',
]);
export type RuleCondition = z.infer<typeof RuleCondition>;

/** One editable rule of a place. Local law and the competent authority decide, always. */
export const Rule = z
  .strictObject({
    id: z.string().regex(/^[a-z0-9_]{3,60}$/, 'Use small letters, digits and underscores.'),
    place: line('Place', 40),
    instrument: line('Instrument', 200),
    /** Version or date of the text. */
    version: line('Version or date', 60),
    parameter: RuleParameter,
    operator: z.enum(['>=', '<=', '>', '<', 'present', 'note']),
    value: z.number().nullable(),
    unit: z.string().max(60),
    condition: RuleCondition,
    appliesWhen: z.string().max(300),
    howToCompute: z.string().max(400),
    severity: z.enum(['fail', 'warn', 'info']),
    source: line('Source', 300),
    certainty: z.string().max(10),
    note: z.string().max(300),
    confirmedBy: z.string().max(120).nullable(),
    confirmedOn: IsoDate.nullable(),
  })
  .superRefine((rule, context) => {
    const compares = ['>=', '<=', '>', '<'].includes(rule.operator);
    if (compares && rule.value === null) {
      context.addIssue({
        code: 'custom',
        path: ['value'],
        message: 'A rule that compares needs a value; choose "note" if there is none.',
      });
    }
  });
export type Rule = z.infer<typeof Rule>;

/** What a rule says of a scenario. */
export const RuleOutcome = z.enum([
  /** holds on paper */
  'pass',
  /** broken; the rule's severity says how grave */
  'fail',
  /** the modelled range lies on both sides of the limit */
  'unclear',
  /** cannot be checked on paper or lacks an input */
  'unchecked',
  /** a document to hand in or keep */
  'duty',
  /** told, not judged */
  'note',
]);
export type RuleOutcome = z.infer<typeof RuleOutcome>;

export const RuleFinding = z.object({
  rule: Rule,
  outcome: RuleOutcome,
  /** Lower and upper value of the plan; equal where there is no range; null where unknown. */
  low: z.number().nullable(),
  high: z.number().nullable(),
  /** The sum in words and numbers, with units. */
  arithmetic: z.string(),
});
export type RuleFinding = z.infer<typeof RuleFinding>;
