import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { faceWord } from '#shared/print/face-word.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { barsText } from '#shared/print/section-text.ts';
import { unitLabel } from '#shared/print/units.ts';
import type { Step } from './steps.ts';

const NUMBERS = {
  width: { symbol: 'b', key: 'widthMm', kind: 'length' },
  depth: { symbol: 'h', key: 'depthMm', kind: 'length' },
  fc: { symbol: null, key: 'fcMPa', kind: 'stress' },
} as const;

/** One step in words: `b 12 → 14 in`, `bottom 3-#8 → 4-#8`. */
export function stepText(
  { input, section }: Pick<Step, 'input' | 'section'>,
  from: SectionInput,
  units: UnitSystem,
  fcSymbol: string,
): string {
  if (input === 'tension' || input === 'compression') {
    const bars = [from, section].map(({ reinforcement }) =>
      reinforcement.kind === 'bars' ? barsText(reinforcement[input]) : '',
    );
    return `${faceWord(input, from)} ${bars.join(' → ')}`;
  }
  const { symbol, key, kind } = NUMBERS[input];
  const ends = [from[key], section[key]].map((value) =>
    formatQuantity(value, kind, units, { hideUnit: true }),
  );
  return `${symbol ?? fcSymbol} ${ends.join(' → ')} ${unitLabel(kind, units)}`;
}
