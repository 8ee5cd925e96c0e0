import type { UnitSystem } from '../contract/design-basis.ts';
import type { Snapshot } from '../contract/records.ts';
import { getBar } from '../engine/bars.ts';
import type { SteelLine } from '../engine/evaluation.ts';
import type { SectionInput } from '../engine/section.ts';
import { faceWord } from '../print/face-word.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import type { QuantityItem } from './quantity-item.ts';

const MASS = 'mass-per-length';
const positionWord = ({ position }: SteelLine, section: SectionInput): string =>
  position === 'skin' ? 'at the sides' : position === 'stirrups' ? 'stirrups' : faceWord(position, section);

/** Steel of the section with the arithmetic of each line, then the sum, the allowances and the total. */
export function steelItems(snapshot: Snapshot, units: UnitSystem): QuantityItem[] {
  const { steel, netSteelKgPerM, lapsKgPerM, wasteKgPerM, totalSteelKgPerM } = snapshot.evaluation.quantities;
  const mass = (value: number) => formatQuantity(value, MASS, units, { digits: 4 });
  const share = (part: number, whole: number) =>
    formatQuantity(whole === 0 ? 0 : part / whole, 'percent', units);
  const longitudinal = steel
    .filter(({ position }) => position !== 'stirrups')
    .reduce((sum, { kgPerM }) => sum + kgPerM, 0);
  const item = (id: string, name: string, how: string, value: number): QuantityItem => ({
    id,
    item: name,
    how,
    value,
    kind: MASS,
  });
  return [
    ...steel.map((line) =>
      item(
        `steel-${line.position}-${line.bar}`,
        nameOf(line, snapshot.section),
        howOf(line, snapshot, units),
        line.kgPerM,
      ),
    ),
    item('steel', 'Net steel', 'sum of the lines above', netSteelKgPerM),
    item(
      'laps',
      'Laps',
      `${share(lapsKgPerM, longitudinal)} of ${mass(longitudinal)} longitudinal`,
      lapsKgPerM,
    ),
    item(
      'waste',
      'Waste',
      `${share(wasteKgPerM, netSteelKgPerM + lapsKgPerM)} of net steel and laps`,
      wasteKgPerM,
    ),
    item('steel-total', 'Steel in all', 'net steel + laps + waste', totalSteelKgPerM),
  ];
}

function nameOf(line: SteelLine, section: SectionInput): string {
  const { bar, position, count } = line;
  if (bar === 'area') return `Steel ${positionWord(line, section)}`;
  return position === 'stirrups'
    ? `Stirrups ${bar}, ${count} legs`
    : `${count}-${bar} ${positionWord(line, section)}`;
}

function howOf(line: SteelLine, { section, basis, evaluation }: Snapshot, units: UnitSystem): string {
  const length = (mm: number) => formatQuantity(mm, 'length', units, { digits: 4 });
  if (line.bar === 'area') return 'area times 7850 kg/m³';
  const unitMass = formatQuantity(getBar(basis.barStandard, line.bar).massKgPerM, MASS, units, { digits: 4 });
  if (line.position !== 'stirrups' || section.stirrup === null) return `${line.count} × ${unitMass}`;
  // results from before spacings were designed have those given
  const { spacingMm } = (evaluation as Partial<typeof evaluation>).stirrups ?? section.stirrup;
  const cutMm = line.lengthPerM * spacingMm;
  const outsideMm = 2 * (section.widthMm + section.depthMm - 4 * section.coverMm);
  return `cut length ${length(cutMm)} (outside 2 (b + h − 4 cover) = ${length(outsideMm)}, hooks, ties and bends ${length(cutMm - outsideMm)}) / ${length(spacingMm)} × ${unitMass}`;
}
