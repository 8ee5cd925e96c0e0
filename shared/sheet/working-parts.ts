import type { UnitSystem } from '../contract/design-basis.ts';
import type { WorkingStep } from '../engine/evaluation.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { figuresOf } from './figures.ts';
import { isSentence, splitRemark } from './formula-tex.ts';
import type { Numbering } from './numbering.ts';
import { residualText } from './residual-text.ts';
import type { WorkingLine } from './sheet.ts';

/** What the parts of a sheet are made of: topics of the working, and the residual, which stands after the layers. */
type Chosen = WorkingStep['topic'] | 'residual';

/** Shown in tables of their own: forces layer by layer, quantities line by line. */
const isInTable = ({ id, topic }: WorkingStep) =>
  topic === 'quantities' || /^(strain|stress|force)-\d+$/.test(id);

const KNOWN: readonly Chosen[] = [
  'materials',
  'ultimate',
  'residual',
  'strength',
  'limits',
  'elastic',
  'ductility',
];

const topicOf = ({ id, topic }: WorkingStep): Chosen => (id === 'residual' ? 'residual' : topic);

/** Lines of the frozen working on some topics; `rest`: on those that this file does not know. */
export function workingPart(
  working: readonly WorkingStep[],
  topics: readonly Chosen[] | 'rest',
  { units, numbering }: { readonly units: UnitSystem; readonly numbering: Numbering },
): WorkingLine[] {
  const isWanted = (step: WorkingStep) =>
    topics === 'rest' ? !KNOWN.includes(topicOf(step)) : topics.includes(topicOf(step));
  return working
    .filter((step) => !isInTable(step) && isWanted(step))
    .sort((a, b) => (topics === 'rest' ? 0 : topics.indexOf(topicOf(a)) - topics.indexOf(topicOf(b))))
    .map((step) => lineOf(step, units, numbering));
}

function lineOf(step: WorkingStep, units: UnitSystem, numbering: Numbering): WorkingLine {
  const print = (value: number, kind: WorkingStep['kind']) =>
    formatQuantity(value, kind, units, { digits: figuresOf(kind) });
  return {
    id: step.id,
    number: numbering.next(),
    // What equilibrium leaves over is rounding: there is nothing to compare it with.
    value: step.id === 'residual' ? null : step.value,
    kind: step.kind,
    symbol: step.symbol,
    ...formulaParts(step.formula),
    inputs: step.inputs.map(({ symbol, value, kind }) => ({ symbol, text: print(value, kind) })),
    result: step.id === 'residual' ? residualText(step.value) : print(step.value, step.kind),
    clause: step.clause,
  };
}

function formulaParts(formula: string): Pick<WorkingLine, 'relation' | 'expression' | 'remark'> {
  if (isSentence(formula)) return { relation: ':', expression: '', remark: formula };
  const parts = splitRemark(formula);
  return { ...parts, relation: parts.expression.includes('=') ? 'from' : '=' };
}
