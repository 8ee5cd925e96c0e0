import { Fragment } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { WorkingStep } from '#shared/engine/evaluation.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

const TOPIC_NAME: Readonly<Record<WorkingStep['topic'], string>> = {
  materials: 'Materials',
  ultimate: 'Section at ultimate',
  strength: 'Strength',
  elastic: 'Cracked section',
  ductility: 'Curvature ductility',
  limits: 'Limits',
  quantities: 'Quantities',
};

interface WorkingTableProps {
  readonly working: readonly WorkingStep[];
  readonly units: UnitSystem;
}

/** Line by line what a checker would work with a calculator: formula, numbers put in, result, clause. */
export function WorkingTable({ working, units }: WorkingTableProps) {
  const topics = [...new Set(working.map((step) => step.topic))];
  return (
    <TableFrame label="Working">
      <thead>
        <tr>
          <th scope="col">Symbol</th>
          <th scope="col">From</th>
          <th scope="col">With</th>
          <th scope="col" className="figure">
            Result
          </th>
          <th scope="col">Clause</th>
        </tr>
      </thead>
      {topics.map((topic) => (
        <tbody key={topic}>
          <tr>
            <th scope="rowgroup" colSpan={5} className="pt-4 font-semibold">
              {TOPIC_NAME[topic]}
            </th>
          </tr>
          {working
            .filter((step) => step.topic === topic)
            .map((step) => (
              <WorkingRow key={step.id} step={step} units={units} />
            ))}
        </tbody>
      ))}
    </TableFrame>
  );
}

function WorkingRow({ step, units }: { readonly step: WorkingStep; readonly units: UnitSystem }) {
  return (
    <tr>
      <th scope="row" className="font-mono font-normal whitespace-nowrap">
        {step.symbol}
      </th>
      <td className="min-w-36">{step.formula}</td>
      <td className="num min-w-40 text-muted">
        {step.inputs.map((input, i) => (
          <Fragment key={`${i}-${input.symbol}`}>
            {i > 0 && ', '}
            <span className="whitespace-nowrap">
              {input.symbol} {formatQuantity(input.value, input.kind, units, { digits: 4 })}
            </span>
          </Fragment>
        ))}
      </td>
      <td className="figure font-medium">{formatQuantity(step.value, step.kind, units, { digits: 4 })}</td>
      <td className="min-w-28 text-muted">{step.clause}</td>
    </tr>
  );
}
