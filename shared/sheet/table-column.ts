import type { UnitSystem } from '../contract/design-basis.ts';
import { unitLabel, type DisplayKind } from '../print/units.ts';
import type { SheetColumn } from './sheet.ts';

export const wordColumn = (label: string): SheetColumn => ({ label, isFigure: false });

export const figureColumn = (label: string): SheetColumn => ({ label, isFigure: true });

export const verdictColumn = (label: string): SheetColumn => ({ label, isFigure: false, isVerdict: true });

/** A column of figures with the unit in its head. */
export function unitColumn(label: string, kind: DisplayKind, units: UnitSystem): SheetColumn {
  const unit = unitLabel(kind, units);
  return figureColumn(unit === '' ? label : `${label}, ${unit}`);
}
