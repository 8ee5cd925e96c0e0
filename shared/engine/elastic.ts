import { compressedInertiaMm4, crackedAxisDepth } from './cracked-section.ts';
import type { DuctilityResult, ElasticResult, FlexureResult } from './evaluation.ts';
import { compressedOverhang, flangeOf, grossOverhang, type Overhang, type ResolvedFlange } from './flange.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** Above this share of f′c concrete leaves its straight line and the elastic yield picture is doubtful (engine rule). */
const DOUBTFUL_CONCRETE_SHARE = 0.7;

/** Modular ratio counted for steel above the axis. */
function ratioAbove(modularRatio: number, basis: DesignBasis): number {
  return basis.displacedConcrete === 'ignore' ? modularRatio : modularRatio - 1;
}

/**
 * Uncracked and cracked linear elastic section: cracking moment at the modulus of rupture, and first yield of the
 * tension steel. Cracked: n A below the axis, (n − 1) A above it.
 */
export function elasticSection(
  section: SectionInput,
  layout: SteelLayout,
  basis: DesignBasis,
  rules: RuleSet,
): ElasticResult {
  const ecMPa = rules.concreteModulusMPa(section.fcMPa);
  const modularRatio = basis.esMPa / ecMPa;
  const flange = flangeOf(section, rules);
  const overhang = compressedOverhang(section.widthMm, flange);
  const uncracked = uncrackedSection(section, flange, layout, modularRatio);
  const ruptureModulusMPa = rules.ruptureModulusMPa(section.fcMPa);
  const crackingCurvaturePerMm = ruptureModulusMPa / ecMPa / (section.depthMm - uncracked.axisMm);
  const kd = crackedAxisDepth(layout.depths, layout.areas, layout.depths.length, {
    widthMm: section.widthMm,
    modularRatio,
    ratioAbove: ratioAbove(modularRatio, basis),
    ...overhang,
  });
  const crackedInertiaMm4 = crackedInertia({ ...overhang, widthMm: section.widthMm }, layout, kd, {
    below: modularRatio,
    above: ratioAbove(modularRatio, basis),
  });
  const epsilonY = rules.designYieldMPa(section.fyMPa) / basis.esMPa;
  const curvature = yieldCurvature(epsilonY, layout, basis, kd);
  const concreteStress = ecMPa * curvature * kd;
  const share = concreteStress / section.fcMPa;
  return {
    ecMPa,
    modularRatio,
    uncrackedAxisMm: uncracked.axisMm,
    uncrackedInertiaMm4: uncracked.inertiaMm4,
    ruptureModulusMPa,
    crackingMomentNmm: ecMPa * uncracked.inertiaMm4 * crackingCurvaturePerMm,
    crackingCurvaturePerMm,
    crackedAxisMm: kd,
    crackedInertiaMm4,
    yieldMomentNmm: ecMPa * crackedInertiaMm4 * curvature,
    concreteStressAtYieldMPa: concreteStress,
    concreteStressShareAtYield: share,
    isElasticPictureDoubtful: share > DOUBTFUL_CONCRETE_SHARE,
  };
}

/** φy = εy / (depth of the measured steel − kd), 1/mm. */
function yieldCurvature(epsilonY: number, layout: SteelLayout, basis: DesignBasis, kd: number): number {
  const measuredAt = basis.yieldCurvatureAt === 'centroid' ? layout.dMm : layout.dtMm;
  return epsilonY / (measuredAt - kd);
}

function uncrackedSection(
  section: SectionInput,
  flange: ResolvedFlange | null,
  layout: SteelLayout,
  modularRatio: number,
) {
  const { widthMm: b, depthMm: h } = section;
  const { overhangMm, overhangDepthMm: hf, middleMm } = grossOverhang(section, flange);
  const added = modularRatio - 1;
  let area = b * h + overhangMm * hf;
  let moment = (b * h * h) / 2 + overhangMm * hf * middleMm;
  layout.depths.forEach((depth, i) => {
    area += added * layout.areas[i]!;
    moment += added * layout.areas[i]! * depth;
  });
  const axisMm = moment / area;
  let inertiaMm4 = (b * h * h * h) / 12 + b * h * (h / 2 - axisMm) ** 2;
  inertiaMm4 += (overhangMm * hf * hf * hf) / 12 + overhangMm * hf * (middleMm - axisMm) ** 2;
  layout.depths.forEach((depth, i) => {
    inertiaMm4 += added * layout.areas[i]! * (depth - axisMm) ** 2;
  });
  return { axisMm, inertiaMm4 };
}

function crackedInertia(
  concrete: Overhang & { readonly widthMm: number },
  layout: SteelLayout,
  kd: number,
  ratios: { readonly above: number; readonly below: number },
): number {
  let inertia = compressedInertiaMm4(kd, concrete);
  layout.depths.forEach((depth, i) => {
    inertia += (depth < kd ? ratios.above : ratios.below) * layout.areas[i]! * (depth - kd) ** 2;
  });
  return inertia;
}

/** μφ = φu / φy of the closed path, with the convention spelled out. */
export function ductilityOf(
  section: SectionInput,
  layout: SteelLayout,
  basis: DesignBasis,
  {
    flexure,
    elastic,
    rules,
  }: { readonly flexure: FlexureResult; readonly elastic: ElasticResult; readonly rules: RuleSet },
): DuctilityResult {
  const epsilonY = rules.designYieldMPa(section.fyMPa) / basis.esMPa;
  const curvatureYieldPerMm = yieldCurvature(epsilonY, layout, basis, elastic.crackedAxisMm);
  const curvatureUltimatePerMm = flexure.epsilonCu / flexure.neutralAxisMm;
  const where =
    basis.yieldCurvatureAt === 'centroid'
      ? 'the centroid of the tension steel'
      : 'the outermost tension layer';
  const displaced = {
    deduct: 'concrete displaced by bars inside the block deducted (of two equilibria the deeper axis)',
    'deduct-above-axis': 'concrete displaced by bars above the neutral axis deducted',
    ignore: 'displaced concrete ignored',
  }[basis.displacedConcrete];
  const { epsilonCu, axis, fyDesign, blockStress } = rules.symbols;
  const designed =
    fyDesign === rules.symbols.fy ? '' : `design values ${blockStress} and ${fyDesign} in both curvatures; `;
  return {
    curvatureYieldPerMm,
    curvatureUltimatePerMm,
    curvatureDuctility: curvatureUltimatePerMm / curvatureYieldPerMm,
    definition: `μφ = φu/φy; φy = εy/(d − kd) on the cracked elastic section at ${where}; φu = ${epsilonCu}/${axis} with ${epsilonCu} = ${Number(flexure.epsilonCu.toPrecision(4))}; ${designed}${displaced}`,
  };
}
