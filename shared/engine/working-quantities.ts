import type { SteelLine, WorkingStep } from './evaluation.ts';
import type { WorkingSource } from './working-source.ts';
import { step, type Input } from './working-step.ts';

const TAKEOFF = 'bar standard, common practice';

const lineInput = (line: SteelLine): Input => [
  `${line.bar} ${line.position}`,
  line.kgPerM,
  'mass-per-length',
];

/** Steel per length of beam: each size by position, laps, waste, and the sums. */
export function quantitySteps({ quantities, basis }: WorkingSource): WorkingStep[] {
  const { steel, netSteelKgPerM, lapsKgPerM, wasteKgPerM, totalSteelKgPerM } = quantities;
  const longitudinal = steel.filter((line) => line.position !== 'stirrups').map(lineInput);
  const net: Input = ['g', netSteelKgPerM, 'mass-per-length'];
  const sum = step(
    'steel',
    'quantities',
    ['g', 'Σ bars and stirrups, net', netSteelKgPerM, 'mass-per-length'],
    steel.map(lineInput),
    TAKEOFF,
  );
  if (!basis.rates) return [sum];
  const laps: Input = ['laps', lapsKgPerM, 'mass-per-length'];
  const waste: Input = ['waste', wasteKgPerM, 'mass-per-length'];
  return [
    sum,
    step(
      'laps',
      'quantities',
      ['laps', 'share × longitudinal bars', lapsKgPerM, 'mass-per-length'],
      [['share', basis.rates.lapShare, 'ratio'], ...longitudinal],
      'price book',
    ),
    step(
      'waste',
      'quantities',
      ['waste', 'share × (g + laps)', wasteKgPerM, 'mass-per-length'],
      [['share', basis.rates.wasteShare, 'ratio'], net, laps],
      'price book',
    ),
    step(
      'steel-total',
      'quantities',
      ['g total', 'g + laps + waste', totalSteelKgPerM, 'mass-per-length'],
      [net, laps, waste],
      TAKEOFF,
    ),
  ];
}
