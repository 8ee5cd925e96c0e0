import { arrangeFace, type ArrangementContext } from '#shared/engine/arrangement.ts';
import { getBar } from '#shared/engine/bars.ts';
import { ACI_318_19 } from '#shared/engine/rules/aci318-19.ts';
import { KG_PER_M_PER_LB_PER_FT, MM2_PER_IN2, MM_PER_IN } from '#shared/engine/units.ts';
import { listOf, type ComputeCase } from './published-case.ts';

const astm = (number: number) => getBar('astm', `#${number}`);

function widthNeededIn(count: number, barNumber: number): number {
  const context: ArrangementContext = {
    rules: ACI_318_19,
    barStandard: 'astm',
    widthMm: 10,
    coverMm: 1.5 * MM_PER_IN,
    stirrupBar: getBar('astm', '#3'),
    maxAggregateMm: 0.75 * MM_PER_IN,
    bendAllowance: 'none',
    maxLayers: 1,
  };
  return arrangeFace('tension', [{ bar: `#${barNumber}`, count }], context).report.widthNeededMm / MM_PER_IN;
}

/**
 * The group table's own areas: the circle of the nominal diameter to No. 8, the old square bars for No. 10 and 11, nominal
 * else. The engine's nominal areas differ from it by design (4 No. 8 is 3.16 in²); this holds its diameters to the table.
 */
function groupTableAreaIn2(number: number): number {
  const oldSquareIn = { 10: 1.125, 11: 1.25 }[number];
  if (oldSquareIn) return oldSquareIn ** 2;
  const bar = astm(number);
  return number <= 8 ? (Math.PI * (bar.diameterMm / MM_PER_IN) ** 2) / 4 : bar.areaMm2 / MM2_PER_IN2;
}

const upToHalf = (inches: number) => Math.ceil(inches * 2 - 1e-9) / 2;

export const BAR_CASES: Readonly<Record<string, ComputeCase>> = {
  'BAR-01': (_, raw) => {
    const bars = listOf<number>(raw, 'no').map(astm);
    return {
      lb_ft: bars.map((bar) => bar.massKgPerM / KG_PER_M_PER_LB_PER_FT),
      kg_m: bars.map((bar) => bar.massKgPerM),
      dia_in: bars.map((bar) => bar.diameterMm / MM_PER_IN),
      dia_mm: bars.map((bar) => bar.diameterMm),
      area_in2: bars.map((bar) => bar.areaMm2 / MM2_PER_IN2),
      area_mm2: bars.map((bar) => bar.areaMm2),
    };
  },
  'BAR-02': (_, raw) => {
    const bars = listOf<string>(raw, 'size').map((designation) => getBar('csa', designation));
    return {
      area_mm2: bars.map((bar) => bar.areaMm2),
      dia_mm: bars.map((bar) => bar.diameterMm),
      kg_m: bars.map((bar) => bar.massKgPerM),
    };
  },
  'BAR-03': (_, raw) => {
    const bars = listOf<number>(raw, 'dia').map((d) => getBar('iso', String(d)));
    return { kg_m: bars.map((bar) => bar.massKgPerM), area_mm2: bars.map((bar) => bar.areaMm2) };
  },
  'BAR-04': (_, raw) =>
    Object.fromEntries(
      listOf<number>(raw, 'bars').map((number) => [
        `No${number}`,
        listOf<number>(raw, 'n').map((count) => count * groupTableAreaIn2(number)),
      ]),
    ),
  'BAR-F01': (_, raw) => ({
    b_min: listOf<number>(raw, 'n').map((count) =>
      [4, 5, 6, 7, 8, 9, 10, 11].map((bar) => upToHalf(widthNeededIn(count, bar))),
    ),
  }),
};
