import type { ConcreteLawId, CurveChoices } from './curve-choices.ts';
import { findConfinement, type HoopConfinement } from './concrete-laws/confinement.ts';
import type { ConcreteLaw, LawSettings } from './concrete-laws/concrete-law.ts';
import { hognestad } from './concrete-laws/hognestad.ts';
import { kentPark, kentParkConfined } from './concrete-laws/kent-park.ts';
import { manderConfined, manderUnconfined } from './concrete-laws/mander.ts';
import { parabolaRectangle } from './concrete-laws/parabola-rectangle.ts';
import { todeschini } from './concrete-laws/todeschini.ts';
import { flangeOf, grossOverhang } from './flange.ts';
import type { Arrangement } from './evaluation.ts';
import { assertPositive, InvalidSectionError } from './preconditions.ts';
import type { CodeSymbols } from './rules/code-symbols.ts';
import type { RuleSet } from './rules/rule-set.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';
import { elasticPlastic, strainHardening, type SteelLaw } from './steel-laws.ts';

/** Concrete in tension before the first crack: σ = Ec ε to fr. */
export interface TensionBeforeCracking {
  readonly ecMPa: number;
  readonly crackingStrain: number;
}

/** One section and its laws, ready to be integrated. Lengths mm. */
export interface CurveModel {
  readonly widthMm: number;
  readonly depthMm: number;
  /** Law of the whole section, or of the cover outside the core. */
  readonly cover: ConcreteLaw;
  /** Law inside the hoop centre lines; null where nothing is confined. */
  readonly core: ConcreteLaw | null;
  readonly coreTopMm: number;
  readonly coreBottomMm: number;
  readonly coreWidthMm: number;
  /** Slab beside the web, unconfined: overhang bf − bw in all between two depths; 0 for a rectangle. */
  readonly overhangMm: number;
  readonly overhangTopMm: number;
  readonly overhangBottomMm: number;
  readonly confinement: HoopConfinement | null;
  /** Why the core is or is not confined. */
  readonly confinementNote: string;
  readonly steel: SteelLaw;
  /** The laws are at a code's design strengths, fcd and fyd. */
  readonly isDesignStrength: boolean;
  /** The code's letters, for what is said of the curve. */
  readonly symbols: CodeSymbols;
  readonly depths: Float64Array;
  readonly areas: Float64Array;
  readonly isDisplacedDeducted: boolean;
  /** Depth at which first yield is measured, by the basis: outermost tension layer or centroid. */
  readonly yieldDepthMm: number;
  /** Outermost tension layer. */
  readonly deepestMm: number;
  /** Depth at which crushing is measured: 0, or the core's edge. */
  readonly crushingDepthMm: number;
  readonly crushingStrain: number;
  readonly tension: TensionBeforeCracking;
}

export interface CurveInput {
  /** Checked by `evaluateSection` or of the same kind; its bars placed, its stirrups as built. */
  readonly section: SectionInput;
  readonly layout: Pick<SteelLayout, 'depths' | 'areas' | 'dMm' | 'dtMm' | 'asMm2' | 'asPrimeMm2'>;
  /** Null for plain layers. */
  readonly arrangement: Arrangement | null;
  readonly basis: DesignBasis;
  readonly choices: CurveChoices;
}

/**
 * The section with its laws made for its materials and, for a confined law, for its own hoops.
 * @throws InvalidSectionError for a choice that is not a number above zero.
 */
export function curveModel(input: CurveInput): CurveModel {
  const { section, basis, choices } = input;
  return curveModelOf(input, curveMaterials(section, basis, choices));
}

/** What a model takes from the materials and the basis alone, so that sections of the same materials can share it. */
export interface CurveMaterials {
  readonly rules: RuleSet;
  /** Law of an unconfined section, and of the cover round a confined core. */
  readonly plain: ConcreteLaw;
  readonly cover: ConcreteLaw;
  readonly steel: SteelLaw;
  readonly isDesignStrength: boolean;
  readonly tension: TensionBeforeCracking;
}

/** @throws InvalidSectionError for a choice that is not a number above zero. */
export function curveMaterials(
  { fcMPa, fyMPa }: Pick<SectionInput, 'fcMPa' | 'fyMPa'>,
  basis: DesignBasis,
  choices: CurveChoices,
): CurveMaterials {
  assertChoices(choices);
  const rules = ruleSetOf(basis);
  const ecMPa = rules.concreteModulusMPa(fcMPa);
  const { concreteLaw, peakShare, peakStrain } = choices;
  const plain = unconfinedLaw(concreteLaw, fcMPa, ecMPa, choices);
  return {
    rules,
    plain,
    // a crushing strain set by the caller is the core's
    cover: isConfinedLaw(concreteLaw)
      ? unconfinedLaw(concreteLaw, fcMPa, ecMPa, { peakShare, peakStrain })
      : plain,
    steel: steelOf(rules, { fyMPa: rules.designYieldMPa(fyMPa), esMPa: basis.esMPa }, choices),
    isDesignStrength: rules.designYieldMPa(fyMPa) !== fyMPa,
    tension: { ecMPa, crackingStrain: rules.ruptureModulusMPa(fcMPa) / ecMPa },
  };
}

