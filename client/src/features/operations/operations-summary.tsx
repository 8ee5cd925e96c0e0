import type { Operations } from '#shared/contract/operations.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { rateText } from './work-words.ts';

/** The whole in one line: workers, rate, what is under way against what may be. */
export function OperationsSummary({ workers, load }: Operations) {
  const living = workers.filter(({ end }) => end === null);
  const perSecond = living.reduce((sum, worker) => sum + worker.sectionsPerSecond, 0);
  const share = Math.min(1, load.sections / load.limit);
  const figures = [
    { value: formatWhole(living.length), what: living.length === 1 ? 'worker' : 'workers' },
    { value: rateText(perSecond), what: 'million sections a second' },
    { value: formatWhole(load.sections), what: `of ${formatWhole(load.limit)} sections under way` },
  ];
  return (
    <div className="grid gap-2">
      <ul className="flex flex-wrap gap-x-10 gap-y-2">
        {figures.map(({ value, what }) => (
          <li key={what}>
            <span className="num block text-2xl font-medium">{value}</span>
            <span className="text-muted">{what}</span>
          </li>
        ))}
      </ul>
      <div className="h-2 max-w-3xl border border-concrete-edge bg-concrete" aria-hidden="true">
        <div className="h-full bg-steel-solid" style={{ width: `${share * 100}%` }} />
      </div>
    </div>
  );
}
