import type { DefinedDuctility } from './defined-ductility.ts';
import type { CheckResult, FlexureResult, SkinSteel } from './evaluation.ts';
import type { ResolvedStirrups } from './resolved-stirrups.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { SeismicRules } from './rules/seismic-rules.ts';
import type { DesignBasis, Demand, SectionInput, UserRules } from './section.ts';
import type { PlacedSteel } from './steel-layout.ts';

/** Everything a check may look at. */
export interface CheckContext {
  readonly section: SectionInput;
  readonly basis: DesignBasis;
  readonly demand: Demand;
  readonly rules: UserRules;
  readonly ruleSet: RuleSet;
  readonly placed: PlacedSteel;
  readonly seismic: SeismicRules | null;
  readonly stirrups: ResolvedStirrups;
  readonly skin: SkinSteel | null;
  readonly flexure: FlexureResult | null;
  /** μφ as the basis measures it. */
  readonly measured: DefinedDuctility | null;
}

const finite = (value: number | null) => (value !== null && Number.isFinite(value) ? value : null);

/** Numbers that are none (0/0, x/0) are shown as none; a pass within the slack of `limits.ts` is a ratio of 1. */
export function check({ passes, capacity, ratio, ...rest }: CheckResult): CheckResult {
  const shown = finite(ratio);
  return {
    ...rest,
    passes,
    capacity: finite(capacity),
    ratio: passes && shown !== null ? Math.min(1, shown) : shown,
  };
}
