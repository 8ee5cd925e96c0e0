import type { CodeSymbols } from '../engine/rules/code-symbols.ts';
import { RULE_SETS } from '../engine/rules/rule-sets.ts';
import type { RuleSetId } from '../engine/section.ts';

/** Letters of a project's design code: `Mu` or `MEd`, `f′c` or `fck`. */
export const codeSymbols = (ruleSet: RuleSetId): CodeSymbols => RULE_SETS[ruleSet].symbols;
