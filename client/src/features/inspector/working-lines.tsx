import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { WorkingStep } from '#shared/engine/evaluation.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';

const TOPICS: readonly { readonly topic: WorkingStep['topic']; readonly title: string }[] = [
  { topic: 'materials', title: 'Materials' },
  { topic: 'ultimate', title: 'Ultimate state' },
  { topic: 'strength', title: 'Strength' },
  { topic: 'limits', title: 'Limits' },
  { topic: 'elastic', title: 'Cracked elastic section' },
  { topic: 'ductility', title: 'Ductility' },
  { topic: 'quantities', title: 'Quantities' },
];

interface WorkingLinesProps {
  readonly steps: readonly WorkingStep[];
  readonly units: UnitSystem;
  readonly digits: number;
}

function Line({ step, units, digits }: Omit<WorkingLinesProps, 'steps'> & { readonly step: WorkingStep }) {
  return (
    <li className="break-inside-avoid border-t border-rule py-1.5">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <p>
          <span className="font-medium">{step.symbol}</span>{' '}
          <span className="text-muted">= {step.formula}</span>
        </p>
        <p className="num ml-auto font-medium">{formatQuantity(step.value, step.kind, units, { digits })}</p>
      </div>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 text-xs text-muted">
        <p className="num">
          {step.inputs
            .map(({ symbol, value, kind }) => `${symbol} ${formatQuantity(value, kind, units, { digits })}`)
            .join(', ')}
        </p>
        <p className="ml-auto">{step.clause}</p>
      </div>
    </li>
  );
}

/** The working a checker ticks: formula, the numbers put in, the result, the clause. */
export function WorkingLines({ steps, units, digits }: WorkingLinesProps) {
  return TOPICS.map(({ topic, title }) => {
    const own = steps.filter((step) => step.topic === topic);
    if (own.length === 0) return null;
    return (
      <section key={topic} className="pb-3">
        <h4 className="break-after-avoid pb-1 text-xs font-semibold text-muted">{title}</h4>
        <ol>
          {own.map((step) => (
            <Line key={step.id} step={step} units={units} digits={digits} />
          ))}
        </ol>
      </section>
    );
  });
}
