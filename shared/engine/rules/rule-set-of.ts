import type { DesignBasis } from '../section.ts';
import type { RuleSet } from './rule-set.ts';
import { RULE_SETS } from './rule-sets.ts';

/** The design code of a basis, with the basis's own national values where the code has such. */
export function ruleSetOf(basis: Pick<DesignBasis, 'ruleSet'>): RuleSet {
  return RULE_SETS[basis.ruleSet];
}
