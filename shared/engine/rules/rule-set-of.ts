import type { DesignBasis } from '../section.ts';
import { en1992 } from './en1992.ts';
import type { NationalValues } from './national-values.ts';
import type { RuleSet } from './rule-set.ts';
import { RULE_SETS } from './rule-sets.ts';

type Choices = Pick<DesignBasis, 'ruleSet' | 'nationalValues' | 'seismicSystem'>;

const NONE: NationalValues = {};
/** Rule sets made for national values, by the object that holds them: a basis is read many times over a section. */
const made = new WeakMap<NationalValues, Map<boolean, RuleSet>>();

/** The design code of a basis, with the basis's own national values where the code has such. */
export function ruleSetOf({ ruleSet, nationalValues, seismicSystem }: Choices): RuleSet {
  if (ruleSet !== 'en1992') return RULE_SETS[ruleSet];
  const isDuctile = seismicSystem === 'dcm' || seismicSystem === 'dch';
  const values = nationalValues ?? NONE;
  const known = made.get(values) ?? new Map<boolean, RuleSet>();
  made.set(values, known);
  const rules = known.get(isDuctile) ?? en1992({ nationalValues: values, isDuctile });
  known.set(isDuctile, rules);
  return rules;
}
