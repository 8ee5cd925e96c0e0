import { getBar } from './bars.ts';
import type { Quantities, SkinSteel, SteelLine } from './evaluation.ts';
import { flangeOf } from './flange.ts';
import { concreteM3PerM, formworkM2PerM, pricingFor, unformedSides, type Pricing } from './pricing.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { BarGroup, DesignBasis, SectionInput } from './section.ts';
import { skinKgPerM } from './skin-steel.ts';
import { stirrupKgPerM, stirrupSetLengthMm, stirrupShape } from './stirrup-length.ts';

/** Density of reinforcing steel, kg/m per mm² (7850 kg/m³, EN 10080), for steel given as plain areas. */
export const STEEL_KG_PER_M_PER_MM2 = 0.00785;

/**
 * Steel, concrete, formwork, cost and carbon per metre of beam. Laps and waste stand on their own lines; a missing rate
 * leaves the amount null.
 * @throws InvalidSectionError for an unknown bar.
 */
export function quantitiesOf(
  section: SectionInput,
  basis: DesignBasis,
  skin: SkinSteel | null = null,
): Quantities {
  const longitudinal = longitudinalLines(section, basis);
  const [tensionKg, compressionKg] = (['tension', 'compression'] as const).map((position) =>
    sum(longitudinal.filter((line) => line.position === position)),
  ) as [number, number];
  const stirrups = stirrupLines(section, basis);
  const pricing = pricingFor(basis.rates, section.fcMPa);
  const sides = skinLines(skin, basis);
  const longitudinalKg = tensionKg + compressionKg + sum(sides);
  const stirrupKg = sum(stirrups);
  const lapsKgPerM = longitudinalKg * pricing.lapShare;
  const netSteelKgPerM = longitudinalKg + stirrupKg;
  const wasteKgPerM = (netSteelKgPerM + lapsKgPerM) * pricing.wasteShare;
  const concrete = concreteM3PerM(section.widthMm, section.depthMm);
  const { slabMm, hasEdge } = unformedSides(flangeOf(section, ruleSetOf(basis)), basis.slabMm);
  const formwork = formworkM2PerM(section.widthMm, section.depthMm, slabMm, hasEdge);
  const totalSteelKgPerM = netSteelKgPerM + lapsKgPerM + wasteKgPerM;
  const co2e = totalSteelKgPerM * pricing.steelCo2ePerKg + concrete * pricing.concreteCo2ePerM3;
  return {
    steel: [...longitudinal, ...sides, ...stirrups],
    netSteelKgPerM,
    lapsKgPerM,
    wasteKgPerM,
    totalSteelKgPerM,
    concreteM3PerM: concrete,
    formworkM2PerM: formwork,
    cost: basis.rates && {
      currency: basis.rates.currency,
      ...costOf({ longitudinalKg, stirrupKg, concrete, formwork }, pricing),
    },
    co2eKgPerM: known(co2e),
  };
}

const sum = (lines: readonly SteelLine[]) => lines.reduce((total, line) => total + line.kgPerM, 0);
const known = (amount: number) => (Number.isNaN(amount) ? null : amount);

interface Amounts {
  readonly longitudinalKg: number;
  readonly stirrupKg: number;
  readonly concrete: number;
  readonly formwork: number;
}

function costOf({ longitudinalKg, stirrupKg, concrete, formwork }: Amounts, pricing: Pricing) {
  const withWaste = 1 + pricing.wasteShare;
  const steel = longitudinalKg * (1 + pricing.lapShare) * withWaste * pricing.longitudinalPerKg;
  const stirrups = stirrupKg === 0 ? 0 : stirrupKg * withWaste * pricing.stirrupPerKg;
  const concreteCost = concrete * pricing.concretePerM3;
  const formworkCost = formwork * pricing.formworkPerM2;
  return {
    steel: known(steel),
    stirrups: known(stirrups),
    concrete: known(concreteCost),
    formwork: known(formworkCost),
    total: known(steel + stirrups + concreteCost + formworkCost),
  };
}

function longitudinalLines({ reinforcement }: SectionInput, basis: DesignBasis): readonly SteelLine[] {
  if (reinforcement.kind === 'layers')
    return (['tension', 'compression'] as const).flatMap((position) => {
      const layers = reinforcement.layers.filter((layer) => layer.face === position);
      const areaMm2 = layers.reduce((total, layer) => total + layer.areaMm2, 0);
      if (areaMm2 === 0) return [];
      const kgPerM = areaMm2 * STEEL_KG_PER_M_PER_MM2;
      return [{ bar: 'area', position, count: layers.length, lengthPerM: layers.length, kgPerM }];
    });
  const linesOf = (group: BarGroup, position: 'tension' | 'compression') =>
    group.map(({ bar, count }) => ({
      bar,
      position,
      count,
      lengthPerM: count,
      kgPerM: count * getBar(basis.barStandard, bar, ['reinforcement', position]).massKgPerM,
    }));
  return [...linesOf(reinforcement.tension, 'tension'), ...linesOf(reinforcement.compression, 'compression')];
}

function skinLines(skin: SkinSteel | null, basis: DesignBasis): readonly SteelLine[] {
  if (!skin || skin.perSide === 0) return [];
  const count = 2 * skin.perSide;
  const { massKgPerM } = getBar(basis.barStandard, skin.bar, ['basis', 'skinBar']);
  return [
    {
      bar: skin.bar,
      position: 'skin',
      count,
      lengthPerM: count,
      kgPerM: skinKgPerM(skin.perSide, massKgPerM),
    },
  ];
}

function stirrupLines(section: SectionInput, basis: DesignBasis): readonly SteelLine[] {
  if (!section.stirrup) return [];
  const bar = getBar(basis.barStandard, section.stirrup.bar, ['stirrup', 'bar']);
  const shape = stirrupShape(bar, section.stirrup, section.coverMm, ruleSetOf(basis));
  return [
    {
      bar: bar.designation,
      position: 'stirrups',
      count: section.stirrup.legs,
      lengthPerM: stirrupSetLengthMm(shape, section.widthMm, section.depthMm) / section.stirrup.spacingMm,
      kgPerM: stirrupKgPerM(shape, section.widthMm, section.depthMm),
    },
  ];
}