/** `curveModel` with its materials given; to be those of its section and basis. */
export function curveModelOf(input: CurveInput, materials: CurveMaterials): CurveModel {
  const { section, layout, basis } = input;
  const { rules, steel, isDesignStrength, tension } = materials;
  const { cover, core, confinement, confinementNote } = concreteOf(input, materials);
  const coreTopMm = core && confinement ? confinement.coreTopMm : 0;
  return {
    widthMm: section.widthMm,
    depthMm: section.depthMm,
    cover,
    core,
    coreTopMm,
    coreBottomMm: section.depthMm - coreTopMm,
    coreWidthMm: core && confinement ? confinement.coreWidthMm : 0,
    ...overhangOf(section, rules),
    confinement,
    confinementNote,
    steel,
    isDesignStrength,
    symbols: rules.symbols,
    depths: layout.depths,
    areas: layout.areas,
    isDisplacedDeducted: basis.displacedConcrete !== 'ignore',
    yieldDepthMm: basis.yieldCurvatureAt === 'centroid' ? layout.dMm : layout.dtMm,
    deepestMm: layout.dtMm,
    crushingDepthMm: coreTopMm,
    crushingStrain: (core ?? cover).crushingStrain,
    tension,
  };
}

/** A slab at either face counts on the curve; in tension only before cracking. */
function overhangOf(
  section: SectionInput,
  rules: RuleSet,
): Pick<CurveModel, 'overhangMm' | 'overhangTopMm' | 'overhangBottomMm'> {
  const { overhangMm, overhangDepthMm, middleMm } = grossOverhang(section, flangeOf(section, rules));
  return {
    overhangMm,
    overhangTopMm: middleMm - overhangDepthMm / 2,
    overhangBottomMm: middleMm + overhangDepthMm / 2,
  };
}

const NUMBERS = {
  peakShare: 'Peak stress over f′c',
  peakStrain: 'Strain at peak stress',
  crushingStrain: 'Crushing strain',
  ruptureStrain: 'Rupture strain',
  strengthRatio: 'fu over fy',
  hardeningStrain: 'Strain at the start of hardening',
  hoopYieldMPa: 'Yield strength of the hoops',
  hoopRuptureStrain: 'Rupture strain of the hoops',
} as const;

function assertChoices(choices: CurveChoices): void {
  for (const key of Object.keys(NUMBERS) as (keyof typeof NUMBERS)[]) {
    const value = choices[key];
    if (value !== undefined) assertPositive(value, NUMBERS[key], ['choices', key]);
  }
  if (choices.strengthRatio !== undefined && choices.strengthRatio < 1)
    throw new InvalidSectionError(`fu over fy must be 1 or more, not ${choices.strengthRatio}`, [
      'choices',
      'strengthRatio',
    ]);
}

interface Concrete {
  readonly cover: ConcreteLaw;
  readonly core: ConcreteLaw | null;
  readonly confinement: HoopConfinement | null;
  readonly confinementNote: string;
}

/** Laws that take the section's own hoops. */
export const isConfinedLaw = (law: ConcreteLawId) =>
  law === 'mander-confined' || law === 'kent-park-confined';

function concreteOf(input: CurveInput, { plain, cover }: CurveMaterials): Concrete {
  const { section, basis, choices } = input;
  const law = choices.concreteLaw;
  const unconfined = (confinementNote: string): Concrete => ({
    cover: plain,
    core: null,
    confinement: null,
    confinementNote,
  });
  if (!isConfinedLaw(law)) return unconfined('unconfined by choice of law');
  const hoops = findConfinement(input, {
    yieldMPa: choices.hoopYieldMPa ?? basis.fytMPa,
    ruptureStrain: choices.hoopRuptureStrain ?? 0.12,
  });
  if (!hoops) return unconfined('no hoops round a core: taken as unconfined');
  if (law === 'mander-confined' && hoops.effectiveness === 0)
    return {
      ...unconfined('hoops too far apart, or held points too few, to confine: ke = 0, taken as unconfined'),
      confinement: hoops,
    };
  const core =
    law === 'mander-confined'
      ? manderConfined(section.fcMPa, hoops, choices)
      : kentParkConfined(section.fcMPa, hoops, choices);
  return { cover, core, confinement: hoops, confinementNote: 'core inside the hoop centre lines confined' };
}

function unconfinedLaw(law: ConcreteLawId, fcMPa: number, ecMPa: number, settings: LawSettings): ConcreteLaw {
  switch (law) {
    case 'hognestad':
      return hognestad(fcMPa, settings);
    case 'todeschini':
      return todeschini(fcMPa, ecMPa, settings);
    case 'kent-park':
    case 'kent-park-confined':
      return kentPark(fcMPa, settings);
    case 'mander':
    case 'mander-confined':
      return manderUnconfined(fcMPa, settings);
    case 'parabola-rectangle':
      return parabolaRectangle(fcMPa, settings);
  }
}

function steelOf(
  { symbols, clauses }: RuleSet,
  bars: { readonly fyMPa: number; readonly esMPa: number },
  choices: CurveChoices,
): SteelLaw {
  const { steelLaw, ruptureStrain, strengthRatio, hardeningStrain } = choices;
  const grade = { ...bars, ruptureStrain, yieldName: symbols.fyDesign, clause: clauses.steelLaw };
  const law =
    steelLaw === 'elastic-plastic'
      ? elasticPlastic(grade)
      : strainHardening({ ...grade, strengthRatio, hardeningStrain });
  const last = law.kinkStrains[law.kinkStrains.length - 1]!;
  if (!(law.ruptureStrain > last))
    throw new InvalidSectionError(
      `Rupture strain ${law.ruptureStrain} must be above ${last}, where the steel yields or hardens`,
      ['choices', 'ruptureStrain'],
    );
  return law;
}
