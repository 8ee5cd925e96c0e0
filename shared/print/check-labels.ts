import type { CheckId } from '../engine/evaluation.ts';
import type { RuleSetId } from '../engine/section.ts';
import { codeSymbols } from './code-symbols.ts';

export interface CheckLabel {
  readonly name: string;
  readonly symbol: string;
}

const CHECKS: Readonly<Record<CheckId, CheckLabel>> = {
  'bar-fit': { name: 'Bar fit', symbol: 'b' },
  'hanger-bars': { name: 'Hanger bars', symbol: '' },
  strength: { name: 'Strength', symbol: 'φMn' },
  'curvature-ductility': { name: 'Curvature ductility', symbol: 'μφ' },
  'tension-strain': { name: 'Tension strain', symbol: 'εt' },
  'least-steel': { name: 'Least steel', symbol: 'As' },
  'depth-to-width': { name: 'Depth to width', symbol: 'h/b' },
  'depth-cap': { name: 'Depth cap', symbol: 'h' },
  'column-width': { name: 'Column width', symbol: 'b' },
  'compression-share': { name: 'Compression share', symbol: 'A′s/As' },
  'bar-rules': { name: 'Bar rules', symbol: '' },
  'crack-control': { name: 'Crack control', symbol: 's' },
  'compression-ties': { name: 'Compression ties', symbol: 's' },
  shear: { name: 'Shear', symbol: 'φVn' },
  'stirrup-spacing': { name: 'Stirrup spacing', symbol: 's' },
  'least-depth': { name: 'Least depth', symbol: 'h' },
  'axis-depth': { name: 'Neutral axis depth', symbol: 'x/d' },
  'most-steel': { name: 'Most steel', symbol: 'As' },
  'skin-steel': { name: 'Skin reinforcement', symbol: 's' },
  'seismic-width': { name: 'Seismic: width', symbol: 'b' },
  'seismic-span': { name: 'Seismic: clear span', symbol: 'ln/d' },
  'seismic-steel': { name: 'Seismic: steel ratio', symbol: 'ρ' },
  'seismic-bars': { name: 'Seismic: continuous bars', symbol: '' },
  'seismic-reversal': { name: 'Seismic: reversed moment', symbol: 'Mn⁺/Mn⁻' },
  'hoop-spacing': { name: 'Seismic: hoop spacing', symbol: 's' },
};

/** A check's name, its symbol in the letters of a code; in those of ACI 318 where none is told. */
export function checkLabel(id: CheckId, code?: RuleSetId): CheckLabel {
  const label = CHECKS[id];
  if (code === undefined) return label;
  const { designMoment, designShear, compressionSteel, spanDepth } = codeSymbols(code);
  if (id === 'strength') return { ...label, symbol: designMoment };
  if (id === 'shear') return { ...label, symbol: designShear };
  if (id === 'least-depth') return { ...label, symbol: spanDepth };
  return id === 'compression-share' ? { ...label, symbol: `${compressionSteel}/As` } : label;
}
