import type { Layout } from '../contract/layout.js';
import type {
  Rule,
  RuleCondition,
  RuleFinding,
  RuleOutcome,
  RuleParameter,
} from '../contract/rules.js';
import type { Fact } from './facts.js';

/** What decides whether a rule's condition is met. */
export interface RuleContext {
  layout: Layout;
  kwp: number | null;
  fruit: boolean;
}

const LIMIT = 1e-9;

const CONDITIONS: Record<RuleCondition, (context: RuleContext) => boolean> = {
  always: () => true,
  'farming-under': ({ layout }) => layout.kind === 'overhead-fixed' || layout.clearHeightM >= 2.1,
  'farming-between': ({ layout }) => layout.kind !== 'overhead-fixed' && layout.clearHeightM < 2.1,
  vertical: ({ layout }) => layout.kind === 'vertical-bifacial',
  'not-vertical': ({ layout }) => layout.kind !== 'vertical-bifacial',
  fixed: ({ layout }) => layout.kind !== 'single-axis-tracker',
  tracking: ({ layout }) => layout.kind === 'single-axis-tracker',
  overhead: ({ layout }) => layout.kind === 'overhead-fixed',
  'over-10-mwp': ({ kwp }) => kwp !== null && kwp > 10_000,
  fruit: ({ fruit }) => fruit,
  asked: () => true,
};

function compare(rule: Rule, limit: number, value: number): boolean {
  switch (rule.operator) {
    case '>=':
      return value >= limit - LIMIT;
    case '<=':
      return value <= limit + LIMIT;
    case '>':
      return value > limit + LIMIT;
    default:
      return value < limit - LIMIT;
  }
}

function judge(rule: Rule, fact: Fact | undefined): RuleOutcome {
  if (rule.operator === 'present') return 'duty';
  if (rule.operator === 'note' || rule.value === null) return 'note';
  if (rule.condition === 'asked' || !fact) return 'unchecked';
  const low = compare(rule, rule.value, fact.low);
  const high = compare(rule, rule.value, fact.high);
  if (low && high) return 'pass';
  return low || high ? 'unclear' : 'fail';
}

function words(rule: Rule, fact: Fact | undefined, outcome: RuleOutcome): string {
  if (outcome === 'duty' || outcome === 'note') return rule.howToCompute;
  if (!fact) return `Needs a value this plan does not hold: ${rule.howToCompute}`;
  const value =
    fact.low === fact.high
      ? fact.low.toFixed(3)
      : `${fact.low.toFixed(3)} to ${fact.high.toFixed(3)}`;
  return `${fact.arithmetic} = ${value}; asked ${rule.operator} ${rule.value} ${rule.unit}`.trim();
}

/**
 * Hold the rules of a place against a plan's facts.
 *
 * Rules whose condition is not met are left out. A modelled range on both sides of a limit is
 * `unclear`, never a pass. Nothing here is legal advice: local law and the authority decide.
 *
 * @param rules the sheet, in the order to show
 * @param facts from planFacts
 * @param context what the layout is
 */
export function evaluateRules(
  rules: readonly Rule[],
  facts: Partial<Record<RuleParameter, Fact>>,
  context: RuleContext,
): RuleFinding[] {
  return rules
    .filter((rule) => CONDITIONS[rule.condition](context))
    .map((rule) => {
      const fact = facts[rule.parameter];
      const outcome = judge(rule, fact);
      return {
        rule,
        outcome,
        low: fact?.low ?? null,
        high: fact?.high ?? null,
        arithmetic: words(rule, fact, outcome),
      };
    });
}
