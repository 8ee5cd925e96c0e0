import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { formatDifferenceTo, formatMoney, formatNumber } from '#shared/print/format-quantity.ts';
import { unitLabel } from '#shared/print/units.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import { Button } from '#client/src/ui/button.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { VerdictMark } from '#client/src/ui/verdict-mark.tsx';
import {
  betterNeighbour,
  RATE_SHIFT,
  rateShiftsOf,
  STEP_MEASURES,
  type Neighbour,
  type RateShift,
} from './neighbours.ts';
import { stepText } from './step-text.ts';

interface NeighbourTableProps {
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
  readonly neighbours: readonly Neighbour[];
  readonly units: UnitSystem;
  /** For readers who may not see rates. */
  readonly isMoneyHidden: boolean;
  /** Goes to a neighbour that was swept; absent where there is nowhere to go. */
  readonly onSelect?: ((index: number) => void) | undefined;
}

/** Whether a better section lies next to this one, in words. */
function Headline({ section, evaluation, neighbours, units, isMoneyHidden }: NeighbourTableProps) {
  const meeting = neighbours.filter((one) => one.meets).length;
  const leading = isMoneyHidden || evaluation.measures.costPerM === null ? 'steelKgPerM' : 'costPerM';
  const own = evaluation.measures[leading];
  const better = betterNeighbour(neighbours, own, leading);
  const word = leading === 'costPerM' ? 'cheaper' : 'lighter in steel';
  const all = `${neighbours.length} sections lie one step away; ${meeting} ${meeting === 1 ? 'meets' : 'meet'} the listed checks`;
  if (better === null || own === null)
    return <p className="text-sm">{`${all}, and none of those is ${word}.`}</p>;
  const difference = formatDifferenceTo(
    better.values[leading]!,
    own,
    measureLabel(leading, units).kind,
    units,
  );
  const currency = leading === 'costPerM' ? `${evaluation.quantities.cost?.currency ?? ''} ` : '';
  return (
    <p className="text-sm">
      {`${all}. One is ${word}: `}
      <span className="font-medium">
        {stepText(better, section, units, codeSymbols(evaluation.ruleSet.id).fc)}
      </span>
      ,{' '}
      <span className="num">
        {currency}
        {difference}
        {unitLabel(measureLabel(leading, units).kind, units).replace(/^(?!\/)/, ' ')}
      </span>
      .
    </p>
  );
}

/** Each input one step down and up: what changes, and whether the section still meets its checks. */
export function NeighbourTable(props: NeighbourTableProps) {
  const { section, evaluation, neighbours, units, isMoneyHidden, onSelect } = props;
  const columns = STEP_MEASURES.filter((id) => !isMoneyHidden || id !== 'costPerM').filter(
    (id) => evaluation.measures[id] !== null,
  );
  return (
    <div className="grid gap-3">
      <Headline {...props} />
      <TableFrame label="Sections one step away">
        <thead>
          <tr>
            <th scope="col">Step, and its checks</th>
            {columns.map((id) => {
              const { symbol, unit } = measureLabel(id, units, evaluation.ruleSet.id);
              return (
                <th key={id} scope="col" className="figure">
                  {symbol}
                  <span className="block text-2xs font-normal">
                    {id === 'costPerM' ? `${evaluation.quantities.cost?.currency ?? ''}${unit}` : unit}
                  </span>
                </th>
              );
            })}
          </tr>
        </thead>
        <tbody>
          {neighbours.map((one) => (
            <tr key={`${one.input} ${JSON.stringify(one.section)}`}>
              <th scope="row" className="min-w-32 font-normal">
                <StepName
                  neighbour={one}
                  text={stepText(one, section, units, codeSymbols(evaluation.ruleSet.id).fc)}
                  onSelect={onSelect}
                />
                <span className="block">
                  <VerdictMark
                    verdict={one.meets ? 'meets' : 'fails'}
                    word={one.meets ? 'meets' : failingWords(one)}
                  />
                </span>
              </th>
              {columns.map((id) => (
                <td key={id} className="figure">
                  {change(one.values[id], evaluation.measures[id], measureLabel(id, units).kind, units)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </TableFrame>
      {!isMoneyHidden && <RateShifts evaluation={evaluation} units={units} />}
    </div>
  );
}

const MOST_NAMED = 2;

function failingWords({ failing }: Neighbour): string {
  const names = failing.slice(0, MOST_NAMED).map((id) => checkLabel(id).name.toLowerCase());
  const more = failing.length - names.length;
  return `${names.join(', ')}${more > 0 ? ` + ${more}` : ''}`;
}

type Kind = Parameters<typeof formatDifferenceTo>[2];
const change = (value: number | null, own: number | null, kind: Kind, units: UnitSystem): string =>
  value === null || own === null ? '' : formatDifferenceTo(value, own, kind, units);

function StepName(props: {
  readonly neighbour: Neighbour;
  readonly text: string;
  readonly onSelect?: ((index: number) => void) | undefined;
}) {
  const { neighbour, text, onSelect } = props;
  const { index } = neighbour;
  if (onSelect === undefined) return text;
  if (index === null)
    return (
      <>
        {text} <span className="text-2xs text-muted">not swept</span>
      </>
    );
  return (
    <Button look="text" className="-ml-1 text-sm" onClick={() => onSelect(index)}>
      {text}
    </Button>
  );
}

const RATE_NAME: Readonly<Record<RateShift['rate'], string>> = {
  bars: 'Longitudinal bars',
  stirrups: 'Stirrups',
  concrete: 'Concrete',
  formwork: 'Formwork',
};

/** What a quarter more or less on each rate does to the cost of this section. */
function RateShifts({ evaluation, units }: { readonly evaluation: Evaluation; readonly units: UnitSystem }) {
  const shifts = rateShiftsOf(evaluation);
  const { cost } = evaluation.quantities;
  if (cost === null || shifts.length === 0) return null;
  const percent = RATE_SHIFT * 100;
  return (
    <TableFrame label="Rates a quarter lower and higher">
      <thead>
        <tr>
          <th scope="col">Rate ± {percent} %</th>
          <th scope="col" className="figure">
            Share of the cost
          </th>
          <th scope="col" className="figure">
            Cost ±
          </th>
        </tr>
      </thead>
      <tbody>
        {shifts.map(({ rate, byQuarter, shareOfCost }) => (
          <tr key={rate}>
            <th scope="row" className="font-normal">
              {RATE_NAME[rate]}
            </th>
            <td className="figure">{formatNumber(shareOfCost * 100, 3)} %</td>
            <td className="figure">
              ± {formatMoney(byQuarter, cost.currency, 'money-per-length', units)} (
              {formatNumber(100 * RATE_SHIFT * shareOfCost, 2)} %)
            </td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
