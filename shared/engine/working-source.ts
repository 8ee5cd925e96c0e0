import type { DuctilityResult, ElasticResult, FlexureResult, Quantities, SkinSteel } from './evaluation.ts';
import type { ResolvedStirrups } from './resolved-stirrups.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { SeismicRules } from './rules/seismic-rules.ts';
import type { DesignBasis, Demand, Face, SectionInput } from './section.ts';
import type { PlacedSteel, SteelLayout } from './steel-layout.ts';
import type { Input } from './working-step.ts';

/** Results whose working is written out. */
export interface WorkingSource {
  readonly section: SectionInput;
  readonly basis: DesignBasis;
  readonly demand: Demand;
  readonly ruleSet: RuleSet;
  readonly layout: SteelLayout;
  readonly flexure: FlexureResult;
  readonly elastic: ElasticResult;
  readonly ductility: DuctilityResult;
  readonly quantities: Quantities;
  readonly placed: PlacedSteel;
  readonly seismic: SeismicRules | null;
  readonly stirrups: ResolvedStirrups;
  readonly skin: SkinSteel | null;
}

/** Depth and area of every layer, or of one face's, for the sums over layers. */
export const layerInputs = (layout: SteelLayout, face?: Face): Input[] =>
  [...layout.depths].flatMap((depth, i): Input[] =>
    face !== undefined && layout.faces[i] !== face
      ? []
      : [
          [`d${i + 1}`, depth, 'length'],
          [`A${i + 1}`, layout.areas[i]!, 'area'],
        ],
  );

/** Strengths and design values that a formula names, as inputs of its step. */
export function materialInputs(
  formula: string,
  { fcMPa, fyMPa }: Pick<SectionInput, 'fcMPa' | 'fyMPa'>,
  ruleSet: Pick<RuleSet, 'symbols' | 'designSteps'>,
): Input[] {
  const letters = formula.split(/[^\p{L}\p{N}′]+/u);
  const { symbols } = ruleSet;
  const known: Input[] = [
    [symbols.fc, fcMPa, 'stress'],
    [symbols.fy, fyMPa, 'stress'],
    ...ruleSet.designSteps(fcMPa, fyMPa).map(({ symbol, value, kind }): Input => [symbol, value, kind]),
  ];
  return known.filter(([symbol]) => letters.includes(symbol));
}
