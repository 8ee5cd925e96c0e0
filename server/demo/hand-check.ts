import type { Snapshot } from '#shared/contract/records.ts';
import { getBar } from '#shared/engine/bars.ts';
import { toDisplay, toStored, type DisplayKind } from '#shared/print/units.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';

/** A number as it is read off a slide rule: three figures. */
const read = (value: number): number => Number(value.toPrecision(3));

/**
 * What the demo's checker gets for a rectangle with one line of bars at each face, worked by its own short way and not
 * copied from the sheet: compression steel elastic, the concrete it displaces left out (common practice by hand, no
 * source), every step rounded to three figures in the project's units. Where displaced concrete matters, it differs.
 * @returns own values by line of the sheet, in stored units; none for a section that is not of this kind.
 */
export function handCheck({ section, basis, evaluation }: Snapshot, units: UnitSystem): Map<string, number> {
  const { geometry, elastic } = evaluation;
  const { reinforcement, widthMm, fcMPa, fyMPa, stirrup } = section;
  if (geometry === null || elastic === null || reinforcement.kind !== 'bars') return new Map();
  const areaOf = (bars: typeof reinforcement.tension) =>
    bars.reduce((sum, { bar, count }) => sum + count * getBar(basis.barStandard, bar).areaMm2, 0);
  const as = areaOf(reinforcement.tension);
  const asPrime = areaOf(reinforcement.compression);
  const [d, dPrime] = [geometry.dMm, geometry.dPrimeMm ?? 0];
  const beta1 = Math.min(0.85, Math.max(0.65, 0.85 - (0.05 * (fcMPa - 28)) / 7));
  const block = 0.85 * fcMPa * widthMm * beta1;
  // block c² + (A′s Es εcu − As fy) c − A′s Es εcu d′ = 0
  const elasticForce = asPrime * basis.esMPa * 0.003;
  const linear = elasticForce - as * fyMPa;
  const c = (-linear + Math.sqrt(linear ** 2 + 4 * block * elasticForce * dPrime)) / (2 * block);
  const values = new Map<string, number>();
  const note = (line: string, value: number, kind: DisplayKind) =>
    values.set(line, toStored(read(toDisplay(value, kind, units)), kind, units)).get(line)!;
  note('beta1', beta1, 'ratio');
  const cRead = note('c', c, 'length');
  const a = note('a', beta1 * cRead, 'length');
  const compression = elasticForce * (1 - dPrime / cRead);
  const mn = note('mn', as * fyMPa * (d - a / 2) + compression * (a / 2 - dPrime), 'moment');
  note('phi-mn', 0.9 * mn, 'moment');
  const phiU = note('phi-u', 0.003 / cRead, 'curvature');
  const n = elastic.modularRatio;
  const [p, q] = [
    (n * as + (n - 1) * asPrime) / widthMm,
    (n * as * d + (n - 1) * asPrime * dPrime) / widthMm,
  ];
  const kd = note('kd', -p + Math.sqrt(p ** 2 + 2 * q), 'length');
  const phiY = note('phi-y', fyMPa / basis.esMPa / (d - kd), 'curvature');
  note('mu-phi', phiU / phiY, 'ratio');
  if (stirrup !== null && basis.ruleSet.startsWith('aci')) {
    const { areaMm2 } = getBar(basis.barStandard, stirrup.bar);
    const spacingMm = evaluation.stirrups?.spacingMm ?? stirrup.spacingMm;
    note('vs', (stirrup.legs * areaMm2 * basis.fytMPa * d) / spacingMm, 'force');
  }
  return values;
}
