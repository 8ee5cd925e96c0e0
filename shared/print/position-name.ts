import type { SteelLine } from '../engine/evaluation.ts';
import type { SectionInput } from '../engine/section.ts';
import { faceWord } from './face-word.ts';

/** Where a line of steel lies in the beam as built: `bottom`, `top`, `skin`, `stirrups`. */
export const positionName = (
  position: SteelLine['position'],
  section: Pick<SectionInput, 'flange'>,
): string => (position === 'tension' || position === 'compression' ? faceWord(position, section) : position);
