import type { RuleSetId } from '../section.ts';
import { ACI_318_14 } from './aci318-14.ts';
import { ACI_318_19 } from './aci318-19.ts';
import { ACI_318M_14 } from './aci318m-14.ts';
import { ACI_318M_19 } from './aci318m-19.ts';
import { EN_1992 } from './en1992.ts';
import type { RuleSet } from './rule-set.ts';

/** Every design code the engine knows, by id. */
export const RULE_SETS: Readonly<Record<RuleSetId, RuleSet>> = {
  'aci318-19': ACI_318_19,
  'aci318m-19': ACI_318M_19,
  'aci318-14': ACI_318_14,
  'aci318m-14': ACI_318M_14,
  en1992: EN_1992,
};
