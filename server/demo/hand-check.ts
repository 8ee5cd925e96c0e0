import type { Snapshot } from '#shared/contract/records.ts';
import { getBar } from '#shared/engine/bars.ts';
import { toDisplay, toStored, type DisplayKind } from '#shared/print/units.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';

/** A number as it is read off a slide rule: three figures. */
const read = (value: number): number => Number(value.toPrecision(3));

/** What a code's block and bars are worked with by hand: MPa, and φ. */
interface HandValues {
  readonly blockStressMPa: number;
  readonly depthFactor: number;
  readonly crushingStrain: number;
  readonly yieldMPa: number;
  readonly reduction: number;
}

/** EN to C50 with the values it recommends (3.1.6, 3.1.7, 2.4.2.4), else ACI 318; memory. */
const handValues = (isEn: boolean, fcMPa: number, fyMPa: number): HandValues =>
  isEn
    ? {
        blockStressMPa: fcMPa / 1.5,
        depthFactor: 0.8,
        crushingStrain: 0.0035,
        yieldMPa: fyMPa / 1.15,
        reduction: 1,
      }
    : {
        blockStressMPa: 0.85 * fcMPa,
        depthFactor: Math.min(0.85, Math.max(0.65, 0.85 - (0.05 * (fcMPa - 28)) / 7)),
        crushingStrain: 0.003,
        yieldMPa: fyMPa,
        reduction: 0.9,
      };

/**
 * What the demo's checker gets for a rectangle with one line of bars at each face, worked by its own short way and not
 * copied from the sheet: compression steel elastic, the concrete it displaces left out (common practice by hand, no
 * source), every step rounded to three figures in the project's units. Where displaced concrete matters, it differs. A slab in
 * tension leaves the rectangle.
 * @returns own values by line of the sheet, in stored units; none for a section that is not of this kind.
 */
export function handCheck({ section, basis, evaluation }: Snapshot, units: UnitSystem): Map<string, number> {
  const { geometry, elastic } = evaluation;
  const { reinforcement, widthMm, fcMPa, fyMPa, stirrup } = section;
  if (geometry === null || elastic === null || reinforcement.kind !== 'bars') return new Map();
  if (section.flange?.face === 'compression') return new Map();
  const hand = handValues(basis.ruleSet === 'en1992', fcMPa, fyMPa);
  const areaOf = (bars: typeof reinforcement.tension) =>
    bars.reduce((sum, { bar, count }) => sum + count * getBar(basis.barStandard, bar).areaMm2, 0);
  const as = areaOf(reinforcement.tension);
  const asPrime = areaOf(reinforcement.compression);
  const [d, dPrime] = [geometry.dMm, geometry.dPrimeMm ?? 0];
  const block = hand.blockStressMPa * widthMm * hand.depthFactor;
  // block c² + (A′s Es εcu − As fy) c − A′s Es εcu d′ = 0
  const elasticForce = asPrime * basis.esMPa * hand.crushingStrain;
  const linear = elasticForce - as * hand.yieldMPa;
  const c = (-linear + Math.sqrt(linear ** 2 + 4 * block * elasticForce * dPrime)) / (2 * block);
  const values = new Map<string, number>();
  const note = (line: string, value: number, kind: DisplayKind) =>
    values.set(line, toStored(read(toDisplay(value, kind, units)), kind, units)).get(line)!;
  note('beta1', hand.depthFactor, 'ratio');
  const cRead = note('c', c, 'length');
  const a = note('a', hand.depthFactor * cRead, 'length');
  const compression = elasticForce * (1 - dPrime / cRead);
  const mn = note('mn', as * hand.yieldMPa * (d - a / 2) + compression * (a / 2 - dPrime), 'moment');
  note('phi-mn', hand.reduction * mn, 'moment');
  const phiU = note('phi-u', hand.crushingStrain / cRead, 'curvature');
  const n = elastic.modularRatio;
  const [p, q] = [
    (n * as + (n - 1) * asPrime) / widthMm,
    (n * as * d + (n - 1) * asPrime * dPrime) / widthMm,
  ];
  const kd = note('kd', -p + Math.sqrt(p ** 2 + 2 * q), 'length');
  const phiY = note('phi-y', hand.yieldMPa / basis.esMPa / (d - kd), 'curvature');
  note('mu-phi', phiU / phiY, 'ratio');
  if (stirrup !== null && basis.ruleSet.startsWith('aci')) {
    const { areaMm2 } = getBar(basis.barStandard, stirrup.bar);
    const spacingMm = evaluation.stirrups?.spacingMm ?? stirrup.spacingMm;
    note('vs', (stirrup.legs * areaMm2 * basis.fytMPa * d) / spacingMm, 'force');
  }
  return values;
}
