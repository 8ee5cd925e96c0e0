import type { FlexureResult, LayerState } from './evaluation.ts';
import { compressedOverhang, flangeOf } from './flange.ts';
import { neutralAxisDepth } from './neutral-axis.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/**
 * Strength at ultimate of a section with placed steel: plane sections, rectangular block (over a flange in compression as
 * wide as that, below it as wide as the web), elastic–perfectly plastic
 * steel with each layer's own strain (ACI 318 22.2). Moments are taken about the compression face.
 */
export function flexureAtUltimate(
  section: SectionInput,
  layout: SteelLayout,
  basis: DesignBasis,
  rules: RuleSet,
): FlexureResult {
  const { widthMm, fcMPa } = section;
  const fyMPa = rules.designYieldMPa(section.fyMPa);
  const { depths, areas, faces } = layout;
  const n = depths.length;
  const blockStressMPa = rules.blockStressMPa(fcMPa);
  const beta1 = rules.blockDepthFactor(fcMPa);
  const epsilonCu = rules.crushingStrain(fcMPa);
  const { overhangMm, overhangDepthMm } = compressedOverhang(widthMm, flangeOf(section, rules));
  const blockForcePerMm = blockStressMPa * widthMm * beta1;
  const overhangPerMm = blockStressMPa * overhangMm;
  const c = neutralAxisDepth(depths, areas, n, {
    blockForcePerMm,
    flangeForcePerMm: blockForcePerMm + overhangPerMm * beta1,
    overhangForceN: overhangPerMm * overhangDepthMm,
    flangeReachMm: overhangDepthMm / beta1,
    blockStressMPa,
    blockDepthFactor: beta1,
    fyMPa,
    esMPa: basis.esMPa,
    epsilonCu,
    displacedConcrete: basis.displacedConcrete,
  });
  const a = beta1 * c;
  const deductionDepth = { deduct: a, 'deduct-above-axis': c, ignore: -1 }[basis.displacedConcrete];
  const webForceN = blockForcePerMm * c;
  const inFlangeMm = Math.min(a, overhangDepthMm);
  const overhangForceN = overhangPerMm * inFlangeMm;
  const concreteForceN = webForceN + overhangForceN;
  let nominalMomentNmm = -webForceN * (a / 2) - overhangForceN * (inFlangeMm / 2);
  let steelForceN = 0;
  const layers: LayerState[] = [];
  for (let i = 0; i < n; i++) {
    const depthMm = depths[i]!;
    const areaMm2 = areas[i]!;
    const strain = (epsilonCu * (depthMm - c)) / c;
    const elastic = basis.esMPa * strain;
    const stressMPa = elastic > fyMPa ? fyMPa : elastic < -fyMPa ? -fyMPa : elastic;
    const isDeducted = depthMm < deductionDepth;
    const forceN = areaMm2 * (isDeducted ? stressMPa + blockStressMPa : stressMPa);
    nominalMomentNmm += forceN * depthMm;
    steelForceN += forceN;
    layers.push({
      face: faces[i]!,
      depthMm,
      areaMm2,
      strain,
      stressMPa,
      forceN,
      yields: Math.abs(elastic) >= fyMPa,
      displacedConcreteDeducted: isDeducted,
    });
  }
  const tensionStrain = (epsilonCu * (layout.dtMm - c)) / c;
  const strengthReduction = rules.strengthReduction(tensionStrain, fyMPa / basis.esMPa);
  return {
    beta1,
    epsilonCu,
    neutralAxisMm: c,
    blockDepthMm: a,
    concreteForceN,
    layers,
    equilibriumResidual: (steelForceN - concreteForceN) / concreteForceN,
    nominalMomentNmm,
    tensionStrain,
    strengthReduction,
    designMomentNmm: strengthReduction * nominalMomentNmm,
  };
}
